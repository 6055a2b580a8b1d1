import type { CheckText } from "../../../trade/sheet/sheet-text";

const lining = {
  "lining-in-the-way": "lining loose in the air path",
  "lining-loose": "lining loose or flaking",
  swollen: "lining swollen",
  clamp: "clamp or barb bad",
} as const;

const liningSteps = [
  "One end off. Outside sound means nothing: look in with a lamp and feel with a finger.",
  "Loose, flaking or swollen lining: change the hose. Black rubber in the pre-filter is this.",
  "Clamps back on the barb, not past it.",
] as const;

const liningGood = "Lining smooth and tight all the way; clamps sound";

export const shop = {
  "shop.primary-ball": {
    label: "Primary shutoff: cage, ball, stop",
    good: "Cage straight, float ball whole and free, its stop in place",
    problems: {
      "ball-missing": "float ball missing",
      "ball-holed": "float ball holed or heavy",
      "stop-bent": "ball stop bent or gone",
      "cage-bent": "cage bent",
    },
    steps: [
      "Tank empty, vented, washed. Work from outside; entry needs a permit.",
      "Cage off. Shake the ball: water inside means it will not float.",
      "See that the stop keeps the ball in the cage and lets it fall free.",
    ],
  },
  "shop.primary-seat": {
    label: "Primary shutoff: seat and gasket",
    good: "Seat clean and whole, gasket groove shallow, no ring of build-up",
    problems: {
      "seat-torn": "seat torn",
      "gasket-groove": "deep groove in the gasket",
      "build-up-ring": "ring of build-up",
    },
    steps: [
      "Wipe the seat. A ring of build-up holds the ball up and shuts off early: scrape it off.",
      "Run a nail round the gasket. A deep groove leaks: change it.",
      "Ball up by hand: it seats all round, and falls by itself.",
    ],
  },
  "shop.primary-fasteners": {
    label: "Primary shutoff: fasteners",
    good: "Every one there, changed as a kit",
    problems: { missing: "missing or broken", worn: "rusted or worn" },
  },
  "shop.secondary": {
    label: "Secondary trap: ball, seat, gasket",
    good: "Ball whole, seat and gasket good; washed with its drain open and plenty came out",
    problems: {
      "ball-missing": "float ball missing",
      seat: "seat torn or dirty",
      gasket: "gasket hard or cut",
      "drain-slow": "little comes out of the open drain",
    },
    steps: [
      "Lid off, ball out: whole, light, clean.",
      "Seat and gasket wiped and looked at.",
      "Wash the trap with its drain open. Plenty should come out; a trickle is a blocked drain.",
      "Lid on; snug again under vacuum at the next run-up.",
    ],
  },
  "shop.hose-separator": {
    label: "Air hose, pump to oil separator, inside",
    good: liningGood,
    problems: lining,
    steps: liningSteps,
  },
  "shop.hose-pump-inlet": {
    label: ({ has }) =>
      has("pre-filter")
        ? "Air hose, pump inlet to pre-filter, inside"
        : "Air hose, pump inlet to trap, inside",
    good: liningGood,
    problems: lining,
    steps: liningSteps,
  },
  "shop.hose-trap": {
    label: "Air hose, pre-filter to trap, inside",
    good: liningGood,
    problems: lining,
    steps: liningSteps,
  },
  "shop.deodorizer-can": {
    label: "Deodorizer can, emptied",
    good: "Emptied, rinsed, no sludge or rust; tube clear; about a quart put back",
    problems: {
      blocked: "tube or can blocked",
      rusted: "rusting through",
      gasket: "lid gasket bad",
    },
    steps: [
      "Drain it into the waste can. Rinse until clear.",
      "Blow through the tube: it must be open.",
      "About a quart back in, to the mark. Lid on.",
    ],
  },
  "shop.gauge": {
    label: "Gauge against a check gauge",
    good: "Reads with the check gauge at zero, at vacuum relief and at pressure relief",
    problems: {
      sticks: "sticks",
      "vacuum-off": "off on the vacuum side",
      "pressure-off": "off on the pressure side",
    },
  },
  "shop.brakes": {
    label: "Brake lining and stroke",
    good: "Lining above its limit; stroke under its limit at full application; chambers alike on each axle",
    problems: {
      lining: "lining at or under its limit",
      stroke: "stroke over its limit",
      "drum-or-disc": "drum or disc cracked or worn",
      "chambers-differ": "chambers or adjusters differ on an axle",
    },
  },
} as const satisfies Record<string, CheckText>;
