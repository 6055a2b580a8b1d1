import { z } from "zod";

/** A carrier's policy: every setting has the default of a careful firm. */
export const policySettings = z.object({
  /** Longest a walk counts, hours; never over 24. */
  walkHours: z.number().int().min(1).max(24).default(24),
  /** The *after* walk ends the day's work. */
  afterWalkRequired: z.boolean().default(true),
  /** Sign-offs this many days older than the walk need no acknowledgement. */
  reviewDays: z.number().int().min(1).max(90).default(30),
  weeklyEveryDays: z.number().int().min(1).max(14).default(7),
  /** Days past due; then a weekly round warns. */
  weeklyGraceDays: z.number().int().min(0).max(7).default(2),
  monthlyEveryMonths: z.number().int().min(1).max(3).default(1),
  /** Pump hours after which the monthly round is due as well; null when hours do not matter. */
  monthlyEveryHours: z.number().min(10).max(1000).nullable().default(null),
  /** Days past due; then a monthly round holds. */
  monthlyGraceDays: z.number().int().min(0).max(14).default(5),
  /** Pump hours past due; then it holds. */
  monthlyGraceHours: z.number().min(0).max(100).default(25),
  /** A dated test warns this many days before its date. */
  testWarnDays: z.number().int().min(0).max(120).default(30),
  /** Both halves of the run-up every day. */
  bothHalvesDaily: z.boolean().default(false),
  /** A run's limits block the handover; off, they warn. */
  limitsBlock: z.boolean().default(true),
  /** Drivers may sign off what is on the driver-fix list. */
  driverFix: z.boolean().default(false),
  /** Whoever found a defect does not sign it off, mechanics included. */
  twoPeople: z.boolean().default(false),
});

export type PolicySettings = z.infer<typeof policySettings>;

export const DEFAULT_POLICY: PolicySettings = policySettings.parse({});
