import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeEach, expect, test } from "vitest";
import { clearances } from "~/db/schema/handovers";
import { acknowledgements, tags } from "~/db/schema/tags";
import { conflicts } from "~/db/schema/walks";
import {
  type AcknowledgeInput,
  acknowledge,
  acknowledgeSchema,
} from "~/domain/acknowledgements/acknowledge";
import type { Actor } from "~/domain/actor";
import { handOver } from "~/domain/handovers/hand-over";
import { allowRun } from "~/domain/tags/allow-run";
import { type SignOffInput, signOff } from "~/domain/tags/sign-off";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import {
  accepted,
  allGood,
  codeOf,
  HOUR,
  makeTruckToWalk,
  sendWalk,
  signature,
  storedWalk,
  type TruckToWalk,
  tagged,
  tagsOf,
  walkBody,
} from "./walk-bodies";

let clock: TestClock;
let carrier: TestCarrier;
let first: Actor;
let next: Actor;
let mechanic: Actor;
let truck: TruckToWalk;

beforeEach(async () => {
  const db = testDb();
  clock = new TestClock();
  carrier = await makeCarrier(db, clock);
  first = await makePerson(db, carrier, ["driver"]);
  next = await makePerson(db, carrier, ["driver"]);
  mechanic = await makePerson(db, carrier, ["mechanic"]);
  truck = await makeTruckToWalk(db, carrier, clock);
});

const send = (by: Actor, wish: Parameters<typeof walkBody>[1] = {}, age = {}) =>
  sendWalk(testDb(), by, walkBody(truck, wish), clock, age);

/** A yellow that limits the truck and does not hold it. */
async function hang(by = first, [checkKey, problemKey] = ["rear.sight-glass", "cannot-read"]) {
  const found = tagged(truck, checkKey!, problemKey!);
  accepted(await send(by, found));
  return found.tags[0]!.id;
}

const repair = async (tagId: string, by = mechanic) =>
  accepted(
    await signOff(
      testDb(),
      by,
      {
        id: uuidv7(),
        tagId,
        kind: "repaired",
        work: "replaced",
        parts: null,
        roadTested: null,
        remote: false,
        signature,
      } as SignOffInput,
      clock,
    ),
  ).id;

const inside = (items: string[], more: object = {}) => ({
  acknowledgement: {
    id: uuidv7(),
    items,
    satisfied: true,
    disputesSignOffId: null,
    note: null,
    ...more,
  },
});

const ask = (items: string[], more: Partial<AcknowledgeInput> = {}): AcknowledgeInput => ({
  id: uuidv7(),
  truckId: truck.truckId,
  items,
  satisfied: true,
  disputesSignOffId: null,
  note: null,
  signature,
  ...more,
});
const said = (items: string[], more: Partial<AcknowledgeInput> = {}, by = next) =>
  acknowledge(testDb(), by, ask(items, more), clock);

const hand = (to: Actor) =>
  makePerson(testDb(), carrier, ["dispatcher"]).then((dispatcher) =>
    handOver(
      testDb(),
      dispatcher,
      {
        id: uuidv7(),
        truckId: truck.truckId,
        driverId: to.personId,
        runName: "Run",
        needs: {
          pressureOffLoad: false,
          towing: false,
          hazmat: false,
          vacuumPa: 0,
          fillL: 0,
          hoseM: 0,
        },
      },
      clock,
    ),
  );

const mayClear = async (by: Actor) => {
  const row = await truckRow(testDb(), truck);
  const [own] = await testDb()
    .select()
    .from(clearances)
    .where(and(eq(clearances.truckId, truck.truckId), eq(clearances.driverId, by.personId)));
  return own !== undefined && own.tagsSeq === row.tagsSeq && own.validUntil > clock.now();
};

