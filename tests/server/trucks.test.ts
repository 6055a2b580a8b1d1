import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeAll, expect, test } from "vitest";
import { changes } from "~/db/schema/carriers";
import { audit } from "~/db/schema/people";
import { fittings, setPoints, trucks } from "~/db/schema/trucks";
import type { Actor } from "~/domain/actor";
import { days } from "~/domain/durations";
import type { Result } from "~/domain/refusals";
import { addFitting, addFittingSchema } from "~/domain/trucks/add-fitting";
import { addTruck, addTruckSchema } from "~/domain/trucks/add-truck";
import { changeFitting } from "~/domain/trucks/change-fitting";
import { changeTruckDetails } from "~/domain/trucks/change-truck-details";
import { shownAmount } from "~/domain/trucks/fitting-attributes";
import { fittingFields } from "~/domain/trucks/fitting-fields";
import { listTrucks } from "~/domain/trucks/list-trucks";
import { moveTruckToYard } from "~/domain/trucks/move-truck";
import { officeCounts } from "~/domain/trucks/office-counts";
import { datedTestSchema, endDatedTest, recordDatedTest } from "~/domain/trucks/record-dated-test";
import { removeFitting, restoreFitting } from "~/domain/trucks/remove-fitting";
import { setInService } from "~/domain/trucks/set-in-service";
import { removeSetPoint, setSetPoint, setSetPointSchema } from "~/domain/trucks/set-set-point";
import { truckSetup } from "~/domain/trucks/truck-setup";
import { vinWarning } from "~/domain/trucks/vin";
import { addYard } from "~/domain/yards/add-yard";
import { refusalText } from "~/text/en/refusals";
import { toSi } from "~/trade/units";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";

const clock = new TestClock();
let ours: TestCarrier;
let theirs: TestCarrier;
let manager: Actor;
let stranger: Actor;
let serial = 0;

beforeAll(async () => {
  ours = await makeCarrier(testDb(), clock);
  theirs = await makeCarrier(testDb(), clock);
  manager = await makePerson(testDb(), ours, ["manager"]);
  stranger = await makePerson(testDb(), theirs, ["manager"]);
});

/** The value of a command that must go through. */
function value<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`refused: ${JSON.stringify(result.refusal)}`);
  return result.value;
}

/** The words at each field of a refused command, by pointer. */
function faults(result: Result<unknown>): Record<string, string> {
  if (result.ok) throw new Error("went through");
  expect(result.refusal.code).toBe("invalid");
  const fields = result.refusal.fields ?? [];
  return Object.fromEntries(
    fields.map(({ pointer, code, values }) => [pointer, refusalText.field(code, values)]),
  );
}

function code(result: Result<unknown>): string | null {
  return result.ok ? null : result.refusal.code;
}

function typed(more: Record<string, unknown> = {}) {
  serial += 1;
  return addTruckSchema.parse({
    unitNumber: `U-${serial}`,
    kind: "powered",
    yardId: ours.yardId,
    ...more,
  });
}

async function newTruck(more: Record<string, unknown> = {}) {
  const { id } = value(await addTruck(testDb(), manager, typed(more), clock));
  return { carrierId: ours.carrierId, truckId: id };
}

/** A truck with what the reliefs' limits depend on, and nothing else. */
async function platedTruck() {
  const key = await newTruck();
  const add = async (kind: string, attributes: unknown) =>
    value(
      await addFitting(
        testDb(),
        manager,
        { truckId: key.truckId, ...addFittingSchema.parse({ kind, attributes }) },
        clock,
      ),
    );
  const tank = await add("tank", {
    volumeL: { value: "3,000", unit: "gal" },
    maxVacuumPa: { value: "27", unit: "inHg" },
    maxPressurePa: { value: "25", unit: "psi" },
  });
  const pump = await add("pump", {
    type: "vane",
    maxVacuumPa: { value: "24", unit: "inHg" },
    maxPressurePa: { value: "15", unit: "psi" },
    minRpm: { value: "900", unit: "rpm" },
    maxRpm: { value: "1200", unit: "rpm" },
  });
  const gauge = await add("compound-gauge", {
    maxVacuumPa: { value: "30", unit: "inHg" },
    maxPressurePa: { value: "30", unit: "psi" },
  });
  await add("vacuum-relief", {});
  await add("pressure-relief", {});
  return { ...key, tankId: tank.id, pumpId: pump.id, gaugeId: gauge.id };
}

