import { expect, test } from "vitest";
import { requiredTests, type TankService, testDueOn } from "~/trade/dated-tests";

const plain: TankService = {
  specificationPlate: true,
  loadedByVacuum: false,
  fullOpeningRear: false,
};

function months(tank: TankService | null, kind: "powered" | "towed" = "powered") {
  return Object.fromEntries(
    requiredTests(kind, tank).map(({ test: name, everyMonths }) => [name, everyMonths]),
  );
}

// 49 CFR 180.407(c), the table of intervals.
test("a specification tank loaded by vacuum with a full-opening rear head is tested oftener", () => {
  const tank = { ...plain, loadedByVacuum: true, fullOpeningRear: true };
  expect(months(tank)).toEqual({
    "annual-inspection": 12,
    "external-visual": 6,
    "internal-visual": 60,
    leakage: 12,
    pressure: 24,
    permit: null,
    extinguisher: 12,
  });
});

test("any other specification tank goes by the common rows", () => {
  expect(months(plain)).toMatchObject({ "external-visual": 12, pressure: 60, leakage: 12 });
  expect(months({ ...plain, loadedByVacuum: true })).toMatchObject({ "external-visual": 12 });
  expect(months({ ...plain, fullOpeningRear: true })).toMatchObject({ pressure: 60 });
});

test("insulation, lining and a corrosive load bring their own rows", () => {
  expect(months({ ...plain, insulated: true })).toMatchObject({
    "internal-visual": 12,
    pressure: 60,
  });
  expect(months({ ...plain, insulated: true, noManhole: true })).toMatchObject({ pressure: 12 });
  expect(months({ ...plain, insulated: true, lined: true })).toMatchObject({ pressure: 12 });
  expect(months({ ...plain, corrosiveToTank: true })).toMatchObject({
    "internal-visual": 12,
    thickness: 24,
  });
  const lined = months({ ...plain, corrosiveToTank: true, lined: true });
  expect(lined).toMatchObject({ lining: 12 });
  expect(lined).not.toHaveProperty("thickness");
});

test("a tank without a specification plate has none of them", () => {
  const tests = months({ ...plain, specificationPlate: false });
  expect(Object.keys(tests)).toEqual(["annual-inspection", "permit", "extinguisher"]);
});

// 49 CFR 396.17 for the yearly inspection; the extinguisher's year is common practice.
test("every unit is inspected each year; a towed one carries no extinguisher of its own", () => {
  expect(months(null, "towed")).toEqual({ "annual-inspection": 12, permit: null });
});

test("a test counts to the same date, and a permit to the date on it", () => {
  const [annual] = requiredTests("powered", null);
  expect(testDueOn(annual!, "2026-08-31")).toBe("2027-08-31");
  const permit = requiredTests("powered", null).find((one) => one.test === "permit");
  expect(testDueOn(permit!, "2026-08-31")).toBeNull();
});
