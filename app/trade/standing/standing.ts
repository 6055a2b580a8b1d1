import { foldLimits, type Limit, type LimitsInForce } from "../limits";
import { type Clearance, clearances, endOfForce, walkInForce } from "./clearance";
import type { StandingFacts, StandingPolicy } from "./facts";

/** One word for a truck now. */
export type StandingWord = "held" | "walk-due" | "limited" | "cleared" | "out";

/** Why a truck is not simply cleared. `id` names the tag, round or test behind it. */
export type Reason =
  | { code: "gate-fault"; detail: string }
  | { code: "out-of-service" }
  | { code: "red-tag"; id: string; title: string }
  | { code: "yellow-needs-certifier"; id: string; title: string }
  | { code: "yellow-date-passed"; id: string; title: string }
  | { code: "test-passed-date"; id: string }
  | { code: "test-not-on-file"; id: string }
  | { code: "round-overdue"; id: string }
  | { code: "walk-due" }
  | { code: "not-acknowledged"; count: number }
  | { code: "limit"; limit: Limit };

/** What the stored copy keeps beside the word. */
export interface StandingDetail {
  reasons: Reason[];
  /** Rounds that warn but do not hold yet. */
  warnings: string[];
  /** Limits in force, each as recorded. */
  limits: Limit[];
}

/** The gate's columns on a truck: the same names, instants as milliseconds. */
export interface GateColumns {
  openReds: number;
  yellowBlockAt: number | null;
  testsBlockAt: number | null;
  roundsBlockAt: number | null;
  roundsBlockHours: number | null;
  limits: LimitsInForce;
}

export interface Standing extends StandingDetail {
  word: StandingWord;
  /** When the word stops being true by itself, ms; null when only an event can change it. */
  until: number | null;
  gate: GateColumns;
  clearances: Clearance[];
}

function earliest(values: readonly (number | null)[]): number | null {
  const known = values.filter((value): value is number => value !== null);
  return known.length === 0 ? null : Math.min(...known);
}

/** The limits in force: open tags', and those of halves the walk in force skipped. */
function limitsInForce(facts: StandingFacts, now: number): Limit[] {
  const limits: Limit[] = [];
  for (const tag of facts.openTags) {
    if (tag.colour !== "yellow") continue;
    const limit = tag.runUntil === null ? tag.limit : tag.runLimit;
    if (limit) limits.push(limit);
  }
  return [...limits, ...(walkInForce(facts, now)?.limits ?? [])];
}

function gateColumns(facts: StandingFacts, limits: Limit[]): GateColumns {
  const folded = foldLimits([...limits, ...facts.cannot]);
  const yellows = facts.openTags.filter((tag) => tag.colour === "yellow" && tag.roadSafety);
  return {
    openReds: facts.openTags.filter((tag) => tag.colour === "red").length,
    yellowBlockAt: earliest(yellows.map((tag) => tag.runUntil ?? 0)),
    testsBlockAt: earliest(facts.tests.map((test) => test.holdsAt)),
    roundsBlockAt: earliest(facts.rounds.map((round) => round.holdsAt)),
    roundsBlockHours: earliest(facts.rounds.map((round) => round.holdsAtHours)),
    limits: {
      ...folded,
      fillL: earliest([folded.fillL, facts.tankL === null ? null : Math.round(facts.tankL)]),
    },
  };
}

function holds(facts: StandingFacts, now: number): Reason[] {
  const reasons: Reason[] = [];
  if (facts.gateFault !== null) reasons.push({ code: "gate-fault", detail: facts.gateFault });
  if (!facts.inService) reasons.push({ code: "out-of-service" });
  for (const tag of facts.openTags) {
    const { id, title } = tag;
    if (tag.colour === "red") reasons.push({ code: "red-tag", id, title });
    else if (tag.colour === "yellow" && tag.roadSafety) {
      if (tag.runUntil === null) reasons.push({ code: "yellow-needs-certifier", id, title });
      else if (tag.runUntil <= now) reasons.push({ code: "yellow-date-passed", id, title });
    }
  }
  for (const test of facts.tests) {
    if (test.dueOn === null) reasons.push({ code: "test-not-on-file", id: test.kind });
    else if (test.holdsAt !== null && test.holdsAt <= now) {
      reasons.push({ code: "test-passed-date", id: test.kind });
    }
  }
  for (const round of facts.rounds) {
    const byDate = round.holdsAt !== null && round.holdsAt <= now;
    const byHours = round.holdsAtHours !== null && facts.pumpHours >= round.holdsAtHours;
    if (byDate || byHours) reasons.push({ code: "round-overdue", id: round.kind });
  }
  return reasons;
}

function walkReasons(held: readonly Clearance[], now: number): Reason[] {
  const valid = held.filter((clearance) => clearance.validUntil > now);
  if (valid.length === 0) return [{ code: "walk-due" }];
  const best = Math.min(...valid.map((clearance) => clearance.unseen.length));
  return best === 0 ? [] : [{ code: "not-acknowledged", count: best }];
}

/** Every instant at which this standing may change without an event. */
function nextChange(facts: StandingFacts, held: readonly Clearance[], now: number): number | null {
  const instants = [
    ...held.map((clearance) => clearance.validUntil),
    ...facts.walks.filter((walk) => walk.limits.length > 0).map(endOfForce),
    ...facts.openTags.map((tag) => tag.runUntil),
    ...facts.tests.flatMap((test) => [test.holdsAt, test.warnsAt]),
    ...facts.rounds.flatMap((round) => [round.holdsAt, round.warnsAt]),
  ];
  return earliest(instants.filter((at) => at !== null && at > now));
}

/**
 * A truck's standing from its facts: the word, every reason, the limits in force, and the
 * instant until which it holds. Pure: the same on phone and server. `now` in ms UTC.
 *
 * Order: held, walk due, limited, cleared; a truck that is out shows out, with the reasons
 * it would be held for.
 */
export function standing(facts: StandingFacts, policy: StandingPolicy, now: number): Standing {
  const held = clearances(facts, policy);
  const limits = limitsInForce(facts, now);
  const holdReasons = holds(facts, now);
  const due = walkReasons(held, now);
  const limitReasons = limits.map((limit): Reason => ({ code: "limit", limit }));
  const warnings = [...facts.rounds, ...facts.tests]
    .filter((item) => item.warnsAt !== null && item.warnsAt <= now)
    .map((item) => item.kind);
  let word: StandingWord = "cleared";
  if (facts.out) word = "out";
  else if (holdReasons.length > 0) word = "held";
  else if (due.length > 0) word = "walk-due";
  else if (limits.length > 0) word = "limited";
  return {
    word,
    reasons: [...holdReasons, ...due, ...limitReasons],
    warnings,
    limits,
    until: nextChange(facts, held, now),
    gate: gateColumns(facts, limits),
    clearances: held,
  };
}
