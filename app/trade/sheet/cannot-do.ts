import type { FittingKind } from "../fittings";
import type { Limit } from "../limits";
import { NO_PRESSURE, NO_TOWING, NO_VACUUM } from "./catalogue-entry";
import type { RunUpHalf, UnitKind } from "./check";

type Has = (kind: FittingKind) => boolean;

/** Halves of the run-up a unit is built for: without a relief there is no pressure half. */
export function halvesBuilt(has: Has): RunUpHalf[] {
  if (!has("pump")) return [];
  return has("pressure-relief") ? ["vacuum", "pressure"] : ["vacuum"];
}

/** What a unit cannot do as it is built; no walk and no sign-off changes it. */
export function cannotDo(kind: UnitKind, has: Has): Limit[] {
  const halves = halvesBuilt(has);
  const cannot: Limit[] = [];
  if (!halves.includes("vacuum")) cannot.push(NO_VACUUM);
  if (!halves.includes("pressure")) cannot.push(NO_PRESSURE);
  if (kind === "powered" && !has("hitch")) cannot.push(NO_TOWING);
  return cannot;
}
