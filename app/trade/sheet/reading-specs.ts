import { greatestVacuum, vacuumAtElevation } from "../atmosphere";
import { type SetPointReading, stopValue } from "../set-points";
import { toSi } from "../units";
import type { Quantity, ReadingSpec } from "./check";
import type { TruckParts } from "./truck-parts";

interface Plain {
  /** In the reading's unit, or in `scaleUnit`. */
  scaleHigh: number;
  scaleUnit?: string;
  step: number;
  low?: number;
  high?: number;
  highExcluded?: boolean;
  seconds?: number;
  below?: string;
  above?: string;
}

/** A reading with fixed limits, all in its own unit, from zero upward. */
export function plainReading(quantity: Quantity, unit: string, plain: Plain): ReadingSpec {
  const si = (value: number | undefined) => (value === undefined ? null : toSi(value, unit));
  return {
    quantity,
    unit,
    scaleLow: 0,
    scaleHigh: toSi(plain.scaleHigh, plain.scaleUnit ?? unit),
    step: toSi(plain.step, unit),
    setPoint: null,
    low: si(plain.low),
    high: si(plain.high),
    highExcluded: plain.highExcluded ?? false,
    stop: null,
    ceiling: null,
    leastHere: null,
    seconds: plain.seconds ?? null,
    asksHeardOpen: false,
    below: plain.below ?? null,
    above: plain.above ?? null,
    pastStop: null,
    belowUnheard: null,
    inBandUnheard: null,
  };
}

/** Ends and steps of a compound gauge with no plate values: 30 inHg, 0, 30 psi, by halves. */
const GAUGE = {
  "vacuum-relief": { end: toSi(30, "inHg"), step: toSi(0.5, "inHg") },
  "pressure-relief": { end: toSi(30, "psi"), step: toSi(0.5, "psi") },
};

/**
 * What the gauge should show when a relief opens. Null without a set point or without a stop
 * value: then nobody may run that half.
 */
export function reliefReading(
  truck: TruckParts,
  reading: "vacuum-relief" | "pressure-relief",
): ReadingSpec | null {
  const point = truck.setPoint(reading);
  const stop = point?.stopSi ?? stopValue(reading, truck.all("tank", "pump", "compound-gauge"));
  if (!point || stop === null) return null;
  const vacuum = reading === "vacuum-relief";
  const gauge = truck.first("compound-gauge")?.attributes ?? {};
  const end = vacuum ? gauge.maxVacuumPa : gauge.maxPressurePa;
  const step = vacuum ? gauge.vacuumStepPa : gauge.pressureStepPa;
  const { elevationM } = truck.yard;
  return {
    quantity: vacuum ? "vacuum" : "pressure",
    unit: point.unit,
    scaleLow: 0,
    scaleHigh: end ?? GAUGE[reading].end,
    step: step ?? GAUGE[reading].step,
    setPoint: point.setPointSi,
    low: point.lowSi,
    high: point.highSi,
    highExcluded: false,
    stop,
    ceiling: vacuum ? greatestVacuum(elevationM) : null,
    leastHere: vacuum ? vacuumAtElevation(point.lowSi ?? point.setPointSi, elevationM) : null,
    seconds: null,
    asksHeardOpen: true,
    below: "opens-low",
    above: "opens-high",
    pastStop: "did-not-open",
    belowUnheard: "weak",
    inBandUnheard: "not-heard",
  };
}

/** Pump speed, rpm: the set point's band, or the band of the pump's plate. */
export function speedReading(truck: TruckParts): ReadingSpec {
  const point = truck.setPoint("pump-speed");
  const plate = truck.first("pump")?.attributes ?? {};
  return {
    ...plainReading("speed", "rpm", {
      scaleHigh: 4000,
      step: 10,
      low: point?.lowSi ?? plate.minRpm,
      high: point?.highSi ?? plate.maxRpm,
      below: "slow",
      above: "fast",
    }),
    setPoint: point?.setPointSi ?? null,
  };
}

/** The lowest tire of those named. Null without a set point. */
export function tireReading(truck: TruckParts, reading: SetPointReading): ReadingSpec | null {
  const point = truck.setPoint(reading);
  if (!point) return null;
  return {
    ...plainReading("pressure", point.unit, {
      scaleHigh: toSi(160, "psi"),
      scaleUnit: "Pa",
      step: 1,
      below: "low",
      above: "high",
    }),
    setPoint: point.setPointSi,
    low: point.lowSi,
    high: point.highSi,
  };
}
