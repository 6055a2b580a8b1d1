import type { RoundKind } from "../../trade/rounds";
import type { DueFact } from "../../trade/standing/facts";
import type { PolicySettings } from "../policy/settings";
import { addDays, addMonths, yardInstant } from "../yard-day";

/** Where and when the shop opens. */
export interface YardClock {
  zone: string;
  shopOpensMinute: number;
}

export interface RoundDone {
  kind: RoundKind;
  doneOn: string;
  pumpHours: number | null;
}

/**
 * When the rounds fall due. A truck without a round yet counts from the day it was entered.
 * Weekly rounds warn; monthly ones hold past their grace, but only from the shop's opening.
 * `weeklyShop`: something of the weekly round needs the shop on this truck.
 */
export function roundFacts(
  done: readonly RoundDone[],
  enteredOn: string,
  yard: YardClock,
  policy: PolicySettings,
  weeklyShop = false,
): DueFact[] {
  const opening = (day: string) => yardInstant(day, yard.shopOpensMinute, yard.zone).getTime();
  const last = (kind: RoundDone["kind"]) => done.find((round) => round.kind === kind);
  const weekly = (kind: "weekly" | "weekly-shop"): DueFact => {
    const dueOn = addDays(last(kind)?.doneOn ?? enteredOn, policy.weeklyEveryDays);
    const warnsAt = opening(addDays(dueOn, policy.weeklyGraceDays));
    return { kind, dueOn, warnsAt, holdsAt: null, holdsAtHours: null };
  };
  const monthly = last("monthly");
  const monthlyDue = addMonths(monthly?.doneOn ?? enteredOn, policy.monthlyEveryMonths);
  const hoursFrom = monthly?.pumpHours ?? 0;
  return [
    weekly("weekly"),
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
    ...(weeklyShop ? [weekly("weekly-shop")] : []),
  ];
}

/**
 * Dates set by law or permit: no grace, they hold from the first minute after their last day.
 * A test set by law that is not on file holds at once.
 */
export function testFacts(
  newest: readonly { kind: string; dueOn: string }[],
  byLaw: readonly string[],
  yard: YardClock,
  policy: PolicySettings,
): DueFact[] {
  const never = byLaw.filter((kind) => !newest.some((test) => test.kind === kind));
  const missing = never.map(
    (kind): DueFact => ({ kind, dueOn: null, warnsAt: null, holdsAt: 0, holdsAtHours: null }),
  );
  const known = newest.map((test) => ({
    kind: test.kind,
    dueOn: test.dueOn,
    warnsAt: yardInstant(addDays(test.dueOn, -policy.testWarnDays), 0, yard.zone).getTime(),
    holdsAt: yardInstant(addDays(test.dueOn, 1), 0, yard.zone).getTime(),
    holdsAtHours: null,
  }));
  return [...missing, ...known];
}
