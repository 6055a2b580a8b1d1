import { toSi } from "../../units";
import {
  type CheckEntry,
  NO_PRESSURE,
  NO_VACUUM,
  pumpType,
  red,
  white,
  yellow,
} from "../catalogue-entry";
import { reliefReading, speedReading } from "../reading-specs";
import type { TruckParts } from "../truck-parts";

const vacuumReading = (truck: TruckParts) => reliefReading(truck, "vacuum-relief");
const pressureReading = (truck: TruckParts) => reliefReading(truck, "pressure-relief");
/** The pump is not started for a relief that has no set point, and vacuum comes first. */
const runsVacuum = (truck: TruckParts) =>
  truck.has("vacuum-relief") && vacuumReading(truck) !== null;
const runsPressure = (truck: TruckParts) => runsVacuum(truck) && pressureReading(truck) !== null;

/** The most a "no deeper" limit can allow; the reading takes its place. */
const noDeeper = (truck: TruckParts) => {
  const spec = vacuumReading(truck);
  const vacuumPa = spec?.low ?? spec?.setPoint ?? toSi(15, "inHg");
  return { kind: "vacuum-no-deeper" as const, vacuumPa };
};

const notRun = { colour: "yellow", limit: NO_VACUUM } as const;
const pressureNotRun = { colour: "yellow", limit: NO_PRESSURE } as const;

/** Engine on, at the controls. In this order: each step unlocks the next. */
export const runUp: readonly CheckEntry[] = [
  {
    key: "run-up.pto-in",
    kind: "look",
    half: "vacuum",
    from: ["pump"],
    when: runsVacuum,
    caution: "ears",
    problems: [red("noise"), red("shakes"), yellow("will-not-engage", { limit: NO_VACUUM })],
    couldNotCheck: notRun,
  },
  {
    key: "run-up.speed",
    kind: "reading",
    half: "vacuum",
    from: ["pump"],
    when: runsVacuum,
    caution: "shafts",
    problems: [
      yellow("fast", { limit: NO_VACUUM }),
      yellow("hunts", { limit: NO_VACUUM }),
      white("slow"),
    ],
    reading: speedReading,
    couldNotCheck: notRun,
  },
  {
    key: "run-up.oil-feed",
    kind: "look",
    half: "vacuum",
    from: ["pump"],
    when: (truck) => runsVacuum(truck) && pumpType(truck) !== "blower",
    caution: "hot-surfaces",
    problems: [red("no-feed"), red("one-line-still"), yellow("slow", { limit: NO_VACUUM })],
    couldNotCheck: notRun,
  },
  {
    key: "run-up.vacuum",
    kind: "reading",
    half: "vacuum",
    from: ["vacuum-relief"],
    when: (truck) => truck.has("pump") && runsVacuum(truck),
    caution: "snug-under-vacuum",
    problems: [
      red("did-not-open", { atTheTruck: "relief-settings" }),
      yellow("opens-high", { limit: NO_VACUUM, atTheTruck: "relief-settings" }),
      yellow("opens-low", { limit: noDeeper, atTheTruck: "relief-settings" }),
      yellow("weak", { limit: noDeeper }),
      yellow("falls-back", { limit: noDeeper }),
      yellow("gauge-sticks", { limit: NO_VACUUM }),
      white("not-heard", { atTheTruck: "relief-settings" }),
    ],
    reading: vacuumReading,
    couldNotCheck: notRun,
  },
  {
    key: "run-up.bled",
    kind: "look",
    half: "pressure",
    from: ["pump"],
    when: (truck) => truck.has("pressure-relief") && runsPressure(truck),
    caution: "stored-vacuum",
    problems: [red("will-not-bleed"), yellow("gauge-off-zero", { limit: NO_PRESSURE })],
    couldNotCheck: pressureNotRun,
  },
  {
    key: "run-up.pressure",
    kind: "reading",
    half: "pressure",
    from: ["pressure-relief"],
    when: (truck) => truck.has("pump") && runsPressure(truck),
    caution: "clamp-under-pressure",
    problems: [
      red("did-not-open", { atTheTruck: "relief-settings" }),
      yellow("opens-high", { limit: NO_PRESSURE, atTheTruck: "relief-settings" }),
      yellow("opens-low", { limit: NO_PRESSURE, atTheTruck: "relief-settings" }),
      yellow("weak", { limit: NO_PRESSURE }),
      yellow("not-heard", { limit: NO_PRESSURE, atTheTruck: "relief-settings" }),
      yellow("leaks", { limit: NO_PRESSURE, atTheTruck: "clamps" }),
      yellow("gauge-sticks", { limit: NO_PRESSURE }),
    ],
    reading: pressureReading,
    couldNotCheck: pressureNotRun,
  },
  {
    key: "run-up.pto-out",
    kind: "look",
    half: "vacuum",
    from: ["pump"],
    when: runsVacuum,
    caution: "stored-pressure",
    problems: [
      red("will-not-come-out"),
      red("will-not-bleed"),
      yellow("hot", { limit: NO_VACUUM }),
    ],
    couldNotCheck: { colour: "red" },
  },
];