function point(truckId: string, more: Record<string, unknown> = {}) {
  const entered = { reading: "vacuum-relief", unit: "inHg", setPoint: "20", low: "19", high: "21" };
  return { truckId, ...setSetPointSchema.parse({ ...entered, ...more }) };
}

async function setupVersion(key: { carrierId: string; truckId: string }) {
  return (await truckRow(testDb(), key)).setupVersion;
}

test("a truck is entered under its unit number in capitals, and is held until its annual inspection is on file", async () => {
  const added = value(await addTruck(testDb(), manager, typed({ unitNumber: "  t-118 " }), clock));
  expect(added.unitNumber).toBe("T-118");
  const row = await truckRow(testDb(), { carrierId: ours.carrierId, truckId: added.id });
  expect(row.standing).toBe("held");
  expect(row.standingDetail?.reasons[0]).toEqual({
    code: "test-not-on-file",
    id: "annual-inspection",
  });
  expect(row.gateFault).toBeNull();
  const feed = await testDb().select().from(changes).where(eq(changes.truckId, added.id));
  expect(feed.map((change) => change.kind)).toEqual(["truck", "standing"]);
});

test("a unit number in use is refused at its field, whatever the case; another firm may use it", async () => {
  value(await addTruck(testDb(), manager, typed({ unitNumber: "T-200" }), clock));
  const again = await addTruck(testDb(), manager, typed({ unitNumber: "t-200" }), clock);
  expect(faults(again)["/unitNumber"]).toBe(
    "T-200 is in use already. Give this one another unit number.",
  );
  const other = { ...typed({ unitNumber: "T-200" }), yardId: theirs.yardId };
  expect((await addTruck(testDb(), stranger, other, clock)).ok).toBe(true);
});

test("unit numbers that cannot be painted on a door are refused", () => {
  for (const unitNumber of ["", "-1", "T 118", "T/118", "Ü-1", "A".repeat(21)]) {
    const result = addTruckSchema.safeParse({ unitNumber, kind: "powered", yardId: uuidv7() });
    expect(result.error?.issues.map((issue) => issue.message)).toEqual(["unit-number-form"]);
  }
});

test("a truck cannot be entered into another firm's yard", async () => {
  const input = { ...typed(), yardId: theirs.yardId };
  expect(faults(await addTruck(testDb(), manager, input, clock))).toEqual({
    "/yardId": "Choose one of your yards.",
  });
  expect(faults(await addTruck(testDb(), manager, { ...input, yardId: uuidv7() }, clock))).toEqual({
    "/yardId": "Choose one of your yards.",
  });
});

test("a VIN is looked over and kept: a warning, never a refusal", async () => {
  expect(vinWarning("1M8GDM9AXKP042788")).toBeNull();
  expect(vinWarning("11111111111111111")).toBeNull();
  expect(vinWarning("1M8GDM9A1KP042788")).toBe("vin-check-digit");
  expect(vinWarning("1M8GDM9AXKPO42788")).toBe("vin-letters");
  expect(vinWarning("TRAILER77")).toBe("vin-length");
  const added = value(
    await addTruck(testDb(), manager, typed({ vin: "1m8 gdm9a1-kp042788" }), clock),
  );
  expect(added.vinWarning).toBe("vin-check-digit");
  const row = await truckRow(testDb(), { carrierId: ours.carrierId, truckId: added.id });
  expect(row.vin).toBe("1M8GDM9A1KP042788");
  expect(addTruckSchema.safeParse({ ...typed(), vin: "1".repeat(18) }).success).toBe(false);
});

