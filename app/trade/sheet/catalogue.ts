import type { CheckEntry } from "./catalogue-entry";
import type { StationKey, UnitKind } from "./check";
import { approach } from "./stations/approach";
import { cab } from "./stations/cab";
import { hood } from "./stations/hood";
import { pullOut } from "./stations/pull-out";
import { pumpSide } from "./stations/pump-side";
import { rear } from "./stations/rear";
import { runUp } from "./stations/run-up";
import { shop } from "./stations/shop";
import { curbSide, driverSide } from "./stations/sides";

/** Every check there is, by station, in walking order. */
export const CATALOGUE: Readonly<Record<StationKey, readonly CheckEntry[]>> = {
  approach,
  hood,
  "pump-side": pumpSide,
  cab,
  "curb-side": curbSide,
  rear,
  "driver-side": driverSide,
  "run-up": runUp,
  "pull-out": pullOut,
  shop,
};

/** A towed unit has no hood and no cab. */
export function stationsOf(kind: UnitKind): StationKey[] {
  const all = Object.keys(CATALOGUE) as StationKey[];
  return kind === "powered" ? all : all.filter((key) => key !== "hood" && key !== "cab");
}
