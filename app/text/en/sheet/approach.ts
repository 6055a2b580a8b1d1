import type { CheckText } from "../../../trade/sheet/sheet-text";

export const approach = {
  "approach.stance": {
    label: "Stance and damage",
    good: "Sits level; no broken spring, no crack in the frame, nothing hanging",
    problems: {
      leans: "leans to one side",
      "spring-or-air-bag": "broken spring or flat air bag",
      frame: "frame cracked, bent or sagging",
      "part-hanging": "part hanging or about to fall",
      dent: "new dent or scrape",
    },
  },
  "approach.leaks": {
    label: "Ground underneath",
    good: "Dry; nothing fresh since it was parked",
    problems: {
      fuel: "fuel on the ground",
      "brake-fluid": "brake fluid on the ground",
      load: "load leaking from tank, valve or hose",
      "oil-runs": "oil running, not dripping",
      coolant: "coolant on the ground",
      "oil-drips": "oil drips",
    },
  },
  "approach.coupling": {
    label: "Coupling and lines",
    good: "Eye or pin sound and locked; chains, breakaway, air lines and cord sound",
    problems: {
      "worn-or-cracked": "eye, pin or plate worn or cracked",
      "pin-or-latch": "pin or latch will not lock",
      chain: "safety chain or hook damaged",
      breakaway: "breakaway does not work",
      "air-line": "brake air line leaks or is chafed",
      "light-cord": "light cord or plug damaged",
      "landing-gear": "landing gear or jack does not hold",
    },
  },
  "approach.parking-brake": {
    label: "Parking brake",
    good: "Set and holding; chocks in place and aboard",
    problems: {
      "does-not-hold": "does not hold",
      "does-not-release": "does not release",
      "chocks-missing": "chocks missing",
    },
  },
  "approach.load-aboard": {
    label: "Load aboard",
    good: ({ has }) =>
      has("pump")
        ? "Read it off the glasses. Empty is 0; loaded, the run-up waits until first empty"
        : "Read it off the glasses. Empty is 0",
    problems: { "load-unknown": "nobody can say what is in it" },
  },
  "approach.wrong-today": {
    label: "Anything wrong today",
    good: "Nothing found or told to you today that makes it unsafe or could break it down",
    problems: {
      "service-brakes": "service brakes",
      "parking-brake": "parking brake",
      steering: "steering",
      tires: "tires",
      wheels: "wheels, rims or nuts",
      coupling: "coupling",
      lighting: "lamps or reflectors",
      horn: "horn",
      wipers: "wipers",
      mirrors: "mirrors",
      "emergency-equipment": "extinguisher, triangles or fuses",
      collision: "hit something, or was hit",
      engine: "engine or gearbox",
      pump: "pump or its drive",
      tank: "tank, valves, hoses or fittings",
      other: "something else",
    },
  },
} as const satisfies Record<string, CheckText>;
