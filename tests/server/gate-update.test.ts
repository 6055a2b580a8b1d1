import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeAll, expect, test } from "vitest";
import type { Db } from "~/db/client";
import { clearances } from "~/db/schema/handovers";
import { trucks } from "~/db/schema/trucks";
import { tryGate } from "~/domain/handovers/gate-update";
import { type Needs, needsMask } from "~/trade/limits";
import { testDb } from "./database";
import { makeCarrier, makePerson, makeTruck, TestClock } from "./factories";

const clock = new TestClock();
const now = clock.now();
const later = (ms: number) => new Date(now.getTime() + ms);

const NO_NEEDS: Needs = {
  pressureOffLoad: false,
  towing: false,
  hazmat: false,
  vacuumPa: 0,
  fillL: 0,
  hoseM: 0,
};

type Row = Partial<typeof trucks.$inferInsert>;
type Clear = Partial<typeof clearances.$inferInsert> | null;
interface Case {
  name: string;
  truck?: Row;
  clearance?: Clear;
  needs?: Partial<Needs>;
  policyVersion?: number;
  otherDriver?: boolean;
  passes: boolean;
}

/** The gate's WHERE, case by case: each condition on both sides of its edge. */
const CASES: Case[] = [
  { name: "nothing against it", passes: true },
  { name: "one open red", truck: { openReds: 1 }, passes: false },
  { name: "three open reds", truck: { openReds: 3 }, passes: false },
  { name: "not in service", truck: { inService: false }, passes: false },
  { name: "a gate fault", truck: { gateFault: "not worked out" }, passes: false },
  { name: "an empty gate fault is still one", truck: { gateFault: "" }, passes: false },
  { name: "already out", truck: { outHandover: uuidv7() }, passes: false },
  { name: "policy version behind", truck: { policyVersion: 1 }, policyVersion: 2, passes: false },
  { name: "policy version ahead", truck: { policyVersion: 3 }, policyVersion: 2, passes: false },
  {
    name: "yellow without a certifier's date",
    truck: { yellowBlockAt: new Date(0) },
    passes: false,
  },
  { name: "yellow whose date is now", truck: { yellowBlockAt: now }, passes: false },
  {
    name: "yellow whose date is a millisecond ahead",
    truck: { yellowBlockAt: later(1) },
    passes: true,
  },
  { name: "test passed its date", truck: { testsBlockAt: later(-1) }, passes: false },
  { name: "test at its last instant", truck: { testsBlockAt: now }, passes: false },
  { name: "test still in date", truck: { testsBlockAt: later(1) }, passes: true },
  { name: "round past its grace", truck: { roundsBlockAt: later(-86_400_000) }, passes: false },
  { name: "round at its instant", truck: { roundsBlockAt: now }, passes: false },
  { name: "round within its grace", truck: { roundsBlockAt: later(1) }, passes: true },
  { name: "hours at the round's", truck: { roundsBlockHours: 250, pumpHours: 250 }, passes: false },
  {
    name: "hours past the round's",
    truck: { roundsBlockHours: 250, pumpHours: 251 },
    passes: false,
  },
  {
    name: "hours under the round's",
    truck: { roundsBlockHours: 250, pumpHours: 249.9 },
    passes: true,
  },
  { name: "hours without a round by hours", truck: { pumpHours: 9000 }, passes: true },
  {
    name: "pressure forbidden and needed",
    truck: { limitsMask: 1 },
    needs: { pressureOffLoad: true },
    passes: false,
  },
  { name: "pressure forbidden, not needed", truck: { limitsMask: 1 }, passes: true },
  {
    name: "no vacuum work, vacuum needed",
    truck: { limitsMask: 2 },
    needs: { vacuumPa: 1 },
    passes: false,
  },
  { name: "no vacuum work, none needed", truck: { limitsMask: 2 }, passes: true },
  {
    name: "no towing, towing needed",
    truck: { limitsMask: 4 },
    needs: { towing: true },
    passes: false,
  },
  {
    name: "no towing, pressure needed",
    truck: { limitsMask: 4 },
    needs: { pressureOffLoad: true },
    passes: true,
  },
  {
    name: "no hazmat, hazmat needed",
    truck: { limitsMask: 8 },
    needs: { hazmat: true },
    passes: false,
  },
  { name: "every bit, nothing needed", truck: { limitsMask: 15 }, passes: true },
  {
    name: "every need, no bit",
    needs: { pressureOffLoad: true, towing: true, hazmat: true, vacuumPa: 84_000 },
    passes: true,
  },
  {
    name: "vacuum deeper than the limit",
    truck: { limitVacuumPa: 60_000 },
    needs: { vacuumPa: 60_001 },
    passes: false,
  },
  {
    name: "vacuum at the limit",
    truck: { limitVacuumPa: 60_000 },
    needs: { vacuumPa: 60_000 },
    passes: true,
  },
  {
    name: "fill over the limit",
    truck: { limitFillL: 8000 },
    needs: { fillL: 8000.5 },
    passes: false,
  },
  { name: "fill at the limit", truck: { limitFillL: 8000 }, needs: { fillL: 8000 }, passes: true },
  {
    name: "hose over the limit",
    truck: { limitHoseMm: 15_240 },
    needs: { hoseM: 15.241 },
    passes: false,
  },
  {
    name: "hose at the limit",
    truck: { limitHoseMm: 15_240 },
    needs: { hoseM: 15.24 },
    passes: true,
  },
  { name: "pressure unanswered", needs: { pressureOffLoad: null }, passes: false },
  { name: "towing unanswered", needs: { towing: null }, passes: false },
  { name: "hazmat unanswered", needs: { hazmat: null }, passes: false },
  { name: "vacuum unanswered, no limit on it", needs: { vacuumPa: null }, passes: false },
  { name: "fill unanswered, no limit on it", needs: { fillL: null }, passes: false },
  { name: "hose unanswered, no limit on it", needs: { hoseM: null }, passes: false },
  { name: "no clearance", clearance: null, passes: false },
  { name: "clearance of another driver", otherDriver: true, passes: false },
  { name: "clearance behind the tags", clearance: { tagsSeq: 4 }, passes: false },
  { name: "clearance ahead of the tags", clearance: { tagsSeq: 6 }, passes: false },
  { name: "clearance with something unseen", clearance: { tagsSeq: -1 }, passes: false },
  { name: "clearance ending now", clearance: { validUntil: now }, passes: false },
  {
    name: "clearance ended a day ago",
    clearance: { validUntil: later(-86_400_000) },
    passes: false,
  },
  { name: "clearance with a millisecond left", clearance: { validUntil: later(1) }, passes: true },
];

