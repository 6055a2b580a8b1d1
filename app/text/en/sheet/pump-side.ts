import type { CheckText, TextFacts } from "../../../trade/sheet/sheet-text";

const drainSteps = (facts: TextFacts): string[] => [
  "Tank vented, gauge on zero. Can under the drain.",
  "Crack it open and watch until it stops. Dry is an answer; frozen is not.",
  "Judge how much and what: clean oil, milky oil, water, or load.",
  ...(facts.winter
    ? ["Frozen: thaw it with warm water or in the shop. A frozen drain is not an empty one."]
    : []),
  "Shut it, and see that no drop follows.",
];

const drainAlways = {
  "not-cracked": "drain not opened",
  frozen: "drain frozen",
  "will-not-shut": "drain will not shut",
};

const PUMP_OIL = {
  label: "Pump oil",
  good: "In the glass between the marks, clear, the right oil; a spare gallon aboard",
};
const PUMP_FLUID: Record<string, { label: string; good: string }> = {
  "liquid-ring": {
    label: "Seal liquid",
    good: "Separator at its level, liquid clear, no ice",
  },
  blower: {
    label: "Blower oil, both ends",
    good: "Both glasses at the mark, oil clear, the right oil; a spare gallon aboard",
  },
};
const pumpFluid = ({ type }: TextFacts) => PUMP_FLUID[type ?? ""] ?? PUMP_OIL;

const flushSteps = [
  "At the end of the day: pump warm, tank vented. No flame, no smoking, nothing hot near.",
  "Let the pump draw the flush in slowly through its port, a little at a time.",
  "Run it a minute or two; catch what comes out behind the pump.",
  "Look at it: dark is a day's work, milky is water, load means the traps let it through.",
  "Drain, shut, and let it take fresh oil before you stop it.",
];

const flushProblems = {
  "came-out-with-load": "load came out",
  "came-out-milky": "came out milky",
  "not-done": "not flushed",
};

