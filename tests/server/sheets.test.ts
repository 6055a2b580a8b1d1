import { eq } from "drizzle-orm";
import { drizzle } from "drizzle-orm/mysql2";
import { v7 as uuidv7 } from "uuid";
import { beforeAll, expect, test } from "vitest";
import type { Db } from "~/db/client";
import { datedTests, sheetVersions } from "~/db/schema/trucks";
import { walks } from "~/db/schema/walks";
import type { Actor } from "~/domain/actor";
import { changeTruck } from "~/domain/gate/change-truck";
import { addOwnCheck, ownCheckSchema } from "~/domain/own-checks/add-own-check";
import { listOwnChecks } from "~/domain/own-checks/read-own-checks";
import { removeOwnCheck, restoreOwnCheck } from "~/domain/own-checks/remove-own-check";
import type { Result } from "~/domain/refusals";
import { sheetForTruck } from "~/domain/sheets/sheet-for-truck";
import { addFitting, addFittingSchema } from "~/domain/trucks/add-fitting";
import { addTruck, addTruckSchema } from "~/domain/trucks/add-truck";
import { moveTruckToYard } from "~/domain/trucks/move-truck";
import { removeFitting, restoreFitting } from "~/domain/trucks/remove-fitting";
import { setSetPoint, setSetPointSchema } from "~/domain/trucks/set-set-point";
import { addYard } from "~/domain/yards/add-yard";
import { refusalText } from "~/text/en/refusals";
import { allChecks } from "~/trade/sheet/due-checks";
import { missingParts } from "~/trade/sheet/road-safety-floor";
import { testDatabase, testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";

const clock = new TestClock();
let ours: TestCarrier;
let manager: Actor;
let driver: Actor;
let stranger: Actor;
let serial = 0;

beforeAll(async () => {
  ours = await makeCarrier(testDb(), clock);
  manager = await makePerson(testDb(), ours, ["manager"]);
  driver = await makePerson(testDb(), ours, ["driver"]);
  stranger = await makePerson(testDb(), await makeCarrier(testDb(), clock), ["manager"]);
});

function value<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`refused: ${JSON.stringify(result.refusal)}`);
  return result.value;
}

async function usualTruck(more: Record<string, unknown> = {}) {
  serial += 1;
  const input = addTruckSchema.parse({
    unitNumber: `S-${serial}`,
    kind: "powered",
    yardId: ours.yardId,
    start: "vane-3000",
    ...more,
  });
  const { id } = value(await addTruck(testDb(), manager, input, clock));
  await testDb().insert(datedTests).values({
    carrierId: ours.carrierId,
    id: uuidv7(),
    truckId: id,
    kind: "annual-inspection",
    dueOn: "2099-12-31",
    recordedBy: manager.personId,
    recordedAt: clock.now(),
  });
  return { carrierId: ours.carrierId, truckId: id };
}

async function sheetOf(truckId: string, db: Db = testDb()) {
  return value(await sheetForTruck(db, manager, truckId, clock));
}

const relief = setSetPointSchema.parse({
  reading: "vacuum-relief",
  unit: "inHg",
  setPoint: 20,
  low: 19,
  high: 21,
});

test("the sheet follows from the fittings and is stored once", async () => {
  const { truckId } = await usualTruck();
  const first = await sheetOf(truckId);
  expect(first.hash).toMatch(/^[0-9a-f]{64}$/);
  expect(await sheetOf(truckId)).toEqual(first);
  const stored = await testDb()
    .select()
    .from(sheetVersions)
    .where(eq(sheetVersions.truckId, truckId));
  expect(stored).toHaveLength(1);
  expect(stored[0]).toMatchObject({ id: first.sheetId, hash: first.hash, madeHere: true });
  expect(stored[0]?.body).toEqual(first.sheet);
});

test("many asking at once for a new sheet get the same one", async () => {
  const { truckId } = await usualTruck();
  const sheets = await Promise.all(Array.from({ length: 12 }, () => sheetOf(truckId)));
  expect(new Set(sheets.map((sheet) => sheet.sheetId)).size).toBe(1);
  const stored = await testDb()
    .select()
    .from(sheetVersions)
    .where(eq(sheetVersions.truckId, truckId));
  expect(stored).toHaveLength(1);
});

