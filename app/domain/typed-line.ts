import { z } from "zod";

/** Characters that cannot be printed, or that turn the writing about: none of them is typed in a name. */
const UNPRINTABLE = /[\p{Cc}\u2028\u2029\u202a-\u202e\u2066-\u2069]/u;

/** One line of text from a form, of so many characters. `code` says what to type instead. */
export function typedLine(code: string, least: number, most: number) {
  return z
    .string({ error: code })
    .trim()
    .min(least, code)
    .max(most, code)
    .refine((text) => !UNPRINTABLE.test(text), "unprintable");
}
