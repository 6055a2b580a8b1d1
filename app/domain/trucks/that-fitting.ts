import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { fittings } from "../../db/schema/trucks";
import type { TruckKey } from "../gate/read-facts";

/** The one place that scopes a fitting: carrier, truck and its own id. */
export function thatFitting(key: TruckKey, fittingId: string) {
  return and(
    eq(fittings.carrierId, key.carrierId),
    eq(fittings.truckId, key.truckId),
    eq(fittings.id, fittingId),
  );
}

export async function readFitting(db: Db, key: TruckKey, fittingId: string) {
  const [row] = await db.select().from(fittings).where(thatFitting(key, fittingId));
  return row ?? null;
}
