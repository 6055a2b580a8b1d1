import type { RunUpHalf, WalkKind } from "../../trade/sheet/check";
import type { AnswerFault } from "../../trade/sheet/judge-answers";

const HALVES: Record<RunUpHalf, string> = {
  vacuum: "Vacuum half",
  pressure: "Pressure half",
};

const FAULTS: Record<AnswerFault["code"], string> = {
  "unknown-check": "This check is not on the truck's sheet any more. Load the page again.",
  "wrong-kind": "Answer it the way it is asked.",
  "unknown-problem": "Choose one of the problems in the list.",
  "unknown-unit": "Enter it in the unit that is shown.",
  "wrong-unit": "Enter it in the unit that is shown.",
  "off-scale": "That is off the gauge's scale. Read it again.",
  "too-short": "Watch it for the whole time.",
  "heard-it-open-missing": "Say whether you heard it open.",
  "no-open-tag": "The tag that hung here has ended. Look again.",
  "always-fitted": "Every truck like this one has it. If it is gone, that is a problem.",
};

/** Words of the walk: the brief, the sheet as a form, and what comes back. */
export const walkText = {
  title: "Walk a truck",
  which: "Pick your truck.",
  none: "No truck has been entered yet.",
  noneHow: "The office enters trucks, their yards and what they carry.",
  kinds: {
    before: "Before the day's work",
    takeover: "Take over",
    after: "After the day's work",
  } satisfies Record<WalkKind, string>,
  kindsLabel: "Which walk",
  takesOver: (driver: string) => `Rests on ${driver}'s walk of`,
  noBase: "Nobody else's walk counts now: walk the truck from the start.",
  yours: "Your walk counts until",
  brief: "Before you start",
  open: "Still open",
  signedOff: "Signed off since your last look",
  nothing: "Nothing is open, and nothing was signed off since your last look.",
  aboard: { empty: "Came back empty", loaded: "Came back loaded" },
  weekly: "The weekly round is due. Its checks are on this sheet.",
  acknowledge: "I have seen this",
  notSatisfied: "Not satisfied",
  disputes: "Not satisfied with which one",
  disputesHint: "Only when you are not satisfied: a second certifier must look at it.",
  disputesNone: "None: something else",
  why: "What is still wrong",
  wording:
    "I am satisfied that the truck is in safe operating condition, and I have seen the last report, what is open and the certification of repairs (49 CFR 396.13).",
  sheet: "The check sheet",
  count: (checks: number) => (checks === 1 ? "1 check" : `${checks} checks`),
  good: "Seen, all good",
  lookGood: "Good",
  notYet: "Not answered",
  steps: (label: string) => `${label}, step by step`,
  problem: "Problem",
  hold: (label: string) => `${label}: hold the truck for this`,
  note: (label: string) => `${label}: note`,
  reason: (label: string) => `${label}: why it could not be checked`,
  photo: (label: string) => `${label}: photo`,
  problemAt: (label: string) => `${label}: problem`,
  counted: (expected: number) => `How many are there. The truck carries ${expected}.`,
  drainDry: "Cracked it: dry",
  drainRan: "Cracked it: something ran",
  amount: (label: string) => `${label}: how much`,
  amounts: {
    none: "A trace",
    cup: "A cup",
    quart: "A quart",
    gallon: "A gallon",
    more: "More than a gallon",
  },
  what: (label: string) => `${label}: what came out`,
  whats: {
    "clean-oil": "Oil",
    "milky-oil": "Milky oil",
    water: "Water",
    sewage: "Load",
  },
  shut: (label: string) => `${label}: shut again`,
  toppedUp: (label: string) => `${label}: topped up, qt`,
  heard: (label: string) => `${label}: heard it open?`,
  hangs: "The tag that hangs here",
  seen: {
    same: "Same as tagged",
    worse: "Worse than tagged",
    hold: "Worse: hold the truck (red tag)",
    gone: "Gone",
  },
  half: HALVES,
  pressureWhen: {
    due: "Due with this walk. Left open, the truck may not off-load by pressure.",
    open: "Only where today's run off-loads by pressure. Left open, the truck may not.",
  },
  certify:
    "I walked this truck and answered what I saw. Anything wrong is written here (49 CFR 396.11).",
  certifyTakeover:
    "I take this truck over: I have seen the walk it rests on, and I answered what I saw.",
  sign: "Sign the walk",
  signAnyway: "Sign it as it is",
  sending: "Sending",
  missing: (count: number) =>
    `${count} ${count === 1 ? "check has" : "checks have"} no answer that stands`,
  missingNote: "Signed as it is, its tags hold but it clears nothing.",
  fault: (code: AnswerFault["code"]) => FAULTS[code],
  offline:
    "No signal. Everything you answered is still on this page; send again when there is signal.",
  refused: "This could not be taken",
  photoNotSent: (count: number) =>
    `${count === 1 ? "A photo" : `${count} photos`} did not go through. The walk is in; its tags hold.`,
  receipt: (standing: string) => `The walk is in. The truck is now: ${standing}.`,
  incomplete: (count: number) =>
    `${count} ${count === 1 ? "check has" : "checks have"} no answer that stands: this walk clears nothing.`,
  clearsNot: {
    incomplete: "",
    "setup-changed":
      "The truck's fittings or set points have changed since: walk it again on its new sheet.",
    "age-unknown": "The phone did not say when it was signed: this walk clears nothing.",
    "age-negative": "The phone's clock went backwards: this walk clears nothing.",
    "age-over-24h": "It is more than a day old: this walk clears nothing.",
    "clock-jumped": "The phone's clock was changed on the way: this walk clears nothing.",
    "sheet-unknown": "The truck's sheet has changed: load the page again and walk it anew.",
  },
  leave: {
    title: "This walk is not sent",
    text: "What you answered is only on this page. Leave, and it is gone.",
    stay: "Stay on the walk",
    go: "Leave and lose it",
  },
  another: "Another truck",
} as const;