test("a usual truck comes with its fittings, in order, and no set points", async () => {
  const key = await newTruck({ start: "vane-3000" });
  const row = await truckRow(testDb(), key);
  const setup = await truckSetup(testDb(), manager, row.unitNumber, clock);
  expect(setup?.fittings.map((fitting) => fitting.kind)).toContain("secondary-trap");
  expect(setup?.fittings[0]?.kind).toBe("tank");
  expect(setup?.fittings[0]?.attributes.volumeL).toBeCloseTo(11_356.2, 1);
  expect(setup?.setPoints.every((line) => line.set === null)).toBe(true);
  for (const start of ["hydraulic-2500", "towed-5000"]) {
    await newTruck({ start, kind: start === "towed-5000" ? "towed" : "powered" });
  }
});

test("details change, a kind change ends walks, and a taken unit number is refused", async () => {
  const key = await newTruck({ unitNumber: "D-1" });
  await newTruck({ unitNumber: "D-2" });
  const change = (more: Partial<{ unitNumber: string; kind: "powered" | "towed" }>) =>
    changeTruckDetails(
      testDb(),
      manager,
      { truckId: key.truckId, unitNumber: "D-1", kind: "powered", vin: null, ...more },
      clock,
    );
  expect(faults(await change({ unitNumber: "D-2" }))["/unitNumber"]).toContain("D-2 is in use");
  const before = await setupVersion(key);
  value(await change({ unitNumber: "D-3" }));
  expect(await setupVersion(key)).toBe(before);
  value(await change({ unitNumber: "D-3", kind: "towed" }));
  expect(await setupVersion(key)).toBe(before + 1);
});

test("plates are typed in the shop's units and kept in SI", async () => {
  const { tankId, truckId, carrierId } = await platedTruck();
  const [tank] = await testDb()
    .select()
    .from(fittings)
    .where(and(eq(fittings.carrierId, carrierId), eq(fittings.id, tankId)));
  expect(tank?.truckId).toBe(truckId);
  expect(tank?.attributes).toEqual({
    volumeL: toSi(3000, "gal") * 1000,
    maxVacuumPa: toSi(27, "inHg"),
    maxPressurePa: toSi(25, "psi"),
    specificationPlate: false,
    fullOpeningRear: false,
    insulated: false,
    lined: false,
    corrosiveLoad: false,
  });
});

test("a plate that is not filled in, off any plate, or in a unit that measures something else is refused at its field", async () => {
  const { truckId } = await newTruck();
  const add = (kind: string, attributes: unknown) =>
    addFitting(
      testDb(),
      manager,
      { truckId, ...addFittingSchema.parse({ kind, attributes }) },
      clock,
    );
  expect(faults(await add("tank", {}))).toEqual({
    "/attributes/volumeL/value": "Fill this in from the plate.",
  });
  expect(
    faults(await add("tank", { volumeL: { value: "3000", unit: "psi" } }))[
      "/attributes/volumeL/unit"
    ],
  ).toBe("psi does not measure this. Use m3, L, gal, qt, cup, fl-oz.");
  expect(
    faults(await add("tank", { volumeL: { value: "3000", unit: "barrels" } }))[
      "/attributes/volumeL/unit"
    ],
  ).toContain("Choose a unit from the list");
  expect(
    faults(await add("tank", { volumeL: { value: "3", unit: "gal" } }))[
      "/attributes/volumeL/value"
    ],
  ).toMatch(/^Type a value from 26\.417 to 21134 gal/);
  expect(faults(await add("pump", { type: "steam", maxVacuumPa: { value: "27" } }))).toEqual({
    "/attributes/type": "Choose one from the list.",
  });
  expect(faults(await add("cap", { count: "2.5" }))["/attributes/count"]).toBe(
    "Type a whole number.",
  );
  const rpm = { minRpm: { value: "1200" }, maxRpm: { value: "900" } };
  const pump = { type: "vane", maxVacuumPa: { value: "27" }, ...rpm };
  expect(faults(await add("pump", pump))["/attributes/minRpm/value"]).toContain("Swap");
  const words = addFittingSchema.safeParse({
    kind: "tank",
    attributes: { volumeL: { value: "3000 gal" } },
  });
  expect(words.error?.issues[0]?.message).toBe("not-a-number");
});

