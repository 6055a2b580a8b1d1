import { and, desc, eq, inArray } from "drizzle-orm";
import type { Db } from "../../db/client";
import { returns } from "../../db/schema/handovers";
import { people } from "../../db/schema/people";
import { signOffs, tags } from "../../db/schema/tags";
import { trucks } from "../../db/schema/trucks";
import { walks } from "../../db/schema/walks";
import { type Clock, systemClock } from "../../services/clock";
import { clearances } from "../../trade/standing/clearance";
import { standing } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { readFacts } from "../gate/read-facts";
import { readPolicy } from "../policy/read-policy";
import { yardOfTruck } from "../tags/yard-of-truck";
import { yardDay } from "../yard-day";

/** The truck a unit number names, scoped to the carrier. */
export async function truckByUnit(db: Db, carrierId: string, unitNumber: string) {
  const [row] = await db
    .select({ id: trucks.id, unitNumber: trucks.unitNumber, kind: trucks.kind })
    .from(trucks)
    .where(and(eq(trucks.carrierId, carrierId), eq(trucks.unitNumber, unitNumber.toUpperCase())));
  return row ?? null;
}

/**
 * What a driver must know before a walk: standing and why, what is open, what was signed off
 * since their last look, and which of it they have not acknowledged yet.
 */
export async function readBrief(db: Db, actor: Actor, truckId: string, clock: Clock = systemClock) {
  const { carrierId, personId } = actor;
  const now = clock.now();
  const policy = await readPolicy(db, carrierId);
  const key = { carrierId, truckId };
  const { facts } = await db.transaction((tx) => readFacts(tx, key, policy.settings, now));
  const state = standing(facts, policy.settings, now.getTime());
  const valid = clearances(facts, policy.settings).filter((c) => c.validUntil > now.getTime());
  const own = valid.find((c) => c.driverId === personId);
  const yard = await yardOfTruck(db, carrierId, truckId);
  const today = yardDay(now, yard.zone).day;
  const seen = new Set(
    facts.acknowledgements.filter((a) => a.driverId === personId).flatMap((a) => a.items),
  );
  const since = now.getTime() - policy.settings.reviewDays * 86_400_000;
  const recent = facts.signOffs.filter((s) => s.signedAt > since && !seen.has(s.id));
  const signedOff =
    recent.length === 0
      ? []
      : await db
          .select({
            id: signOffs.id,
            kind: signOffs.kind,
            work: signOffs.work,
            parts: signOffs.parts,
            reason: signOffs.reason,
            signedAt: signOffs.signedAt,
            signedBy: people.name,
            title: tags.title,
            tagKind: tags.kind,
            colour: tags.colour,
          })
          .from(signOffs)
          .innerJoin(tags, and(eq(tags.carrierId, signOffs.carrierId), eq(tags.id, signOffs.tagId)))
          .innerJoin(people, eq(people.id, signOffs.signedBy))
          .where(
            and(
              eq(signOffs.carrierId, carrierId),
              inArray(
                signOffs.id,
                recent.map((s) => s.id),
              ),
            ),
          )
          .orderBy(desc(signOffs.signedAt));
  const bases = facts.walks.filter(
    (walk) => walk.kind === "before" && valid.some((c) => c.walkId === walk.id && c !== own),
  );
  return {
    standing: state,
    openTags: facts.openTags.map((tag) => ({
      ...tag,
      unseen: tag.eventBy !== personId && !seen.has(tag.eventId),
    })),
    signedOff,
    /** Ids an acknowledgement must name to cover everything. */
    toAcknowledge: [
      ...facts.openTags
        .filter((t) => t.eventBy !== personId && !seen.has(t.eventId))
        .map((t) => t.eventId),
      ...recent.map((s) => s.id),
    ],
    ownWalk: own ?? null,
    /** The newest walk of another driver that this one may take over. */
    base: await walkerOf(db, carrierId, bases.at(-1)?.id ?? null),
    aboard: await lastAboard(db, key),
    weeklyDue: facts.rounds.some((one) => one.kind === "weekly" && (one.dueOn ?? today) <= today),
    bothHalves: policy.settings.bothHalvesDaily,
    yard,
  };
}

async function walkerOf(db: Db, carrierId: string, walkId: string | null) {
  if (walkId === null) return null;
  const [row] = await db
    .select({ id: walks.id, driver: people.name, countsFrom: walks.countsFrom })
    .from(walks)
    .innerJoin(people, eq(people.id, walks.driverId))
    .where(and(eq(walks.carrierId, carrierId), eq(walks.id, walkId)));
  return row ?? null;
}

/** What the newest return said is in the tank. */
async function lastAboard(db: Db, { carrierId, truckId }: { carrierId: string; truckId: string }) {
  const [row] = await db
    .select({ aboard: returns.aboard, at: returns.returnedAt })
    .from(returns)
    .where(and(eq(returns.carrierId, carrierId), eq(returns.truckId, truckId)))
    .orderBy(desc(returns.returnedAt))
    .limit(1);
  return row ?? null;
}
