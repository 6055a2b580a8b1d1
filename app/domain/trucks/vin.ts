import { z } from "zod";

/** Values of letters and weights of places for the check digit, 49 CFR 565.15(c)(1), tables III and IV. */
const LETTERS: Readonly<Record<string, number>> = {
  A: 1,
  B: 2,
  C: 3,
  D: 4,
  E: 5,
  F: 6,
  G: 7,
  H: 8,
  J: 1,
  K: 2,
  L: 3,
  M: 4,
  N: 5,
  P: 7,
  R: 9,
  S: 2,
  T: 3,
  U: 4,
  V: 5,
  W: 6,
  X: 7,
  Y: 8,
  Z: 9,
};
const WEIGHTS = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];

export type VinWarning = "vin-length" | "vin-letters" | "vin-check-digit";

/** A VIN as typed, spaces and hyphens taken out. Anything that fits is kept: an old trailer has a short one. */
export const vinSchema = z.preprocess(
  (typed) =>
    typeof typed === "string"
      ? typed.replaceAll(/[\s-]/g, "").toUpperCase() || null
      : (typed ?? null),
  z
    .string({ error: "vin-form" })
    .regex(/^[A-Z0-9]{1,17}$/, "vin-form")
    .nullable(),
);

/** What looks wrong with a VIN. A warning, never a refusal: the plate on the truck is right. */
export function vinWarning(vin: string | null): VinWarning | null {
  if (vin === null) return null;
  if (vin.length !== 17) return "vin-length";
  if (/[IOQ]/.test(vin)) return "vin-letters";
  let sum = 0;
  for (const [place, character] of [...vin].entries()) {
    sum += (LETTERS[character] ?? Number(character)) * (WEIGHTS[place] ?? 0);
  }
  const digit = sum % 11 === 10 ? "X" : String(sum % 11);
  return vin[8] === digit ? null : "vin-check-digit";
}
