import { sheetText } from "~/text/en/sheet";
import type { Fitting, FittingAttributes, FittingKind } from "~/trade/fittings";
import type { SetPoint, SetPointReading } from "~/trade/set-points";
import type { Sheet, UnitKind } from "~/trade/sheet/check";
import { makeSheet, type OwnCheck } from "~/trade/sheet/make-sheet";
import { toSi } from "~/trade/units";

export interface TestTruck {
  kind: UnitKind;
  fittings: Fitting[];
  setPoints: SetPoint[];
  yard: { elevationM: number; winter?: boolean };
}

type Row = FittingKind | [FittingKind, FittingAttributes];

/** Fittings in the order given, with ids in that order. */
export function fittings(...rows: Row[]): Fitting[] {
  return rows.map((row, index) => {
    const [kind, attributes] = Array.isArray(row) ? row : [row, {}];
    return {
      id: `018f0000-0000-7000-8000-${String(index + 1).padStart(12, "0")}`,
      kind,
      attributes,
    };
  });
}

/** A set point typed in `unit`. */
export function point(
  reading: SetPointReading,
  unit: string,
  setPoint: number,
  [low, high]: [number | null, number | null] = [null, null],
  stop: number | null = null,
): SetPoint {
  const si = (value: number | null) => (value === null ? null : toSi(value, unit));
  return {
    reading,
    unit,
    setPointSi: toSi(setPoint, unit),
    lowSi: si(low),
    highSi: si(high),
    stopSi: si(stop),
  };
}

export const gallons = (value: number) => toSi(value, "gal") * 1000;
const inHg = (value: number) => toSi(value, "inHg");
const psi = (value: number) => toSi(value, "psi");

const compoundGauge: Row = [
  "compound-gauge",
  {
    maxVacuumPa: inHg(30),
    maxPressurePa: psi(30),
    vacuumStepPa: inHg(0.5),
    pressureStepPa: psi(0.5),
    grade: "B",
  },
];

/** A septic truck with everything a straight truck usually carries. */
export const septic: TestTruck = {
  kind: "powered",
  fittings: fittings(
    [
      "tank",
      {
        volumeL: gallons(3000),
        maxVacuumPa: inHg(28),
        maxPressurePa: psi(20),
        fullOpeningRear: true,
      },
    ],
    [
      "pump",
      { type: "vane", maxVacuumPa: inHg(27), maxPressurePa: psi(20), minRpm: 1000, maxRpm: 1400 },
    ],
    ["drive", { type: "shaft" }],
    "changeover-valve",
    "four-way-valve-lock",
    "primary-shutoff",
    "secondary-trap",
    "oil-catch",
    "pre-filter",
    "vacuum-relief",
    "pressure-relief",
    compoundGauge,
    "deodorizer-can",
    "flush-kit",
    ["sight-glass", { count: 3 }],
    "rear-door",
    "manway",
    ["valve", { count: 2 }],
    ["hose", { count: 4, lengthM: 36 }],
    ["hose-tray", { count: 2 }],
    ["cap", { count: 8 }],
    "ladder",
    "air-brakes",
    "spill-kit",
    "toolbox",
  ),
  setPoints: [
    point("vacuum-relief", "inHg", 21, [19, 23], 26),
    point("pressure-relief", "psi", 15, [14, 16]),
    point("tire-pressure-steer", "psi", 110, [105, 120]),
    point("tire-pressure", "psi", 100, [95, 110]),
  ],
  yard: { elevationM: 240 },
};

