import { look, red, type StationEntry, yellow } from "../catalogue";

export const pullOut: StationEntry = {
  key: "pull-out",
  checks: [
    look("pull-out.shut", [red("drain-open", { fix: true }), red("door-open"), yellow("cap-off", { fix: true })], {
      needs: ["tank"],
    }),
    look("pull-out.brakes-feel", [red("pull"), red("soft"), yellow("noise")], {
      unit: "powered",
      part: "service-brakes",
      caution: "chocks-up",
    }),
    look("pull-out.service-brakes", [red("drag"), red("dead")], { unit: "towed", part: "service-brakes" }),
    {
      key: "pull-out.washed-out",
      kind: "level",
      cadence: "daily",
      needs: ["tank"],
      caution: "tank-air",
      levels: [
        ["washed", null],
        ["not-washed", "not-washed"],
      ],
      problems: [yellow("not-washed", { limit: { kind: "no-hazmat" }, remote: true })],
      walks: ["after"],
    },
  ],
};
