import { z } from "zod";
import { limitSchema } from "../limit-schema";
import { COLOURS } from "../limits";
import { CAUTIONS } from "./cautions";
import {
  CADENCES,
  CHECK_KINDS,
  DRAIN_AMOUNTS,
  DRAIN_CONTENTS,
  QUANTITIES,
  ROAD_SAFETY_PARTS,
  RUN_UP_HALVES,
  type Sheet,
  STATIONS,
  UNIT_KINDS,
  WALK_KINDS,
} from "./check";

const key = z.string().min(1).max(80);
const words = z.string().max(400);
const si = z.number().finite().nullable();
const colour = z.enum(COLOURS);
const caution = z.enum(CAUTIONS).nullable();
const problemKey = z.string().min(1).max(60);

const problem = z.object({
  key: problemKey,
  label: words,
  colour,
  lowest: colour,
  limit: limitSchema.nullable(),
  driverFix: z.boolean(),
  remote: z.boolean(),
  part: z.enum(ROAD_SAFETY_PARTS).nullable(),
});

const reading = z.object({
  quantity: z.enum(QUANTITIES),
  unit: z.string().max(12),
  scaleLow: z.number().finite(),
  scaleHigh: z.number().finite(),
  step: z.number().finite(),
  setPoint: si,
  low: si,
  high: si,
  highExcluded: z.boolean(),
  stop: si,
  ceiling: si,
  leastHere: si,
  seconds: si,
  asksHeardOpen: z.boolean(),
  below: problemKey.nullable(),
  above: problemKey.nullable(),
  pastStop: problemKey.nullable(),
  belowUnheard: problemKey.nullable(),
  inBandUnheard: problemKey.nullable(),
});

const drain = z.object({
  findings: z
    .array(
      z.object({ what: z.enum(DRAIN_CONTENTS), from: z.enum(DRAIN_AMOUNTS), problem: problemKey }),
    )
    .max(40),
  notCracked: problemKey,
  frozen: problemKey,
  notShut: problemKey,
});

const check = z.object({
  key,
  station: z.enum(STATIONS),
  kind: z.enum(CHECK_KINDS),
  cadence: z.enum(CADENCES),
  fittingId: z.uuid().nullable(),
  part: z.enum(ROAD_SAFETY_PARTS).nullable(),
  roadSafety: z.boolean(),
  label: words,
  good: words,
  caution,
  problems: z.array(problem).max(40),
  reading: reading.nullable(),
  drain: drain.nullable(),
  expected: z.number().int().min(0).nullable(),
  steps: z.array(words).max(20),
  half: z.enum(RUN_UP_HALVES).nullable(),
  locksRunUp: z.boolean(),
  who: z.enum(["driver", "shop"]),
  walks: z.array(z.enum(WALK_KINDS)).max(3),
  mayBeNotFitted: z.boolean(),
  own: z.boolean(),
});

/** A sheet that comes back with a walk, made by an older build or not at all by this one. */
export const sheetSchema = z.object({
  format: z.literal(1),
  kind: z.enum(UNIT_KINDS),
  stations: z
    .array(
      z.object({
        key: z.enum(STATIONS),
        label: words,
        engine: words,
        caution,
        checks: z.array(check).max(200),
      }),
    )
    .max(STATIONS.length),
  halves: z.array(z.enum(RUN_UP_HALVES)),
  missingSetPoints: z.array(z.string().max(40)),
  cannot: z.array(limitSchema),
}) satisfies z.ZodType<Sheet>;
