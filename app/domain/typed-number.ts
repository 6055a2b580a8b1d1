import { z } from "zod";

/** A number as a person types it: "3,000" and " 18.5 " are numbers, "18 inHg" is not. */
function readNumber(typed: unknown): unknown {
  if (typeof typed !== "string") return typed;
  const text = typed.trim();
  if (text === "") return undefined;
  const plain = /^[+-]?\d{1,3}(,\d{3})+(\.\d+)?$/.test(text) ? text.replaceAll(",", "") : text;
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : Number.NaN;
}

/** A number from a form or from JSON. */
export const typedNumber = z.preprocess(readNumber, z.number({ error: "not-a-number" }));

/** The same, or left empty. */
export const typedNumberOptional = z.preprocess(
  readNumber,
  z.number({ error: "not-a-number" }).optional(),
);

/** The same, or null where nothing was typed. */
export const typedNumberOrNone = z.preprocess(
  (typed) => readNumber(typed) ?? null,
  z.number({ error: "not-a-number" }).nullable(),
);
