import { z } from "zod";
import { fromSi, groupOf, isUnit, toSi, unitsOf } from "../../trade/units";
import type { FieldFault } from "../refusals";
import { typedLine } from "../typed-line";
import { typedNumber } from "../typed-number";
import { isZone } from "../yard-day";

/** From the lowest land there is to above the highest road, m. */
const LOWEST_M = -430;
const HIGHEST_M = 5000;

const CLOCK = /^([01]\d|2[0-3]):([0-5]\d)$/;

/** "06:30" as minutes after midnight. */
const shopOpens = z
  .string({ error: "clock-form" })
  .trim()
  .regex(CLOCK, "clock-form")
  .transform((text) => Number(text.slice(0, 2)) * 60 + Number(text.slice(3)));

const phone = z.preprocess(
  (typed) => (typeof typed === "string" ? typed.trim() || null : (typed ?? null)),
  z
    .string({ error: "phone-form" })
    .regex(/^[+()\d .-]{3,32}$/, "phone-form")
    .nullable(),
);

export const yardSchema = z.object({
  name: typedLine("yard-name", 1, 80),
  zone: z.string({ error: "zone-unknown" }).refine(isZone, "zone-unknown"),
  elevation: typedNumber,
  elevationUnit: z.string({ error: "unknown-unit" }).max(12, "unknown-unit"),
  phone: phone.default(null),
  shopOpens,
  winter: z.boolean().default(false),
});
export type YardInput = z.infer<typeof yardSchema>;

/** An elevation as a form shows it: whole feet or meters. */
export function shownElevation(elevationM: number, unit = "ft"): number {
  return Math.round(fromSi(elevationM, unit, "length"));
}

/** The elevation typed, m. Typed back as shown, it stays what is stored. */
export function readElevation(
  input: Pick<YardInput, "elevation" | "elevationUnit">,
  before: number | null,
): { ok: true; elevationM: number } | { ok: false; fault: FieldFault } {
  const { elevation, elevationUnit: unit } = input;
  const units = unitsOf("length").join(", ");
  const unitFault = (code: string) =>
    ({ ok: false, fault: { pointer: "/elevationUnit", code, values: { unit, units } } }) as const;
  if (!isUnit(unit)) return unitFault("unknown-unit");
  if (groupOf(unit) !== "length") return unitFault("wrong-unit");
  if (before !== null && shownElevation(before, unit) === elevation) {
    return { ok: true, elevationM: before };
  }
  const elevationM = toSi(elevation, unit, "length");
  if (elevationM >= LOWEST_M && elevationM <= HIGHEST_M) return { ok: true, elevationM };
  const values = {
    low: Math.ceil(fromSi(LOWEST_M, unit)),
    high: Math.floor(fromSi(HIGHEST_M, unit)),
    unit,
  };
  return { ok: false, fault: { pointer: "/elevation", code: "elevation-range", values } };
}
