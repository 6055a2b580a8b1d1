import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeEach, expect, test } from "vitest";
import { rounds } from "~/db/schema/trucks";
import { readings } from "~/db/schema/walks";
import type { Actor } from "~/domain/actor";
import { changePolicy } from "~/domain/policy/change-policy";
import { DEFAULT_POLICY } from "~/domain/policy/settings";
import { type RecordRoundInput, recordRound } from "~/domain/rounds/record-round";
import type { Answers } from "~/trade/sheet/answers";
import { allChecks } from "~/trade/sheet/due-checks";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import {
  accepted,
  allGood,
  codeOf,
  HOUR,
  makeTruckToWalk,
  sendWalk,
  sha256,
  type TruckToWalk,
  tagged,
  walkBody,
} from "./walk-bodies";

const DAY = 24 * HOUR;
let clock: TestClock;
let carrier: TestCarrier;
let driver: Actor;
let mechanic: Actor;
let manager: Actor;
let truck: TruckToWalk;

beforeEach(async () => {
  const db = testDb();
  // A Tuesday, 05:00 in Denver; the shop opens at 06:00.
  clock = new TestClock(Date.parse("2026-06-02T11:00:00Z"));
  carrier = await makeCarrier(db, clock);
  driver = await makePerson(db, carrier, ["driver"]);
  mechanic = await makePerson(db, carrier, ["mechanic"]);
  manager = await makePerson(db, carrier, ["manager"]);
  truck = await makeTruckToWalk(db, carrier, clock);
});

const round = (more: Partial<RecordRoundInput> = {}): RecordRoundInput => ({
  id: uuidv7(),
  truckId: truck.truckId,
  kind: "monthly",
  doneOn: "2026-06-02",
  pumpHours: null,
  ...more,
});
const record = (more: Partial<RecordRoundInput> = {}) =>
  recordRound(testDb(), mechanic, round(more), clock);
const walk = (
  wish: Parameters<typeof walkBody>[1] = {},
  age: Parameters<typeof sendWalk>[4] = {},
) => sendWalk(testDb(), driver, walkBody(truck, wish), clock, age);
/** A walk with the weekly checks in it, which are due once a week has gone by. */
const wholeWalk = () => walk({ answers: allGood(truck, "before", true) });
const hoursRead = (value: number, age = {}) =>
  walk({ instead: { "cab.pump-hours": { kind: "reading", value, unit: "h" } } }, age);

async function reasonsNow(): Promise<string[]> {
  const { standingDetail } = await truckRow(testDb(), truck);
  return standingDetail!.reasons.map((reason) => reason.code);
}
async function warningsNow(): Promise<string[]> {
  return (await truckRow(testDb(), truck)).standingDetail!.warnings;
}
const roundsOf = () =>
  testDb().select().from(rounds).where(eq(rounds.truckId, truck.truckId)).orderBy(rounds.doneAt);

test("a monthly round past its grace holds the truck from the shop's opening, and doing it frees it", async () => {
  // Due 2 July, five days of grace: it holds from 8 July, 06:00.
  clock.turn(Date.parse("2026-07-08T11:59:59Z") - clock.now().getTime());
  expect(accepted(await wholeWalk()).standing).toBe("cleared");
  clock.turn(1000);
  expect(accepted(await wholeWalk()).standing).toBe("held");
  expect(await reasonsNow()).toContain("round-overdue");
  const done = accepted(await record({ doneOn: "2026-07-08" }));
  expect(done.standing).toBe("cleared");
  expect((await truckRow(testDb(), truck)).standing).toBe("cleared");
});

test("a weekly round past its grace warns and never holds; done at the bench, a plain walk clears again", async () => {
  clock.turn(12 * DAY);
  expect(accepted(await walk())).toMatchObject({ standing: "walk-due", clearsNot: "incomplete" });
  expect(await warningsNow()).toContain("weekly");
  expect(await reasonsNow()).not.toContain("round-overdue");
  accepted(await record({ kind: "weekly", doneOn: "2026-06-14" }));
  expect(await warningsNow()).not.toContain("weekly");
  expect(accepted(await walk())).toMatchObject({ standing: "cleared", clearsNot: null });
});

test("a walk names the weekly checks it lacks from the day the round is due, by the yard's day", async () => {
  const lacks = weeklyDriver().map((check) => check.key);
  clock.turn(Date.parse("2026-06-09T05:59:00Z") - clock.now().getTime());
  expect(accepted(await walk()).missing).toEqual([]);
  clock.turn(2 * 60_000);
  expect(accepted(await walk()).missing.sort()).toEqual(lacks.sort());
});

test("a round of one kind does nothing for the other", async () => {
  clock.turn(40 * DAY);
  expect(accepted(await record({ kind: "weekly", doneOn: "2026-07-12" })).standing).toBe("held");
  expect(await reasonsNow()).toContain("round-overdue");
});

