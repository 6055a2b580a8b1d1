import { look, NO_PRESSURE, NO_VACUUM, red, type StationEntry, yellow } from "../catalogue";

/** In order, each step unlocking the next. */
export const runUp: StationEntry = {
  key: "run-up",
  checks: [
    look("run-up.clear", [red("not-clear"), yellow("loaded", NO_VACUUM)], {
      needs: ["pump"],
      caution: "people-clear",
      half: "vacuum",
    }),
    {
      key: "run-up.speed",
      kind: "reading",
      cadence: "daily",
      needs: ["pump"],
      half: "vacuum",
      caution: "at-controls",
      reading: { quantity: "speed", unit: "rpm", setPoint: "pump-speed" },
      problems: [yellow("slow", NO_VACUUM), red("fast"), red("noise")],
    },
    look("run-up.oil-moving", [red("none-moves"), yellow("one-line", NO_VACUUM)], {
      needs: ["pump"],
      when: (fittings) => !fittings.some((f) => f.kind === "pump" && f.attributes.type === "liquid-ring"),
      half: "vacuum",
      caution: "moving-parts",
    }),
    {
      key: "run-up.vacuum",
      kind: "reading",
      cadence: "daily",
      needs: ["pump", "compound-gauge"],
      half: "vacuum",
      caution: "ears",
      steps: true,
      reading: { quantity: "vacuum", unit: "inHg", setPoint: "vacuum-relief" },
      problems: [yellow("low", NO_VACUUM), red("high"), yellow("not-heard", NO_VACUUM)],
    },
    {
      key: "run-up.pressure",
      kind: "reading",
      cadence: "weekly",
      needs: ["pump", "compound-gauge", "pressure-relief"],
      half: "pressure",
      caution: "stored-pressure",
      steps: true,
      reading: { quantity: "pressure", unit: "psi", setPoint: "pressure-relief" },
      problems: [yellow("low", NO_PRESSURE), red("high"), yellow("not-heard", NO_PRESSURE)],
    },
    look("run-up.bled", [red("will-not-bleed"), red("pto-stays-in")], {
      needs: ["pump"],
      half: "vacuum",
      caution: "stored-pressure",
    }),
  ],
};
