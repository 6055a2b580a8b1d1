import {
  type CheckEntry,
  fillShare,
  NO_PRESSURE,
  NO_VACUUM,
  red,
  white,
  yellow,
} from "../catalogue-entry";

const monthly = { cadence: "monthly", who: "shop" } as const;

/** An air hose is looked at from inside: its lining fails while the outside still feels sound. */
const lining = [
  red("lining-in-the-way"),
  yellow("lining-loose", { limit: NO_VACUUM }),
  yellow("swollen", { limit: NO_VACUUM }),
  yellow("clamp", { limit: NO_VACUUM }),
];

/** At the bench, engine off, tank vented and locked off. */
export const shop: readonly CheckEntry[] = [
  {
    ...monthly,
    key: "shop.primary-ball",
    kind: "look",
    from: ["primary-shutoff"],
    caution: "tank-air",
    problems: [
      red("ball-missing"),
      red("ball-holed"),
      red("stop-bent"),
      yellow("cage-bent", { limit: fillShare(0.75) }),
    ],
  },
  {
    ...monthly,
    key: "shop.primary-seat",
    kind: "look",
    from: ["primary-shutoff"],
    caution: "tank-air",
    problems: [
      red("seat-torn"),
      yellow("gasket-groove", { limit: fillShare(0.75) }),
      yellow("build-up-ring", { limit: fillShare(0.75) }),
    ],
  },
  {
    ...monthly,
    key: "shop.primary-fasteners",
    kind: "look",
    from: ["primary-shutoff"],
    caution: "tank-air",
    problems: [red("missing"), yellow("worn", { limit: fillShare(0.75) })],
  },
  {
    ...monthly,
    key: "shop.secondary",
    kind: "look",
    from: ["secondary-trap"],
    caution: "stored-vacuum",
    problems: [
      red("ball-missing"),
      yellow("seat", { limit: NO_VACUUM }),
      yellow("gasket", { limit: NO_VACUUM }),
      yellow("drain-slow", { limit: NO_VACUUM }),
    ],
  },
  // Air hoses in the order they fail.
  {
    ...monthly,
    key: "shop.hose-separator",
    kind: "look",
    from: ["oil-catch"],
    caution: "hot-surfaces",
    problems: lining,
  },
  {
    ...monthly,
    key: "shop.hose-pump-inlet",
    kind: "look",
    from: ["pump"],
    caution: "stored-vacuum",
    problems: lining,
  },
  {
    ...monthly,
    key: "shop.hose-trap",
    kind: "look",
    from: ["secondary-trap"],
    when: (truck) => truck.has("pre-filter"),
    caution: "stored-vacuum",
    problems: lining,
  },
  {
    ...monthly,
    key: "shop.deodorizer-can",
    kind: "look",
    from: ["deodorizer-can"],
    caution: "upwind",
    problems: [yellow("blocked", { limit: NO_VACUUM }), white("rusted"), white("gasket")],
  },
  {
    ...monthly,
    key: "shop.gauge",
    kind: "look",
    from: ["compound-gauge"],
    caution: "at-the-controls",
    problems: [
      red("sticks"),
      yellow("vacuum-off", { limit: NO_VACUUM }),
      yellow("pressure-off", { limit: NO_PRESSURE }),
    ],
  },
  {
    ...monthly,
    key: "shop.brakes",
    kind: "look",
    part: "service-brakes",
    caution: "chocks",
    problems: [
      red("lining", { atTheTruck: "brakes" }),
      red("stroke", { atTheTruck: "brakes" }),
      red("drum-or-disc", { atTheTruck: "brakes" }),
      red("chambers-differ", { atTheTruck: "brakes" }),
    ],
  },
];
