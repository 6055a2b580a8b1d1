import { z } from "zod";
import type { FittingAttributes, FittingKind } from "../../trade/fittings";
import { fromSi, groupOf, isUnit, toSi, unitsOf } from "../../trade/units";
import type { FieldFault } from "../refusals";
import { typedNumberOptional } from "../typed-number";
import {
  type AmountField,
  type CountField,
  type FittingField,
  fittingFields,
} from "./fitting-fields";

const amount = z.object({
  value: typedNumberOptional,
  unit: z.string({ error: "unknown-unit" }).max(12, "unknown-unit").optional(),
});

/** Values of a plate as typed, by attribute. Which of them a kind takes is in `fittingFields`. */
export const typedAttributesSchema = z.object({
  type: z.string({ error: "choice-unknown" }).max(40, "choice-unknown").optional(),
  grade: z.string({ error: "choice-unknown" }).max(40, "choice-unknown").optional(),
  count: typedNumberOptional,
  specificationPlate: z.boolean().optional(),
  fullOpeningRear: z.boolean().optional(),
  insulated: z.boolean().optional(),
  lined: z.boolean().optional(),
  corrosiveLoad: z.boolean().optional(),
  volumeL: amount.optional(),
  maxVacuumPa: amount.optional(),
  maxPressurePa: amount.optional(),
  flowM3s: amount.optional(),
  minRpm: amount.optional(),
  maxRpm: amount.optional(),
  vacuumStepPa: amount.optional(),
  pressureStepPa: amount.optional(),
  lengthM: amount.optional(),
});
export type TypedAttributes = z.infer<typeof typedAttributesSchema>;

/** Rounded to what a plate says: five figures. */
export function figures(value: number): number {
  return Number(value.toPrecision(5));
}

/** A stored measure as a form shows it, in a unit. */
export function shownAmount(field: AmountField, stored: number, unit: string = field.units[0]) {
  return figures(fromSi(stored / field.scale, unit));
}

type Read<T> = { value: T | undefined } | { fault: FieldFault };

function fault(name: string, code: string, values?: FieldFault["values"]): { fault: FieldFault } {
  return { fault: { pointer: `/attributes/${name}`, code, ...(values && { values }) } };
}

/** Stored as shown and typed back unchanged, a measure stays what it was: rounding is no change. */
function readAmount(
  field: AmountField,
  typed: TypedAttributes,
  before: number | undefined,
): Read<number> {
  const { value, unit = field.units[0] } = typed[field.name] ?? {};
  if (value === undefined) {
    return field.required ? fault(`${field.name}/value`, "value-missing") : { value: undefined };
  }
  const units = unitsOf(field.group).join(", ");
  if (!isUnit(unit)) return fault(`${field.name}/unit`, "unknown-unit", { units });
  if (groupOf(unit) !== field.group) {
    return fault(`${field.name}/unit`, "wrong-unit", { unit, units });
  }
  if (before !== undefined && shownAmount(field, before, unit) === value) return { value: before };
  const stored = toSi(value, unit) * field.scale;
  if (stored < field.low || stored > field.high) {
    const low = shownAmount(field, field.low, unit);
    const high = shownAmount(field, field.high, unit);
    return fault(`${field.name}/value`, "out-of-range", { low, high, unit });
  }
  return { value: stored };
}

function readCount(field: CountField, typed: number | undefined): Read<number> {
  if (typed === undefined) return fault("count", "value-missing");
  if (!Number.isInteger(typed)) return fault("count", "whole-number");
  const { low, high } = field;
  if (typed < low || typed > high) return fault("count", "out-of-range", { low, high, unit: "" });
  return { value: typed };
}

function readField(
  field: FittingField,
  typed: TypedAttributes,
  before: FittingAttributes,
): Read<string | number | boolean> {
  switch (field.as) {
    case "amount":
      return readAmount(field, typed, before[field.name]);
    case "count":
      return readCount(field, typed.count);
    case "flag":
      return { value: typed[field.name] ?? false };
    case "choice": {
      const chosen = typed[field.name] || undefined;
      if (chosen === undefined && field.required) return fault(field.name, "value-missing");
      if (chosen !== undefined && !field.options.includes(chosen)) {
        return fault(field.name, "choice-unknown");
      }
      return { value: chosen };
    }
  }
}

export type AttributesRead =
  | { ok: true; attributes: FittingAttributes }
  | { ok: false; faults: FieldFault[] };

/**
 * The plate of a fitting in SI, from what was typed in any unit. Values the kind does not take
 * are left out. `before` is what is stored now.
 */
export function readAttributes(
  kind: FittingKind,
  typed: TypedAttributes,
  before: FittingAttributes = {},
): AttributesRead {
  const faults: FieldFault[] = [];
  const entries: [string, unknown][] = [];
  for (const field of fittingFields(kind)) {
    const read = readField(field, typed, before);
    if ("fault" in read) faults.push(read.fault);
    else if (read.value !== undefined) entries.push([field.name, read.value]);
  }
  const attributes: FittingAttributes = Object.fromEntries(entries);
  const { minRpm, maxRpm } = attributes;
  if (minRpm !== undefined && maxRpm !== undefined && minRpm > maxRpm) {
    faults.push({ pointer: "/attributes/minRpm/value", code: "least-over-most" });
  }
  return faults.length > 0 ? { ok: false, faults } : { ok: true, attributes };
}

/** Equal plates: nothing was changed. */
export function samePlate(a: FittingAttributes, b: FittingAttributes): boolean {
  const names = new Set([...Object.keys(a), ...Object.keys(b)]) as Set<keyof FittingAttributes>;
  return [...names].every((name) => (a[name] ?? false) === (b[name] ?? false));
}
