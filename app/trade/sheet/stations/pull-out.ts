import { type CheckEntry, red, yellow } from "../catalogue-entry";

/** The last look, and the first twenty feet. */
export const pullOut: readonly CheckEntry[] = [
  {
    key: "pull-out.shut",
    kind: "look",
    walks: ["before", "after", "takeover"],
    problems: [red("will-not-shut"), red("loose"), yellow("chock-missing")],
  },
  {
    key: "pull-out.brakes",
    kind: "look",
    part: "service-brakes",
    walks: ["before", "takeover"],
    problems: [
      red("weak", { atTheTruck: "brakes" }),
      red("pulls", { atTheTruck: "brakes" }),
      red("drags", { atTheTruck: "brakes" }),
      red("noise", { atTheTruck: "brakes" }),
    ],
  },
];
