import type { CheckText } from "../../../trade/sheet/sheet-text";

export const hood = {
  "hood.engine-oil": {
    label: "Engine oil",
    good: "Between the marks, oil-colored, cap on",
    problems: {
      low: "below the low mark",
      empty: "nothing on the stick",
      milky: "milky",
      over: "over the full mark",
    },
  },
  "hood.coolant": {
    label: "Coolant, belts, hoses",
    good: "Between the marks, cap on (never open it hot); belts tight, hoses dry, no bare wire",
    problems: {
      low: "coolant below the low mark",
      empty: "no coolant to be seen",
      "oil-in-it": "oil in the coolant",
      over: "coolant over the full mark",
      "belt-gone": "belt broken or off",
      "belt-frayed": "belt frayed or slack",
      "hose-soft": "hose soft, swollen or weeping",
      "wire-bare": "bare or burnt wire",
    },
  },
  "hood.steering": {
    label: "Steering parts",
    good: "Box, shaft and joints tight and pinned; fluid up, no leak; wheel without play",
    problems: {
      play: "too much play at the wheel",
      "loose-joint": "loose joint, pin or bolt",
      "fluid-leak": "steering fluid leaking",
      "fluid-low": "steering fluid low",
    },
  },
  "hood.brake-fluid": {
    label: "Brake fluid",
    good: "Between the marks, cap on, no wet lines",
    problems: {
      low: "below the low mark",
      empty: "none to be seen",
      over: "over the full mark",
    },
  },
} as const satisfies Record<string, CheckText>;
