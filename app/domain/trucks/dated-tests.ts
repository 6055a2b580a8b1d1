import { and, asc, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { datedTests } from "../../db/schema/trucks";
import {
  DATED_TESTS,
  type DatedTest,
  type RequiredTest,
  requiredTests,
} from "../../trade/dated-tests";
import type { Fitting } from "../../trade/fittings";
import type { UnitKind } from "../../trade/sheet/check";
import type { TruckKey } from "../gate/read-facts";

/** Rows are never changed, so a test that is no longer asked for gets a last day out of reach. */
export const NO_LONGER_DUE = "9990-01-01";

export function isDatedTest(kind: string): kind is DatedTest {
  return (DATED_TESTS as readonly string[]).includes(kind);
}

/** The tests a unit needs, from its kind and its tank. Every tank here is loaded by vacuum. */
export function testsFor(kind: UnitKind, fitted: readonly Fitting[]): RequiredTest[] {
  const tank = fitted.find((fitting) => fitting.kind === "tank")?.attributes;
  return requiredTests(
    kind,
    tank
      ? {
          specificationPlate: tank.specificationPlate ?? false,
          loadedByVacuum: true,
          fullOpeningRear: tank.fullOpeningRear ?? false,
          insulated: tank.insulated ?? false,
          lined: tank.lined ?? false,
          corrosiveToTank: tank.corrosiveLoad ?? false,
          noManhole: !fitted.some((fitting) => fitting.kind === "manway"),
        }
      : null,
  );
}

export interface RecordedTest {
  id: string;
  kind: string;
  passedOn: string | null;
  dueOn: string;
  note: string | null;
}

/** The newest record of each test, which is the one that counts. */
export async function readTests(db: Db, key: TruckKey): Promise<RecordedTest[]> {
  const rows = await db
    .select({
      id: datedTests.id,
      kind: datedTests.kind,
      passedOn: datedTests.passedOn,
      dueOn: datedTests.dueOn,
      note: datedTests.note,
    })
    .from(datedTests)
    .where(and(eq(datedTests.carrierId, key.carrierId), eq(datedTests.truckId, key.truckId)))
    .orderBy(asc(datedTests.recordedAt), asc(datedTests.id));
  return [...new Map(rows.map((row) => [row.kind, row])).values()];
}
