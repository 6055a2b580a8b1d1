import { type CheckEntry, red, white, yellow } from "../catalogue-entry";

/** Engine off, hood open. Powered trucks only. */
export const hood: readonly CheckEntry[] = [
  {
    key: "hood.engine-oil",
    kind: "level",
    problems: [red("low", { driverFix: true }), red("empty"), red("milky"), white("over")],
  },
  {
    key: "hood.coolant",
    kind: "level",
    caution: "hot-surfaces",
    problems: [
      yellow("low", { driverFix: true }),
      red("empty"),
      red("oil-in-it"),
      white("over"),
      red("belt-gone"),
      yellow("belt-frayed"),
      yellow("hose-soft"),
      red("wire-bare"),
    ],
  },
  {
    key: "hood.steering",
    kind: "look",
    part: "steering",
    walks: ["before", "takeover"],
    problems: [
      red("play", { atTheTruck: "steering" }),
      red("loose-joint", { atTheTruck: "steering" }),
      red("fluid-leak", { atTheTruck: "steering" }),
      yellow("fluid-low", { atTheTruck: "steering" }),
    ],
  },
  {
    key: "hood.brake-fluid",
    kind: "level",
    part: "service-brakes",
    from: ["hydraulic-brakes"],
    problems: [
      red("low", { atTheTruck: "brakes" }),
      red("empty", { atTheTruck: "brakes" }),
      yellow("over", { atTheTruck: "brakes" }),
    ],
  },
];
