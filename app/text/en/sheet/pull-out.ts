import type { CheckText } from "../../../trade/sheet/sheet-text";

export const pullOut = {
  "pull-out.shut": {
    label: "Shut and stowed",
    good: "Drains and valves shut, caps on, doors shut; chocks up to leave, in place to park",
    problems: {
      "will-not-shut": "door, box or drain will not shut",
      loose: "something not held",
      "chock-missing": "chock missing",
    },
  },
  "pull-out.brakes": {
    label: ({ towed }) => (towed ? "Tug test and first 20 feet" : "Brakes in the first 20 feet"),
    good: ({ towed }) =>
      towed
        ? "Its brakes hold a light pull, release, and stop it straight"
        : "Stops straight, pedal firm, no drag, no noise",
    problems: {
      weak: "weak",
      pulls: "pulls to one side",
      drags: "drags",
      noise: "grinds or squeals",
    },
  },
} as const satisfies Record<string, CheckText>;
