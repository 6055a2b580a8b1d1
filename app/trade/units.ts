/**
 * Units of the trade, each as `si = value * factor + offset`.
 * Exact definitions and factors: NIST SP 811 (2008), appendix B.8, unless said otherwise.
 */

const INCH_M = 0.0254;
const FOOT_M = 0.3048;
const MILE_M = 1609.344;
/** Liquid gallon: 231 cubic inches. */
const US_GALLON_M3 = 231 * INCH_M ** 3;
const CUBIC_FOOT_M3 = FOOT_M ** 3;
/** Avoirdupois pound times standard gravity. */
const POUND_FORCE_N = 0.453_592_37 * 9.806_65;
/** Conventional millimeter of mercury: 13 595.1 kg/m3 at standard gravity (0 °C). Not the 60 °F inch. */
const MM_MERCURY_PA = 13_595.1 * 9.806_65 * 1e-3;

interface Unit {
  group: UnitGroup;
  factor: number;
  offset?: number;
}

/** What a unit measures. Two units convert only within one group. */
export type UnitGroup =
  | "pressure"
  | "length"
  | "volume"
  | "flow"
  | "temperature"
  | "speed"
  | "time"
  | "hours";

const UNITS = {
  Pa: { group: "pressure", factor: 1 },
  kPa: { group: "pressure", factor: 1000 },
  bar: { group: "pressure", factor: 100_000 },
  psi: { group: "pressure", factor: POUND_FORCE_N / INCH_M ** 2 },
  inHg: { group: "pressure", factor: MM_MERCURY_PA * 25.4 },
  mmHg: { group: "pressure", factor: MM_MERCURY_PA },

  m: { group: "length", factor: 1 },
  mm: { group: "length", factor: 0.001 },
  km: { group: "length", factor: 1000 },
  in: { group: "length", factor: INCH_M },
  /** Thirty-seconds of an inch, as tread depth is read. */
  "in/32": { group: "length", factor: INCH_M / 32 },
  ft: { group: "length", factor: FOOT_M },
  mi: { group: "length", factor: MILE_M },

  m3: { group: "volume", factor: 1 },
  L: { group: "volume", factor: 0.001 },
  gal: { group: "volume", factor: US_GALLON_M3 },
  qt: { group: "volume", factor: US_GALLON_M3 / 4 },
  cup: { group: "volume", factor: US_GALLON_M3 / 16 },
  "fl-oz": { group: "volume", factor: US_GALLON_M3 / 128 },

  "m3/s": { group: "flow", factor: 1 },
  "m3/h": { group: "flow", factor: 1 / 3600 },
  "L/s": { group: "flow", factor: 0.001 },
  cfm: { group: "flow", factor: CUBIC_FOOT_M3 / 60 },

  K: { group: "temperature", factor: 1 },
  degC: { group: "temperature", factor: 1, offset: 273.15 },
  degF: { group: "temperature", factor: 5 / 9, offset: 459.67 * (5 / 9) },

  /** The trade's own base: nobody reads rad/s off a pump. */
  rpm: { group: "speed", factor: 1 },

  s: { group: "time", factor: 1 },
  min: { group: "time", factor: 60 },

  /** Hours on a meter: a count that is kept in hours. */
  h: { group: "hours", factor: 1 },
} as const satisfies Record<string, Unit>;

export type UnitKey = keyof typeof UNITS;

export const UNIT_KEYS = Object.keys(UNITS) as UnitKey[];

/** A unit that is unknown, or one that measures something else. */
export class UnitError extends Error {
  constructor(
    readonly code: "unknown-unit" | "wrong-unit",
    readonly unit: string,
    readonly expected: UnitGroup | null = null,
  ) {
    super(
      code === "unknown-unit"
        ? `unknown unit "${unit}"`
        : `"${unit}" does not measure ${expected ?? "that"}`,
    );
    this.name = "UnitError";
  }
}

export function isUnit(unit: string): unit is UnitKey {
  return Object.hasOwn(UNITS, unit);
}

function known(unit: string): Unit {
  if (!isUnit(unit)) throw new UnitError("unknown-unit", unit);
  return UNITS[unit];
}

/** What a unit measures. Throws UnitError for an unknown unit. */
export function groupOf(unit: string): UnitGroup {
  return known(unit).group;
}

/** The units that measure one thing, the SI unit (or the trade's base) first. */
export function unitsOf(group: UnitGroup): UnitKey[] {
  return UNIT_KEYS.filter((unit) => UNITS[unit].group === group);
}

/**
 * A value in SI: Pa, m, m3, m3/s, K, s; speed stays in rpm and meter hours in h.
 * With `group`, a unit that measures something else throws UnitError "wrong-unit".
 * Pressures are differences: gauge stays gauge, absolute stays absolute.
 */
export function toSi(value: number, unit: string, group?: UnitGroup): number {
  const { factor, offset = 0, group: own } = known(unit) as Unit;
  if (group !== undefined && own !== group) throw new UnitError("wrong-unit", unit, group);
  return value * factor + offset;
}

/** The inverse of `toSi`. */
export function fromSi(si: number, unit: string, group?: UnitGroup): number {
  const { factor, offset = 0, group: own } = known(unit) as Unit;
  if (group !== undefined && own !== group) throw new UnitError("wrong-unit", unit, group);
  return (si - offset) / factor;
}

/** From one unit to another of the same group. Throws UnitError when they measure different things. */
export function convert(value: number, from: string, to: string): number {
  return fromSi(toSi(value, from, groupOf(to)), to);
}
