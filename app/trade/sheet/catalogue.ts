import type { Fitting, FittingKind } from "../fittings";
import type { Colour, Limit } from "../limits";
import type {
  Cadence,
  CheckKind,
  Quantity,
  RoadSafetyPart,
  RunUpHalf,
  StationKey,
  UnitKind,
  WalkKind,
} from "./check";

/** A problem answer without its words. */
export interface ProblemEntry {
  key: string;
  colour: Colour;
  limit: Limit | null;
  driverFix: boolean;
  remote: boolean;
}

/** A check without its words; `text/en/sheet` has them under the same key. */
export interface CheckEntry {
  key: string;
  kind: CheckKind;
  cadence: Cadence;
  problems: ProblemEntry[];
  part?: RoadSafetyPart;
  caution?: string;
  /** Only on trucks that carry one of these. */
  needs?: FittingKind[];
  /** Only where this holds of the truck's fittings. */
  when?: (fittings: readonly Fitting[]) => boolean;
  /** Kinds of unit; both when left out. */
  unit?: UnitKind;
  who?: "driver" | "shop";
  half?: RunUpHalf;
  /** Passes it belongs to; `before` when left out. */
  walks?: WalkKind[];
  /** Answers of a level check, and the problem each is. */
  levels?: [key: string, problem: string | null][];
  reading?: { quantity: Quantity; unit: string; setPoint?: string };
  /** The fitting whose count is expected. */
  countOf?: FittingKind;
  steps?: boolean;
}

export interface StationEntry {
  key: StationKey;
  checks: CheckEntry[];
}

interface More {
  limit?: Limit;
  /** On the driver-fix list: bulb, fuse, wiper, air, cap or gasket, top-up, triangles, latch. */
  fix?: boolean;
  /** May be signed off from photos. */
  remote?: boolean;
}

function entry(colour: Colour, key: string, more: More = {}): ProblemEntry {
  const { limit = null, fix = false, remote = false } = more;
  return { key, colour, limit: colour === "yellow" ? limit : null, driverFix: fix, remote };
}

export const red = (key: string, more?: More) => entry("red", key, more);
export const yellow = (key: string, more?: More) => entry("yellow", key, more);
export const white = (key: string, more?: More) => entry("white", key, more);

export const NO_VACUUM: More = { limit: { kind: "no-vacuum-work" } };
export const NO_PRESSURE: More = { limit: { kind: "no-pressure-off-load" } };

/** A look, every day, before the day's work. */
export function look(
  key: string,
  problems: ProblemEntry[],
  more: Partial<CheckEntry> = {},
): CheckEntry {
  return { key, kind: "look", cadence: "daily", problems, ...more };
}
