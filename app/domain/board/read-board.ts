import { and, asc, eq, gt, isNull, lte } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { clearances, handovers, runs } from "../../db/schema/handovers";
import { memberships, people } from "../../db/schema/people";
import { tags } from "../../db/schema/tags";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Colour } from "../../trade/limits";
import type { StandingDetail, StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";

export interface BoardTruck {
  id: string;
  unitNumber: string;
  standing: StandingWord;
  standingUntil: Date | null;
  detail: StandingDetail;
  inService: boolean;
  tags: { id: string; title: string; kind: string; colour: Colour; raisedAt: Date }[];
  out: { handoverId: string; driver: string; runName: string; since: Date } | null;
  /** Drivers whose walk counts now, and whether they have seen what they must. */
  walkedBy: { driverId: string; name: string; seen: boolean; until: Date }[];
}

export interface BoardYard {
  id: string;
  name: string;
  zone: string;
  trucks: BoardTruck[];
}

export interface Board {
  asOf: Date;
  yards: BoardYard[];
  drivers: { id: string; name: string }[];
}

/** A word past its time is not shown: those trucks are worked out again first. */
async function refreshPast(db: Db, carrierId: string, clock: Clock): Promise<void> {
  const past = await db
    .select({ id: trucks.id })
    .from(trucks)
    .where(and(eq(trucks.carrierId, carrierId), lte(trucks.standingUntil, clock.now())));
  for (const { id } of past) {
    await changeTruck(db, { carrierId, truckId: id }, async () => undefined, { clock });
  }
}

function groupBy<T, K>(rows: readonly T[], key: (row: T) => K): Map<K, T[]> {
  const groups = new Map<K, T[]>();
  for (const row of rows) {
    const held = groups.get(key(row));
    if (held) held.push(row);
    else groups.set(key(row), [row]);
  }
  return groups;
}

const NO_DETAIL: StandingDetail = { reasons: [], warnings: [], limits: [] };

/** Every truck of the carrier on its peg, by yard, in a fixed number of statements. */
export async function readBoard(db: Db, actor: Actor, clock: Clock = systemClock): Promise<Board> {
  const { carrierId } = actor;
  await refreshPast(db, carrierId, clock);
  const asOf = clock.now();
  const fleet = await db
    .select({ truck: trucks, yardName: yards.name, zone: yards.zone })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .where(eq(trucks.carrierId, carrierId))
    .orderBy(asc(yards.name), asc(trucks.unitNumber));
  const open = await db
    .select({
      id: tags.id,
      truckId: tags.truckId,
      title: tags.title,
      kind: tags.kind,
      colour: tags.colour,
      raisedAt: tags.raisedAt,
    })
    .from(tags)
    .where(and(eq(tags.carrierId, carrierId), isNull(tags.signedOffAt)))
    .orderBy(tags.raisedAt);
  const out = await db
    .select({
      truckId: handovers.truckId,
      handoverId: handovers.id,
      driver: people.name,
      runName: runs.name,
      since: handovers.decidedAt,
    })
    .from(handovers)
    .innerJoin(people, eq(people.id, handovers.driverId))
    .innerJoin(
      runs,
      and(eq(runs.carrierId, handovers.carrierId), eq(runs.handoverId, handovers.id)),
    )
    .where(and(eq(handovers.carrierId, carrierId), isNull(handovers.returnedAt)));
  const cleared = await db
    .select({
      truckId: clearances.truckId,
      driverId: clearances.driverId,
      name: people.name,
      tagsSeq: clearances.tagsSeq,
      until: clearances.validUntil,
    })
    .from(clearances)
    .innerJoin(people, eq(people.id, clearances.driverId))
    .where(and(eq(clearances.carrierId, carrierId), gt(clearances.validUntil, asOf)));
  const drivers = await activeDrivers(db, carrierId);
  const tagsOf = groupBy(open, (tag) => tag.truckId);
  const outOf = groupBy(out, (row) => row.truckId);
  const clearedOf = groupBy(cleared, (row) => row.truckId);
  const yardsOf = groupBy(fleet, (row) => row.truck.yardId);
  return {
    asOf,
    drivers,
    yards: [...yardsOf].map(([id, rows]) => ({
      id,
      name: rows[0]!.yardName,
      zone: rows[0]!.zone,
      trucks: rows.map(({ truck }) => ({
        id: truck.id,
        unitNumber: truck.unitNumber,
        standing: truck.standing,
        standingUntil: truck.standingUntil,
        detail: truck.standingDetail ?? NO_DETAIL,
        inService: truck.inService,
        tags: tagsOf.get(truck.id) ?? [],
        out: outOf.get(truck.id)?.[0] ?? null,
        walkedBy: (clearedOf.get(truck.id) ?? []).map((row) => ({
          driverId: row.driverId,
          name: row.name,
          seen: row.tagsSeq === truck.tagsSeq,
          until: row.until,
        })),
      })),
    })),
  };
}

/** Who the key may be handed to. */
export async function activeDrivers(db: Db, carrierId: string) {
  const staff = await db
    .select({ id: people.id, name: people.name, roles: memberships.roles })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(and(eq(memberships.carrierId, carrierId), isNull(memberships.deactivatedAt)))
    .orderBy(asc(people.name));
  return staff
    .filter((person) => person.roles.includes("driver"))
    .map(({ id, name }) => ({ id, name }));
}
