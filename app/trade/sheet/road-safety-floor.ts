import {
  ROAD_SAFETY_PARTS,
  type RoadSafetyPart,
  type Sheet,
  type UnitKind,
  type WalkKind,
} from "./check";

/**
 * The parts of 49 CFR 396.11(a)(1) that a unit's sheet covers every day. A towed unit has no
 * steering, horn, wipers or mirrors, and its emergency equipment (393.95) rides on the power
 * unit. Nothing here hangs on a fitting: a list of fittings with a gap in it takes no part away.
 */
export const ROAD_SAFETY_FLOOR: Readonly<Record<UnitKind, readonly RoadSafetyPart[]>> = {
  powered: ROAD_SAFETY_PARTS,
  towed: ["service-brakes", "parking-brake", "lighting", "tires", "coupling", "wheels"],
};

/** Parts of the floor that a walk's daily checks leave out. Empty on every sheet made here. */
export function missingParts(sheet: Sheet, walk: WalkKind): RoadSafetyPart[] {
  const covered = new Set<RoadSafetyPart>();
  for (const { checks } of sheet.stations) {
    for (const check of checks) {
      if (check.cadence !== "daily" || check.who !== "driver" || !check.walks.includes(walk))
        continue;
      if (check.part) covered.add(check.part);
      if (!check.roadSafety) continue;
      for (const { part } of check.problems) if (part) covered.add(part);
    }
  }
  return ROAD_SAFETY_FLOOR[sheet.kind].filter((part) => !covered.has(part));
}
