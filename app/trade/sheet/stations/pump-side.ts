import type { Fitting } from "../../fittings";
import { look, NO_PRESSURE, NO_VACUUM, type ProblemEntry, red, type StationEntry, white, yellow } from "../catalogue";

const driveIs = (type: string) => (fittings: readonly Fitting[]) =>
  fittings.some((fitting) => fitting.kind === "drive" && fitting.attributes.type === type);
const pumpIs = (type: string) => (fittings: readonly Fitting[]) =>
  fittings.some((fitting) => fitting.kind === "pump" && fitting.attributes.type === type);

/** What came out outranks how much: sewage in the oil catch is red whatever the amount. */
const drainProblems = (sewage: ProblemEntry): ProblemEntry[] => [
  sewage,
  yellow("milky"),
  yellow("too-much"),
  red("left-open", { fix: true }),
  yellow("frozen", NO_VACUUM),
  yellow("plugged"),
];

export const pumpSide: StationEntry = {
  key: "pump-side",
  checks: [
    look("pump-side.controls", [red("pto-in"), red("valve-stuck"), yellow("valve-stiff")], {
      needs: ["pump"],
      caution: "stored-pressure",
    }),
    look("pump-side.vented", [red("pressure-held"), yellow("gauge-off-zero", NO_PRESSURE), red("gauge-broken")], {
      needs: ["tank", "compound-gauge"],
      caution: "stored-pressure",
      walks: ["before", "takeover"],
    }),
    {
      key: "pump-side.oil",
      kind: "level",
      cadence: "daily",
      needs: ["pump"],
      when: (fittings) => !pumpIs("liquid-ring")(fittings),
      levels: [
        ["in-range", null],
        ["low", "low"],
        ["none", "none"],
      ],
      problems: [white("low", { fix: true, remote: true }), red("none"), yellow("wrong-oil", NO_VACUUM), yellow("no-spare", { fix: true, remote: true })],
    },
    {
      key: "pump-side.seal-liquid",
      kind: "level",
      cadence: "daily",
      needs: ["pump"],
      when: pumpIs("liquid-ring"),
      levels: [
        ["in-range", null],
        ["low", "low"],
        ["none", "none"],
      ],
      problems: [white("low", { fix: true, remote: true }), red("none"), yellow("dirty")],
    },
    {
      key: "pump-side.secondary-drain",
      kind: "drain",
      cadence: "daily",
      needs: ["secondary-trap"],
      caution: "stored-pressure",
      steps: true,
      problems: drainProblems(yellow("sewage", NO_VACUUM)),
      walks: ["before", "after"],
    },
    {
      key: "pump-side.oil-catch-drain",
      kind: "drain",
      cadence: "daily",
      needs: ["oil-catch"],
      caution: "waste-oil",
      steps: true,
      problems: drainProblems(red("sewage")),
      walks: ["before", "after"],
    },
    {
      key: "pump-side.deodorizer",
      kind: "level",
      cadence: "daily",
      needs: ["deodorizer-can"],
      caution: "solvent",
      levels: [
        ["full", null],
        ["low", "low"],
        ["empty", "empty"],
      ],
      problems: [white("low", { fix: true, remote: true }), white("empty", { fix: true, remote: true }), yellow("can-leaks")],
    },
    look("pump-side.outlet", [red("blocked"), yellow("oil-mist"), white("dirty", { remote: true })], {
      needs: ["pump"],
      caution: "upwind",
    }),
    look("pump-side.guard", [red("guard-off"), red("shavings"), yellow("guard-loose", NO_VACUUM)], {
      needs: ["drive"],
      caution: "moving-parts",
    }),
    look("pump-side.leaks", [red("runs"), yellow("drips"), white("damp", { remote: true })], { needs: ["pump"] }),
    look("pump-side.hydraulics", [red("hose-bulged"), yellow("weeps"), yellow("oil-low", { fix: true })], {
      needs: ["drive"],
      when: driveIs("hydraulic"),
      caution: "hoses",
    }),
    look("pump-side.relief-locks", [red("disturbed"), red("plugged"), yellow("seal-missing", NO_VACUUM)], {
      needs: ["vacuum-relief", "pressure-relief"],
    }),
    {
      key: "pump-side.flush",
      kind: "level",
      cadence: "daily",
      needs: ["flush-kit"],
      steps: true,
      levels: [
        ["done-warm", null],
        ["not-done", "not-done"],
      ],
      problems: [white("not-done", { fix: true })],
      walks: ["after"],
    },
    look("pump-side.pre-filter", [yellow("rubber", NO_VACUUM), yellow("plugged", NO_VACUUM), white("dirty")], {
      cadence: "weekly",
      needs: ["pre-filter"],
      caution: "stored-pressure",
      steps: true,
    }),
    look("pump-side.gearbox-oil", [yellow("low", { fix: true }), red("none"), yellow("metal", NO_VACUUM)], {
      cadence: "weekly",
      needs: ["gearbox"],
      steps: true,
    }),
    look("pump-side.hydraulic-oil", [yellow("low", { fix: true }), red("none"), yellow("milky", NO_VACUUM)], {
      cadence: "weekly",
      needs: ["drive"],
      when: driveIs("hydraulic"),
    }),
    look("pump-side.pto-shaft", [red("joint-loose"), yellow("dry"), yellow("yoke-worn", NO_VACUUM)], {
      cadence: "weekly",
      needs: ["drive"],
      when: driveIs("shaft"),
      caution: "moving-parts",
    }),
    look("pump-side.flush-weekly", [white("not-done"), yellow("came-out-black", NO_VACUUM)], {
      cadence: "weekly",
      needs: ["pump"],
      when: (fittings) =>
        !pumpIs("liquid-ring")(fittings) && !fittings.some((fitting) => fitting.kind === "flush-kit"),
      steps: true,
    }),
  ],
};
