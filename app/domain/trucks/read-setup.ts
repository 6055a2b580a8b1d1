import { and, asc, eq, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { fittings, setPoints, trucks } from "../../db/schema/trucks";
import type { Fitting } from "../../trade/fittings";
import { isSetPointReading, type SetPoint } from "../../trade/set-points";
import type { TruckKey } from "../gate/read-facts";

/** The one place that scopes a truck: its carrier and its id. */
export function thatTruck(key: TruckKey) {
  return and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId));
}

/** The truck's own row; null when this carrier has none such. */
export async function readTruck(db: Db, key: TruckKey) {
  const [row] = await db.select().from(trucks).where(thatTruck(key));
  return row ?? null;
}

/** What is fitted now, in the order it was fitted. */
export async function readFittings(db: Db, key: TruckKey): Promise<Fitting[]> {
  return db
    .select({ id: fittings.id, kind: fittings.kind, attributes: fittings.attributes })
    .from(fittings)
    .where(
      and(
        eq(fittings.carrierId, key.carrierId),
        eq(fittings.truckId, key.truckId),
        isNull(fittings.removedAt),
      ),
    )
    .orderBy(asc(fittings.fittedAt), asc(fittings.id));
}

export async function readSetPointRows(db: Db, key: TruckKey) {
  return db
    .select()
    .from(setPoints)
    .where(
      and(
        eq(setPoints.carrierId, key.carrierId),
        eq(setPoints.truckId, key.truckId),
        isNull(setPoints.replacedAt),
      ),
    )
    .orderBy(asc(setPoints.setAt), asc(setPoints.id));
}
export type SetPointRow = Awaited<ReturnType<typeof readSetPointRows>>[number];

/** A stored set point as the sheet reads it. A stop nobody typed is left to the plates of the day. */
export function asSetPoints(rows: readonly SetPointRow[]): SetPoint[] {
  return rows.flatMap((row): SetPoint[] => {
    const { reading, unit, setPointSi, lowSi, highSi, entered } = row;
    if (!isSetPointReading(reading)) return [];
    const stopSi = entered.stop === null ? null : row.stopSi;
    return [{ reading, unit, setPointSi, lowSi, highSi, stopSi }];
  });
}
