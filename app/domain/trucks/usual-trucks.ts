import type { FittingAttributes, FittingKind } from "../../trade/fittings";
import type { UnitKind } from "../../trade/sheet/check";
import { toSi } from "../../trade/units";

/** Trucks to start from, so that nobody enters twenty fittings by hand. */
export const USUAL_TRUCKS = ["vane-3000", "hydraulic-2500", "towed-5000"] as const;
export type UsualTruck = (typeof USUAL_TRUCKS)[number];

type Fitted = readonly [kind: FittingKind, attributes?: FittingAttributes];

const liters = (gallons: number) => toSi(gallons, "gal") * 1000;
const vacuum = (inHg: number) => toSi(inHg, "inHg");
const pressure = (psi: number) => toSi(psi, "psi");

const GAUGE: FittingAttributes = {
  maxVacuumPa: vacuum(30),
  maxPressurePa: pressure(30),
  vacuumStepPa: vacuum(1),
  pressureStepPa: pressure(1),
};

/** What sits between tank and outlet on any truck with a vane pump. */
const AIR_LINE: readonly Fitted[] = [
  ["changeover-valve"],
  ["primary-shutoff"],
  ["secondary-trap"],
  ["oil-catch"],
  ["oil-reservoir", { volumeL: toSi(2, "gal") * 1000 }],
  ["pre-filter"],
  ["vacuum-relief"],
  ["pressure-relief"],
  ["compound-gauge", GAUGE],
  ["deodorizer-can", { volumeL: toSi(1, "qt") * 1000 }],
];

const BODY: readonly Fitted[] = [
  ["manway"],
  ["valve", { count: 2 }],
  ["hose-tray", { count: 2 }],
  ["ladder"],
  ["spill-kit"],
  ["toolbox"],
];

/** Usual plates, for the manager to compare with the real ones. No set points: those come from the truck. */
const TRUCKS: Readonly<Record<UsualTruck, { kind: UnitKind; fittings: readonly Fitted[] }>> = {
  "vane-3000": {
    kind: "powered",
    fittings: [
      ["tank", { volumeL: liters(3000), maxVacuumPa: vacuum(27), maxPressurePa: pressure(15) }],
      [
        "pump",
        {
          type: "vane",
          maxVacuumPa: vacuum(27),
          maxPressurePa: pressure(15),
          flowM3s: toSi(360, "cfm"),
          minRpm: 900,
          maxRpm: 1200,
        },
      ],
      ["drive", { type: "shaft" }],
      ["gearbox", { type: "three-shaft" }],
      ...AIR_LINE,
      ["flush-kit"],
      ["sight-glass", { count: 3 }],
      ["rear-door"],
      ...BODY,
      ["cap", { count: 3 }],
      ["hose", { count: 4, lengthM: toSi(120, "ft") }],
      ["air-brakes"],
    ],
  },
  "hydraulic-2500": {
    kind: "powered",
    fittings: [
      ["tank", { volumeL: liters(2500), maxVacuumPa: vacuum(27), maxPressurePa: pressure(15) }],
      [
        "pump",
        {
          type: "vane",
          maxVacuumPa: vacuum(27),
          maxPressurePa: pressure(15),
          flowM3s: toSi(300, "cfm"),
          minRpm: 900,
          maxRpm: 1400,
        },
      ],
      ["drive", { type: "hydraulic" }],
      ...AIR_LINE,
      ["sight-glass", { count: 3 }],
      ...BODY,
      ["cap", { count: 3 }],
      ["hose", { count: 4, lengthM: toSi(120, "ft") }],
      ["air-brakes"],
    ],
  },
  "towed-5000": {
    kind: "towed",
    fittings: [
      ["tank", { volumeL: liters(5000), maxVacuumPa: vacuum(27), maxPressurePa: pressure(15) }],
      ["primary-shutoff"],
      ["sight-glass", { count: 4 }],
      ...BODY,
      ["cap", { count: 3 }],
      ["hose", { count: 3, lengthM: toSi(90, "ft") }],
      ["hitch"],
      ["air-brakes"],
    ],
  },
};

export function usualTruck(start: UsualTruck) {
  return TRUCKS[start];
}