test("a truck has one pump; sight glasses may be several", async () => {
  const { truckId } = await platedTruck();
  const add = (kind: string, attributes: unknown) =>
    addFitting(
      testDb(),
      manager,
      { truckId, ...addFittingSchema.parse({ kind, attributes }) },
      clock,
    );
  const second = { type: "blower", maxVacuumPa: { value: "16" } };
  expect(faults(await add("pump", second))["/kind"]).toContain("has one already");
  value(await add("sight-glass", { count: 2 }));
  value(await add("sight-glass", { count: 1 }));
});

test("a form's id that is another truck's fitting makes a fitting of its own", async () => {
  const first = await platedTruck();
  const { truckId } = await newTruck();
  const ladder = addFittingSchema.parse({ kind: "ladder", id: first.pumpId });
  const { id } = value(await addFitting(testDb(), manager, { truckId, ...ladder }, clock));
  expect(id).not.toBe(first.pumpId);
});

test("two managers fitting a pump at once fit one", async () => {
  const { truckId } = await newTruck();
  const pump = addFittingSchema.parse({
    kind: "pump",
    attributes: { type: "vane", maxVacuumPa: { value: 27 } },
  });
  const add = () => addFitting(testDb(), manager, { truckId, ...pump }, clock);
  const results = await Promise.all([add(), add(), add(), add()]);
  expect(results.filter((result) => result.ok)).toHaveLength(1);
});

test("saving a fitting as it is shown changes nothing and ends no walk", async () => {
  const key = await newTruck();
  const attributes = {
    volumeL: { value: "11356", unit: "L" },
    maxVacuumPa: { value: "91.5", unit: "kPa" },
  };
  const { id } = value(
    await addFitting(
      testDb(),
      manager,
      { truckId: key.truckId, ...addFittingSchema.parse({ kind: "tank", attributes }) },
      clock,
    ),
  );
  const before = await setupVersion(key);
  const [row] = await testDb().select().from(fittings).where(eq(fittings.id, id));
  const shown = Object.fromEntries(
    fittingFields("tank").flatMap((field) => {
      const stored = field.as === "amount" ? row?.attributes[field.name] : undefined;
      if (field.as !== "amount" || stored === undefined) return [];
      return [[field.name, { value: shownAmount(field, stored), unit: field.units[0] }]];
    }),
  );
  const input = { truckId: key.truckId, fittingId: id, attributes: shown };
  expect(value(await changeFitting(testDb(), manager, input, clock))).toEqual({ changed: false });
  expect(await setupVersion(key)).toBe(before);
  const larger = { ...shown, volumeL: { value: 4000, unit: "gal" } };
  const changed = { ...input, attributes: larger };
  expect(value(await changeFitting(testDb(), manager, changed, clock))).toEqual({ changed: true });
  expect(await setupVersion(key)).toBe(before + 1);
});

test("a removed fitting is kept and can be put back, once", async () => {
  const { truckId, pumpId, carrierId } = await platedTruck();
  const on = { truckId, fittingId: pumpId };
  const { unitNumber } = await truckRow(testDb(), { carrierId, truckId });
  value(await removeFitting(testDb(), manager, on, clock));
  expect(code(await removeFitting(testDb(), manager, on, clock))).toBe("not-found");
  const without = await truckSetup(testDb(), manager, unitNumber, clock);
  expect(without?.removed.map((fitting) => fitting.id)).toEqual([pumpId]);
  expect(without?.fittings.some((fitting) => fitting.kind === "pump")).toBe(false);
  const change = { ...on, attributes: {} };
  expect(faults(await changeFitting(testDb(), manager, change, clock))[""]).toContain("Restore it");
  value(await restoreFitting(testDb(), manager, on, clock));
  expect(code(await restoreFitting(testDb(), manager, on, clock))).toBe("invalid");
  const row = await truckRow(testDb(), { carrierId, truckId });
  expect((await truckSetup(testDb(), manager, row.unitNumber, clock))?.removed).toEqual([]);
});