let db: Db;
let carrier: Awaited<ReturnType<typeof makeCarrier>>;
let driver: string;
let stranger: string;

beforeAll(async () => {
  db = testDb();
  carrier = await makeCarrier(db, clock);
  driver = (await makePerson(db, carrier, ["driver"])).personId;
  stranger = (await makePerson(db, carrier, ["driver"])).personId;
});

test.each(CASES)("K1: $name -> $passes", async (one) => {
  const truck = await makeTruck(db, carrier, clock, { bare: true });
  const key = { carrierId: truck.carrierId, truckId: truck.truckId };
  const policyVersion = one.policyVersion ?? 1;
  await db
    .update(trucks)
    .set({ tagsSeq: 5, ...one.truck })
    .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
  if (one.clearance !== null) {
    await db.insert(clearances).values({
      ...key,
      driverId: one.otherDriver ? stranger : driver,
      walkId: uuidv7(),
      tagsSeq: 5,
      validUntil: later(3_600_000),
      ...one.clearance,
    });
  }
  const needs = needsMask({ ...NO_NEEDS, ...one.needs });
  const ask = { ...key, driverId: driver, handoverId: uuidv7(), policyVersion, needs };
  expect(await db.transaction((tx) => tryGate(tx, ask, now))).toBe(one.passes);
  const [after] = await db
    .select({ out: trucks.outHandover, seq: trucks.gateSeq })
    .from(trucks)
    .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
  expect(after?.seq).toBe(one.passes ? 1 : 0);
  if (one.passes) expect(after?.out).toBe(ask.handoverId);
});

test("K7: the gate of another carrier's truck never opens", async () => {
  const truck = await makeTruck(db, carrier, clock, { bare: true });
  const other = await makeCarrier(db, clock);
  const ask = {
    carrierId: other.carrierId,
    truckId: truck.truckId,
    driverId: driver,
    handoverId: uuidv7(),
    policyVersion: 1,
    needs: needsMask(NO_NEEDS),
  };
  expect(await db.transaction((tx) => tryGate(tx, ask, now))).toBe(false);
});

test("there are at least forty hand-made cases, and both verdicts are well represented", () => {
  expect(CASES.length).toBeGreaterThanOrEqual(40);
  expect(CASES.filter((one) => one.passes).length).toBeGreaterThanOrEqual(15);
});
