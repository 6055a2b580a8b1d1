import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeEach, expect, test } from "vitest";
import { changes } from "~/db/schema/carriers";
import { mailOutbox } from "~/db/schema/people";
import { signOffs, tags } from "~/db/schema/tags";
import { conflicts } from "~/db/schema/walks";
import { acknowledge } from "~/domain/acknowledgements/acknowledge";
import type { Actor, Role } from "~/domain/actor";
import { changeTruck } from "~/domain/gate/change-truck";
import { changePolicy } from "~/domain/policy/change-policy";
import { DEFAULT_POLICY } from "~/domain/policy/settings";
import { allowRun } from "~/domain/tags/allow-run";
import { type SignOffInput, signOff } from "~/domain/tags/sign-off";
import { testDb } from "./database";
import {
  makeCarrier,
  makePerson,
  makeTruck,
  type TestCarrier,
  TestClock,
  truckRow,
} from "./factories";

const clock = new TestClock();
const signature = { name: "A Signer", wording: "test" };
let carrier: TestCarrier;
let driver: Actor;
let mechanic: Actor;
let key: { carrierId: string; truckId: string };

beforeEach(async () => {
  const db = testDb();
  carrier = await makeCarrier(db, clock);
  driver = await makePerson(db, carrier, ["driver"]);
  mechanic = await makePerson(db, carrier, ["mechanic"]);
  const { carrierId, truckId } = await makeTruck(db, carrier, clock, { bare: true });
  key = { carrierId, truckId };
});

async function hang(more: Partial<typeof tags.$inferInsert> = {}): Promise<string> {
  const id = uuidv7();
  await changeTruck(
    testDb(),
    key,
    async (change) => {
      await change.tx.insert(tags).values({
        ...key,
        id,
        colour: "red",
        title: "Lamps: out",
        roadSafety: false,
        raisedBy: driver.personId,
        raisedAt: clock.now(),
        receivedAt: clock.now(),
        ...more,
      });
      change.moveTags();
    },
    { clock },
  );
  return id;
}

function repaired(tagId: string, more: Partial<SignOffInput> = {}): SignOffInput {
  return {
    id: uuidv7(),
    tagId,
    kind: "repaired",
    work: "replaced",
    parts: null,
    roadTested: null,
    remote: false,
    signature,
    ...more,
  } as SignOffInput;
}

const codeOf = (result: { ok: true } | { ok: false; refusal: { code: string } }) =>
  result.ok ? "ok" : result.refusal.code;

test("K3, K10: a mechanic's sign-off ends a red tag, stores who and what, and frees the key", async () => {
  const db = testDb();
  const tagId = await hang();
  expect((await truckRow(db, key)).openReds).toBe(1);
  const result = await signOff(db, mechanic, repaired(tagId), clock);
  expect(result.ok && result.value.standing).toBe("walk-due");
  expect((await truckRow(db, key)).openReds).toBe(0);
  const [stored] = await db.select().from(signOffs).where(eq(signOffs.tagId, tagId));
  expect(stored).toMatchObject({
    kind: "repaired",
    work: "replaced",
    signedBy: mechanic.personId,
    ownFinding: false,
  });
  const mail = await db.select().from(mailOutbox).where(eq(mailOutbox.template, "key-freed"));
  expect(mail.some((one) => one.recipient.includes(driver.personId))).toBe(true);
});

test("K10: dispatchers and plain drivers never sign off, certifier flag or not", async () => {
  const db = testDb();
  const tagId = await hang();
  const roles: [Role[], boolean][] = [
    [["dispatcher"], false],
    [["dispatcher"], true],
    [["driver"], false],
  ];
  for (const [list, certifier] of roles) {
    const person = await makePerson(db, carrier, list, { certifier });
    expect(codeOf(await signOff(db, person, repaired(tagId), clock)), list.join()).toBe(
      "not-allowed",
    );
  }
});

test("K10: a mechanic may sign off what they found at the bench, and the record says so", async () => {
  const db = testDb();
  const both = await makePerson(db, carrier, ["driver", "mechanic"]);
  const bench = await hang({ raisedBy: both.personId });
  expect(codeOf(await signOff(db, both, repaired(bench), clock))).toBe("ok");
  const [stored] = await db.select().from(signOffs).where(eq(signOffs.tagId, bench));
  expect(stored?.ownFinding).toBe(true);
});

test("K10: two people, where the carrier demands it", async () => {
  const db = testDb();
  await changePolicy(db, mechanic, { ...DEFAULT_POLICY, twoPeople: true }, clock);
  const own = await hang({ raisedBy: mechanic.personId });
  expect(codeOf(await signOff(db, mechanic, repaired(own), clock))).toBe("two-people");
});

test("K10: from photos only where the check allows, never on a road-safety part", async () => {
  const db = testDb();
  const remote = { remote: true };
  expect(codeOf(await signOff(db, mechanic, repaired(await hang(), remote), clock))).toBe(
    "not-from-photos",
  );
  const brakes = await hang({ remote: true, roadSafety: true });
  expect(codeOf(await signOff(db, mechanic, repaired(brakes, remote), clock))).toBe(
    "not-from-photos",
  );
  const cap = await hang({ remote: true });
  expect(codeOf(await signOff(db, mechanic, repaired(cap, remote), clock))).toBe("ok");
});

test("K10: the driver-fix list is off by default, and opens only what is on it", async () => {
  const db = testDb();
  const bulb = await hang({ colour: "yellow", driverFix: true });
  expect(codeOf(await signOff(db, driver, repaired(bulb), clock))).toBe("not-allowed");
  await changePolicy(db, mechanic, { ...DEFAULT_POLICY, driverFix: true }, clock);
  expect(codeOf(await signOff(db, driver, repaired(bulb), clock))).toBe("ok");
  const other = await hang({ colour: "yellow" });
  expect(codeOf(await signOff(db, driver, repaired(other), clock))).toBe("not-allowed");
});

