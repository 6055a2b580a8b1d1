import type { UnitGroup } from "../units";
import type { Quantity, ReadingSpec } from "./check";

export type VerdictWord =
  | "in-band"
  | "below"
  | "above"
  | "past-stop"
  | "off-scale"
  | "not-reachable-here"
  /** There is no band: kept, not judged. */
  | "recorded";

export interface ReadingVerdict {
  word: VerdictWord;
  /** Key of the check's problem that follows, or null. */
  problemKey: string | null;
}

/** What each quantity is measured in. */
export const QUANTITY_GROUPS: Readonly<Record<Quantity, UnitGroup>> = {
  vacuum: "pressure",
  pressure: "pressure",
  temperature: "temperature",
  speed: "speed",
  "pump-hours": "hours",
  odometer: "length",
  duration: "time",
  tread: "length",
  volume: "volume",
  drained: "volume",
  "topped-up": "volume",
};

/** Rounding of unit conversions, far below any gauge's step. */
function slack(limit: number): number {
  return 1e-9 * Math.max(1, Math.abs(limit));
}
const over = (value: number, limit: number) => value > limit + slack(limit);
const under = (value: number, limit: number) => value < limit - slack(limit);
const reaches = (value: number, limit: number) => !under(value, limit);

/**
 * Judges one reading, SI, by simple acceptance (ILAC-G8:09/2019 section 4.2): in the band or not,
 * with no allowance for the gauge. `heardItOpen` is the driver's word on the relief: false means
 * the number is what the pump can do, not what the relief allows.
 *
 * Off the scale is refused, not judged. At the stop with no relief heard, or past it, is
 * "past-stop". Below a band whose set point the yard's air cannot give is "not-reachable-here",
 * and no fault as long as the pump does what it should at this height.
 */
export function judgeReading(
  spec: ReadingSpec,
  valueSi: number,
  heardItOpen?: boolean,
): ReadingVerdict {
  const { low, high, stop, ceiling, setPoint, leastHere } = spec;
  if (!Number.isFinite(valueSi) || under(valueSi, spec.scaleLow) || over(valueSi, spec.scaleHigh)) {
    return { word: "off-scale", problemKey: null };
  }
  const unheard = spec.asksHeardOpen && heardItOpen === false;
  if (stop !== null && (over(valueSi, stop) || (unheard && reaches(valueSi, stop)))) {
    return { word: "past-stop", problemKey: spec.pastStop };
  }
  if (high !== null && (over(valueSi, high) || (spec.highExcluded && reaches(valueSi, high)))) {
    return { word: "above", problemKey: spec.above };
  }
  const outOfReach = setPoint !== null && ceiling !== null && over(setPoint, ceiling);
  if (outOfReach && heardItOpen !== true) {
    const weak = leastHere !== null && under(valueSi, leastHere);
    return { word: "not-reachable-here", problemKey: weak ? spec.belowUnheard : null };
  }
  if (low !== null && under(valueSi, low)) {
    return { word: "below", problemKey: unheard ? spec.belowUnheard : spec.below };
  }
  if (unheard) {
    return {
      word: low === null && high === null ? "recorded" : "in-band",
      problemKey: spec.inBandUnheard,
    };
  }
  return { word: low === null && high === null ? "recorded" : "in-band", problemKey: null };
}
