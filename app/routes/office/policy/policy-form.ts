import { z } from "zod";
import { type PolicySettings, policySettings } from "~/domain/policy/settings";
import { policyText } from "~/text/en/policy";

const { shape } = policySettings;
const off = z.boolean().default(false);

/** Settings that are numbers, as the form asks for them: left empty is missing, not the default. */
const NUMBERS = {
  walkHours: shape.walkHours.unwrap(),
  reviewDays: shape.reviewDays.unwrap(),
  weeklyEveryDays: shape.weeklyEveryDays.unwrap(),
  weeklyGraceDays: shape.weeklyGraceDays.unwrap(),
  monthlyEveryMonths: shape.monthlyEveryMonths.unwrap(),
  monthlyGraceDays: shape.monthlyGraceDays.unwrap(),
  monthlyGraceHours: shape.monthlyGraceHours.unwrap(),
  testWarnDays: shape.testWarnDays.unwrap(),
};

/** The one number that may be none: pump hours between monthly rounds. */
const hours = shape.monthlyEveryHours.unwrap().unwrap();

export type NumberSetting = keyof typeof NUMBERS | "monthlyEveryHours";

/** The settings as the form sends them: a box left empty is off, whatever its default. */
export const policyForm: z.ZodType<PolicySettings> = z.object({
  ...NUMBERS,
  monthlyEveryHours: hours.nullable().default(null),
  afterWalkRequired: off,
  bothHalvesDaily: off,
  driverFix: off,
  twoPeople: off,
  limitsBlock: z.enum(["block", "warn"]).transform((choice) => choice === "block"),
});

function isNumber(name: string): name is keyof typeof NUMBERS {
  return Object.hasOwn(NUMBERS, name);
}

/** What to type instead, from the setting's own limits. */
export function numberFault(name: string): string {
  const wanted = isNumber(name) ? NUMBERS[name] : hours;
  const words = isNumber(name) ? policyText.range : policyText.rangeOrEmpty;
  return words(wanted.minValue ?? 0, wanted.maxValue ?? 0);
}
