import { look, NO_PRESSURE, NO_VACUUM, red, type StationEntry, white, yellow } from "../catalogue";

export const rear: StationEntry = {
  key: "rear",
  checks: [
    look("rear.lamps", [red("brake-lamps"), yellow("lamp-out", { fix: true, remote: true }), yellow("reflector", { remote: true })], {
      part: "lighting",
      caution: "rear-door",
    }),
    look("rear.door", [red("clamp"), red("leaks"), yellow("gasket", NO_PRESSURE)], {
      needs: ["rear-door"],
      caution: "rear-door",
    }),
    look("rear.manway", [red("clamp"), yellow("gasket", NO_PRESSURE)], { needs: ["manway"], caution: "fall" }),
    look("rear.valves", [red("leaks"), yellow("stiff", NO_PRESSURE), white("handle-bent", { remote: true })], {
      needs: ["valve"],
    }),
    {
      key: "rear.caps",
      kind: "count",
      cadence: "daily",
      needs: ["cap"],
      countOf: "cap",
      problems: [yellow("missing", { fix: true, remote: true }), yellow("gasket", { fix: true, remote: true }), red("ear-broken")],
      walks: ["before", "after", "takeover"],
    },
    look("rear.sight-glasses", [red("cracked"), yellow("leaks", NO_PRESSURE), white("hazed", { remote: true })], {
      needs: ["sight-glass"],
    }),
    look("rear.placards", [red("wrong"), yellow("missing", { limit: { kind: "no-hazmat" }, remote: true })], {
      when: (fittings) =>
        fittings.some((fitting) => fitting.kind === "tank" && fitting.attributes.specificationPlate === true),
    }),
    look("rear.hitch", [red("will-not-lock"), red("chain"), yellow("worn", { limit: { kind: "no-towing" } })], {
      part: "coupling",
    }),
    look("rear.ladder", [yellow("loose"), white("rung-bent", { remote: true })], { needs: ["ladder"], caution: "fall" }),
    look("rear.door-seal", [yellow("cut", NO_VACUUM), white("dry")], {
      cadence: "weekly",
      needs: ["rear-door"],
      caution: "rear-door",
    }),
  ],
};