test("a set point is kept as typed and in SI, and the newest is the one in force", async () => {
  const { truckId } = await platedTruck();
  value(await setSetPoint(testDb(), manager, point(truckId), clock));
  value(await setSetPoint(testDb(), manager, point(truckId, { setPoint: "20.5" }), clock));
  const rows = await testDb().select().from(setPoints).where(eq(setPoints.truckId, truckId));
  const inForce = rows.filter((row) => row.replacedAt === null);
  expect(rows).toHaveLength(2);
  expect(inForce[0]?.entered).toEqual({ setPoint: 20.5, low: 19, high: 21, stop: null });
  expect(inForce[0]?.setPointSi).toBeCloseTo(69_420.9, 0);
  // Nobody typed a stop: it is the lowest of tank, pump and gauge, here the pump's 24 inHg.
  expect(inForce[0]?.stopSi).toBeCloseTo(toSi(24, "inHg"), 3);
});

test("the same set point again changes nothing and ends no walk", async () => {
  const key = await platedTruck();
  value(await setSetPoint(testDb(), manager, point(key.truckId), clock));
  const before = await setupVersion(key);
  const again = value(await setSetPoint(testDb(), manager, point(key.truckId), clock));
  expect(again.changed).toBe(false);
  expect(await setupVersion(key)).toBe(before);
});

test("a set point, band or stop over the pump's limit is refused, and the words name the limit", async () => {
  const { truckId } = await platedTruck();
  const set = async (more: Record<string, unknown>) =>
    faults(await setSetPoint(testDb(), manager, point(truckId, more), clock));
  const over = "Over the pump's plate, 24 inHg. Type 24 inHg or less.";
  expect(await set({ setPoint: "25", high: "26" })).toEqual({ "/setPoint": over, "/high": over });
  expect(await set({ stop: "27" })).toEqual({ "/stop": over });
  const pressure = {
    reading: "pressure-relief",
    unit: "psi",
    setPoint: "18",
    low: "17",
    high: "19",
  };
  expect((await set(pressure))["/setPoint"]).toBe(
    "Over the pump's plate, 15 psi. Type 15 psi or less.",
  );
  const atLimit = point(truckId, { setPoint: "24", low: "23", high: "24", stop: "24" });
  expect((await setSetPoint(testDb(), manager, atLimit, clock)).ok).toBe(true);
});

test("a set point off the gauge's scale is refused", async () => {
  const key = await newTruck();
  const attributes = {
    maxVacuumPa: { value: 15, unit: "inHg" },
    maxPressurePa: { value: 15, unit: "psi" },
  };
  const gauge = addFittingSchema.parse({ kind: "compound-gauge", attributes });
  value(await addFitting(testDb(), manager, { truckId: key.truckId, ...gauge }, clock));
  const result = await setSetPoint(testDb(), manager, point(key.truckId), clock);
  expect(faults(result)["/setPoint"]).toBe(
    "Over the end of the gauge's scale, 15 inHg. Type 15 inHg or less.",
  );
});