test("every road-safety part is on the daily sheet of a truck with nothing entered yet", async () => {
  const { truckId } = await usualTruck({ start: null });
  const { sheet } = await sheetOf(truckId);
  expect(missingParts(sheet, "before")).toEqual([]);
});

test("a truck without a deodorizer is not asked about one", async () => {
  const { truckId } = await usualTruck();
  const asked = async () =>
    allChecks((await sheetOf(truckId)).sheet).some((check) => check.key === "pump-side.can");
  expect(await asked()).toBe(true);
  const can = allChecks((await sheetOf(truckId)).sheet).find((c) => c.key === "pump-side.can");
  value(await removeFitting(testDb(), manager, { truckId, fittingId: can!.fittingId! }, clock));
  expect(await asked()).toBe(false);
  value(await restoreFitting(testDb(), manager, { truckId, fittingId: can!.fittingId! }, clock));
  expect(await asked()).toBe(true);
});

test("the run-up waits for its set points, and stops at the lowest plate of the day", async () => {
  const { truckId } = await usualTruck();
  expect((await sheetOf(truckId)).sheet.missingSetPoints).toEqual([
    "vacuum-relief",
    "pressure-relief",
  ]);
  value(await setSetPoint(testDb(), manager, { truckId, ...relief }, clock));
  const { sheet } = await sheetOf(truckId);
  expect(sheet.missingSetPoints).toEqual(["pressure-relief"]);
  const vacuum = allChecks(sheet).find((check) => check.key === "run-up.vacuum");
  expect(vacuum?.reading?.stop).toBeCloseTo(91_432, 0);
});

test("a sheet costs the same number of statements whatever the truck carries", async () => {
  const bare = await usualTruck({ start: null });
  const full = await usualTruck();
  for (const kind of ["manway", "secondary-trap", "oil-catch", "pre-filter"]) {
    const input = { truckId: full.truckId, ...addFittingSchema.parse({ kind }) };
    value(await addFitting(testDb(), manager, input, clock));
  }
  let asked = 0;
  const counting = drizzle({
    client: testDatabase().pool.promise(),
    logger: {
      logQuery: () => {
        asked += 1;
      },
    },
  });
  const statements = async (truckId: string) => {
    asked = 0;
    await sheetOf(truckId, counting);
    return asked;
  };
  const first = await statements(bare.truckId);
  expect(first).toBe(7);
  expect(await statements(full.truckId)).toBe(first);
  expect(await statements(full.truckId)).toBe(5);
});

test("another firm's truck has no sheet", async () => {
  const { truckId } = await usualTruck();
  const refused = await sheetForTruck(testDb(), stranger, truckId, clock);
  expect(refused.ok ? null : refused.refusal.code).toBe("not-found");
});

/** A walk as one that clears is stored: complete, on the truck's setup of the moment. */
async function walked(key: { carrierId: string; truckId: string }) {
  const { sheetId, setupVersion } = await sheetOf(key.truckId);
  const changed = await changeTruck(
    testDb(),
    key,
    async ({ tx, now }) => {
      await tx.insert(walks).values({
        ...key,
        id: uuidv7(),
        driverId: driver.personId,
        kind: "before",
        sheetId,
        setupVersion,
        hash: "0".repeat(64),
        signedAt: now,
        ageMs: 0,
        receivedAt: now,
        countsFrom: now,
        yardDay: "2026-06-02",
        complete: true,
        limits: [],
        missing: [],
        signature: { name: driver.name, wording: "walk" },
      });
    },
    { clock },
  );
  return value(changed).standing.word;
}

test("a fitting added, changed back or taken off ends the walk made before it", async () => {
  const key = await usualTruck();
  const { truckId } = key;
  expect(await walked(key)).toBe("cleared");
  const input = { truckId, ...addFittingSchema.parse({ kind: "hitch" }) };
  const { id } = value(await addFitting(testDb(), manager, input, clock));
  expect((await truckRow(testDb(), key)).standing).toBe("walk-due");
  clock.turn(1000);
  expect(await walked(key)).toBe("cleared");
  value(await removeFitting(testDb(), manager, { truckId, fittingId: id }, clock));
  expect((await truckRow(testDb(), key)).standing).toBe("walk-due");
});

