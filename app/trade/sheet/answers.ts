import { z } from "zod";
import { COLOURS } from "../limits";
import { DRAIN_AMOUNTS, DRAIN_CONTENTS } from "./check";

/** What a driver says about one check. Small: a whole walk goes into a QR code. */

const colour = z.enum(COLOURS);
const note = z.string().trim().max(1000);
const unit = z.string().min(1).max(12);
const amount = z.number().finite();

const problem = z.object({
  key: z.string().min(1).max(60),
  /** A colour above the problem's own. */
  raisedColour: colour.optional(),
  note: note.optional(),
  photoIds: z.array(z.uuid()).max(6).optional(),
});
export type ProblemAnswer = z.infer<typeof problem>;

/** Problems found beside a number or a level. */
const problems = z.array(problem).max(8).optional();

const drain = z
  .object({
    kind: z.literal("drain"),
    cracked: z.boolean(),
    saw: z.enum(["ran", "dry", "frozen"]),
    amount: z.enum(DRAIN_AMOUNTS),
    what: z.enum(DRAIN_CONTENTS),
    shutAgain: z.boolean(),
    problems,
  })
  .superRefine((answer, context) => {
    const issue = (field: "amount" | "what", message: string) =>
      context.addIssue({ code: "custom", path: [field], message });
    const ran = answer.saw === "ran";
    // A trace of load is an answer: something came out, and there was no measuring it.
    if (ran && answer.what === "nothing") issue("what", "say-what-came-out");
    if (!ran && answer.what !== "nothing") issue("what", "nothing-ran");
    if (!ran && answer.amount !== "none") issue("amount", "nothing-ran");
  });

const answerSchema = z.discriminatedUnion("kind", [
  /** A look, all good. */
  z.object({ kind: z.literal("look"), ok: z.literal(true) }),
  z.object({ kind: z.literal("problem"), problems: z.array(problem).min(1).max(8) }),
  z.object({
    kind: z.literal("level"),
    /** How it stands now, after any top-up. */
    level: z.enum(["ok", "low", "over", "empty"]),
    toppedUp: z.object({ amount: amount.positive(), unit }).optional(),
    problems,
  }),
  drain,
  z.object({ kind: z.literal("count"), counted: z.number().int().min(0).max(999), problems }),
  z.object({
    kind: z.literal("reading"),
    value: amount,
    unit,
    heardItOpen: z.boolean().optional(),
    problems,
  }),
  z.object({
    kind: z.literal("timed"),
    value: amount,
    unit,
    seconds: z.number().min(0).max(3600),
    problems,
  }),
  z.object({
    kind: z.literal("could-not-check"),
    reason: note.min(1),
    /** Another colour than proposed; never below what the check allows. */
    colour: colour.optional(),
    photoIds: z.array(z.uuid()).max(6).optional(),
  }),
  z.object({ kind: z.literal("not-fitted") }),
  /** At a look with an open tag, in place of a new one. */
  z.object({ kind: z.literal("tag-seen"), seen: z.enum(["same", "worse", "gone"]) }),
]);
export type Answer = z.infer<typeof answerSchema>;
export type DrainAnswer = Extract<Answer, { kind: "drain" }>;

/**
 * The key of a check as sheets write it. No second spelling of one key gets by: the tables
 * take "cab.horn", "CAB.HORN" and "cab.horn " for the same.
 */
export const checkKeySchema = z
  .string()
  .max(80)
  .regex(/^[a-z0-9]+(?:[.-][a-z0-9]+)*$/, "not-a-check-key");

/** Answers by check key. */
export const answersSchema = z
  .record(checkKeySchema, answerSchema)
  .refine((answers) => Object.keys(answers).length <= 300, "too-many-answers");
export type Answers = z.infer<typeof answersSchema>;
