/**
 * Due dates on calendar days written "YYYY-MM-DD". Pure: no zone and no clock. Which day it is
 * at the yard is decided elsewhere.
 */

/** Checks done less often than daily: by drivers in a walk, and by the shop at the bench. */
export const ROUND_KINDS = ["weekly", "weekly-shop", "monthly"] as const;
export type RoundKind = (typeof ROUND_KINDS)[number];

const DAY_MS = 86_400_000;
const DAY_FORM = /^(\d{4})-(\d{2})-(\d{2})$/;

function parts(day: string): [year: number, month: number, date: number] {
  const match = DAY_FORM.exec(day);
  if (!match) throw new RangeError(`"${day}" is not a day`);
  const [year, month, date] = match.slice(1).map(Number) as [number, number, number];
  if (month < 1 || month > 12 || date < 1 || date > daysInMonth(year, month)) {
    throw new RangeError(`"${day}" is not a day`);
  }
  return [year, month, date];
}

function daysInMonth(year: number, month: number): number {
  return new Date(Date.UTC(year, month, 0)).getUTCDate();
}

function written(year: number, month: number, date: number): string {
  return `${String(year).padStart(4, "0")}-${String(month).padStart(2, "0")}-${String(date).padStart(2, "0")}`;
}

/** Whole days after a day; negative for before. Throws RangeError for what is not a day. */
export function daysAfter(day: string, days: number): string {
  const [year, month, date] = parts(day);
  const then = new Date(Date.UTC(year, month - 1, date) + Math.trunc(days) * DAY_MS);
  return written(then.getUTCFullYear(), then.getUTCMonth() + 1, then.getUTCDate());
}

/** The same date whole months later, or that month's last day. */
export function monthsAfter(day: string, months: number): string {
  const [year, month, date] = parts(day);
  const count = year * 12 + (month - 1) + Math.trunc(months);
  const [toYear, toMonth] = [Math.floor(count / 12), (((count % 12) + 12) % 12) + 1];
  return written(toYear, toMonth, Math.min(date, daysInMonth(toYear, toMonth)));
}

/** From one day to another, in days. */
export function daysBetween(from: string, to: string): number {
  const [a, b] = [from, to].map((day) => {
    const [year, month, date] = parts(day);
    return Date.UTC(year, month - 1, date);
  }) as [number, number];
  return Math.round((b - a) / DAY_MS);
}

export type Interval = { days: number } | { months: number };

/**
 * The `nth` due date of a series, 1 or more. Months count from the anchor, so a series from
 * 31 January goes 28 February, 31 March, 30 April and never slides to the 28th.
 */
export function nthDue(anchor: string, interval: Interval, nth = 1): string {
  return "months" in interval
    ? monthsAfter(anchor, interval.months * nth)
    : daysAfter(anchor, interval.days * nth);
}

/** Pump hours as a second clock beside the calendar. */
export interface HoursClock {
  /** Hours between rounds. */
  every: number;
  /** Hours run since the last round. */
  used: number;
  /** Hours a day the pump runs of late; zero for a pump that stands. */
  perDay: number;
}

export interface Due {
  dueOn: string;
  by: "calendar" | "hours";
}

/**
 * The earlier of the calendar's date and the day the hours run out. Part days are rounded down:
 * a round is due before the hours are gone, not after. Hours already gone are due today; a pump
 * that does not run has no date by hours.
 */
export function roundDue(
  last: string,
  interval: Interval,
  today: string,
  hours: HoursClock | null = null,
): Due {
  const calendar = nthDue(last, interval);
  if (hours === null) return { dueOn: calendar, by: "calendar" };
  const left = hours.every - hours.used;
  if (left > 0 && !(hours.perDay > 0)) return { dueOn: calendar, by: "calendar" };
  const byHours = left <= 0 ? today : daysAfter(today, Math.floor(left / hours.perDay));
  return byHours < calendar ? { dueOn: byHours, by: "hours" } : { dueOn: calendar, by: "calendar" };
}