test("a set point in a unit that measures something else, or out of its own band, is refused", async () => {
  const { truckId } = await platedTruck();
  const set = async (more: Record<string, unknown>) =>
    faults(await setSetPoint(testDb(), manager, point(truckId, more), clock));
  expect((await set({ unit: "gal" }))["/unit"]).toBe(
    "gal does not measure this. Use Pa, kPa, bar, psi, inHg, mmHg.",
  );
  expect((await set({ unit: "feet" }))["/unit"]).toContain("Choose a unit");
  expect((await set({ reading: "moon-phase" }))["/reading"]).toContain("Choose a reading");
  expect(await set({ low: "22" })).toEqual({
    "/low": "The low end is above the set point. Type 20 inHg or less.",
  });
  expect(await set({ high: "19.5" })).toEqual({
    "/high": "The high end is below the set point. Type 20 inHg or more.",
  });
  expect(await set({ stop: "20.5" })).toEqual({
    "/stop": "The stop value is inside the band. Type 21 inHg or more.",
  });
  expect(await set({ setPoint: "0" })).toHaveProperty("/setPoint");
  const speed = { reading: "pump-speed", unit: "rpm", setPoint: "1300", low: "800", high: "" };
  expect(await set(speed)).toEqual({
    "/setPoint": "Over the pump's plate, 1200 rpm. Type 1200 rpm or less.",
    "/low": "Under the lowest speed on the pump's plate, 900 rpm. Type 900 rpm or more.",
  });
});

test("a relief with no plate to stop at has no set point", async () => {
  const { truckId } = await newTruck();
  expect(faults(await setSetPoint(testDb(), manager, point(truckId), clock))).toHaveProperty(
    "/stop",
  );
});

test("a vacuum that the yard's air never allows is kept, and said", async () => {
  const { truckId } = await platedTruck();
  const yard = {
    name: `High Yard ${truckId.slice(-6)}`,
    zone: "America/Denver",
    elevation: 8500,
    elevationUnit: "ft",
    phone: null,
    shopOpens: 360,
    winter: true,
  };
  const { id: yardId } = value(await addYard(testDb(), manager, yard, clock));
  value(await moveTruckToYard(testDb(), manager, { truckId, yardId }, clock));
  const input = point(truckId, { setPoint: "23", low: "22", high: "24" });
  const set = value(await setSetPoint(testDb(), manager, input, clock));
  expect(set.greatestHere?.unit).toBe("inHg");
  expect(set.greatestHere?.value).toBeCloseTo(21.8, 1);
});

test("a plate is not typed lower than a set point in force", async () => {
  const { truckId, pumpId } = await platedTruck();
  value(await setSetPoint(testDb(), manager, point(truckId), clock));
  const attributes = { type: "vane", maxVacuumPa: { value: 18, unit: "inHg" } };
  const weaker = { truckId, fittingId: pumpId, attributes };
  const words = faults(await changeFitting(testDb(), manager, weaker, clock));
  expect(words["/attributes/maxVacuumPa/value"]).toContain("20 inHg, over the pump's plate");
  const [pump] = await testDb().select().from(fittings).where(eq(fittings.id, pumpId));
  expect(pump?.attributes.maxVacuumPa).toBe(toSi(24, "inHg"));
});

test("a set point can be taken away", async () => {
  const { truckId } = await platedTruck();
  value(await setSetPoint(testDb(), manager, point(truckId), clock));
  const which = { truckId, reading: "vacuum-relief" };
  value(await removeSetPoint(testDb(), manager, which, clock));
  expect(code(await removeSetPoint(testDb(), manager, which, clock))).toBe("not-found");
});

test("out of service holds the key, and back in service lets the walk decide", async () => {
  const { truckId } = await newTruck();
  value(await recordDatedTest(testDb(), manager, dated(truckId), clock));
  const set = async (inService: boolean) =>
    value(await setInService(testDb(), manager, { truckId, inService }, clock)).standing;
  expect(await set(false)).toBe("held");
  expect(await set(true)).toBe("walk-due");
});

function dated(truckId: string, more: Record<string, unknown> = {}) {
  const entered = { kind: "annual-inspection", passedOn: "2026-05-20" };
  return { truckId, ...datedTestSchema.parse({ ...entered, ...more }) };
}