test("an acknowledgement inside a walk that covers every open tag and sign-off clears its driver", async () => {
  const db = testDb();
  const open = await hang();
  const signed = await repair(await hang(first, ["rear.lamps", "tail"]));
  const walk = walkBody(truck, inside([open, signed]));
  expect(accepted(await sendWalk(db, next, walk, clock)).standing).toBe("limited");
  expect(await mayClear(next)).toBe(true);
  const [row] = await db
    .select()
    .from(acknowledgements)
    .where(eq(acknowledgements.walkId, walk.id));
  expect(row).toMatchObject({
    id: walk.acknowledgement!.id,
    driverId: next.personId,
    items: [open, signed],
    satisfied: true,
    signature: walk.signature,
  });
  expect(codeOf(await hand(next))).toBe("ok");
});

test("one item left out, a tag or a sign-off, and nobody hands over the key", async () => {
  const open = await hang();
  const signed = await repair(await hang(first, ["rear.lamps", "tail"]));
  for (const [items, unseen] of [
    [[open], 1],
    [[signed], 1],
    [[], 2],
    [[uuidv7(), truck.truckId], 2],
  ] as const) {
    const driver = await makePerson(testDb(), carrier, ["driver"]);
    accepted(await send(driver, inside([...items])));
    expect(await mayClear(driver), String(items)).toBe(false);
    const refused = await hand(driver);
    expect(refused.ok || refused.refusal.reasons).toEqual([
      { code: "driver-has-not-acknowledged", count: unseen },
    ]);
    clock.turn(1000);
  }
});

test("a tag hung while the walk was on its way is not acknowledged by it", async () => {
  const open = await hang();
  const walk = walkBody(truck, inside([open]));
  clock.turn(60_000);
  const meanwhile = await hang(first, ["rear.placards", "plate"]);
  accepted(await sendWalk(testDb(), next, walk, clock, { ageMs: 120_000 }));
  expect(await mayClear(next)).toBe(false);
  expect(accepted(await said([meanwhile])).standing).toBe("limited");
  expect(await mayClear(next)).toBe(true);
});

test("a tag hung after everything was acknowledged takes every other driver's clearance away", async () => {
  const open = await hang();
  accepted(await send(next, inside([open])));
  expect(await mayClear(next)).toBe(true);
  clock.turn(60_000);
  await hang(first, ["rear.placards", "plate"]);
  expect(await mayClear(next)).toBe(false);
  expect(await mayClear(first)).toBe(true);
});

test("a tag seen worse, and a leave to run, are events of their own to acknowledge", async () => {
  const open = await hang();
  accepted(await send(next, inside([open])));
  clock.turn(60_000);
  const worse = {
    id: uuidv7(),
    tagId: open,
    seen: "worse" as const,
    colour: null,
    note: "Cannot see a thing",
  };
  accepted(await send(first, { seenTags: [worse] }));
  expect(await mayClear(next)).toBe(false);
  accepted(await said([worse.id]));
  expect(await mayClear(next)).toBe(true);
  clock.turn(60_000);
  const leave = { id: uuidv7(), tagId: open, limit: null, untilDay: "2026-06-05", signature };
  accepted(await allowRun(testDb(), mechanic, leave, clock));
  expect(await mayClear(next)).toBe(false);
  accepted(await said([leave.id]));
  expect(await mayClear(next)).toBe(true);
});

test("what a driver hung themself needs no acknowledgement; what was repaired of it does", async () => {
  const own = await hang(first);
  expect(await mayClear(first)).toBe(true);
  const signed = await repair(own);
  expect(await mayClear(first)).toBe(false);
  accepted(await said([signed], {}, first));
  expect(await mayClear(first)).toBe(true);
});

test("an acknowledgement without a walk clears nobody, and one driver's counts for no other", async () => {
  const open = await hang();
  expect(accepted(await said([open])).standing).toBe("limited");
  expect(await mayClear(next)).toBe(false);
  accepted(await send(next));
  expect(await mayClear(next)).toBe(true);
  const third = await makePerson(testDb(), carrier, ["driver"]);
  accepted(await send(third));
  expect(await mayClear(third)).toBe(false);
});

