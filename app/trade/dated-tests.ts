import { monthsAfter } from "./rounds";
import type { UnitKind } from "./sheet/check";

/** Tests and papers with a last day of their own. No grace applies to those set by law. */
export const DATED_TESTS = [
  "annual-inspection",
  "external-visual",
  "internal-visual",
  "lining",
  "leakage",
  "pressure",
  "thickness",
  "permit",
  "extinguisher",
] as const;
export type DatedTest = (typeof DATED_TESTS)[number];

/** What of a tank decides its tests. Left out means no. */
export interface TankService {
  /** Carries a cargo-tank specification plate: 49 CFR 180.407 applies to no other tank. */
  specificationPlate: boolean;
  loadedByVacuum: boolean;
  fullOpeningRear: boolean;
  insulated?: boolean;
  lined?: boolean;
  /** The load eats the tank's metal. */
  corrosiveToTank?: boolean;
  noManhole?: boolean;
}

export interface RequiredTest {
  test: DatedTest;
  /** Null: the carrier enters the date on the paper. */
  everyMonths: number | null;
  /** Set by law: without one on file the unit does not go. */
  byLaw: boolean;
  source: string;
}

const TABLE = "49 CFR 180.407(c)";

/**
 * Tests of a specification tank after its first, from the table of 49 CFR 180.407(c). Chlorine,
 * propane and MC 338 rows are left out: no vacuum truck is built for them.
 */
function tankTests(tank: TankService): RequiredTest[] {
  if (!tank.specificationPlate) return [];
  const { insulated = false, lined = false, corrosiveToTank = false, noManhole = false } = tank;
  const rearLoaded = tank.loadedByVacuum && tank.fullOpeningRear;
  const yearlyPressure = insulated && (noManhole || lined);
  const every = (test: DatedTest, everyMonths: number) => ({
    test,
    everyMonths,
    byLaw: true,
    source: TABLE,
  });
  const tests = [
    every("external-visual", rearLoaded ? 6 : 12),
    every("internal-visual", insulated || corrosiveToTank ? 12 : 60),
    every("leakage", 12),
    every("pressure", yearlyPressure ? 12 : rearLoaded ? 24 : 60),
  ];
  if (lined && corrosiveToTank) tests.push(every("lining", 12));
  if (!lined && corrosiveToTank) tests.push(every("thickness", 24));
  return tests;
}

/** The dated tests of one unit, with the interval of each and where it comes from. */
export function requiredTests(kind: UnitKind, tank: TankService | null): RequiredTest[] {
  const tests: RequiredTest[] = [
    { test: "annual-inspection", everyMonths: 12, byLaw: true, source: "49 CFR 396.17" },
    ...(tank ? tankTests(tank) : []),
    { test: "permit", everyMonths: null, byLaw: false, source: "the carrier's permit" },
  ];
  if (kind === "powered") {
    tests.push({
      test: "extinguisher",
      everyMonths: 12,
      byLaw: false,
      source: "common practice",
    });
  }
  return tests;
}

/** The last day a test counts, from the day it was passed. Null where the paper itself says. */
export function testDueOn(test: RequiredTest, passedOn: string): string | null {
  return test.everyMonths === null ? null : monthsAfter(passedOn, test.everyMonths);
}
