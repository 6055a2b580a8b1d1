import type { FittingKind } from "../fittings";
import type { StationKey } from "./check";

/** What a line of text may say about the truck it is for. Numbers are in `unit`. */
export interface TextFacts {
  /** The expected number at a count, or how many the fitting stands for. */
  count: number;
  /** Which of several alike this is, from 1; null where the truck has one. */
  nth: number | null;
  /** Type from the fitting's plate: "vane", "liquid-ring", "right-angle" … */
  type: string | null;
  low: number | null;
  high: number | null;
  setPoint: number | null;
  stop: number | null;
  /** The deepest vacuum the yard's air gives. */
  ceiling: number | null;
  unit: string;
  winter: boolean;
  towed: boolean;
  has(kind: FittingKind): boolean;
}

type Line = string | ((facts: TextFacts) => string);

export interface CheckText {
  label: Line;
  /** One line: what good looks like. */
  good: Line;
  problems: Readonly<Record<string, Line>>;
  steps?: readonly string[] | ((facts: TextFacts) => readonly string[]);
}

export interface StationText {
  label: string;
  engine: Line;
}

/** The words of a sheet, apart from its rules. Checks by key, without the fitting's number. */
export interface SheetText {
  stations: Readonly<Record<StationKey, StationText>>;
  checks: Readonly<Record<string, CheckText>>;
  couldNotCheck: string;
  notFitted: string;
  /** The problem answer of a carrier's own check. */
  notRight: string;
}