test("an annual inspection counts twelve months, and holds the key from the day after", async () => {
  const key = await newTruck();
  const old = value(
    await recordDatedTest(testDb(), manager, dated(key.truckId, { passedOn: "2025-06-01" }), clock),
  );
  expect(old.dueOn).toBe("2026-06-01");
  expect((await truckRow(testDb(), key)).standing).toBe("held");
  const fresh = value(await recordDatedTest(testDb(), manager, dated(key.truckId), clock));
  expect(fresh.dueOn).toBe("2027-05-20");
  expect((await truckRow(testDb(), key)).standing).toBe("walk-due");
});

test("dates that cannot be are refused at their field", async () => {
  const { truckId } = await newTruck();
  const record = async (more: Record<string, unknown>) =>
    faults(await recordDatedTest(testDb(), manager, dated(truckId, more), clock));
  // The yard's day is 2 June: the third is still to come.
  expect((await record({ passedOn: "2026-06-03" }))["/passedOn"]).toContain("day to come");
  expect((await record({ passedOn: "" }))["/passedOn"]).toBe("Type the date.");
  expect((await record({ dueOn: "2026-05-19" }))["/dueOn"]).toContain("lies before");
  expect((await record({ dueOn: "2027-05-21" }))["/dueOn"]).toContain("2027-05-20");
  expect((await record({ kind: "permit", passedOn: "" }))["/dueOn"]).toBe("Type the date.");
  const form = datedTestSchema.safeParse({ kind: "permit", dueOn: "31/12/2026" });
  expect(form.error?.issues[0]?.message).toBe("date-form");
  expect(datedTestSchema.safeParse({ kind: "horoscope" }).success).toBe(false);
});

test("tank tests are for a tank with a specification plate, and end with the plate", async () => {
  const key = await platedTruck();
  const { truckId, tankId } = key;
  const { unitNumber } = await truckRow(testDb(), key);
  const visual = dated(truckId, { kind: "external-visual" });
  expect(faults(await recordDatedTest(testDb(), manager, visual, clock))["/kind"]).toContain(
    "specification plate",
  );
  const plate = async (specificationPlate: boolean) =>
    value(
      await changeFitting(
        testDb(),
        manager,
        {
          truckId,
          fittingId: tankId,
          attributes: {
            volumeL: { value: 3000, unit: "gal" },
            maxVacuumPa: { value: 27, unit: "inHg" },
            maxPressurePa: { value: 25, unit: "psi" },
            specificationPlate,
            fullOpeningRear: true,
          },
        },
        clock,
      ),
    );
  await plate(true);
  const recorded = value(await recordDatedTest(testDb(), manager, visual, clock));
  // Loaded by vacuum with a full-opening rear head: six months.
  expect(recorded.dueOn).toBe("2026-11-20");
  const which = { truckId, kind: "external-visual" };
  expect(faults(await endDatedTest(testDb(), manager, which, clock))["/kind"]).toContain("The law");
  await plate(false);
  const left = await truckSetup(testDb(), manager, unitNumber, clock);
  expect(left?.testsLeftOver.map((one) => one.kind)).toEqual(["external-visual"]);
  value(await endDatedTest(testDb(), manager, which, clock));
  const ended = await truckSetup(testDb(), manager, unitNumber, clock);
  expect(ended?.testsLeftOver).toEqual([]);
  expect((await truckRow(testDb(), key)).gateFault).toBeNull();
});

test("a test's state is said: never recorded, good, soon, past", async () => {
  const key = await newTruck();
  const { unitNumber } = await truckRow(testDb(), key);
  const state = async () =>
    (await truckSetup(testDb(), manager, unitNumber, clock))?.tests.find(
      (line) => line.required.test === "annual-inspection",
    )?.state;
  const record = (passedOn: string) =>
    recordDatedTest(testDb(), manager, dated(key.truckId, { passedOn }), clock);
  expect(await state()).toBe("never");
  const told: (string | undefined)[] = [];
  for (const passedOn of ["2025-05-01", "2025-06-20", "2026-05-20"]) {
    value(await record(passedOn));
    told.push(await state());
  }
  expect(told).toEqual(["past", "soon", "good"]);
});

