import type { RoundKind } from "../rounds";
import type { Check, RunUpHalf, Sheet, WalkKind } from "./check";

export interface DueToday {
  walkKind: WalkKind;
  weeklyDue?: boolean;
  monthlyDue?: boolean;
  /** Halves of the run-up asked for; the vacuum half unless told otherwise, both when the weekly round is due. */
  halves?: readonly RunUpHalf[];
}

/** The driver's checks of one walk, in walking order. Shop checks are never among them. */
export function dueChecks(sheet: Sheet, due: DueToday): Check[] {
  const { walkKind, weeklyDue = false, monthlyDue = false } = due;
  const halves = due.halves ?? (weeklyDue ? ["vacuum", "pressure"] : ["vacuum"]);
  return allChecks(sheet).filter((check) => {
    if (check.who === "shop" || !check.walks.includes(walkKind)) return false;
    if (check.half !== null && !halves.includes(check.half)) return false;
    if (check.cadence === "weekly") return weeklyDue;
    if (check.cadence === "monthly") return monthlyDue;
    return true;
  });
}

/** The checks of a round as done at the bench, in walking order. */
export function roundChecks(sheet: Sheet, round: RoundKind): Check[] {
  return allChecks(sheet).filter(({ cadence, who }) => {
    if (round === "monthly") return cadence === "monthly";
    return cadence === "weekly" && (who === "shop") === (round === "weekly-shop");
  });
}

export function allChecks(sheet: Sheet): Check[] {
  return sheet.stations.flatMap((station) => station.checks);
}

/** What must be good in the same walk before the pump is run. */
export function runUpLocks(sheet: Sheet): Check[] {
  return allChecks(sheet).filter((check) => check.locksRunUp);
}
