import type { Answer, Answers } from "~/trade/sheet/answers";
import type { Check } from "~/trade/sheet/check";
import { fromSi } from "~/trade/units";

/** An answer that finds nothing wrong: in the band, at its level, run dry, all counted. */
function goodAnswer(check: Check): Answer {
  const { reading } = check;
  if (reading) {
    const middle =
      reading.setPoint ??
      (reading.low !== null && reading.high !== null
        ? (reading.low + reading.high) / 2
        : (reading.low ?? (reading.high === null ? 0 : reading.high / 2)));
    const value = fromSi(middle, reading.unit);
    if (check.kind === "timed") {
      return { kind: "timed", value, unit: reading.unit, seconds: reading.seconds ?? 0 };
    }
    return {
      kind: "reading",
      value,
      unit: reading.unit,
      ...(reading.asksHeardOpen ? { heardItOpen: true } : {}),
    };
  }
  switch (check.kind) {
    case "level":
      return { kind: "level", level: "ok" };
    case "drain":
      return {
        kind: "drain",
        cracked: true,
        saw: "dry",
        amount: "none",
        what: "nothing",
        shutAgain: true,
      };
    case "count":
      return { kind: "count", counted: check.expected ?? 0 };
    default:
      return { kind: "look", ok: true };
  }
}

export function goodAnswers(due: readonly Check[]): Answers {
  return Object.fromEntries(due.map((check) => [check.key, goodAnswer(check)]));
}
