import { and, eq, max } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { rounds, trucks } from "../../db/schema/trucks";
import type { Answers } from "../../trade/sheet/answers";
import { COULD_NOT_CHECK, type Sheet } from "../../trade/sheet/check";
import { allChecks, roundChecks } from "../../trade/sheet/due-checks";
import type { Judgement } from "../../trade/sheet/judge-answers";
import type { GateChange } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import type { PolicySettings } from "../policy/settings";
import { addDays, yardDay } from "../yard-day";

/** Is the weekly round due on a day of the yard? A truck without one counts from the day it was entered. */
export async function weeklyDueOn(
  db: Db,
  key: TruckKey,
  day: string,
  zone: string,
  policy: PolicySettings,
): Promise<boolean> {
  const ofKind = and(
    eq(rounds.carrierId, trucks.carrierId),
    eq(rounds.truckId, trucks.id),
    eq(rounds.kind, "weekly"),
  );
  const [row] = await db
    .select({ createdAt: trucks.createdAt, doneOn: max(rounds.doneOn) })
    .from(trucks)
    .leftJoin(rounds, ofKind)
    .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)))
    .groupBy(trucks.createdAt);
  if (!row) return false;
  const from = row.doneOn ?? yardDay(row.createdAt, zone).day;
  return addDays(from, policy.weeklyEveryDays) <= day;
}

const SKIPPED = { vacuum: "no-vacuum-work", pressure: "no-pressure-off-load" } as const;

/** Every weekly check was really made, and each half of the run-up that the sheet has. */
export function weeklyDone(sheet: Sheet, answers: Answers, judged: Judgement): boolean {
  const weekly = roundChecks(sheet, "weekly");
  const made = weekly.every(({ key }) => {
    const answer = answers[key];
    const skipped =
      answer?.kind === "could-not-check" ||
      (answer?.kind === "problem" && answer.problems.some((one) => one.key === COULD_NOT_CHECK));
    return answer !== undefined && !skipped && !judged.faults.some((one) => one.checkKey === key);
  });
  const asked = sheet.halves.filter((half) => allChecks(sheet).some((one) => one.half === half));
  const ran = !asked.some((half) => judged.limits.some((one) => one.kind === SKIPPED[half]));
  return made && ran;
}

/** A weekly round done within a walk. */
export async function writeWeeklyRound(
  change: GateChange,
  key: TruckKey,
  done: { walkId: string; by: string; at: Date; day: string; pumpHours: number | null },
): Promise<void> {
  await change.tx.insert(rounds).values({
    ...key,
    id: uuidv7(),
    kind: "weekly",
    doneOn: done.day,
    doneAt: done.at,
    doneBy: done.by,
    walkId: done.walkId,
    pumpHours: done.pumpHours,
  });
  change.note("round", done.walkId, { kind: "weekly" });
}
