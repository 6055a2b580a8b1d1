import type { StandingFacts, StandingPolicy, WalkFact } from "./facts";

const HOUR = 3_600_000;
const DAY = 24 * HOUR;

/** One driver's right to the key of one truck, as far as the walk and what they have seen go. */
export interface Clearance {
  driverId: string;
  walkId: string;
  /** Milliseconds since 1970 UTC. */
  validUntil: number;
  /** Ids of open tags' newest events and of sign-offs that this driver has not seen. */
  unseen: string[];
}

/** The instant at which a walk stops counting: its greatest age, or the end of its driver's day. */
function endOfWalk(walk: WalkFact, facts: StandingFacts, policy: StandingPolicy): number {
  let end = walk.countsFrom + Math.min(policy.walkHours, 24) * HOUR;
  for (const dayEnd of facts.dayEnds) {
    if (dayEnd.driverId === walk.driverId && dayEnd.at > walk.countsFrom) {
      end = Math.min(end, dayEnd.at);
    }
  }
  for (const after of facts.walks) {
    const ends = after.kind === "after" && after.driverId === walk.driverId;
    if (ends && after.countsFrom > walk.countsFrom) end = Math.min(end, after.countsFrom);
  }
  if (walk.kind === "takeover") {
    const base = facts.walks.find((candidate) => candidate.id === walk.baseWalkId);
    const stands = base?.kind === "before" && base.clears && base.setupCurrent;
    if (!stands || endOfWalk(base, facts, policy) <= walk.countsFrom) return walk.countsFrom;
    end = Math.min(end, base.countsFrom + Math.min(policy.walkHours, 24) * HOUR);
  }
  return end;
}

/** What a driver must have seen before the key: every open tag's newest event and every recent sign-off. */
function unseenBy(
  driverId: string,
  walk: WalkFact,
  facts: StandingFacts,
  policy: StandingPolicy,
): string[] {
  const seen = new Set(
    facts.acknowledgements.filter((a) => a.driverId === driverId).flatMap((a) => a.items),
  );
  const since = walk.countsFrom - policy.reviewDays * DAY;
  return [
    ...facts.openTags
      .filter((tag) => tag.eventBy !== driverId && !seen.has(tag.eventId))
      .map((tag) => tag.eventId),
    ...facts.signOffs.filter((s) => s.signedAt > since && !seen.has(s.id)).map((s) => s.id),
  ];
}

/**
 * Every driver's clearance from the newest walk of theirs that counts.
 * A walk older than the one in force replaces nothing, so the newest `countsFrom` wins.
 */
export function clearances(facts: StandingFacts, policy: StandingPolicy): Clearance[] {
  const newest = new Map<string, WalkFact>();
  for (const walk of facts.walks) {
    if (walk.kind === "after" || !walk.clears || !walk.setupCurrent) continue;
    const held = newest.get(walk.driverId);
    if (!held || walk.countsFrom > held.countsFrom) newest.set(walk.driverId, walk);
  }
  return [...newest.values()].map((walk) => ({
    driverId: walk.driverId,
    walkId: walk.id,
    validUntil: endOfWalk(walk, facts, policy),
    unseen: unseenBy(walk.driverId, walk, facts, policy),
  }));
}

/**
 * The *before* walk whose skipped halves limit the truck at `now` (ms), or null: the newest
 * that counts. It outlives its driver's day, since a takeover may rest on it, but never 24 h.
 */
export function walkInForce(facts: StandingFacts, now: number): WalkFact | null {
  let newest: WalkFact | null = null;
  for (const walk of facts.walks) {
    if (walk.kind !== "before" || !walk.clears || !walk.setupCurrent) continue;
    if (endOfForce(walk) <= now) continue;
    if (!newest || walk.countsFrom > newest.countsFrom) newest = walk;
  }
  return newest;
}

/** The last instant at which a walk's skipped halves can still limit the truck, ms. */
export function endOfForce(walk: WalkFact): number {
  return walk.countsFrom + DAY;
}
