import { look, red, type StationEntry, white, yellow } from "../catalogue";

const powered = { unit: "powered" } as const;

export const cab: StationEntry = {
  key: "cab",
  checks: [
    look("cab.papers", [red("expired"), yellow("missing", { remote: true })], powered),
    look("cab.emergency", [red("extinguisher"), yellow("triangles", { fix: true, remote: true }), yellow("spill-kit", { remote: true }), yellow("ppe", { remote: true })], {
      ...powered,
      part: "emergency-equipment",
    }),
    look("cab.seat-glass", [red("belt"), red("windshield"), yellow("glass")], powered),
    look("cab.mirrors", [red("broken"), yellow("loose")], { ...powered, part: "mirrors" }),
    look("cab.warning-air", [red("warning-lamp"), red("no-air-build"), yellow("gauge")], {
      ...powered,
      walks: ["before", "takeover"],
    }),
    look("cab.horn", [red("dead")], { ...powered, part: "horn" }),
    look("cab.wipers", [red("dead"), yellow("blade", { fix: true, remote: true }), white("washer-empty", { fix: true, remote: true })], {
      ...powered,
      part: "wipers",
    }),
    look("cab.parking-brake", [red("slips"), red("will-not-set")], {
      part: "parking-brake",
      caution: "chocks",
      walks: ["before", "takeover"],
    }),
    {
      key: "cab.leak-down",
      kind: "timed",
      cadence: "daily",
      ...powered,
      part: "service-brakes",
      needs: ["air-brakes"],
      caution: "chocks",
      steps: true,
      reading: { quantity: "leak", unit: "psi/min", setPoint: "applied-leak" },
      problems: [red("over-limit"), yellow("audible")],
    },
    look("cab.pedal", [red("sinks"), red("soft"), yellow("fluid-low")], {
      ...powered,
      part: "service-brakes",
      when: (fittings) => !fittings.some((fitting) => fitting.kind === "air-brakes"),
      caution: "chocks",
    }),
    {
      key: "cab.pump-hours",
      kind: "reading",
      cadence: "daily",
      ...powered,
      needs: ["pump"],
      reading: { quantity: "pump-hours", unit: "h" },
      problems: [white("meter-dead")],
      walks: ["before", "after"],
    },
    {
      key: "cab.odometer",
      kind: "reading",
      cadence: "daily",
      ...powered,
      reading: { quantity: "odometer", unit: "mi" },
      problems: [white("meter-dead")],
      walks: ["before", "after"],
    },
    look("cab.leak-released", [red("over-limit"), yellow("audible")], {
      ...powered,
      cadence: "weekly",
      part: "service-brakes",
      needs: ["air-brakes"],
      caution: "chocks",
      steps: true,
    }),
    look("cab.low-air", [red("no-warning"), red("too-late")], {
      ...powered,
      cadence: "weekly",
      needs: ["air-brakes"],
      caution: "chocks",
      steps: true,
    }),
    look("cab.spring-brake", [red("does-not-pop")], {
      ...powered,
      cadence: "weekly",
      part: "parking-brake",
      needs: ["air-brakes"],
      caution: "chocks",
      steps: true,
    }),
  ],
};
