import { z } from "zod";

const positive = z.number().positive().finite();

/** A limit as it comes from outside, SI values. */
export const limitSchema = z.discriminatedUnion("kind", [
  z.object({ kind: z.literal("no-pressure-off-load") }),
  z.object({ kind: z.literal("no-vacuum-work") }),
  z.object({ kind: z.literal("no-towing") }),
  z.object({ kind: z.literal("no-hazmat") }),
  z.object({ kind: z.literal("vacuum-no-deeper"), vacuumPa: positive.max(101_325) }),
  z.object({ kind: z.literal("fill-no-more"), fillL: positive.max(100_000) }),
  z.object({ kind: z.literal("hose-no-longer"), hoseM: positive.max(1000) }),
]);
