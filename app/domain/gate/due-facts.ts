import type { DueFact } from "../../trade/standing/facts";
import type { PolicySettings } from "../policy/settings";
import { addDays, addMonths, yardInstant } from "../yard-day";

/** Where and when the shop opens. */
export interface YardClock {
  zone: string;
  shopOpensMinute: number;
}

export interface RoundDone {
  kind: "weekly" | "monthly";
  doneOn: string;
  pumpHours: number | null;
}

/**
 * When the rounds fall due. A truck without a round yet counts from the day it was entered.
 * Weekly rounds warn; monthly ones hold past their grace, but only from the shop's opening.
 */
export function roundFacts(
  done: readonly RoundDone[],
  enteredOn: string,
  yard: YardClock,
  policy: PolicySettings,
): DueFact[] {
  const opening = (day: string) => yardInstant(day, yard.shopOpensMinute, yard.zone).getTime();
  const last = (kind: RoundDone["kind"]) => done.find((round) => round.kind === kind);
  const weeklyDue = addDays(last("weekly")?.doneOn ?? enteredOn, policy.weeklyEveryDays);
  const monthly = last("monthly");
  const monthlyDue = addMonths(monthly?.doneOn ?? enteredOn, policy.monthlyEveryMonths);
  const hoursFrom = monthly?.pumpHours ?? 0;
  return [
    {
      kind: "weekly",
      dueOn: weeklyDue,
      warnsAt: opening(addDays(weeklyDue, policy.weeklyGraceDays)),
      holdsAt: null,
      holdsAtHours: null,
    },
    {
      kind: "monthly",
      dueOn: monthlyDue,
      warnsAt: opening(monthlyDue),
      holdsAt: opening(addDays(monthlyDue, policy.monthlyGraceDays + 1)),
      holdsAtHours:
        policy.monthlyEveryHours === null
          ? null
          : hoursFrom + policy.monthlyEveryHours + policy.monthlyGraceHours,
    },
  ];
}

/** Dates set by law or permit: no grace, they hold from the first minute after their last day. */
export function testFacts(
  newest: readonly { kind: string; dueOn: string }[],
  yard: YardClock,
  policy: PolicySettings,
): DueFact[] {
  return newest.map((test) => ({
    kind: test.kind,
    dueOn: test.dueOn,
    warnsAt: yardInstant(addDays(test.dueOn, -policy.testWarnDays), 0, yard.zone).getTime(),
    holdsAt: yardInstant(addDays(test.dueOn, 1), 0, yard.zone).getTime(),
    holdsAtHours: null,
  }));
}
