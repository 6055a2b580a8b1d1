import type { Colour, Limit } from "../limits";

/** Places on the walk, in walking order (DESIGN section 6). */
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

export type CheckKind = "look" | "level" | "drain" | "count" | "reading" | "timed";
export type Cadence = "daily" | "weekly" | "monthly";
/** Which pass over the truck a check belongs to. */
export type WalkKind = "before" | "after" | "takeover";
/** The half of the run-up a check belongs to. */
export type RunUpHalf = "vacuum" | "pressure";

/** One thing that can be wrong at a check, and what it does to the key. */
export interface Problem {
  /** Stable, unique within its check: "cracked", "below-band". */
  key: string;
  label: string;
  /** The floor: a driver may raise it, never lower it. */
  colour: Colour;
  /** What a yellow tag forbids; null for red, white, or a yellow that only needs a certifier's date. */
  limit: Limit | null;
  /** May a driver put it right where the carrier's driver-fix list allows it? */
  driverFix: boolean;
  /** May it be signed off from photos? */
  remote: boolean;
}

export type Quantity =
  | "vacuum"
  | "pressure"
  | "temperature"
  | "speed"
  | "pump-hours"
  | "odometer"
  | "duration"
  | "tread"
  | "volume";

/** What a numeric check asks for. Values in SI (Pa, K, rad/s would not be read by anyone: speed in rpm, odometer in m). */
export interface ReadingSpec {
  quantity: Quantity;
  /** The unit the dial or field shows, a key of `units`. */
  unit: string;
  /** Ends of the gauge's scale, SI: a value outside is refused. */
  scaleLow: number;
  scaleHigh: number;
  /** Smallest step, SI. */
  step: number;
  /** Band, SI; null where there is no limit on that side. */
  low: number | null;
  high: number | null;
  /** The value at which the operator stops, SI. */
  stop: number | null;
  /** Which problem a value outside the band is: key of one of the check's problems. */
  below: string | null;
  above: string | null;
}

export interface Check {
  /** Stable, independent of wording: "pump-side.oil-level"; with a fitting index where a truck has several: "rear.sight-glass.2". */
  key: string;
  station: StationKey;
  kind: CheckKind;
  cadence: Cadence;
  fittingId: string | null;
  part: RoadSafetyPart | null;
  label: string;
  /** One line: what good looks like. */
  good: string;
  /** Key of a caution shown before the check, or null. */
  caution: string | null;
  problems: Problem[];
  reading: ReadingSpec | null;
  /** Expected number at a count check. */
  expected: number | null;
  /** Steps, where there are steps. */
  steps: string[];
  half: RunUpHalf | null;
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
  caution: string | null;
  checks: Check[];
}

/** All checks for one truck; a walk takes those that are due. */
export interface Sheet {
  /** Shape of this record, raised when readers must change. */
  format: 1;
  stations: Station[];
}