test("a set point or a move to another yard ends the walk made before it", async () => {
  const key = await usualTruck();
  expect(await walked(key)).toBe("cleared");
  value(await setSetPoint(testDb(), manager, { truckId: key.truckId, ...relief }, clock));
  expect((await truckRow(testDb(), key)).standing).toBe("walk-due");
  clock.turn(1000);
  expect(await walked(key)).toBe("cleared");
  const yard = {
    name: "Mesa Yard",
    zone: "America/Denver",
    elevation: 6496,
    elevationUnit: "ft",
    phone: null,
    shopOpens: 360,
    winter: false,
  };
  const { id: yardId } = value(await addYard(testDb(), manager, yard, clock));
  value(await moveTruckToYard(testDb(), manager, { truckId: key.truckId, yardId }, clock));
  expect((await truckRow(testDb(), key)).standing).toBe("walk-due");
});

test("an own check is on the sheets from the next walk on, ends no walk, and can be taken off and put back", async () => {
  const key = await usualTruck();
  const other = await usualTruck();
  expect(await walked(key)).toBe("cleared");
  const input = ownCheckSchema.parse({
    truckId: key.truckId,
    station: "rear",
    cadence: "daily",
    label: "Blue drum strapped",
    good: "Both straps tight, lid on",
    colour: "yellow",
  });
  const { id: checkId } = value(await addOwnCheck(testDb(), manager, input, clock));
  const on = async (truckId: string) =>
    allChecks((await sheetOf(truckId)).sheet).some((check) => check.key === `own.${checkId}`);
  expect(await on(key.truckId)).toBe(true);
  expect(await on(other.truckId)).toBe(false);
  expect((await truckRow(testDb(), key)).standing).toBe("cleared");
  value(await removeOwnCheck(testDb(), manager, { checkId }, clock));
  expect(await on(key.truckId)).toBe(false);
  const again = await removeOwnCheck(testDb(), manager, { checkId }, clock);
  expect(again.ok ? null : again.refusal.code).toBe("not-found");
  value(await restoreOwnCheck(testDb(), manager, { checkId }, clock));
  expect(await on(key.truckId)).toBe(true);
});

test("an own check is refused without words, off the station list, on another firm's truck, and by another firm", async () => {
  const fields = { station: "rear", cadence: "daily", label: "Look", good: "Good", colour: "red" };
  const words = (more: Record<string, unknown>) =>
    ownCheckSchema
      .safeParse({ ...fields, ...more })
      .error?.issues.map((issue) => refusalText.field(issue.message));
  expect(words({ label: " " })).toEqual(["Say what to look at, 80 characters at most."]);
  expect(words({ good: "x".repeat(161) })?.[0]).toContain("160 characters");
  expect(words({ station: "roof" })?.[0]).toContain("station");
  expect(words({ cadence: "yearly" })?.[0]).toContain("how often");
  expect(words({ colour: "purple" })?.[0]).toContain("color");
  const { truckId } = await usualTruck();
  const onTheirs = await addOwnCheck(
    testDb(),
    stranger,
    ownCheckSchema.parse({ ...fields, truckId }),
    clock,
  );
  expect(onTheirs.ok ? null : onTheirs.refusal.fields).toEqual([
    { pointer: "/truckId", code: "truck-unknown" },
  ]);
  const { id: checkId } = value(
    await addOwnCheck(testDb(), manager, ownCheckSchema.parse(fields), clock),
  );
  expect((await removeOwnCheck(testDb(), stranger, { checkId }, clock)).ok).toBe(false);
  expect((await restoreOwnCheck(testDb(), stranger, { checkId }, clock)).ok).toBe(false);
  expect((await listOwnChecks(testDb(), stranger)).some((check) => check.id === checkId)).toBe(
    false,
  );
});