export const pumpSide = {
  "pump-side.at-rest": {
    label: "Pump at rest",
    good: ({ has }) =>
      has("changeover-valve")
        ? "PTO out, valve at neutral and moves freely, tank vented, gauge on zero"
        : "PTO out, tank vented, gauge on zero",
    problems: {
      "pto-will-not-come-out": "PTO will not come out",
      "will-not-vent": "tank will not vent",
      "valve-stuck": "changeover valve stuck",
      "valve-stiff": "changeover valve stiff",
      "valve-lock": "changeover valve lock does not hold",
      "gauge-off-zero": "gauge does not come back to zero",
    },
  },
  "pump-side.oil-level": {
    label: (facts) => pumpFluid(facts).label,
    good: (facts) => pumpFluid(facts).good,
    problems: {
      low: "below the low mark",
      empty: "nothing in the glass",
      milky: "milky",
      "wrong-oil": "wrong oil put in",
      over: "over the full mark",
      "no-spare": "no spare oil aboard",
    },
  },
  "pump-side.trap-drain": {
    label: ({ nth }) => `Drain the secondary trap (scrubber)${nth ? ` ${nth}` : ""}`,
    good: "Cracked it and saw it run out or dry: a cup of water at most. Shut again",
    problems: {
      "sewage-much": "a gallon or more of load",
      sewage: "load in the trap",
      "water-much": "more than a gallon of water",
      "water-some": "a gallon of water",
      "milky-oil": "milky oil",
      oil: "oil in the trap",
      ...drainAlways,
    },
    steps: drainSteps,
  },
  "pump-side.catch-drain": {
    label: ({ nth }) => `Drain the oil catch${nth ? ` ${nth}` : ""}`,
    good: "Cracked it and saw it run out or dry: used oil only, into the waste can. Shut again",
    problems: {
      sewage: "load has been through the pump",
      "milky-oil": "milky oil",
      water: "water",
      "oil-some": "a gallon of oil",
      "oil-much": "more than a gallon of oil",
      ...drainAlways,
    },
    steps: drainSteps,
  },
  "pump-side.can": {
    label: "Deodorizer can and outlet",
    good: "Can filled to its mark, about a quart; lid tight; outlet clear, no oil round it",
    problems: {
      low: "below the mark",
      empty: "empty",
      over: "over the mark",
      "lid-leaks": "lid or gasket leaks",
      "outlet-blocked": "outlet blocked",
      "outlet-oily": "oil at the outlet",
    },
    steps: [
      "Stand upwind. Pump stopped, tank vented.",
      "Lid off, look for sludge and rust, fill to the mark. Too much is blown out as spray.",
      "Wipe the gasket, lid on, snug by hand and a quarter turn.",
    ],
  },
  "pump-side.outlet": {
    label: "Air outlet",
    good: "Clear, tight, pointing away from people; no oil round it",
    problems: {
      "outlet-blocked": "outlet blocked",
      "outlet-oily": "oil at the outlet",
      "outlet-loose": "outlet pipe loose",
    },
  },
  "pump-side.guard": {
    label: "Drive guard",
    good: "On, tight, nothing rubbing; no metal or rubber shavings to be seen through it",
    problems: {
      off: "off",
      loose: "loose or broken",
      shavings: "metal or rubber shavings under it",
    },
  },
  "pump-side.leaks": {
    label: "Pump and drive leaks",
    good: "Dry at pump, drive and hoses; mounts tight",
    problems: {
      runs: "oil running",
      "air-hose": "air hose split, soft or loose",
      "hydraulic-hose": "hydraulic hose wet or chafed",
      "mount-loose": "mount bolt loose or missing",
      weeps: "weeps",
    },
  },
  "pump-side.reliefs": {
    label: "Relief valves undisturbed",
    good: "Lock nuts and seals as left, stems free, ports open. Never set one on a walk",
    problems: {
      "lock-disturbed": "lock nut or seal disturbed",
      stuck: "stem stuck",
      plugged: "plugged, capped or iced",
      "screen-dirty": "screen dirty",
    },
  },
  "pump-side.flush": {
    label: "Flush the pump, warm",
    good: "Flushed from the kit until it ran clean; kit shut and filled",
    problems: { ...flushProblems, "kit-broken": "flush kit does not work" },
    steps: flushSteps,
  },
  "pump-side.flush-by-hand": {
    label: "Pump flushed by hand this week",
    good: "At the end of a day, warm, with the maker's flushing oil, until it ran clean",
    problems: flushProblems,
    steps: flushSteps,
  },
  "pump-side.pre-filter": {
    label: "Pre-filter",
    good: "Screen whole and clean, bowl dry, gasket flat, lid snug; no black rubber",
    problems: {
      load: "load in the filter",
      "black-rubber": "black rubber: a hose lining is going",
      torn: "screen torn",
      "gasket-groove": "deep groove in the gasket",
      dirty: "too dirty to clean here",
    },
    steps: [
      "Pump stopped, tank vented, gauge on zero. Only then loosen the lid.",
      "Look before you wipe. Black rubber means a hose lining, though the hose feels sound outside.",
      "Wet or load in the bowl: it got past both shutoffs. Stop here and tag it.",
      "Wash the screen, hold it to the light, put it back the same way up.",
      "Gasket: a deep groove leaks. Turn it over or change it; wipe the seat.",
      "Lid on, snug evenly. Snug once more at the run-up, under vacuum.",
    ],
  },
  "pump-side.gearbox-oil": {
    label: ({ type }) => (type === "right-angle" ? "Right-angle gearbox oil" : "Gearbox oil"),
    good: ({ type }) =>
      type === "three-shaft"
        ? "To the bottom third of the shaft (about 24 fl oz in all), clear, no metal"
        : "To the level plug, clear, no metal",
    problems: {
      low: "below the level",
      empty: "none to be seen",
      metal: "metal in the oil",
      milky: "milky",
      over: "over the level",
    },
  },
  "pump-side.hydraulic-oil": {
    label: "Hydraulic oil",
    good: "In the glass between the marks, clear, breather clean",
    problems: {
      low: "below the low mark",
      empty: "nothing in the glass",
      milky: "milky or foaming",
      over: "over the full mark",
    },
  },
  "pump-side.pto-shaft": {
    label: "PTO shaft",
    good: "Joints tight and greased, every bolt in, shaft guard whole",
    problems: {
      "joint-loose": "joint loose",
      "bolt-missing": "bolt missing or loose",
      guard: "shaft guard missing or broken",
      dry: "joint dry",
    },
    steps: [
      "Engine off, key in your pocket.",
      "Twist and lift each joint by hand; look at every bolt and the slip yoke.",
      "Grease until it shows at the seals.",
    ],
  },
  "pump-side.coupling": {
    label: "Coupling, guard off",
    good: "Insert whole, key and screws tight, shafts in line; guard back on",
    problems: {
      "key-or-screw": "key or set screw loose",
      "insert-worn": "insert worn or cracked",
      "out-of-line": "shafts out of line",
    },
    steps: [
      "Lock the engine off. Guard off.",
      "Turn it by hand: look at the insert, the key, the set screws.",
      "Straightedge across both halves, top and side.",
      "Guard on and bolted before the lock comes off.",
    ],
  },
} as const satisfies Record<string, CheckText>;
