import type { Colour, Limit } from "../limits";
import type { CautionKey } from "./cautions";

/** Places on the walk, in walking order. */
export const STATIONS = [
  "approach",
  "hood",
  "pump-side",
  "cab",
  "curb-side",
  "rear",
  "driver-side",
  "run-up",
  "pull-out",
  "shop",
] as const;
export type StationKey = (typeof STATIONS)[number];

/** The eleven parts every daily report must cover, 49 CFR 396.11(a)(1). */
export const ROAD_SAFETY_PARTS = [
  "service-brakes",
  "parking-brake",
  "steering",
  "lighting",
  "tires",
  "horn",
  "wipers",
  "mirrors",
  "coupling",
  "wheels",
  "emergency-equipment",
] as const;
export type RoadSafetyPart = (typeof ROAD_SAFETY_PARTS)[number];

export const CHECK_KINDS = ["look", "level", "drain", "count", "reading", "timed"] as const;
export type CheckKind = (typeof CHECK_KINDS)[number];
export const CADENCES = ["daily", "weekly", "monthly"] as const;
export type Cadence = (typeof CADENCES)[number];
/** Which pass over the truck a check belongs to. */
export const WALK_KINDS = ["before", "after", "takeover"] as const;
export type WalkKind = (typeof WALK_KINDS)[number];
/** The half of the run-up a check belongs to. */
export const RUN_UP_HALVES = ["vacuum", "pressure"] as const;
export type RunUpHalf = (typeof RUN_UP_HALVES)[number];

/** A truck with an engine of its own, or a unit that is towed. */
export const UNIT_KINDS = ["powered", "towed"] as const;
export type UnitKind = (typeof UNIT_KINDS)[number];

/** Problem answers that every check has, beside its own. */
export const COULD_NOT_CHECK = "could-not-check";
export const NOT_FITTED = "not-fitted";

/** One thing that can be wrong at a check, and what it does to the key. */
export interface Problem {
  /** Stable, unique within its check: "cracked", "below-band". */
  key: string;
  label: string;
  /** The colour proposed. A driver may raise it. */
  colour: Colour;
  /** The lowest colour a driver may choose: the proposed one, except for some "could not check". */
  lowest: Colour;
  /**
   * What the tag forbids while it is yellow; null for a yellow that only needs a certifier's date.
   * The vacuum of "vacuum-no-deeper" is the most it can be: a reading below it takes its place.
   */
  limit: Limit | null;
  /** May a driver put it right where the carrier's driver-fix list allows it? */
  driverFix: boolean;
  /** May it be signed off from photos? Never on a road-safety part. */
  remote: boolean;
  /** The road-safety part at fault where it is another than the check's own. */
  part: RoadSafetyPart | null;
}

export const QUANTITIES = [
  "vacuum",
  "pressure",
  "temperature",
  "speed",
  "pump-hours",
  "odometer",
  "duration",
  "tread",
  "volume",
  /** What came out of a drain, and what was put in at a level. */
  "drained",
  "topped-up",
] as const;
export type Quantity = (typeof QUANTITIES)[number];

/** What a numeric check asks for. Values in SI (Pa, K, m, m3, s; speed in rpm, meter hours in h). */
export interface ReadingSpec {
  quantity: Quantity;
  /** The unit the dial or field shows, a key of `units`. */
  unit: string;
  /** Ends of the gauge's scale, SI: a value outside is refused. */
  scaleLow: number;
  scaleHigh: number;
  /** Smallest step, SI. */
  step: number;
  /** The value it should have, SI; shown only after entry. */
  setPoint: number | null;
  /** Band, SI; null where there is no limit on that side. */
  low: number | null;
  high: number | null;
  /** The high limit itself is already too much: "under 2 psi", not "2 at most". */
  highExcluded: boolean;
  /** The value at which the operator stops, SI. */
  stop: number | null;
  /** Greatest vacuum the yard's air allows, SI; null for other quantities. */
  ceiling: number | null;
  /** Where the set point is above the ceiling: the least a sound pump still makes here, SI. */
  leastHere: number | null;
  /** How long a timed check lasts, s. */
  seconds: number | null;
  /** The driver also says whether the relief was heard to open. */
  asksHeardOpen: boolean;
  /** Which problem a value outside the band is: key of one of the check's problems. */
  below: string | null;
  above: string | null;
  /** Past the stop, or at it with no relief. */
  pastStop: string | null;
  /** The relief was not heard: below the band, and inside it. */
  belowUnheard: string | null;
  inBandUnheard: string | null;
}

/** How much came out of a drain, as a gloved hand judges it. */
export const DRAIN_AMOUNTS = ["none", "cup", "quart", "gallon", "more"] as const;
export type DrainAmount = (typeof DRAIN_AMOUNTS)[number];
/** What came out. `sewage` is any load: septage, grease, sludge. */
export const DRAIN_CONTENTS = ["nothing", "clean-oil", "milky-oil", "water", "sewage"] as const;
export type DrainContent = (typeof DRAIN_CONTENTS)[number];

/** What one finding at a drain means, from an amount upward. The worst that applies counts. */
export interface DrainFinding {
  what: DrainContent;
  from: DrainAmount;
  problem: string;
}

/** Rules of a drain check: problem keys of the check. */
export interface DrainSpec {
  findings: DrainFinding[];
  notCracked: string;
  frozen: string;
  notShut: string;
}

export interface Check {
  /** Stable, independent of wording: "pump-side.oil-level"; the second of several: "rear.sight-glass.2". */
  key: string;
  station: StationKey;
  kind: CheckKind;
  cadence: Cadence;
  fittingId: string | null;
  part: RoadSafetyPart | null;
  /** On a part that decides whether the truck is fit for the road: "could not check" stays as it is. */
  roadSafety: boolean;
  label: string;
  /** One line: what good looks like. */
  good: string;
  /** Key of a caution shown before the check, or null. */
  caution: CautionKey | null;
  problems: Problem[];
  reading: ReadingSpec | null;
  drain: DrainSpec | null;
  /** Expected number at a count check. */
  expected: number | null;
  /** Steps, where there are steps. */
  steps: string[];
  half: RunUpHalf | null;
  /** The run-up stays locked until this check is answered good in the same walk. */
  locksRunUp: boolean;
  /** Shop checks are done at the bench, not by a driver. */
  who: "driver" | "shop";
  walks: WalkKind[];
  /** Made from a fitting, so "not fitted" is a possible answer. */
  mayBeNotFitted: boolean;
  /** One of the carrier's own checks. */
  own: boolean;
}

export interface Station {
  key: StationKey;
  label: string;
  /** What the engine is doing at this station. */
  engine: string;
  caution: CautionKey | null;
  checks: Check[];
}

/** All checks for one truck; a walk takes those that are due. */
export interface Sheet {
  /** Shape of this record, raised when readers must change. */
  format: 1;
  kind: UnitKind;
  stations: Station[];
  /** Halves of the run-up this truck is built for. One without checks lacks its set point. */
  halves: RunUpHalf[];
  /** Set points the office still owes: without them a half cannot be run. */
  missingSetPoints: string[];
  /** What the truck cannot do as it is built; no walk changes it. */
  cannot: Limit[];
}