test("another firm's truck, fitting and yard are not there, in the path or in the body", async () => {
  const { truckId, pumpId, carrierId } = await platedTruck();
  const { unitNumber } = await truckRow(testDb(), { carrierId, truckId });
  const mine = await newTruck();
  const db = testDb();
  expect(await truckSetup(db, stranger, unitNumber, clock)).toBeNull();
  expect((await listTrucks(db, stranger, clock)).some((truck) => truck.id === truckId)).toBe(false);
  const fitting = addFittingSchema.parse({ kind: "ladder" });
  const details = { truckId, unitNumber: "X-1", kind: "powered", vin: null } as const;
  const refused = [
    await changeTruckDetails(db, stranger, details, clock),
    await moveTruckToYard(db, stranger, { truckId, yardId: theirs.yardId }, clock),
    await setInService(db, stranger, { truckId, inService: false }, clock),
    await addFitting(db, stranger, { truckId, ...fitting }, clock),
    await changeFitting(db, stranger, { truckId, fittingId: pumpId, attributes: {} }, clock),
    await removeFitting(db, stranger, { truckId, fittingId: pumpId }, clock),
    await restoreFitting(db, stranger, { truckId, fittingId: pumpId }, clock),
    await setSetPoint(db, stranger, point(truckId), clock),
    await removeSetPoint(db, stranger, { truckId, reading: "vacuum-relief" }, clock),
    await recordDatedTest(db, stranger, dated(truckId), clock),
    await endDatedTest(db, stranger, { truckId, kind: "permit" }, clock),
    // Own truck in the path, a fitting of another truck in the body.
    await removeFitting(db, manager, { truckId: mine.truckId, fittingId: pumpId }, clock),
    await changeFitting(
      db,
      manager,
      { truckId: mine.truckId, fittingId: pumpId, attributes: {} },
      clock,
    ),
  ];
  expect(refused.map(code)).toEqual(refused.map(() => "not-found"));
  const moved = await moveTruckToYard(db, manager, { ...mine, yardId: theirs.yardId }, clock);
  expect(faults(moved)).toEqual({ "/yardId": "Choose one of your yards." });
  const after = await truckRow(db, { carrierId, truckId });
  expect(after).toMatchObject({ unitNumber, inService: true, yardId: ours.yardId });
});

test("an unknown unit number has no setup", async () => {
  expect(await truckSetup(testDb(), manager, "NOT-THERE", clock)).toBeNull();
  expect(await truckSetup(testDb(), manager, "", clock)).toBeNull();
});

test("the list shows a standing past its time as being worked out", async () => {
  const key = await newTruck();
  const past = new Date(clock.now().getTime() - days(1));
  await testDb().update(trucks).set({ standingUntil: past }).where(eq(trucks.id, key.truckId));
  const listed = (await listTrucks(testDb(), manager, clock)).find((t) => t.id === key.truckId);
  expect(listed?.standing).toBeNull();
});

test("the office counts what is this firm's, and every change names who made it", async () => {
  const carrier = await makeCarrier(testDb(), clock);
  const boss = await makePerson(testDb(), carrier, ["manager"]);
  const input = { ...typed(), yardId: carrier.yardId };
  const { id } = value(await addTruck(testDb(), boss, input, clock));
  value(await setInService(testDb(), boss, { truckId: id, inService: false }, clock));
  expect(await officeCounts(testDb(), boss)).toEqual({
    yards: 1,
    trucks: 1,
    outOfService: 1,
    people: 1,
    ownChecks: 0,
    policyVersion: 1,
  });
  const kept = await testDb().select().from(audit).where(eq(audit.carrierId, carrier.carrierId));
  expect(kept.map((row) => [row.action, row.actorId])).toEqual([
    ["truck.add", boss.personId],
    ["truck.out-of-service", boss.personId],
  ]);
});