test("a round cannot be done tomorrow, by the yard's own day", async () => {
  const tomorrow = await record({ doneOn: "2026-06-03" });
  expect(tomorrow).toEqual({
    ok: false,
    refusal: { code: "invalid", fields: [{ pointer: "/doneOn", code: "date-future" }] },
  });
  // 04:00 UTC on the 3rd is still the 2nd in Denver.
  clock.turn(17 * HOUR);
  expect(codeOf(await record({ doneOn: "2026-06-03" }))).toBe("invalid");
  expect(await roundsOf()).toEqual([]);
  clock.turn(2 * HOUR);
  expect(codeOf(await record({ doneOn: "2026-06-03" }))).toBe("ok");
});

test("a round entered late counts from the day it was done, and an older one replaces nothing", async () => {
  clock.turn(40 * DAY);
  expect(accepted(await record({ doneOn: "2026-06-04" })).standing).toBe("held");
  accepted(await wholeWalk());
  expect(accepted(await record({ doneOn: "2026-07-10" })).standing).toBe("cleared");
  expect(accepted(await record({ doneOn: "2026-06-20" })).standing).toBe("cleared");
});

test("K7: a round of another truck, of this carrier or another, changes nothing here", async () => {
  const db = testDb();
  accepted(await record({ doneOn: "2026-06-01", pumpHours: 40 }));
  const before = await truckRow(db, truck);
  const elsewhere = await makeCarrier(db, clock);
  for (const of of [carrier, elsewhere]) {
    const second = await makeTruckToWalk(db, of, clock);
    const by = await makePerson(db, of, ["mechanic"]);
    accepted(await recordRound(db, by, round({ truckId: second.truckId }), clock));
  }
  accepted(await walk());
  expect((await truckRow(db, truck)).roundsBlockAt).toEqual(before.roundsBlockAt);
  // 1 June and a month, five days of grace, then the shop's opening.
  expect(before.roundsBlockAt).toEqual(new Date("2026-07-07T12:00:00Z"));
});

test("of two rounds on one day the later one's hours count", async () => {
  const settings = { ...DEFAULT_POLICY, monthlyEveryHours: 100 };
  await changePolicy(testDb(), manager, settings, clock);
  for (const pumpHours of [300, 310, 305]) {
    clock.turn(60_000);
    accepted(await record({ pumpHours }));
  }
  expect((await truckRow(testDb(), truck)).roundsBlockHours).toBe(305 + 100 + 25);
});

test("K4: the same round sent again is one round; the same id with another day is refused", async () => {
  const input = round();
  const results = await Promise.all(
    Array.from({ length: 10 }, () => recordRound(testDb(), mechanic, input, clock)),
  );
  expect(results.map(codeOf)).toEqual(results.map(() => "ok"));
  expect(await roundsOf()).toHaveLength(1);
  const other = { ...input, doneOn: "2026-06-01" };
  expect(codeOf(await recordRound(testDb(), mechanic, other, clock))).toBe("same-id-other-body");
});

test("K7: another carrier's truck has no round done on it from here", async () => {
  const elsewhere = await makeCarrier(testDb(), clock);
  const stranger = await makePerson(testDb(), elsewhere, ["mechanic"]);
  expect(codeOf(await recordRound(testDb(), stranger, round(), clock))).toBe("not-found");
  expect(await roundsOf()).toEqual([]);
});

test("a round's pump hours are a reading of the truck", async () => {
  const input = round({ pumpHours: 812.5 });
  accepted(await recordRound(testDb(), mechanic, input, clock));
  const [row] = await testDb().select().from(readings).where(eq(readings.id, input.id));
  expect(row).toMatchObject({ quantity: "pump-hours", entered: 812.5, unit: "h", si: 812.5 });
  expect((await truckRow(testDb(), truck)).pumpHours).toBe(812.5);
});

test("where hours count, the pump's hours hold past their grace, and a round done frees it from there", async () => {
  const settings = { ...DEFAULT_POLICY, monthlyEveryHours: 100, monthlyGraceHours: 25 };
  await changePolicy(testDb(), manager, settings, clock);
  accepted(await record({ pumpHours: 500 }));
  clock.turn(60_000);
  expect(accepted(await hoursRead(624.9)).standing).toBe("cleared");
  clock.turn(60_000);
  expect(accepted(await hoursRead(625)).standing).toBe("held");
  expect(await reasonsNow()).toContain("round-overdue");
  clock.turn(60_000);
  expect(accepted(await record({ pumpHours: 625 })).standing).toBe("cleared");
  expect((await truckRow(testDb(), truck)).roundsBlockHours).toBe(750);
});

test("hours that come late from an older walk do not turn the truck's hours back", async () => {
  accepted(await hoursRead(900, { ageMs: HOUR }));
  accepted(await hoursRead(880, { ageMs: 10 * HOUR }));
  expect((await truckRow(testDb(), truck)).pumpHours).toBe(900);
});

