import type { FittingKind } from "../fittings";
import type { Colour, Limit } from "../limits";
import type { CautionKey } from "./cautions";
import type {
  Cadence,
  CheckKind,
  DrainSpec,
  ReadingSpec,
  RoadSafetyPart,
  RunUpHalf,
  StationKey,
  WalkKind,
} from "./check";
import type { TruckParts } from "./truck-parts";

/** What nobody signs off from photos and no driver puts right (K10). */
export type AtTheTruck =
  | "brakes"
  | "steering"
  | "suspension"
  | "wheels"
  | "frame"
  | "coupling"
  | "relief-settings"
  | "cracked-glass"
  | "clamps"
  | "guards";

export type LimitOf = Limit | ((truck: TruckParts) => Limit | null);

export interface ProblemEntry {
  key: string;
  colour: Colour;
  limit?: LimitOf;
  driverFix?: boolean;
  remote?: boolean;
  part?: RoadSafetyPart;
  /** Only on trucks this is true of. */
  when?: (truck: TruckParts) => boolean;
  /** Set: only a certifier standing at the truck ends it, whatever else is said here. */
  atTheTruck?: AtTheTruck;
}

/** One check of the catalogue, without its words. Left-out fields take the everyday value. */
export interface CheckEntry {
  /** Within its station; also the key of its words: "pump-side.trap-drain". */
  key: `${StationKey}.${string}`;
  kind: CheckKind;
  /** Default: daily. */
  cadence?: Cadence;
  part?: RoadSafetyPart;
  /** Default: true where a part is named. */
  roadSafety?: boolean;
  caution?: CautionKey | ((truck: TruckParts) => CautionKey | null);
  /** Default: before. */
  walks?: readonly WalkKind[];
  /** Default: driver. */
  who?: "driver" | "shop";
  half?: RunUpHalf;
  locksRunUp?: boolean;
  /** Made once when the truck has any of these; its fitting is the first of them. */
  from?: readonly FittingKind[];
  /** Made once for each of these. */
  each?: FittingKind;
  when?: (truck: TruckParts) => boolean;
  problems: readonly ProblemEntry[];
  /** What "could not check" proposes where the general rule does not fit. */
  couldNotCheck?: { colour: Colour; lowest?: Colour; limit?: LimitOf };
  /** Null: the truck lacks what the reading needs, and the check is not made. */
  reading?: (truck: TruckParts) => ReadingSpec | null;
  expected?: (truck: TruckParts) => number;
  drain?: DrainSpec;
}

export const NO_VACUUM: Limit = { kind: "no-vacuum-work" };
export const NO_PRESSURE: Limit = { kind: "no-pressure-off-load" };
export const NO_TOWING: Limit = { kind: "no-towing" };

type More = Omit<ProblemEntry, "key" | "colour">;
export const red = (key: string, more: More = {}): ProblemEntry => ({
  key,
  colour: "red",
  ...more,
});
export const yellow = (key: string, more: More = {}): ProblemEntry => ({
  key,
  colour: "yellow",
  ...more,
});
/** White is to watch: photos are enough unless it says otherwise. */
export const white = (key: string, more: More = {}): ProblemEntry => ({
  key,
  colour: "white",
  remote: true,
  ...more,
});

/** Fill no more than a share of the tank; without a tank size it limits nothing and the certifier sets a date. */
export function fillShare(share: number): (truck: TruckParts) => Limit | null {
  return (truck) => {
    const litres = truck.first("tank")?.attributes.volumeL;
    if (litres === undefined) return null;
    return { kind: "fill-no-more", fillL: Math.round(litres * share * 10) / 10 };
  };
}

/** The hose that is left with the longest length taken off the truck; no vacuum work where none is left. */
export function hoseLeft(truck: TruckParts): Limit {
  const lengths = truck
    .all("hose")
    .flatMap(({ attributes: { lengthM = 0, count = 1 } }) =>
      Array.from({ length: count }, () => lengthM / count),
    );
  const left = lengths.reduce((sum, one) => sum + one, 0) - Math.max(0, ...lengths);
  return left > 0 ? { kind: "hose-no-longer", hoseM: left } : NO_VACUUM;
}

/** Type of the pump as on its plate; a vane pump where nothing is said. */
export const pumpType = (truck: TruckParts) => truck.first("pump")?.attributes.type ?? "vane";
/** How the pump is driven; by a shaft where nothing is said. */
export const driveType = (truck: TruckParts) => truck.first("drive")?.attributes.type ?? "shaft";
