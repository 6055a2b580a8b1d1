import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { trucks } from "../../db/schema/trucks";

/** The yard a truck sleeps in: its zone, height and shop hours. */
export async function yardOfTruck(db: Db, carrierId: string, truckId: string) {
  const [row] = await db
    .select({ zone: yards.zone, elevationM: yards.elevationM, name: yards.name, id: yards.id })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .where(and(eq(trucks.carrierId, carrierId), eq(trucks.id, truckId)));
  if (!row) throw new Error("truck without a yard");
  return row;
}