test("hours that fall, as on a new meter, count from the newest reading on", async () => {
  accepted(await hoursRead(9000));
  clock.turn(DAY);
  accepted(await hoursRead(3));
  expect((await truckRow(testDb(), truck)).pumpHours).toBe(3);
});

test("a round entered late, with the hours of its day, does not turn the truck's hours back", async () => {
  clock.turn(3 * DAY);
  accepted(await hoursRead(900));
  clock.turn(60_000);
  accepted(await record({ doneOn: "2026-06-03", pumpHours: 850 }));
  expect((await truckRow(testDb(), truck)).pumpHours).toBe(900);
  accepted(await record({ doneOn: "2026-06-05", pumpHours: 901 }));
  expect((await truckRow(testDb(), truck)).pumpHours).toBe(901);
});

test("a monthly round done without its hours counts from the hours last read before it", async () => {
  const settings = { ...DEFAULT_POLICY, monthlyEveryHours: 100, monthlyGraceHours: 25 };
  await changePolicy(testDb(), manager, settings, clock);
  expect(accepted(await hoursRead(600)).standing).toBe("held");
  clock.turn(60_000);
  expect(accepted(await record()).standing).toBe("cleared");
  expect((await truckRow(testDb(), truck)).roundsBlockHours).toBe(725);
});

const weeklyDriver = () =>
  allChecks(truck.sheet).filter((check) => check.cadence === "weekly" && check.who === "driver");

async function weeklyFrom(answers: Answers, more: Parameters<typeof walkBody>[1] = {}, age = {}) {
  const body = walkBody(truck, { ...more, answers });
  accepted(await sendWalk(testDb(), driver, body, clock, age));
  return testDb()
    .select()
    .from(rounds)
    .where(and(eq(rounds.walkId, body.id), eq(rounds.kind, "weekly")));
}

test("every weekly check answered in a walk before the day is a weekly round done", async () => {
  clock.turn(12 * DAY);
  accepted(await walk());
  expect(await warningsNow()).toContain("weekly");
  const done = await weeklyFrom({
    ...allGood(truck, "before", true),
    "cab.pump-hours": { kind: "reading", value: 77, unit: "h" },
  });
  expect(done).toMatchObject([
    { doneOn: "2026-06-14", doneBy: driver.personId, pumpHours: 77, doneAt: clock.now() },
  ]);
  expect(await warningsNow()).not.toContain("weekly");
});

test("one weekly check left out, and it is no weekly round: the warning stays", async () => {
  expect(weeklyDriver().length).toBeGreaterThan(3);
  for (const { key } of weeklyDriver()) {
    const { [key]: _left, ...answers } = allGood(truck, "before", true);
    expect(await weeklyFrom(answers), key).toEqual([]);
  }
});

test("a weekly check not really made is no weekly round: could not check, off the scale, too short", async () => {
  const all = allGood(truck, "before", true);
  const spoiled: Answers = {
    "cab.tires-by-gauge": { kind: "could-not-check", reason: "No gauge aboard" },
    "cab.tread": { kind: "reading", value: 999, unit: "in/32" },
    "cab.released-leak-down": { kind: "timed", value: 1, unit: "psi", seconds: 5 },
    "run-up.pressure": { kind: "could-not-check", reason: "Load aboard" },
  };
  for (const [key, answer] of Object.entries(spoiled)) {
    expect(all[key], key).toBeDefined();
    expect(await weeklyFrom({ ...all, [key]: answer }), key).toEqual([]);
  }
});

test("the walk after the day's work is no weekly round", async () => {
  const all = allGood(truck, "before", true);
  expect(await weeklyFrom({ ...all, ...allGood(truck, "after") }, { kind: "after" })).toEqual([]);
});

test("a weekly check with a problem is done, and hangs its tag", async () => {
  const found = tagged(truck, "cab.tires-by-gauge", "flat");
  const done = await weeklyFrom(
    { ...allGood(truck, "before", true), ...found.instead },
    { tags: found.tags },
  );
  expect(done).toHaveLength(1);
  expect((await truckRow(testDb(), truck)).openReds).toBe(1);
});

test("a walk that is not believed is no weekly round: unknown sheet, unknown age, a clock that jumped", async () => {
  const all = allGood(truck, "before", true);
  const sheetHash = sha256("a sheet of nobody here");
  expect(await weeklyFrom(all, { sheetHash, sheet: truck.sheet })).toEqual([]);
  const ages = [
    { ageMs: null },
    { ageMs: -1 },
    { ageMs: 25 * HOUR },
    { ageMs: 0, clockJumped: true },
  ];
  for (const age of ages) expect(await weeklyFrom(all, {}, age), JSON.stringify(age)).toEqual([]);
});
