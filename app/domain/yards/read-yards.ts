import { and, asc, eq, ne, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { feedHeads, yards } from "../../db/schema/carriers";
import { trucks } from "../../db/schema/trucks";
import type { Actor } from "../actor";

/** The one place that scopes a yard: its carrier and its id. */
export function thatYard(carrierId: string, yardId: string) {
  return and(eq(yards.carrierId, carrierId), eq(yards.id, yardId));
}

export async function readYard(db: Db, carrierId: string, yardId: string) {
  const [row] = await db.select().from(yards).where(thatYard(carrierId, yardId));
  return row ?? null;
}

/** Two yards of one name would be one name for two places. */
/** Until this transaction ends nobody else of this carrier asks whether a yard's name is free. */
export async function holdYardNames(tx: Db, carrierId: string): Promise<void> {
  await tx
    .select({ carrierId: feedHeads.carrierId })
    .from(feedHeads)
    .where(eq(feedHeads.carrierId, carrierId))
    .for("update");
}

export async function nameIsTaken(db: Db, carrierId: string, name: string, except: string | null) {
  const [same] = await db
    .select({ id: yards.id })
    .from(yards)
    .where(
      and(
        eq(yards.carrierId, carrierId),
        eq(yards.name, name),
        except === null ? undefined : ne(yards.id, except),
      ),
    )
    .limit(1);
  return same !== undefined;
}

/** The carrier's yards with how many trucks sleep in each. */
export async function listYards(db: Db, actor: Actor) {
  return db
    .select({
      id: yards.id,
      name: yards.name,
      zone: yards.zone,
      elevationM: yards.elevationM,
      phone: yards.phone,
      shopOpensMinute: yards.shopOpensMinute,
      winter: yards.winter,
      trucks: sql<number>`count(${trucks.id})`.mapWith(Number),
    })
    .from(yards)
    .leftJoin(trucks, and(eq(trucks.carrierId, yards.carrierId), eq(trucks.yardId, yards.id)))
    .where(eq(yards.carrierId, actor.carrierId))
    .groupBy(yards.carrierId, yards.id)
    .orderBy(asc(yards.name), asc(yards.id));
}
