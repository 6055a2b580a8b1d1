import { z } from "zod";

/** What is painted on the door: "T-118". Typed in any case, kept in capitals. */
export const unitNumberSchema = z
  .string({ error: "unit-number-form" })
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{0,19}$/, "unit-number-form");
