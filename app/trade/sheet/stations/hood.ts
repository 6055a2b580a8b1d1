import { look, red, type StationEntry, white, yellow } from "../catalogue";

export const hood: StationEntry = {
  key: "hood",
  checks: [
    {
      key: "hood.oil",
      kind: "level",
      cadence: "daily",
      unit: "powered",
      caution: "hot",
      levels: [
        ["in-range", null],
        ["low", "low"],
        ["none-on-stick", "none"],
      ],
      problems: [white("low", { fix: true, remote: true }), red("none"), yellow("milky")],
    },
    {
      key: "hood.coolant",
      kind: "level",
      cadence: "daily",
      unit: "powered",
      caution: "hot",
      levels: [
        ["in-range", null],
        ["low", "low"],
        ["empty", "empty"],
      ],
      problems: [white("low", { fix: true, remote: true }), red("empty"), yellow("oily")],
    },
    look("hood.belts", [red("torn"), yellow("cracked"), yellow("hose-soft")], {
      unit: "powered",
      caution: "moving-parts",
    }),
    look("hood.steering", [red("loose"), red("leak"), yellow("fluid-low", { fix: true })], {
      unit: "powered",
      part: "steering",
    }),
  ],
};
