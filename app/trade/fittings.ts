/** What a truck can carry. One row per fitting on the truck; attributes by kind. */
export const FITTING_KINDS = [
  "tank",
  "pump",
  "drive",
  "gearbox",
  "changeover-valve",
  "four-way-valve-lock",
  "primary-shutoff",
  "secondary-trap",
  "oil-catch",
  "oil-reservoir",
  "pre-filter",
  "vacuum-relief",
  "pressure-relief",
  "compound-gauge",
  "deodorizer-can",
  "flush-kit",
  "sight-glass",
  "rear-door",
  "manway",
  "valve",
  "hose",
  "hose-tray",
  "cap",
  "ladder",
  "hitch",
  "air-brakes",
  "hydraulic-brakes",
  "spill-kit",
  "toolbox",
] as const;
export type FittingKind = (typeof FITTING_KINDS)[number];

/** SI values of a fitting's plate. Only what its kind has is set. */
export interface FittingAttributes {
  /** pump: vane, liquid ring or blower. drive: shaft, hydraulic, direct. gearbox: three-shaft, right-angle. */
  type?: string;
  /** How many of them: sight glasses, caps, hoses, valves. */
  count?: number;
  /** tank: liters. deodorizer can, oil reservoir: liters. */
  volumeL?: number;
  /** tank: greatest working pressure. pump, gauge: greatest pressure. Pa above the yard's air. */
  maxPressurePa?: number;
  /** tank, pump, gauge: greatest vacuum. Pa below the yard's air. */
  maxVacuumPa?: number;
  /** pump: free air at sea level, m3/s. */
  flowM3s?: number;
  /** pump: band of the plate, rpm. */
  minRpm?: number;
  maxRpm?: number;
  /** gauge: smallest step, Pa on the vacuum side and on the pressure side. */
  vacuumStepPa?: number;
  pressureStepPa?: number;
  /** gauge: accuracy grade as on its face (ASME B40.100 or EN 837-1). */
  grade?: string;
  /** tank: carries a cargo-tank specification plate (49 CFR 180). */
  specificationPlate?: boolean;
  /** tank: full-opening rear head. */
  fullOpeningRear?: boolean;
  /** tank: insulated, lined, or hauling a load that eats its metal: each changes its tests. */
  insulated?: boolean;
  lined?: boolean;
  corrosiveLoad?: boolean;
  /** hose: length aboard, m. */
  lengthM?: number;
}

export interface Fitting {
  id: string;
  kind: FittingKind;
  attributes: FittingAttributes;
}
