const SECOND = 1000;

/** Durations in milliseconds, by named unit. */
export function seconds(count: number): number {
  return count * SECOND;
}
export function minutes(count: number): number {
  return count * 60 * SECOND;
}
export function hours(count: number): number {
  return count * 3600 * SECOND;
}
export function days(count: number): number {
  return count * 24 * 3600 * SECOND;
}
