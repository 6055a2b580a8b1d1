import { and, asc, eq, inArray, isNull, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { fittings, rounds, trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { RoundKind } from "../../trade/rounds";
import type { Actor } from "../actor";
import { roundFacts } from "../gate/due-facts";
import { needsShopWeekly } from "../gate/read-facts";
import { readPolicy } from "../policy/read-policy";
import { yardDay } from "../yard-day";

export type RoundState = "holds" | "warns" | "due" | "ahead";

export interface RoundLine {
  truckId: string;
  unitNumber: string;
  yardName: string;
  kind: RoundKind;
  /** The yard's days. */
  dueOn: string;
  lastOn: string | null;
  today: string;
  state: RoundState;
}

/** Every truck's rounds, the earliest due first, in a fixed number of statements. */
export async function readRounds(
  db: Db,
  actor: Actor,
  clock: Clock = systemClock,
): Promise<RoundLine[]> {
  const { carrierId } = actor;
  const now = clock.now();
  const { settings } = await readPolicy(db, carrierId);
  const fleet = await db
    .select({ truck: trucks, yard: yards })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .where(and(eq(trucks.carrierId, carrierId), eq(trucks.inService, true)))
    .orderBy(asc(trucks.unitNumber));
  const done = await db
    .select({
      truckId: rounds.truckId,
      kind: rounds.kind,
      doneOn: rounds.doneOn,
      pumpHours: rounds.pumpHours,
    })
    .from(rounds)
    .where(
      and(
        eq(rounds.carrierId, carrierId),
        sql`(${rounds.truckId}, ${rounds.kind}, ${rounds.doneOn}) in (select own.truck_id, own.kind, max(own.done_on) from rounds own where own.carrier_id = ${rounds.carrierId} group by own.truck_id, own.kind)`,
      ),
    );
  const driven = await db
    .select({
      truckId: fittings.truckId,
      id: fittings.id,
      kind: fittings.kind,
      attributes: fittings.attributes,
    })
    .from(fittings)
    .where(
      and(
        eq(fittings.carrierId, carrierId),
        isNull(fittings.removedAt),
        inArray(fittings.kind, ["drive", "gearbox"]),
      ),
    );
  return fleet
    .flatMap(({ truck, yard }) => {
      const mine = done.filter((round) => round.truckId === truck.id);
      const fitted = driven.filter((fitting) => fitting.truckId === truck.id);
      const today = yardDay(now, yard.zone).day;
      const entered = yardDay(truck.createdAt, yard.zone).day;
      return roundFacts(mine, entered, yard, settings, needsShopWeekly(fitted)).map((fact) => {
        const kind = fact.kind as RoundKind;
        const byHours = fact.holdsAtHours !== null && truck.pumpHours >= fact.holdsAtHours;
        const byDate = fact.holdsAt !== null && fact.holdsAt <= now.getTime();
        const dueOn = fact.dueOn ?? today;
        let state: RoundState = dueOn <= today ? "due" : "ahead";
        if (fact.warnsAt !== null && fact.warnsAt <= now.getTime()) state = "warns";
        if (byHours || byDate) state = "holds";
        return {
          truckId: truck.id,
          unitNumber: truck.unitNumber,
          yardName: yard.name,
          kind,
          dueOn,
          lastOn: mine.find((round) => round.kind === kind)?.doneOn ?? null,
          today,
          state,
        };
      });
    })
    .sort((a, b) => (a.dueOn < b.dueOn ? -1 : a.dueOn > b.dueOn ? 1 : 0));
}
