import { and, desc, eq, lte } from "drizzle-orm";
import type { Db } from "../../db/client";
import { readings } from "../../db/schema/walks";
import type { TruckKey } from "../gate/read-facts";

/** The pump's hours as last read, now or before an instant; null when nobody has read them. */
export async function lastPumpHours(db: Db, key: TruckKey, before?: Date): Promise<number | null> {
  const [row] = await db
    .select({ si: readings.si })
    .from(readings)
    .where(
      and(
        eq(readings.carrierId, key.carrierId),
        eq(readings.truckId, key.truckId),
        eq(readings.quantity, "pump-hours"),
        before && lte(readings.countsFrom, before),
      ),
    )
    .orderBy(desc(readings.countsFrom), desc(readings.id))
    .limit(1);
  return row?.si ?? null;
}
