import type { FittingAttributes, FittingKind } from "../../trade/fittings";
import type { UnitGroup, UnitKey } from "../../trade/units";

/** A measure from the plate. It is stored as SI times `scale`; `low` and `high` are as stored. */
export interface AmountField {
  as: "amount";
  name: AmountName;
  group: UnitGroup;
  /** Units offered, the usual one first. Any other unit of the group is taken as well. */
  units: readonly [UnitKey, ...UnitKey[]];
  scale: number;
  low: number;
  high: number;
  required: boolean;
}
export interface CountField {
  as: "count";
  name: "count";
  low: number;
  high: number;
  required: boolean;
}
export interface ChoiceField {
  as: "choice";
  name: "type" | "grade";
  options: readonly string[];
  required: boolean;
}
export interface FlagField {
  as: "flag";
  name: FlagName;
}
/** What is true of a tank or not. */
export type FlagName =
  | "specificationPlate"
  | "fullOpeningRear"
  | "insulated"
  | "lined"
  | "corrosiveLoad";
export type FittingField = AmountField | CountField | ChoiceField | FlagField;

export type AmountName = {
  [Name in keyof FittingAttributes]-?: NonNullable<FittingAttributes[Name]> extends number
    ? Name
    : never;
}[Exclude<keyof FittingAttributes, "count">];

type Range = readonly [low: number, high: number];

function amount(
  name: AmountName,
  group: UnitGroup,
  units: AmountField["units"],
  [low, high]: Range,
  { required = false, scale = 1 } = {},
): AmountField {
  return { as: "amount", name, group, units, scale, low, high, required };
}

const choice = (name: ChoiceField["name"], options: readonly string[], required = false) =>
  ({ as: "choice", name, options, required }) as const;
const flag = (name: FlagField["name"]) => ({ as: "flag", name }) as const;
const count = (high: number): CountField => ({
  as: "count",
  name: "count",
  low: 1,
  high,
  required: true,
});

/** A scale may end a little past the deepest vacuum there is: 30 inHg is 101 592 Pa. */
const VACUUM: Range = [1000, 102_000];
const PRESSURE: Range = [1000, 700_000];
const LITERS_PER_M3 = 1000;

const vacuum = (required = false) =>
  amount("maxVacuumPa", "pressure", ["inHg", "kPa", "mmHg"], VACUUM, { required });
const pressure = (required = false) =>
  amount("maxPressurePa", "pressure", ["psi", "kPa", "bar"], PRESSURE, { required });
const volume = (units: AmountField["units"], range: Range, required = false) =>
  amount("volumeL", "volume", units, range, { required, scale: LITERS_PER_M3 });

/** What the plate of each kind of fitting says. A kind that is not here has nothing to fill in. */
const FIELDS: Partial<Record<FittingKind, readonly FittingField[]>> = {
  tank: [
    volume(["gal", "L", "m3"], [100, 80_000], true),
    vacuum(),
    pressure(),
    flag("specificationPlate"),
    flag("fullOpeningRear"),
    flag("insulated"),
    flag("lined"),
    flag("corrosiveLoad"),
  ],
  pump: [
    choice("type", ["vane", "liquid-ring", "blower"], true),
    vacuum(true),
    pressure(),
    amount("flowM3s", "flow", ["cfm", "m3/h", "L/s"], [0.005, 5]),
    amount("minRpm", "speed", ["rpm"], [100, 6000]),
    amount("maxRpm", "speed", ["rpm"], [100, 6000]),
  ],
  drive: [choice("type", ["shaft", "hydraulic", "direct"], true)],
  gearbox: [choice("type", ["three-shaft", "right-angle"], true)],
  "compound-gauge": [
    vacuum(true),
    pressure(true),
    amount("vacuumStepPa", "pressure", ["inHg", "kPa"], [100, 20_000]),
    amount("pressureStepPa", "pressure", ["psi", "kPa"], [100, 70_000]),
    choice("grade", ["A", "B", "C", "D", "1A", "2A", "1", "1.6", "2.5", "4"]),
  ],
  "oil-reservoir": [volume(["qt", "gal", "L"], [0.5, 200])],
  "deodorizer-can": [volume(["qt", "fl-oz", "L"], [0.1, 40])],
  "sight-glass": [count(20)],
  valve: [count(20)],
  cap: [count(40)],
  "hose-tray": [count(10)],
  hose: [count(40), amount("lengthM", "length", ["ft", "m"], [0.3, 600], { required: true })],
};

/** Kinds a truck may carry several of, each a fitting of its own. */
const SEVERAL: readonly FittingKind[] = [
  "gearbox",
  "primary-shutoff",
  "secondary-trap",
  "oil-catch",
  "pre-filter",
  "sight-glass",
  "manway",
  "valve",
  "hose",
  "hose-tray",
  "cap",
  "toolbox",
];

export function fittingFields(kind: FittingKind): readonly FittingField[] {
  return FIELDS[kind] ?? [];
}

export function mayCarrySeveral(kind: FittingKind): boolean {
  return SEVERAL.includes(kind);
}
