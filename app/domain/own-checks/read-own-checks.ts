import { and, asc, eq, isNull, or } from "drizzle-orm";
import type { Db } from "../../db/client";
import { ownChecks, trucks } from "../../db/schema/trucks";
import { STATIONS, type StationKey } from "../../trade/sheet/check";
import type { OwnCheck } from "../../trade/sheet/make-sheet";
import type { Actor } from "../actor";
import type { TruckKey } from "../gate/read-facts";

function isStation(station: string): station is StationKey {
  return (STATIONS as readonly string[]).includes(station);
}

/** The carrier's own checks that are on one truck's sheet. */
export async function ownChecksOfTruck(db: Db, key: TruckKey): Promise<OwnCheck[]> {
  const rows = await db
    .select({
      id: ownChecks.id,
      station: ownChecks.station,
      cadence: ownChecks.cadence,
      label: ownChecks.label,
      good: ownChecks.good,
      colour: ownChecks.colour,
    })
    .from(ownChecks)
    .where(
      and(
        eq(ownChecks.carrierId, key.carrierId),
        isNull(ownChecks.removedAt),
        or(isNull(ownChecks.truckId), eq(ownChecks.truckId, key.truckId)),
      ),
    )
    .orderBy(asc(ownChecks.createdAt), asc(ownChecks.id));
  return rows.flatMap(({ station, ...row }) => (isStation(station) ? [{ ...row, station }] : []));
}

/** All of them, those taken off the sheets included: they can be put back. */
export async function listOwnChecks(db: Db, actor: Actor) {
  return db
    .select({
      id: ownChecks.id,
      truckId: ownChecks.truckId,
      unitNumber: trucks.unitNumber,
      station: ownChecks.station,
      cadence: ownChecks.cadence,
      label: ownChecks.label,
      good: ownChecks.good,
      colour: ownChecks.colour,
      removedAt: ownChecks.removedAt,
    })
    .from(ownChecks)
    .leftJoin(
      trucks,
      and(eq(trucks.carrierId, ownChecks.carrierId), eq(trucks.id, ownChecks.truckId)),
    )
    .where(eq(ownChecks.carrierId, actor.carrierId))
    .orderBy(asc(ownChecks.createdAt), asc(ownChecks.id));
}
export type OwnCheckRow = Awaited<ReturnType<typeof listOwnChecks>>[number];
