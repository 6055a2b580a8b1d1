import type { Colour, Limit } from "../limits";

/** Instants here are milliseconds since 1970 UTC, days are the yard's "YYYY-MM-DD". */
export interface TagFact {
  id: string;
  title: string;
  colour: Colour;
  limit: Limit | null;
  roadSafety: boolean;
  raisedAt: number;
  /** End of the newest run-with-limit as an instant: the shop's opening after its last day. Null without one. */
  runUntil: number | null;
  /** The limit of that run-with-limit, which takes the place of the tag's own. */
  runLimit: Limit | null;
  /** Id of the newest event of this tag: the tag, its last change, or its last run-with-limit. */
  eventId: string;
  /** Who made that event: a driver need not acknowledge what they wrote themselves. */
  eventBy: string;
}

export interface SignOffFact {
  id: string;
  signedAt: number;
}

export interface WalkFact {
  id: string;
  driverId: string;
  kind: "before" | "after" | "takeover";
  baseWalkId: string | null;
  countsFrom: number;
  receivedAt: number;
  /** Complete, with a clock that can be believed, on a sheet made here. */
  clears: boolean;
  /** Made on the truck's present fittings and set points. */
  setupCurrent: boolean;
  limits: Limit[];
}

export interface AcknowledgementFact {
  driverId: string;
  items: readonly string[];
  satisfied: boolean;
}

/** The end of a driver's day with this truck: a return that said so. */
export interface DayEndFact {
  driverId: string;
  at: number;
}

export interface DueFact {
  kind: string;
  /** Its last day, "YYYY-MM-DD" of the yard; null for a test set by law that is not on file. */
  dueOn: string | null;
  /** When it starts to hold, as an instant; null when it never holds. */
  holdsAt: number | null;
  /** When it starts to warn. */
  warnsAt: number | null;
  /** Pump hours at which it holds; null when hours do not matter. */
  holdsAtHours: number | null;
}

/** All that decides a truck's standing. */
export interface StandingFacts {
  inService: boolean;
  gateFault: string | null;
  out: { handoverId: string; driverId: string; since: number } | null;
  tankL: number | null;
  /** What the unit cannot do as it is built: in the gate, not in the word. */
  cannot: readonly Limit[];
  pumpHours: number;
  openTags: readonly TagFact[];
  signOffs: readonly SignOffFact[];
  /** Walks of the last three days, newest last. */
  walks: readonly WalkFact[];
  acknowledgements: readonly AcknowledgementFact[];
  dayEnds: readonly DayEndFact[];
  rounds: readonly DueFact[];
  tests: readonly DueFact[];
}

/** The part of the carrier's policy that a standing needs. */
export interface StandingPolicy {
  /** Longest a walk counts, hours; at most 24. */
  walkHours: number;
  /** Sign-offs this many days older than the walk need no acknowledgement. */
  reviewDays: number;
}