/** A grease truck: hydraulic drive, no deodorizer, no rear door, at the high yard in winter. */
export const grease: TestTruck = {
  kind: "powered",
  fittings: fittings(
    ["tank", { volumeL: gallons(2200), maxVacuumPa: inHg(28), maxPressurePa: psi(18) }],
    ["pump", { type: "vane", maxVacuumPa: inHg(27), maxPressurePa: psi(18) }],
    ["drive", { type: "hydraulic" }],
    "changeover-valve",
    "primary-shutoff",
    "secondary-trap",
    "oil-catch",
    "vacuum-relief",
    "pressure-relief",
    compoundGauge,
    "sight-glass",
    "sight-glass",
    "manway",
    ["valve", { count: 2 }],
    ["hose", { count: 1, lengthM: 15 }],
    "hose-tray",
    ["cap", { count: 4 }],
    "air-brakes",
  ),
  setPoints: [
    point("vacuum-relief", "inHg", 25, [24, 26], 27),
    point("pressure-relief", "psi", 12, [11, 13]),
    point("pump-speed", "rpm", 1200, [1100, 1300]),
  ],
  yard: { elevationM: 1980, winter: true },
};

/** A specification tank with a liquid-ring pump over a right-angle gearbox, and a hitch. */
export const specification: TestTruck = {
  kind: "powered",
  fittings: fittings(
    [
      "tank",
      {
        volumeL: gallons(3500),
        maxVacuumPa: inHg(29),
        maxPressurePa: psi(25),
        specificationPlate: true,
        fullOpeningRear: true,
      },
    ],
    ["pump", { type: "liquid-ring", maxVacuumPa: inHg(27), maxPressurePa: psi(20) }],
    ["drive", { type: "shaft" }],
    ["gearbox", { type: "right-angle" }],
    "changeover-valve",
    "four-way-valve-lock",
    "primary-shutoff",
    "secondary-trap",
    "secondary-trap",
    "oil-catch",
    "vacuum-relief",
    "pressure-relief",
    compoundGauge,
    ["sight-glass", { count: 4 }],
    "rear-door",
    "manway",
    ["valve", { count: 3 }],
    ["hose", { count: 6, lengthM: 48 }],
    ["hose-tray", { count: 2 }],
    ["cap", { count: 10 }],
    "ladder",
    "hitch",
    "air-brakes",
    "spill-kit",
    "toolbox",
  ),
  setPoints: [
    point("vacuum-relief", "inHg", 24, [22, 25], 27),
    point("pressure-relief", "psi", 18, [17, 19]),
    point("tire-pressure", "psi", 100, [95, 110]),
  ],
  yard: { elevationM: 240 },
};

/** A small portable-toilet truck: direct drive, hydraulic brakes, vacuum only. */
export const portable: TestTruck = {
  kind: "powered",
  fittings: fittings(
    ["tank", { volumeL: gallons(650), maxVacuumPa: inHg(26) }],
    ["pump", { type: "vane", maxVacuumPa: inHg(25) }],
    ["drive", { type: "direct" }],
    "primary-shutoff",
    "secondary-trap",
    "vacuum-relief",
    "compound-gauge",
    "sight-glass",
    ["valve", { count: 1 }],
    ["hose", { count: 2, lengthM: 12 }],
    ["cap", { count: 2 }],
    "hydraulic-brakes",
    "toolbox",
  ),
  setPoints: [point("vacuum-relief", "inHg", 18, [16, 20])],
  yard: { elevationM: 240 },
};

/** A towed tank without a pump of its own. */
export const towed: TestTruck = {
  kind: "towed",
  fittings: fittings(
    ["tank", { volumeL: gallons(4000), maxPressurePa: psi(15) }],
    ["sight-glass", { count: 3 }],
    "rear-door",
    "manway",
    "ladder",
    ["valve", { count: 2 }],
    ["cap", { count: 4 }],
    ["hose", { count: 2, lengthM: 15 }],
    "hose-tray",
    "air-brakes",
  ),
  setPoints: [],
  yard: { elevationM: 240 },
};

export const FIVE_TRUCKS = { septic, grease, specification, portable, towed };

export function sheetOf(truck: TestTruck, ownChecks: OwnCheck[] = []): Sheet {
  return makeSheet({ ...truck, ownChecks, text: sheetText });
}
