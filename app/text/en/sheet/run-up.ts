import type { CheckText, TextFacts } from "../../../trade/sheet/sheet-text";

function band({ low, high, unit }: TextFacts): string {
  if (low !== null && high !== null) return `${low} to ${high} ${unit}`;
  if (low !== null) return `${low} ${unit} or more`;
  if (high !== null) return `${high} ${unit} or less`;
  return "";
}

/** Where the yard's air cannot give the set point, the number to read is the pump's own best. */
function opens(facts: TextFacts): string {
  const { setPoint, stop, ceiling, unit } = facts;
  const at = band(facts) || `${setPoint} ${unit}`;
  if (setPoint !== null && ceiling !== null && setPoint > ceiling) {
    return `Set to ${at}; the air here gives ${ceiling}. Read the pump's best. Stop at ${stop} ${unit}`;
  }
  return `Opens at ${at}. Stop at ${stop} ${unit}`;
}

export const runUp = {
  "run-up.pto-in": {
    label: "Pump started",
    good: ({ has }) =>
      has("changeover-valve")
        ? "People clear of rear and outlet, valve at neutral, PTO in: runs smooth"
        : "People clear of rear and outlet, vent open, PTO in: runs smooth",
    problems: {
      noise: "knocks, grinds or squeals",
      shakes: "shakes",
      "will-not-engage": "PTO will not go in",
    },
    steps: ({ has }) => [
      "Look round the truck: nobody behind it, nobody at the outlet.",
      has("changeover-valve")
        ? "Valve at neutral, tank vented. PTO in at idle."
        : "Vent open, tank vented. PTO in at idle.",
      "Stay at the controls until it is out again.",
    ],
  },
  "run-up.speed": {
    label: "Pump speed",
    good: (facts) => {
      const wanted = band(facts);
      return wanted === "" ? "At the speed on the card, steady" : `Steady, ${wanted}`;
    },
    problems: { fast: "too fast", hunts: "will not hold its speed", slow: "slow" },
  },
  "run-up.oil-feed": {
    label: ({ type }) => (type === "liquid-ring" ? "Seal liquid moving" : "Oil moving"),
    good: ({ type }) =>
      type === "liquid-ring"
        ? "Liquid moving in the line and back"
        : "Oil moving in every feed line",
    problems: {
      "no-feed": "none moving: stop the pump",
      "one-line-still": "one line still: stop the pump",
      slow: "slow",
    },
  },
  "run-up.vacuum": {
    label: "Vacuum relief: gauge when steady",
    good: (facts) => opens(facts),
    problems: {
      "did-not-open": "at the stop and did not open",
      "opens-high": "opens above its band",
      "opens-low": "opens below its band",
      weak: "pump does not reach the band",
      "falls-back": "vacuum falls back",
      "gauge-sticks": "needle sticks or jumps",
      "not-heard": "not heard to open",
    },
    steps: ({ has }) => [
      has("changeover-valve")
        ? "Valve slowly to vacuum. Watch the gauge, not the clock."
        : "Shut the vent slowly. Watch the gauge, not the clock.",
      "When it is steady, read it. Did you hear the relief open? If not, it is the pump's end vacuum.",
      has("changeover-valve")
        ? "At the stop value with no relief: valve to neutral, PTO out."
        : "At the stop value with no relief: vent open, PTO out.",
      "Not over a minute at relief: the pump gets hot.",
      "Lids may be snugged now, under vacuum: guard on, people clear, lock off first.",
    ],
  },
  "run-up.bled": {
    label: "Bled to zero",
    good: "Valve at neutral, vacuum bled off, gauge on zero",
    problems: { "will-not-bleed": "does not bleed off", "gauge-off-zero": "gauge off zero" },
  },
  "run-up.pressure": {
    label: "Pressure relief: gauge when steady",
    good: (facts) => opens(facts),
    problems: {
      "did-not-open": "at the stop and did not open",
      "opens-high": "opens above its band",
      "opens-low": "opens below its band",
      weak: "pump does not reach the band",
      "not-heard": "not heard to open",
      leaks: "door, lid or hose leaks under pressure",
      "gauge-sticks": "needle sticks or jumps",
    },
    steps: [
      "Valve slowly to pressure. Nobody at the rear; no clamp is touched.",
      "When it is steady, read it. Did you hear the relief open?",
      "At the stop value with no relief: valve to neutral, PTO out.",
      "Not over a minute at relief. Then neutral, and bleed to zero.",
    ],
  },
  "run-up.pto-out": {
    label: "Pump stopped",
    good: ({ has }) =>
      has("changeover-valve")
        ? "Valve at neutral, tank bled to zero, PTO out; no smell or smoke of heat"
        : "Vent open, tank bled to zero, PTO out; no smell or smoke of heat",
    problems: {
      "will-not-come-out": "PTO will not come out",
      "will-not-bleed": "tank does not bleed to zero",
      hot: "runs hot",
    },
  },
} as const satisfies Record<string, CheckText>;
