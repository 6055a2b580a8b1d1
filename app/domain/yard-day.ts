import moment from "moment-timezone";

/**
 * The yard's local day, from zone data of its own: the runtime's can be a year old, and a
 * day decided wrong is a walk on the wrong date.
 */
export function yardDay(instant: Date, zone: string): { day: string; offsetMinutes: number } {
  const local = moment.tz(instant, knownZone(zone));
  return { day: local.format("YYYY-MM-DD"), offsetMinutes: local.utcOffset() };
}

/** The instant at which the yard's clock shows `minute` minutes past midnight of `day`. */
export function yardInstant(day: string, minute: number, zone: string): Date {
  const clock = `${String(Math.floor(minute / 60)).padStart(2, "0")}:${String(minute % 60).padStart(2, "0")}`;
  return moment.tz(`${day} ${clock}`, "YYYY-MM-DD HH:mm", true, knownZone(zone)).toDate();
}

/** Is this a zone name the data knows? */
export function isZone(zone: string): boolean {
  return moment.tz.zone(zone) !== null;
}

function knownZone(zone: string): string {
  if (!isZone(zone)) throw new RangeError(`unknown zone ${zone}`);
  return zone;
}

/** A day a number of days later. */
export function addDays(day: string, days: number): string {
  return moment.utc(day, "YYYY-MM-DD", true).add(days, "days").format("YYYY-MM-DD");
}

/** The same day a number of months later, or that month's last day: 31 January + 1 is 28 February. */
export function addMonths(day: string, months: number): string {
  return moment.utc(day, "YYYY-MM-DD", true).add(months, "months").format("YYYY-MM-DD");
}

/** Every zone name the data knows, for a list to choose from. */
export function zoneNames(): string[] {
  return moment.tz.names();
}