test("not satisfied, inside a walk, holds the truck for a second certifier", async () => {
  const db = testDb();
  const signed = await repair(await hang(first, ["rear.lamps", "tail"]));
  const note = "It still flickers";
  const more = { satisfied: false, disputesSignOffId: signed, note };
  expect(accepted(await send(next, inside([signed], more))).standing).toBe("held");
  const [dispute] = await db
    .select()
    .from(tags)
    .where(and(eq(tags.truckId, truck.truckId), eq(tags.kind, "not-satisfied")));
  expect(dispute).toMatchObject({
    colour: "red",
    note,
    disputesSignOffId: signed,
    raisedBy: next.personId,
    signedOffAt: null,
  });
  const end = (by: Actor) =>
    signOff(
      db,
      by,
      {
        id: uuidv7(),
        tagId: dispute!.id,
        kind: "not-needed",
        reason: "Looked at it twice",
        remote: false,
        signature,
      },
      clock,
    );
  expect(codeOf(await end(mechanic))).toBe("second-certifier");
  expect(codeOf(await end(next))).not.toBe("ok");
  expect(codeOf(await end(await makePerson(db, carrier, ["mechanic"])))).toBe("ok");
});

test("not satisfied with a sign-off that is not this truck's: the whole walk is refused, nothing is stored", async () => {
  const db = testDb();
  const second = await makeTruckToWalk(db, carrier, clock);
  const found = tagged(second, "rear.lamps", "tail");
  accepted(await sendWalk(db, first, walkBody(second, found), clock));
  const theirs = await repair(found.tags[0]!.id);
  for (const disputesSignOffId of [theirs, uuidv7()]) {
    const walk = walkBody(truck, inside([], { satisfied: false, disputesSignOffId }));
    expect(codeOf(await sendWalk(db, next, walk, clock))).toBe("not-found");
    expect(await storedWalk(db, truck, walk.id)).toBeNull();
    expect(codeOf(await said([], { satisfied: false, disputesSignOffId }))).toBe("not-found");
  }
  expect(await tagsOf(db, truck)).toEqual([]);
});

test("K7: an acknowledgement on another carrier's truck is a 404", async () => {
  const elsewhere = await makeCarrier(testDb(), clock);
  const stranger = await makePerson(testDb(), elsewhere, ["driver"]);
  expect(codeOf(await said([], {}, stranger))).toBe("not-found");
});

test("K4: the same acknowledgement ten times at once is one; the same id with other items is refused", async () => {
  const db = testDb();
  const input = ask([await hang()]);
  const results = await Promise.all(
    Array.from({ length: 10 }, () => acknowledge(db, next, input, clock)),
  );
  expect(new Set(results.map((result) => JSON.stringify(result)))).toHaveLength(1);
  expect(codeOf(results[0]!)).toBe("ok");
  const stored = eq(acknowledgements.id, input.id);
  expect(await db.select().from(acknowledgements).where(stored)).toHaveLength(1);
  const other = { ...input, items: [] };
  expect(codeOf(await acknowledge(db, next, other, clock))).toBe("same-id-other-body");
  expect(codeOf(await acknowledge(db, first, input, clock))).toBe("same-id-other-body");
  const kept = await db.select().from(conflicts).where(eq(conflicts.recordId, input.id));
  expect(kept).toHaveLength(2);
});

test("a sign-off older than the review window needs no acknowledgement", async () => {
  await repair(await hang(first, ["rear.lamps", "tail"]));
  clock.turn(29 * 24 * HOUR);
  accepted(await send(next, { answers: allGood(truck, "before", true) }));
  expect(await mayClear(next)).toBe(false);
  clock.turn(2 * 24 * HOUR);
  accepted(await send(next));
  expect(await mayClear(next)).toBe(true);
});

test("an acknowledgement that is not whole is refused by its schema, field by field", () => {
  const cases: [object, string][] = [
    [{ items: ["x"] }, "items.0"],
    [{ items: Array.from({ length: 501 }, () => uuidv7()) }, "items"],
    [{ satisfied: "yes" }, "satisfied"],
    [{ note: "x".repeat(1001) }, "note"],
    [{ signature: { name: "", wording: "test" } }, "signature.name"],
    [{ truckId: "T-118" }, "truckId"],
  ];
  for (const [more, path] of cases) {
    const parsed = acknowledgeSchema.safeParse({ ...ask([]), ...more });
    expect(parsed.error?.issues.map((issue) => issue.path.join("."))).toEqual([path]);
  }
});
