import { and, asc, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";

export interface ListedTruck {
  id: string;
  unitNumber: string;
  kind: "powered" | "towed";
  yardName: string;
  inService: boolean;
  /** Null while a word past its time is being worked out again. */
  standing: StandingWord | null;
}

/** Every truck and towed unit of the carrier, by unit number. */
export async function listTrucks(
  db: Db,
  actor: Actor,
  clock: Clock = systemClock,
): Promise<ListedTruck[]> {
  const rows = await db
    .select({
      id: trucks.id,
      unitNumber: trucks.unitNumber,
      kind: trucks.kind,
      yardName: yards.name,
      inService: trucks.inService,
      standing: trucks.standing,
      until: trucks.standingUntil,
    })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .where(eq(trucks.carrierId, actor.carrierId))
    .orderBy(asc(trucks.unitNumber));
  const now = clock.now();
  return rows.map(({ until, ...row }) => ({
    ...row,
    standing: until !== null && until <= now ? null : row.standing,
  }));
}
