import { z } from "zod";

/** A typed signature under one certification wording. */
export const signatureSchema = z.object({
  name: z.string().trim().min(2, "signature-empty").max(80),
  wording: z.string().min(1).max(60),
});
