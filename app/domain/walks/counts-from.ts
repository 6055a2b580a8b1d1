import { hours } from "../durations";

/** Why a walk clears nothing although its tags hold. */
export type ClearsNot =
  | "incomplete"
  | "setup-changed"
  | "age-unknown"
  | "age-negative"
  | "age-over-24h"
  | "clock-jumped"
  | "sheet-unknown";

/** What the phone said, beside the body, of the time between signature and this send. */
export interface SendAge {
  /** Milliseconds; null when the header was missing or not a number. */
  ageMs: number | null;
  clockJumped: boolean;
}

/**
 * K6: a walk counts from `received − age`. The phone's clock can shorten a walk, never
 * lengthen it: an age that cannot be believed makes the walk clear nothing.
 */
export function countsFrom(
  receivedAt: Date,
  age: SendAge,
): { countsFrom: Date; ageMs: number; clearsNot: ClearsNot | null } {
  const { ageMs, clockJumped } = age;
  if (ageMs === null) return { countsFrom: receivedAt, ageMs: 0, clearsNot: "age-unknown" };
  if (ageMs < 0) return { countsFrom: receivedAt, ageMs, clearsNot: "age-negative" };
  const from = new Date(receivedAt.getTime() - ageMs);
  if (ageMs > hours(24)) return { countsFrom: from, ageMs, clearsNot: "age-over-24h" };
  return { countsFrom: from, ageMs, clearsNot: clockJumped ? "clock-jumped" : null };
}