test("not satisfied hangs a red tag that only a second certifier ends", async () => {
  const db = testDb();
  const second = await makePerson(db, carrier, ["mechanic"]);
  const tagId = await hang();
  const first = await signOff(db, mechanic, repaired(tagId), clock);
  const disputesSignOffId = first.ok ? first.value.id : "";
  const input = {
    id: uuidv7(),
    truckId: key.truckId,
    items: [disputesSignOffId],
    satisfied: false,
  };
  const said = await acknowledge(
    db,
    driver,
    { ...input, disputesSignOffId, note: "Still dark", signature },
    clock,
  );
  expect(said.ok && said.value.standing).toBe("held");
  const [dispute] = await db
    .select()
    .from(tags)
    .where(and(eq(tags.truckId, key.truckId), eq(tags.kind, "not-satisfied")));
  expect(codeOf(await signOff(db, mechanic, repaired(dispute!.id), clock))).toBe(
    "second-certifier",
  );
  expect(codeOf(await signOff(db, driver, repaired(dispute!.id), clock))).toBe("not-allowed");
  expect(codeOf(await signOff(db, second, repaired(dispute!.id), clock))).toBe("ok");
});

test("K4: the same sign-off sent twenty times at once is stored once, with one answer", async () => {
  const db = testDb();
  const input = repaired(await hang());
  const results = await Promise.all(
    Array.from({ length: 20 }, () => signOff(db, mechanic, input, clock)),
  );
  expect(new Set(results.map((result) => JSON.stringify(result)))).toHaveLength(1);
  expect(results[0]?.ok).toBe(true);
  expect(await db.select().from(signOffs).where(eq(signOffs.id, input.id))).toHaveLength(1);
});

test("K4: the same id with another body is refused, and the second body is kept", async () => {
  const db = testDb();
  const input = repaired(await hang());
  expect(codeOf(await signOff(db, mechanic, input, clock))).toBe("ok");
  const other = { ...input, work: "cleaned" } as SignOffInput;
  expect(codeOf(await signOff(db, mechanic, other, clock))).toBe("same-id-other-body");
  expect(codeOf(await signOff(db, mechanic, other, clock))).toBe("same-id-other-body");
  const kept = await db.select().from(conflicts).where(eq(conflicts.recordId, input.id));
  expect(kept).toHaveLength(1);
  expect(kept[0]?.body).toMatchObject({ work: "cleaned" });
});

test("a tag already ended, and another carrier's tag, are refused", async () => {
  const db = testDb();
  const tagId = await hang();
  expect(codeOf(await signOff(db, mechanic, repaired(tagId), clock))).toBe("ok");
  expect(codeOf(await signOff(db, mechanic, repaired(tagId), clock))).toBe("already-ended");
  const elsewhere = await makeCarrier(db, clock);
  const stranger = await makePerson(db, elsewhere, ["mechanic"]);
  expect(codeOf(await signOff(db, stranger, repaired(await hang()), clock))).toBe("not-found");
});

test("two certifiers at once: one sign-off stands, the other is told it has ended", async () => {
  const db = testDb();
  const second = await makePerson(db, carrier, ["mechanic"]);
  const tagId = await hang();
  const results = await Promise.all([
    signOff(db, mechanic, repaired(tagId), clock),
    signOff(db, second, repaired(tagId), clock),
  ]);
  expect(results.map(codeOf).sort()).toEqual(["already-ended", "ok"]);
});

test("a run under a limit: yellow alone, from a certifier, not for a day past; the tag stays open", async () => {
  const db = testDb();
  const limit = { kind: "fill-no-more", fillL: 5000 } as const;
  const ask = (tagId: string, untilDay: string) => ({
    id: uuidv7(),
    tagId,
    limit,
    untilDay,
    signature,
  });
  const red = await hang();
  expect(codeOf(await allowRun(db, mechanic, ask(red, "2026-06-05"), clock))).toBe(
    "nothing-to-limit",
  );
  const yellow = await hang({ colour: "yellow", roadSafety: true });
  expect((await truckRow(db, key)).yellowBlockAt).toEqual(new Date(0));
  expect(codeOf(await allowRun(db, mechanic, ask(yellow, "2026-06-01"), clock))).toBe("invalid");
  expect(codeOf(await allowRun(db, driver, ask(yellow, "2026-06-05"), clock))).toBe("not-allowed");
  expect(codeOf(await allowRun(db, mechanic, ask(yellow, "2026-06-05"), clock))).toBe("ok");
  const row = await truckRow(db, key);
  // The shop opens at 06:00 in Denver, UTC-6 in June, on the day after the last one.
  expect(row.yellowBlockAt).toEqual(new Date("2026-06-06T12:00:00Z"));
  expect(row.limitFillL).toBe(5000);
});

test("the change feed is gapless and in order under writers at once", async () => {
  const db = testDb();
  const ids = await Promise.all(Array.from({ length: 8 }, () => hang({ colour: "white" })));
  await Promise.all(ids.map((id) => signOff(db, mechanic, repaired(id), clock)));
  const rows = await db
    .select({ seq: changes.seq })
    .from(changes)
    .where(eq(changes.carrierId, carrier.carrierId))
    .orderBy(changes.seq);
  expect(rows.map((row) => row.seq)).toEqual(rows.map((_, index) => index + 1));
  expect(rows.length).toBeGreaterThanOrEqual(16);
});
