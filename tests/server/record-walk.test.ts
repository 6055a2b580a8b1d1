import { and, eq } from "drizzle-orm";
import { drizzle } from "drizzle-orm/mysql2";
import { v7 as uuidv7 } from "uuid";
import { beforeEach, expect, test } from "vitest";
import { changes } from "~/db/schema/carriers";
import { clearances } from "~/db/schema/handovers";
import { mailOutbox } from "~/db/schema/people";
import { photos, signOffs, tagChanges } from "~/db/schema/tags";
import { sheetVersions } from "~/db/schema/trucks";
import { answers, conflicts, readings, receipts, walks } from "~/db/schema/walks";
import type { Actor } from "~/domain/actor";
import { storePhoto } from "~/domain/photos/store-photo";
import { changePolicy } from "~/domain/policy/change-policy";
import { DEFAULT_POLICY } from "~/domain/policy/settings";
import { allowRun } from "~/domain/tags/allow-run";
import { type SignOffInput, signOff } from "~/domain/tags/sign-off";
import { addFitting, addFittingSchema } from "~/domain/trucks/add-fitting";
import { setSetPoint, setSetPointSchema } from "~/domain/trucks/set-set-point";
import { storage } from "~/services/storage";
import { canonicalSheet } from "~/trade/sheet/canonical-sheet";
import { allChecks } from "~/trade/sheet/due-checks";
import { testDatabase, testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import { drawnPicture } from "./pictures";
import {
  accepted,
  allGood,
  codeOf,
  HOUR,
  makeTruckToWalk,
  sendWalk,
  sha256,
  sheetNow,
  signature,
  storedWalk,
  type TruckToWalk,
  tagged,
  tagsOf,
  walkBody,
} from "./walk-bodies";

/** NIST SP 811 (2008), appendix B.8. */
const INCH_OF_MERCURY_PA = 3386.388640341;
const PSI_PA = 6894.757293168361;

let clock: TestClock;
let carrier: TestCarrier;
let driver: Actor;
let other: Actor;
let mechanic: Actor;
let manager: Actor;
let truck: TruckToWalk;

beforeEach(async () => {
  const db = testDb();
  clock = new TestClock();
  carrier = await makeCarrier(db, clock);
  driver = await makePerson(db, carrier, ["driver"]);
  other = await makePerson(db, carrier, ["driver"]);
  mechanic = await makePerson(db, carrier, ["mechanic"]);
  manager = await makePerson(db, carrier, ["manager"]);
  truck = await makeTruckToWalk(db, carrier, clock);
});

const send = (
  body: ReturnType<typeof walkBody>,
  age: Parameters<typeof sendWalk>[4] = {},
  by = driver,
) => sendWalk(testDb(), by, body, clock, age);

const mayClear = async (by: Actor) => {
  const row = await truckRow(testDb(), truck);
  const [own] = await testDb()
    .select()
    .from(clearances)
    .where(and(eq(clearances.truckId, truck.truckId), eq(clearances.driverId, by.personId)));
  return own !== undefined && own.tagsSeq === row.tagsSeq && own.validUntil > clock.now();
};

const repaired = (tagId: string): SignOffInput => ({
  id: uuidv7(),
  tagId,
  kind: "repaired",
  work: "replaced",
  parts: null,
  roadTested: null,
  remote: false,
  signature,
});

async function readingOf(walkId: string, checkKey: string) {
  const [row] = await testDb()
    .select()
    .from(readings)
    .where(and(eq(readings.walkId, walkId), eq(readings.checkKey, checkKey)));
  return row ?? null;
}

test("a whole good walk clears the truck for its driver alone, in one transaction with its receipt and feed", async () => {
  const db = testDb();
  const body = walkBody(truck);
  const receipt = accepted(await send(body));
  expect(receipt).toEqual({
    id: body.id,
    hash: sha256(JSON.stringify(body)),
    receivedAt: clock.now().toISOString(),
    standing: "cleared",
    clearsNot: null,
    missing: [],
    faults: [],
    tags: [],
    photosMissing: [],
  });
  expect((await truckRow(db, truck)).standing).toBe("cleared");
  expect(await mayClear(driver)).toBe(true);
  expect(await mayClear(other)).toBe(false);
  const [kept] = await db.select().from(receipts).where(eq(receipts.id, body.id));
  expect(kept).toMatchObject({ kind: "walk", hash: receipt.hash, body: receipt });
  const stored = await db.select().from(answers).where(eq(answers.walkId, body.id));
  expect(Object.fromEntries(stored.map((row) => [row.checkKey, row.body]))).toEqual(body.answers);
  const feed = await db.select().from(changes).where(eq(changes.truckId, truck.truckId));
  expect(feed.some((row) => row.kind === "walk" && row.subjectId === body.id)).toBe(true);
});

test("K2: a red tag holds the truck as the record commits, with its photo still missing", async () => {
  const db = testDb();
  const bytes = await drawnPicture();
  const found = tagged(truck, "rear.lamps", "brake-or-turn", { note: "Left one dark" });
  const photo = {
    id: uuidv7(),
    tagId: found.tags[0]!.id,
    sha256: sha256(bytes),
    bytes: bytes.length,
  };
  const receipt = accepted(await send(walkBody(truck, { ...found, photos: [photo] })));
  expect(receipt).toMatchObject({ standing: "held", photosMissing: [photo.id] });
  expect(await truckRow(db, truck)).toMatchObject({ standing: "held", openReds: 1 });
  const ofPhoto = eq(photos.id, photo.id);
  const [promised] = await db.select().from(photos).where(ofPhoto);
  expect(promised).toMatchObject({ storedAt: null, tagId: photo.tagId, ownerId: driver.personId });
  const seqBefore = (await truckRow(db, truck)).gateSeq;
  const put = await storePhoto(db, driver, storage(), { id: photo.id, bytes }, clock);
  expect(put.state).toBe("stored");
  const [stored] = await db.select().from(photos).where(ofPhoto);
  expect(stored?.storedAt).toEqual(clock.now());
  expect(await truckRow(db, truck)).toMatchObject({ standing: "held", gateSeq: seqBefore });
});

test("K2: a red tag mails certifiers and dispatchers of the yard, once each however often it is sent", async () => {
  const db = testDb();
  const dispatcher = await makePerson(db, carrier, ["dispatcher"]);
  const body = walkBody(truck, tagged(truck, "rear.lamps", "brake-or-turn"));
  await send(body);
  await send(body);
  const queued = await db
    .select()
    .from(mailOutbox)
    .where(and(eq(mailOutbox.carrierId, carrier.carrierId), eq(mailOutbox.template, "red-tag")));
  const readers = queued.map((mail) => mail.recipient).sort();
  expect(readers).toHaveLength(2);
  expect(readers.some((address) => address.includes(mechanic.personId))).toBe(true);
  expect(readers.some((address) => address.includes(dispatcher.personId))).toBe(true);
});

test("K4: the same walk sent ten times at once is stored once, with one receipt", async () => {
  const db = testDb();
  const body = walkBody(truck, tagged(truck, "rear.lamps", "brake-or-turn"));
  const results = await Promise.all(Array.from({ length: 10 }, () => send(body)));
  expect(results[0]?.ok).toBe(true);
  expect(new Set(results.map((result) => JSON.stringify(result)))).toHaveLength(1);
  expect(await db.select().from(walks).where(eq(walks.id, body.id))).toHaveLength(1);
  expect(await tagsOf(db, truck)).toHaveLength(1);
  expect(await db.select().from(conflicts).where(eq(conflicts.recordId, body.id))).toHaveLength(0);
});

test("K4: a walk sent again after another took its place is answered with its first receipt", async () => {
  const db = testDb();
  const body = walkBody(truck, tagged(truck, "rear.lamps", "brake-or-turn"));
  const first = accepted(await send(body, { ageMs: HOUR }));
  await send(walkBody(truck));
  accepted(await signOff(db, mechanic, repaired(body.tags[0]!.id), clock));
  clock.turn(30 * HOUR);
  const seq = (await truckRow(db, truck)).gateSeq;
  expect(accepted(await send(body, { ageMs: 31 * HOUR }))).toEqual(first);
  expect((await truckRow(db, truck)).gateSeq).toBe(seq);
});

test("K4: the same id with another body is refused, and both are kept", async () => {
  const db = testDb();
  const body = walkBody(truck);
  const receipt = accepted(await send(body));
  const changed = { ...body, ...tagged(truck, "rear.lamps", "tail"), instead: undefined };
  for (let n = 0; n < 3; n += 1) expect(codeOf(await send(changed))).toBe("same-id-other-body");
  const kept = await db.select().from(conflicts).where(eq(conflicts.recordId, body.id));
  expect(kept).toHaveLength(1);
  expect(kept[0]).toMatchObject({
    kind: "walk",
    hash: sha256(JSON.stringify(changed)),
    personId: driver.personId,
  });
  expect(kept[0]?.body).toMatchObject({ tags: [{ problemKey: "tail" }] });
  expect((await storedWalk(db, truck, body.id))?.hash).toBe(receipt.hash);
  expect(await tagsOf(db, truck)).toHaveLength(0);
});

test("K4: another person's walk under a known id is refused, even byte for byte", async () => {
  const body = walkBody(truck);
  accepted(await send(body));
  expect(codeOf(await send(body, {}, other))).toBe("same-id-other-body");
  const kept = await testDb().select().from(conflicts).where(eq(conflicts.recordId, body.id));
  expect(kept.map((one) => one.personId)).toEqual([other.personId]);
  expect(await mayClear(other)).toBe(false);
});

test("K4: a known id on another truck is refused, and that truck is untouched", async () => {
  const db = testDb();
  const second = await makeTruckToWalk(db, carrier, clock);
  const body = walkBody(truck);
  accepted(await send(body));
  const seq = (await truckRow(db, second)).gateSeq;
  const moved = walkBody(second, { id: body.id });
  expect(codeOf(await send(moved))).toBe("same-id-other-body");
  expect((await truckRow(db, second)).gateSeq).toBe(seq);
});

test("K4, K7: another carrier's walk under the same id is a walk of its own", async () => {
  const db = testDb();
  const elsewhere = await makeCarrier(db, clock);
  const stranger = await makePerson(db, elsewhere, ["driver"]);
  const theirs = await makeTruckToWalk(db, elsewhere, clock);
  const body = walkBody(truck);
  accepted(await send(body));
  const same = walkBody(theirs, { id: body.id });
  expect(accepted(await send(same, {}, stranger)).standing).toBe("cleared");
  expect(await db.select().from(walks).where(eq(walks.id, body.id))).toHaveLength(2);
});

test("K4: a walk's id used again for a sign-off is refused, and the tag stays open", async () => {
  const db = testDb();
  const body = walkBody(truck, tagged(truck, "rear.lamps", "brake-or-turn"));
  accepted(await send(body));
  const again = { ...repaired(body.tags[0]!.id), id: body.id };
  expect(codeOf(await signOff(db, mechanic, again, clock))).toBe("same-id-other-body");
  expect(await db.select().from(signOffs).where(eq(signOffs.id, body.id))).toHaveLength(0);
  const [kept] = await db.select().from(conflicts).where(eq(conflicts.recordId, body.id));
  expect(kept).toMatchObject({ kind: "sign-off", personId: mechanic.personId });
});

test("K8: a reading is stored as entered and in SI, inches of mercury and psi alike, with the yard's height", async () => {
  const db = testDb();
  const body = walkBody(truck, {
    instead: {
      "run-up.vacuum": { kind: "reading", value: 19.5, unit: "inHg", heardItOpen: true },
      "run-up.pressure": { kind: "reading", value: 9.75, unit: "psi", heardItOpen: true },
    },
  });
  accepted(await send(body, { ageMs: HOUR }));
  const vacuum = await readingOf(body.id, "run-up.vacuum");
  expect(vacuum).toMatchObject({
    entered: 19.5,
    unit: "inHg",
    quantity: "vacuum",
    verdict: "in-band",
    elevationM: 240,
    truckId: truck.truckId,
    countsFrom: new Date(clock.now().getTime() - HOUR),
  });
  expect(vacuum?.si).toBeCloseTo(19.5 * INCH_OF_MERCURY_PA, 6);
  const pressure = await readingOf(body.id, "run-up.pressure");
  expect(pressure).toMatchObject({ entered: 9.75, unit: "psi", verdict: "in-band" });
  expect(pressure?.si).toBeCloseTo(9.75 * PSI_PA, 6);
  expect((await truckRow(db, truck)).limitsMask).toBe(0);
});

test("K8: a reading in another unit of pressure is judged by what it measures", async () => {
  const kPa = (17 * INCH_OF_MERCURY_PA) / 1000;
  const body = walkBody(truck, {
    instead: { "run-up.vacuum": { kind: "reading", value: kPa, unit: "kPa", heardItOpen: true } },
  });
  accepted(await send(body));
  const row = await readingOf(body.id, "run-up.vacuum");
  expect(row).toMatchObject({ entered: kPa, unit: "kPa", verdict: "below" });
  expect(row?.si).toBeCloseTo(17 * INCH_OF_MERCURY_PA, 6);
});

test("K8: a reading out of its band hangs its tag although the phone said it was fine", async () => {
  const db = testDb();
  const sent = walkBody(truck, {
    instead: {
      "run-up.vacuum": { kind: "reading", value: 17, unit: "inHg", heardItOpen: true },
      "cab.applied-leak-down": { kind: "timed", value: 6, unit: "psi", seconds: 60 },
    },
  });
  const bytes = { ...sent, verdicts: { "run-up.vacuum": "in-band" }, complete: true, tags: [] };
  const receipt = accepted(await send(bytes as typeof sent));
  expect(receipt.standing).toBe("held");
  const hung = await tagsOf(db, truck);
  expect(
    hung.map(({ checkKey, problemKey, colour }) => [checkKey, problemKey, colour]).sort(),
  ).toEqual([
    ["cab.applied-leak-down", "over", "red"],
    ["run-up.vacuum", "opens-low", "yellow"],
  ]);
  const early = hung.find((tag) => tag.checkKey === "run-up.vacuum");
  expect(early?.limit).toMatchObject({
    kind: "vacuum-no-deeper",
    vacuumPa: Math.floor(17 * INCH_OF_MERCURY_PA),
  });
  expect((await readingOf(sent.id, "run-up.vacuum"))?.verdict).toBe("below");
});

test("K8: pump hours go with every reading of the walk and to the truck", async () => {
  const db = testDb();
  const body = walkBody(truck, {
    instead: { "cab.pump-hours": { kind: "reading", value: 1234.5, unit: "h" } },
  });
  accepted(await send(body));
  expect(await readingOf(body.id, "run-up.vacuum")).toMatchObject({ pumpHours: 1234.5 });
  expect((await truckRow(db, truck)).pumpHours).toBe(1234.5);
});

test("what was drained and topped up is kept as readings", async () => {
  const body = walkBody(truck, {
    instead: {
      "pump-side.trap-drain": {
        kind: "drain",
        cracked: true,
        saw: "ran",
        amount: "quart",
        what: "clean-oil",
        shutAgain: true,
      },
      "pump-side.oil-level": {
        kind: "level",
        level: "ok",
        toppedUp: { amount: 2, unit: "qt" },
      },
    },
  });
  accepted(await send(body));
  const drained = await readingOf(body.id, "pump-side.trap-drain");
  expect(drained).toMatchObject({ quantity: "drained", entered: 1, unit: "qt" });
  expect(drained?.si).toBeCloseTo(9.463_529_46e-4, 12);
  expect(await readingOf(body.id, "pump-side.oil-level")).toMatchObject({
    quantity: "topped-up",
    entered: 2,
    unit: "qt",
  });
});

test("a walk with one answer missing is stored, names it and clears nothing", async () => {
  const db = testDb();
  const body = walkBody(truck, { instead: { "cab.horn": undefined } });
  const receipt = accepted(await send(body));
  expect(receipt).toMatchObject({
    standing: "walk-due",
    clearsNot: "incomplete",
    missing: ["cab.horn"],
  });
  expect(await storedWalk(db, truck, body.id)).toMatchObject({
    complete: false,
    clearsNot: "incomplete",
    missing: ["cab.horn"],
  });
  expect(await mayClear(driver)).toBe(false);
});

test("a walk with no answer at all is stored, and its tags hold", async () => {
  const db = testDb();
  const { tags } = tagged(truck, "rear.lamps", "brake-or-turn");
  const receipt = accepted(await send(walkBody(truck, { answers: {}, tags })));
  expect(receipt).toMatchObject({ standing: "held", clearsNot: "incomplete" });
  expect(receipt.missing).toContain("rear.lamps");
  expect((await truckRow(db, truck)).openReds).toBe(1);
});

test("an answer that cannot stand counts as missing: kept as sent, clears nothing", async () => {
  const wrong: [string, Parameters<typeof walkBody>[1]][] = [
    [
      "cab.pump-hours",
      { instead: { "cab.pump-hours": { kind: "reading", value: 5, unit: "kg" } } },
    ],
    [
      "cab.pump-hours",
      { instead: { "cab.pump-hours": { kind: "reading", value: 5, unit: "psi" } } },
    ],
    [
      "cab.pump-hours",
      { instead: { "cab.pump-hours": { kind: "reading", value: -1, unit: "h" } } },
    ],
    [
      "cab.odometer",
      { instead: { "cab.odometer": { kind: "reading", value: 1e308, unit: "mi" } } },
    ],
    [
      "cab.applied-leak-down",
      {
        instead: { "cab.applied-leak-down": { kind: "timed", value: 1, unit: "psi", seconds: 59 } },
      },
    ],
    ["cab.horn", { instead: { "cab.horn": { kind: "level", level: "ok" } } }],
    ["rear.caps", { instead: { "rear.caps": { kind: "look", ok: true } } }],
    ["cab.horn", { instead: { "cab.horn": { kind: "not-fitted" } } }],
    ["cab.horn", { instead: { "cab.horn": { kind: "problem", problems: [{ key: "no-such" }] } } }],
    ["cab.horn", { instead: { "cab.horn": { kind: "tag-seen", seen: "same" } } }],
  ];
  for (const [checkKey, wish] of wrong) {
    const body = walkBody(truck, wish);
    const receipt = accepted(await send(body));
    expect(receipt.missing, JSON.stringify(wish)).toEqual([checkKey]);
    expect(receipt.clearsNot).toBe("incomplete");
    const stored = await testDb()
      .select({ body: answers.body })
      .from(answers)
      .where(and(eq(answers.walkId, body.id), eq(answers.checkKey, checkKey)));
    expect(stored[0]?.body).toEqual(body.answers[checkKey]);
    expect(await readingOf(body.id, checkKey)).toBeNull();
  }
  expect(await mayClear(driver)).toBe(false);
});

test("a vacuum off the gauge's scale is no reading: the half counts as not run", async () => {
  const db = testDb();
  const body = walkBody(truck, {
    instead: { "run-up.vacuum": { kind: "reading", value: 40, unit: "inHg", heardItOpen: true } },
  });
  const receipt = accepted(await send(body));
  expect(await readingOf(body.id, "run-up.vacuum")).toBeNull();
  expect(receipt.standing).toBe("limited");
  expect((await storedWalk(db, truck, body.id))?.limits).toEqual([
    { kind: "no-vacuum-work" },
    { kind: "no-pressure-off-load" },
  ]);
});

test("no pressure half leaves the limit that belongs to it, and nothing missing", async () => {
  const body = walkBody(truck, {
    instead: { "run-up.bled": undefined, "run-up.pressure": undefined },
  });
  expect(accepted(await send(body))).toMatchObject({ standing: "limited", missing: [] });
  expect((await storedWalk(testDb(), truck, body.id))?.limits).toEqual([
    { kind: "no-pressure-off-load" },
  ]);
});

test("could not check counts as an answer, and cannot be lowered on a road-safety part", async () => {
  const db = testDb();
  const reason = "Ice on the lens";
  const body = walkBody(truck, {
    instead: {
      "rear.lamps": { kind: "could-not-check", reason, colour: "white" },
      "driver-side.fuel": { kind: "could-not-check", reason, colour: "white" },
    },
  });
  const receipt = accepted(await send(body));
  expect(receipt).toMatchObject({ missing: [], clearsNot: null, standing: "held" });
  const hung = await tagsOf(db, truck);
  const colours = Object.fromEntries(hung.map((tag) => [tag.checkKey, tag.colour]));
  expect(colours).toEqual({ "rear.lamps": "red", "driver-side.fuel": "yellow" });
  for (const tag of hung)
    expect(tag).toMatchObject({ problemKey: "could-not-check", note: reason });
});

test("not fitted stands only at a check made from a fitting, as a white tag", async () => {
  const db = testDb();
  const fitted = allChecks(truck.sheet).find(
    (check) => check.mayBeNotFitted && check.who === "driver",
  );
  const body = walkBody(truck, { instead: { [fitted!.key]: { kind: "not-fitted" } } });
  expect(accepted(await send(body))).toMatchObject({ clearsNot: null, standing: "cleared" });
  expect(await tagsOf(db, truck)).toMatchObject([
    { checkKey: fitted!.key, problemKey: "not-fitted", colour: "white" },
  ]);
});

test("the driver may raise a colour, never lower it; a note is kept on the tag", async () => {
  const db = testDb();
  const raised = tagged(truck, "rear.lamps", "marker-or-plate", {
    colour: "red",
    note: "Both of them ✨",
  });
  const lowered = tagged(truck, "curb-side.tires", "flat", { colour: "white" });
  const body = walkBody(truck, {
    instead: { ...raised.instead, ...lowered.instead },
    tags: [...raised.tags, ...lowered.tags],
  });
  const receipt = accepted(await send(body));
  expect(receipt.tags.map(({ checkKey, colour }) => [checkKey, colour]).sort()).toEqual([
    ["curb-side.tires", "red"],
    ["rear.lamps", "red"],
  ]);
  const hung = await tagsOf(db, truck);
  expect(hung.map((tag) => tag.id).sort()).toEqual(body.tags.map((tag) => tag.id).sort());
  expect(hung.find((tag) => tag.checkKey === "rear.lamps")).toMatchObject({
    note: "Both of them ✨",
    limit: null,
    roadSafety: true,
    part: "lighting",
    raisedBy: driver.personId,
    raisedAt: clock.now(),
  });
});

test("a tag the driver hung beside a good answer hangs too, with what the sheet knows of it", async () => {
  const { tags } = tagged(truck, "rear.sight-glass", "cannot-read");
  accepted(await send(walkBody(truck, { tags })));
  expect(await tagsOf(testDb(), truck)).toMatchObject([
    { id: tags[0]!.id, colour: "yellow", limit: { kind: "fill-no-more" }, roadSafety: false },
  ]);
});

test("a tag hung beside is never lower than its problem, and knows the part at fault", async () => {
  const brakes = tagged(truck, "pull-out.brakes", "weak", { colour: "white" });
  const horn = tagged(truck, "approach.wrong-today", "horn", { colour: "white" });
  const fuel = tagged(truck, "driver-side.fuel", "could-not-check", { colour: "white" });
  const tags = [...brakes.tags, ...horn.tags, ...fuel.tags];
  expect(accepted(await send(walkBody(truck, { tags }))).standing).toBe("held");
  const hung = Object.fromEntries((await tagsOf(testDb(), truck)).map((tag) => [tag.id, tag]));
  expect(tags.map(({ id }) => [hung[id]!.colour, hung[id]!.part, hung[id]!.roadSafety])).toEqual([
    ["red", "service-brakes", true],
    ["yellow", "horn", true],
    ["yellow", null, false],
  ]);
});

/** A sheet this server never made, under its own hash. */
function foreignSheet(change: (sheet: TruckToWalk["sheet"]) => void = () => undefined) {
  const sheet = structuredClone(truck.sheet);
  sheet.stations[0]!.label = "Approach, as it was";
  change(sheet);
  return { sheet, sheetHash: sha256(canonicalSheet(sheet)) };
}

test("an unknown sheet is stored with the walk, never refused: tags hold, nothing clears", async () => {
  const db = testDb();
  const { sheet, sheetHash } = foreignSheet();
  const found = tagged(truck, "rear.lamps", "brake-or-turn");
  const body = walkBody(truck, { sheetHash, sheet, ...found });
  const receipt = accepted(await send(body));
  expect(receipt).toMatchObject({ clearsNot: "sheet-unknown", standing: "held" });
  const row = await storedWalk(db, truck, body.id);
  const [kept] = await db.select().from(sheetVersions).where(eq(sheetVersions.id, row!.sheetId));
  expect(kept).toMatchObject({ hash: sheetHash, madeHere: false, truckId: truck.truckId });
  expect(kept?.body).toEqual(sheet);
  accepted(await signOff(db, mechanic, repaired(body.tags[0]!.id), clock));
  expect((await truckRow(db, truck)).standing).toBe("walk-due");
});

test("a second walk on the same unknown sheet clears nothing either", async () => {
  const { sheet, sheetHash } = foreignSheet();
  accepted(await send(walkBody(truck, { sheetHash, sheet })));
  const second = accepted(await send(walkBody(truck, { sheetHash, sheet })));
  expect(second).toMatchObject({ clearsNot: "sheet-unknown", standing: "walk-due" });
});

test("K10: an unknown sheet opens no driver-fix and no sign-off from photos, the first time or the second", async () => {
  const db = testDb();
  await changePolicy(db, manager, { ...DEFAULT_POLICY, driverFix: true }, clock);
  const { sheet, sheetHash } = foreignSheet((own) => {
    for (const check of own.stations.flatMap((station) => station.checks)) {
      Object.assign(check, { roadSafety: false, part: null });
      for (const one of check.problems) Object.assign(one, { driverFix: true, remote: true });
    }
  });
  for (const problemKey of ["weak", "pulls"]) {
    const body = walkBody(truck, {
      sheetHash,
      sheet,
      ...tagged(truck, "pull-out.brakes", problemKey),
    });
    accepted(await send(body));
    const end = repaired(body.tags[0]!.id);
    expect(codeOf(await signOff(db, driver, end, clock))).toBe("own-red-tag");
    const remote = { ...repaired(body.tags[0]!.id), remote: true };
    expect(codeOf(await signOff(db, mechanic, remote, clock))).toBe("not-from-photos");
  }
});

test("many first walks at once on one unknown sheet are all stored", async () => {
  const { sheet, sheetHash } = foreignSheet();
  const bodies = Array.from({ length: 6 }, () => walkBody(truck, { sheetHash, sheet }));
  const results = await Promise.all(bodies.map((body) => send(body)));
  expect(results.map(codeOf)).toEqual(bodies.map(() => "ok"));
  const kept = await testDb()
    .select()
    .from(sheetVersions)
    .where(and(eq(sheetVersions.truckId, truck.truckId), eq(sheetVersions.madeHere, false)));
  expect(kept).toHaveLength(1);
});

test("an unknown sheet that is no sheet at all, or none, is no reason to refuse a walk", async () => {
  const sheets = [undefined, null, 7, "sheet", [], { format: 2 }, { format: 1, stations: "all" }];
  for (const sheet of sheets) {
    const sheetHash = sha256(JSON.stringify(sheet) ?? "none");
    const receipt = accepted(await send(walkBody(truck, { sheetHash, sheet })));
    expect(receipt.clearsNot, String(sheet)).toBe("sheet-unknown");
  }
  expect(await mayClear(driver)).toBe(false);
});

test("a sheet that is not what its hash says is kept by nobody, and the walk is judged by today's", async () => {
  const { sheet } = foreignSheet();
  const body = walkBody(truck, { sheet, sheetHash: sha256("another sheet") });
  expect(accepted(await send(body)).clearsNot).toBe("sheet-unknown");
  expect((await storedWalk(testDb(), truck, body.id))?.sheetId).toBe(truck.sheetId);
});

test("a walk on another truck's sheet is a walk on an unknown sheet", async () => {
  const second = await makeTruckToWalk(testDb(), carrier, clock);
  const body = walkBody(truck, { sheetHash: second.hash, sheet: second.sheet });
  expect(accepted(await send(body)).clearsNot).toBe("sheet-unknown");
});

test("a walk on a sheet from before a fitting came is stored, and clears nothing", async () => {
  const db = testDb();
  const fitting = addFittingSchema.parse({
    kind: "manway",
    attributes: {},
  });
  accepted(await addFitting(db, manager, { ...fitting, truckId: truck.truckId }, clock));
  const body = walkBody(truck, tagged(truck, "rear.lamps", "marker-or-plate"));
  const receipt = accepted(await send(body));
  expect(receipt.standing).not.toBe("cleared");
  expect(await storedWalk(db, truck, body.id)).toMatchObject({
    sheetId: truck.sheetId,
    setupVersion: truck.setupVersion,
  });
  expect(await mayClear(driver)).toBe(false);
  expect(await tagsOf(db, truck)).toHaveLength(1);
  Object.assign(truck, await sheetNow(db, truck, clock));
  accepted(await signOff(db, mechanic, repaired(body.tags[0]!.id), clock));
  accepted(await send(walkBody(truck)));
  expect((await truckRow(db, truck)).standing).toBe("walk-due");
});

test("a set point changed after the walk ends its clearance", async () => {
  const db = testDb();
  accepted(await send(walkBody(truck)));
  expect(await mayClear(driver)).toBe(true);
  const point = setSetPointSchema.parse({
    reading: "vacuum-relief",
    unit: "inHg",
    setPoint: 18,
    low: 17,
    high: 19,
  });
  accepted(await setSetPoint(db, manager, { ...point, truckId: truck.truckId }, clock));
  expect(await mayClear(driver)).toBe(false);
  expect((await truckRow(db, truck)).standing).toBe("walk-due");
});

test("the number of statements does not grow with answers, tags, photos or seen tags", async () => {
  const lookDue = allChecks(truck.sheet).filter(
    (check) =>
      check.kind === "look" &&
      check.problems.some((problem) => problem.colour === "red") &&
      allGood(truck)[check.key] !== undefined,
  );
  // What hangs already is not hung again, so each walk finds something new.
  const record = async (from: number, count: number) => {
    const open = (await tagsOf(testDb(), truck)).slice(0, count);
    const found = lookDue.slice(from, from + count).map((check) => {
      const problem = check.problems.find((one) => one.colour === "red")!;
      return tagged(truck, check.key, problem.key);
    });
    const tags = found.flatMap((one) => one.tags);
    const photosSent = tags.map((tag) => ({
      id: uuidv7(),
      tagId: tag.id,
      sha256: sha256(tag.id),
      bytes: 1,
    }));
    const body = walkBody(truck, {
      instead: Object.assign({}, ...found.map((one) => one.instead)),
      tags,
      photos: photosSent,
      seenTags: open.map((tag) => ({
        id: uuidv7(),
        tagId: tag.id,
        seen: "same" as const,
        colour: null,
        note: null,
      })),
    });
    const statements: string[] = [];
    const logger = { logQuery: (query: string) => statements.push(query) };
    const counted = drizzle({ client: testDatabase().pool.promise(), logger });
    accepted(await sendWalk(counted, driver, body, clock));
    return statements.length;
  };
  await record(0, 2);
  const few = await record(2, 2);
  const many = await record(4, lookDue.length - 4);
  expect(lookDue.length).toBeGreaterThan(14);
  expect(few).toBeGreaterThan(10);
  expect(many).toBe(few);
});

test("a defect found again while its tag hangs is no second tag, and its photo belongs to the one that hangs", async () => {
  const db = testDb();
  const first = walkBody(truck, tagged(truck, "rear.lamps", "tail"));
  accepted(await send(first));
  const found = tagged(truck, "rear.lamps", "tail");
  const photo = {
    id: uuidv7(),
    tagId: found.tags[0]!.id,
    sha256: sha256("again"),
    bytes: 5,
  };
  const receipt = accepted(await send(walkBody(truck, { ...found, photos: [photo] })));
  expect(receipt.tags).toEqual([]);
  expect(receipt.photosMissing).toEqual([photo.id]);
  expect(await tagsOf(db, truck)).toHaveLength(1);
  const [promised] = await db.select().from(photos).where(eq(photos.id, photo.id));
  expect(promised?.tagId).toBe(first.tags[0]!.id);
});

test("a defect found worse than its tag hangs a new one in the worse colour", async () => {
  const marker = tagged(truck, "curb-side.lamps", "marker");
  accepted(await send(walkBody(truck, marker)));
  const worse = tagged(truck, "curb-side.lamps", "marker", { colour: "red" });
  const receipt = accepted(await send(walkBody(truck, worse)));
  expect(receipt.tags.map((tag) => tag.colour)).toEqual(["red"]);
  expect(receipt.standing).toBe("held");
});

test("the receipt says why an answer does not stand", async () => {
  const body = walkBody(truck, {
    instead: { "run-up.vacuum": { kind: "reading", value: 99, unit: "inHg", heardItOpen: true } },
  });
  const receipt = accepted(await send(body));
  expect(receipt.faults).toEqual([{ checkKey: "run-up.vacuum", code: "off-scale" }]);
});

test("K10: a driver does not sign off a red tag of their own walk, certifier or not", async () => {
  const db = testDb();
  const certifier = await makePerson(db, carrier, ["driver", "mechanic"], { certifier: true });
  for (const by of [driver, certifier]) {
    const body = walkBody(truck, tagged(truck, "curb-side.tires", "flat"));
    accepted(await send(body, {}, by));
    expect(codeOf(await signOff(db, by, repaired(body.tags[0]!.id), clock))).toBe("own-red-tag");
    accepted(await signOff(db, mechanic, repaired(body.tags[0]!.id), clock));
  }
});

test("K10: from the driver-fix list, where the carrier allows it, a driver ends their own bulb", async () => {
  const db = testDb();
  const bulb = walkBody(truck, tagged(truck, "rear.lamps", "brake-or-turn"));
  accepted(await send(bulb));
  expect(codeOf(await signOff(db, driver, repaired(bulb.tags[0]!.id), clock))).toBe("own-red-tag");
  await changePolicy(db, manager, { ...DEFAULT_POLICY, driverFix: true }, clock);
  expect(codeOf(await signOff(db, driver, repaired(bulb.tags[0]!.id), clock))).toBe("ok");
  const brakes = walkBody(truck, tagged(truck, "pull-out.brakes", "weak"));
  accepted(await send(brakes));
  expect(codeOf(await signOff(db, driver, repaired(brakes.tags[0]!.id), clock))).toBe(
    "own-red-tag",
  );
});

test("K7: a truck, a base walk or a corrected walk of another carrier: nothing is stored", async () => {
  const db = testDb();
  const elsewhere = await makeCarrier(db, clock);
  const stranger = await makePerson(db, elsewhere, ["driver"]);
  const theirs = await makeTruckToWalk(db, elsewhere, clock);
  const theirWalk = walkBody(theirs);
  accepted(await send(theirWalk, {}, stranger));
  const seq = (await truckRow(db, theirs)).gateSeq;

  const onTheirs = walkBody(theirs);
  expect(codeOf(await send(onTheirs))).toBe("not-found");
  const asked: [string, ReturnType<typeof walkBody>][] = [
    ["/baseWalkId", walkBody(truck, { kind: "takeover", baseWalkId: theirWalk.id })],
    ["/correctsWalkId", walkBody(truck, { correctsWalkId: theirWalk.id })],
    ["/baseWalkId", walkBody(truck, { kind: "takeover", baseWalkId: uuidv7() })],
  ];
  for (const [pointer, body] of asked) {
    const result = await send(body);
    expect(result).toEqual({
      ok: false,
      refusal: { code: "invalid", fields: [{ pointer, code: "unknown-walk" }] },
    });
    expect(await storedWalk(db, truck, body.id)).toBeNull();
  }
  expect((await truckRow(db, theirs)).gateSeq).toBe(seq);
  expect(await db.select().from(walks).where(eq(walks.truckId, truck.truckId))).toHaveLength(0);
});

test("K7: another carrier's tag named as seen is left alone, and nothing is stored of it", async () => {
  const db = testDb();
  const elsewhere = await makeCarrier(db, clock);
  const stranger = await makePerson(db, elsewhere, ["driver"]);
  const theirs = await makeTruckToWalk(db, elsewhere, clock);
  const hung = walkBody(theirs, tagged(theirs, "rear.lamps", "marker-or-plate"));
  accepted(await send(hung, {}, stranger));
  const tagId = hung.tags[0]!.id;
  const seen = { id: uuidv7(), tagId, seen: "worse" as const, colour: "red" as const, note: null };
  await send(walkBody(truck, { seenTags: [seen] }));
  expect(await db.select().from(tagChanges).where(eq(tagChanges.tagId, tagId))).toHaveLength(0);
  expect((await truckRow(db, theirs)).openReds).toBe(0);
});

const seenAs = (tagId: string, more: Partial<ReturnType<typeof walkBody>["seenTags"][number]>) => [
  { id: uuidv7(), tagId, seen: "same" as const, colour: null, note: null, ...more },
];

async function hangYellow(): Promise<string> {
  const body = walkBody(truck, tagged(truck, "rear.lamps", "marker-or-plate"));
  accepted(await send(body));
  return body.tags[0]!.id;
}

test("K3: seen the same or gone, a tag stays open as it was", async () => {
  const db = testDb();
  const tagId = await hangYellow();
  const row = await truckRow(db, truck);
  for (const seen of ["same", "gone"] as const) {
    accepted(await send(walkBody(truck, { seenTags: seenAs(tagId, { seen, colour: "red" }) })));
  }
  const [tag] = await tagsOf(db, truck);
  expect(tag).toMatchObject({ id: tagId, colour: "yellow", signedOffAt: null });
  expect(await truckRow(db, truck)).toMatchObject({ openReds: 0, tagsSeq: row.tagsSeq });
  const said = await db.select().from(tagChanges).where(eq(tagChanges.tagId, tagId));
  expect(said.map((one) => [one.seen, one.colour]).sort()).toEqual([
    ["gone", "yellow"],
    ["same", "yellow"],
  ]);
});

test("K3: seen worse raises a tag's colour and holds the truck; no later word lowers it", async () => {
  const db = testDb();
  const tagId = await hangYellow();
  const worse = seenAs(tagId, { seen: "worse", colour: "red", note: "Now all of them" });
  expect(accepted(await send(walkBody(truck, { seenTags: worse }))).standing).toBe("held");
  expect((await truckRow(db, truck)).openReds).toBe(1);
  clock.turn(HOUR);
  const lower = seenAs(tagId, { seen: "worse", colour: "white" });
  expect(accepted(await send(walkBody(truck, { seenTags: lower }))).standing).toBe("held");
  expect((await truckRow(db, truck)).openReds).toBe(1);
});

test("a tag seen worse ends the leave it ran under", async () => {
  const db = testDb();
  const tagId = await hangYellow();
  const leave = { id: uuidv7(), tagId, limit: null, untilDay: "2026-06-05", signature };
  accepted(await allowRun(db, mechanic, leave, clock));
  const before = (await truckRow(db, truck)).yellowBlockAt;
  expect(before!.getTime()).toBeGreaterThan(clock.now().getTime());
  clock.turn(HOUR);
  accepted(await send(walkBody(truck, { seenTags: seenAs(tagId, { seen: "worse" }) })));
  expect((await truckRow(db, truck)).yellowBlockAt).toEqual(new Date(0));
});

test("a tag signed off since the phone last looked is no reason to refuse a walk that saw it", async () => {
  const db = testDb();
  const tagId = await hangYellow();
  accepted(await signOff(db, mechanic, repaired(tagId), clock));
  const late = walkBody(truck, { seenTags: seenAs(tagId, { seen: "worse", colour: "red" }) });
  accepted(await send(late));
  expect((await truckRow(db, truck)).openReds).toBe(0);
});

test("a look answered with 'same' stands where a tag hangs", async () => {
  const tagId = await hangYellow();
  const body = walkBody(truck, {
    instead: { "rear.lamps": { kind: "tag-seen", seen: "same" } },
    seenTags: seenAs(tagId, {}),
  });
  expect(accepted(await send(body)).missing).toEqual([]);
  expect(await tagsOf(testDb(), truck)).toHaveLength(1);
});

test("the same finding again hangs no second tag; a worse one does", async () => {
  const db = testDb();
  await hangYellow();
  const same = tagged(truck, "rear.lamps", "marker-or-plate");
  accepted(await send(walkBody(truck, { instead: same.instead })));
  expect(await tagsOf(db, truck)).toHaveLength(1);
  accepted(await send(walkBody(truck, tagged(truck, "rear.lamps", "tail"))));
  expect(await tagsOf(db, truck)).toHaveLength(2);
});

test("a takeover rests on another driver's walk and clears its own driver", async () => {
  const base = walkBody(truck);
  accepted(await send(base));
  const body = walkBody(truck, { kind: "takeover", baseWalkId: base.id });
  expect(accepted(await send(body, {}, other))).toMatchObject({ clearsNot: null, missing: [] });
  expect(await mayClear(other)).toBe(true);
  clock.turn(25 * HOUR);
  expect(await mayClear(other)).toBe(false);
});

test("a takeover of a walk of another truck is refused with the field at fault", async () => {
  const db = testDb();
  const second = await makeTruckToWalk(db, carrier, clock);
  const base = walkBody(second);
  accepted(await send(base));
  const body = walkBody(truck, { kind: "takeover", baseWalkId: base.id });
  expect(await send(body, {}, other)).toMatchObject({
    ok: false,
    refusal: { code: "invalid", fields: [{ pointer: "/baseWalkId" }] },
  });
});

test("a takeover of a walk that clears nothing, that is no walk before, or that has run out clears nobody", async () => {
  const incomplete = walkBody(truck, { instead: { "cab.horn": undefined } });
  accepted(await send(incomplete));
  const after = walkBody(truck, { kind: "after" });
  accepted(await send(after));
  const old = walkBody(truck);
  accepted(await send(old, { ageMs: 23 * HOUR }));
  clock.turn(2 * HOUR);
  for (const base of [incomplete, after, old]) {
    const body = walkBody(truck, { kind: "takeover", baseWalkId: base.id });
    accepted(await send(body, {}, other));
    expect(await storedWalk(testDb(), truck, body.id)).not.toBeNull();
    expect(await mayClear(other), base.kind).toBe(false);
    clock.turn(1000);
  }
});

test("a takeover counts no longer than the walk it rests on", async () => {
  const base = walkBody(truck);
  accepted(await send(base));
  clock.turn(20 * HOUR);
  const body = walkBody(truck, { kind: "takeover", baseWalkId: base.id });
  accepted(await send(body, {}, other));
  expect(await mayClear(other)).toBe(true);
  clock.turn(3 * HOUR);
  expect(await mayClear(other)).toBe(true);
  clock.turn(2 * HOUR);
  expect(await mayClear(other)).toBe(false);
});

test("the walk after the day's work ends its driver's clearance", async () => {
  const db = testDb();
  accepted(await send(walkBody(truck)));
  clock.turn(8 * HOUR);
  expect(await mayClear(driver)).toBe(true);
  expect(accepted(await send(walkBody(truck, { kind: "after" }))).standing).toBe("walk-due");
  expect(await mayClear(driver)).toBe(false);
  expect((await truckRow(db, truck)).standing).toBe("walk-due");
});

test("a walk that corrects another names it, and both stay", async () => {
  const db = testDb();
  const first = walkBody(truck);
  accepted(await send(first));
  clock.turn(60_000);
  const second = walkBody(truck, {
    correctsWalkId: first.id,
    ...tagged(truck, "rear.lamps", "brake-or-turn"),
  });
  expect(accepted(await send(second)).standing).toBe("held");
  expect(await storedWalk(db, truck, second.id)).toMatchObject({ correctsWalkId: first.id });
  expect(await storedWalk(db, truck, first.id)).toMatchObject({ correctsWalkId: null });
});
