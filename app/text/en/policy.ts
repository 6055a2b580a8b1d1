import type { PolicySettings } from "../../domain/policy/settings";

type Setting = keyof PolicySettings;

interface SettingWords {
  label: string;
  hint: string;
}

/** Words of the office's page about the firm's policy. */
export const policyText = {
  title: "Policy",
  lead: "The firm's own rules. A change holds from now on and is kept with who made it.",
  save: "Save the policy",
  range: (low: number, high: number) => `Type a whole number from ${low} to ${high}.`,
  rangeOrEmpty: (low: number, high: number) =>
    `Type a whole number from ${low} to ${high}, or leave it empty.`,
  version: (version: number) => `Version ${version} is in force.`,
  floor:
    "What the law asks for is not here: road-safety parts are on every sheet, red tags hold, and dates set by law have no grace.",
  groups: {
    walks: "Walks",
    rounds: "Rounds",
    tests: "Dated tests",
    runs: "Runs",
    signs: "Who signs",
  },
  blocks: "Refuse the handover",
  warns: "Warn, and let the dispatcher decide",
} as const;

export const settingText: Record<Setting, SettingWords> = {
  walkHours: {
    label: "A walk counts for, hours",
    hint: "24 at most. It ends sooner with the walk after the day's work.",
  },
  afterWalkRequired: {
    label: "Walk after the day's work",
    hint: "Off: a day's work ends with the last return.",
  },
  reviewDays: {
    label: "Sign-offs are shown for, days",
    hint: "The next driver acknowledges those no older than this.",
  },
  bothHalvesDaily: {
    label: "Both halves of the run-up every day",
    hint: "Off: the pressure half only when the day's run off-loads by pressure, else weekly.",
  },
  weeklyEveryDays: { label: "Weekly round every, days", hint: "Counted from the last one." },
  weeklyGraceDays: {
    label: "Weekly round, days of grace",
    hint: "After that the truck shows a warning.",
  },
  monthlyEveryMonths: { label: "Monthly round every, months", hint: "One, two or three." },
  monthlyGraceDays: {
    label: "Monthly round, days of grace",
    hint: "After that the truck is held from the shop's opening.",
  },
  monthlyEveryHours: {
    label: "Or after, pump hours",
    hint: "Whichever comes first. Empty: pump hours do not matter.",
  },
  monthlyGraceHours: {
    label: "Pump hours of grace",
    hint: "Only where pump hours count above.",
  },
  testWarnDays: {
    label: "Warn ahead, days",
    hint: "How long before its date an inspection or permit shows as due.",
  },
  limitsBlock: {
    label: "When a run needs what a limit forbids",
    hint: "A red tag, a missing walk or a passed date always refuses.",
  },
  driverFix: {
    label: "Drivers may fix small things and sign them off",
    hint: "Bulb, fuse, wiper, air to pressure, a cap or its gasket, top-ups, triangles, a latch. Nothing else.",
  },
  twoPeople: {
    label: "Two people",
    hint: "Whoever found a defect does not sign it off, mechanics included.",
  },
};
