import { greatestVacuum } from "./atmosphere";
import type { Fitting } from "./fittings";
import { fromSi, groupOf, isUnit, toSi, type UnitGroup } from "./units";

/** Readings that can have a set point, and what each is measured in. */
export const SET_POINT_READINGS = {
  "vacuum-relief": "pressure",
  "pressure-relief": "pressure",
  "pump-speed": "speed",
  "tire-pressure-steer": "pressure",
  "tire-pressure": "pressure",
} as const satisfies Record<string, UnitGroup>;
export type SetPointReading = keyof typeof SET_POINT_READINGS;

export function isSetPointReading(reading: string): reading is SetPointReading {
  return Object.hasOwn(SET_POINT_READINGS, reading);
}

/**
 * The value a reading should have and the limits round it, SI. Vacuum is Pa below the yard's air,
 * pressure Pa above it, speed rpm. `unit` is what the gauge shows.
 */
export interface SetPoint {
  reading: SetPointReading;
  unit: string;
  setPointSi: number;
  lowSi: number | null;
  highSi: number | null;
  stopSi: number | null;
}

/** Whose plate sets a limit. */
export type LimitedBy = "tank" | "pump" | "gauge";

export interface PlateLimit {
  by: LimitedBy;
  valueSi: number;
}

const PLATES: Record<string, LimitedBy> = {
  tank: "tank",
  pump: "pump",
  "compound-gauge": "gauge",
};

/** The limits of tank, pump and gauge on one reading, SI, lowest first. Empty when no plate says. */
export function plateLimits(reading: SetPointReading, fittings: readonly Fitting[]): PlateLimit[] {
  return fittings
    .flatMap(({ kind, attributes }): PlateLimit[] => {
      const by = PLATES[kind];
      if (by === undefined) return [];
      let valueSi: number | undefined;
      if (reading === "vacuum-relief") valueSi = attributes.maxVacuumPa;
      if (reading === "pressure-relief") valueSi = attributes.maxPressurePa;
      if (reading === "pump-speed" && by === "pump") valueSi = attributes.maxRpm;
      return valueSi === undefined ? [] : [{ by, valueSi }];
    })
    .sort((a, b) => a.valueSi - b.valueSi);
}

/** Where the operator stops, SI: the lowest of the plates. Null when no plate says. */
export function stopValue(reading: SetPointReading, fittings: readonly Fitting[]): number | null {
  return plateLimits(reading, fittings)[0]?.valueSi ?? null;
}

/** A set point as the manager typed it, all in `unit`. */
export interface SetPointInput {
  reading: string;
  unit: string;
  setPoint: number;
  low: number | null;
  high: number | null;
  stop: number | null;
}

export type SetPointField = "reading" | "unit" | "setPoint" | "low" | "high" | "stop";

/** What is wrong with a set point, and where. Values are in the input's unit. */
export type SetPointFault =
  | { field: "reading"; code: "unknown-reading" }
  | { field: "unit"; code: "unknown-unit" }
  | { field: "unit"; code: "wrong-unit"; expected: UnitGroup }
  | { field: SetPointField; code: "not-a-positive-number" }
  | { field: SetPointField; code: "over-limit"; by: LimitedBy; limit: number }
  | { field: SetPointField; code: "under-plate"; limit: number }
  | { field: "low" | "high"; code: "band-leaves-out-set-point"; setPoint: number }
  | { field: "stop"; code: "stop-below-band"; high: number };

export type SetPointVerdict =
  | { ok: true; setPoint: SetPoint; reachableHere: boolean }
  | { ok: false; faults: SetPointFault[] };

/** Rounding of unit conversions must not refuse a value equal to its limit. */
function exceeds(value: number, limit: number): boolean {
  return value > limit + 1e-9 * Math.max(1, Math.abs(limit));
}

function overPlates(
  fields: [SetPointField, number | null][],
  input: SetPointInput,
  reading: SetPointReading,
  fittings: readonly Fitting[],
): SetPointFault[] {
  const [lowest] = plateLimits(reading, fittings);
  const faults: SetPointFault[] = [];
  for (const [field, value] of fields) {
    if (value === null) continue;
    const si = toSi(value, input.unit);
    if (lowest && exceeds(si, lowest.valueSi)) {
      const limit = fromSi(lowest.valueSi, input.unit);
      faults.push({ field, code: "over-limit", by: lowest.by, limit });
    }
    const least = fittings.find((one) => one.kind === "pump")?.attributes.minRpm;
    if (reading === "pump-speed" && field !== "stop" && least && exceeds(least, si)) {
      faults.push({ field, code: "under-plate", limit: least });
    }
  }
  return faults;
}

/**
 * Judges a set point against its own band, the plates of tank, pump and gauge, and the yard's
 * air. A set point deeper than the yard's air is kept and reported as not reachable here: the
 * same truck may stand lower tomorrow. Without a stop typed, the lowest plate is the stop.
 */
export function judgeSetPoint(
  input: SetPointInput,
  fittings: readonly Fitting[],
  yard: { elevationM: number },
): SetPointVerdict {
  const { reading, unit, setPoint, low, high, stop } = input;
  if (!isSetPointReading(reading)) {
    return { ok: false, faults: [{ field: "reading", code: "unknown-reading" }] };
  }
  if (!isUnit(unit)) return { ok: false, faults: [{ field: "unit", code: "unknown-unit" }] };
  const expected = SET_POINT_READINGS[reading];
  if (groupOf(unit) !== expected) {
    return { ok: false, faults: [{ field: "unit", code: "wrong-unit", expected }] };
  }
  const fields: [SetPointField, number | null][] = [
    ["setPoint", setPoint],
    ["low", low],
    ["high", high],
    ["stop", stop],
  ];
  const faults: SetPointFault[] = [];
  for (const [field, value] of fields) {
    if (value !== null && !(Number.isFinite(value) && value > 0)) {
      faults.push({ field, code: "not-a-positive-number" });
    }
  }
  if (faults.length > 0) return { ok: false, faults };

  if (low !== null && low > setPoint) {
    faults.push({ field: "low", code: "band-leaves-out-set-point", setPoint });
  }
  if (high !== null && high < setPoint) {
    faults.push({ field: "high", code: "band-leaves-out-set-point", setPoint });
  }
  const top = Math.max(setPoint, high ?? setPoint);
  if (stop !== null && stop < top)
    faults.push({ field: "stop", code: "stop-below-band", high: top });
  faults.push(...overPlates(fields, input, reading, fittings));
  if (faults.length > 0) return { ok: false, faults };

  const si = (value: number | null) => (value === null ? null : toSi(value, unit));
  const setPointSi = toSi(setPoint, unit);
  return {
    ok: true,
    setPoint: {
      reading,
      unit,
      setPointSi,
      lowSi: si(low),
      highSi: si(high),
      stopSi: si(stop) ?? stopValue(reading, fittings),
    },
    reachableHere: reading !== "vacuum-relief" || setPointSi <= greatestVacuum(yard.elevationM),
  };
}
