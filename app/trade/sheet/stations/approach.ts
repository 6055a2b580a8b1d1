import { look, red, type StationEntry, white, yellow } from "../catalogue";

export const approach: StationEntry = {
  key: "approach",
  checks: [
    look("approach.stance", [red("leans"), yellow("body-damage", { remote: true }), white("scrape", { remote: true })], {
      caution: "chocks",
      walks: ["before", "takeover"],
    }),
    look("approach.ground", [red("lading-leak"), red("fuel-leak"), yellow("oil-leak"), yellow("coolant-leak")], {
      walks: ["before", "takeover"],
    }),
    {
      key: "approach.aboard",
      kind: "level",
      cadence: "daily",
      needs: ["tank"],
      levels: [
        ["empty", null],
        ["part", null],
        ["full", null],
      ],
      problems: [white("unknown-load")],
      walks: ["before", "after", "takeover"],
    },
    look("approach.wrong-today", [red("unsafe"), yellow("needs-shop"), white("to-watch")], {
      walks: ["after"],
    }),
  ],
};
