import type { CheckText } from "../../../trade/sheet/sheet-text";

const tires = {
  label: "Tires, wheels, nuts",
  good: "Aired up, no cut, tread left; nuts all there and tight, no rust trail, hubs dry",
  problems: {
    flat: "flat, or leak heard",
    cut: "cut, bulge, or cord showing",
    worn: "tread worn out",
    low: "low",
    "stone-between": "stone or rubbing between duals",
    nut: "nut loose or missing",
    "wheel-cracked": "wheel or rim cracked",
    "hub-leaks": "hub leaks oil",
  },
} as const;

const lampProblems = {
  head: "headlamp out",
  turn: "turn signal out",
  marker: "marker lamp out",
  lens: "lens broken",
  reflector: "reflector missing",
} as const;

const brakeHoses = {
  label: "Brakes and springs underneath",
  good: "Lines clear of everything and dry, chambers tight, springs whole",
  problems: {
    "hose-chafed": "brake hose chafed, kinked or swollen",
    leaks: "air or fluid leak",
    "chamber-or-drum": "chamber, rod, drum or disc damaged",
    "spring-broken": "spring, bolt or hanger broken",
  },
} as const;

const stowage = {
  label: "Hoses, trays, boxes",
  good: "Hoses sound, plugged and strapped; trays latched; boxes shut and locked",
  problems: {
    loose: "hose, tool or tray not held",
    latch: "latch or lock broken",
    "hose-damaged": "hose cracked, soft or kinked",
    "hose-short": "a hose is missing",
    "gasket-dry": "coupling gasket dry or cut",
  },
} as const;

export const sides = {
  "curb-side.tires": tires,
  "curb-side.lamps": {
    label: ({ towed }) => (towed ? "Lamps, curb side" : "Lamps, front and curb side"),
    good: ({ towed }) =>
      towed
        ? "Markers, turn signal and reflectors clean and lit"
        : "Headlamps, markers, turn signals, reflectors: clean and lit",
    problems: lampProblems,
  },
  "curb-side.brake-hoses": brakeHoses,
  "curb-side.stowage": stowage,
  "curb-side.tread": {
    label: "Tread, lowest tire",
    good: "2/32 in or more in a major groove, never on a bar or hump",
    problems: { worn: "under 2/32 in", uneven: "worn unevenly" },
  },
  "driver-side.tires": tires,
  "driver-side.lamps": {
    label: "Lamps, driver side",
    good: "Markers, turn signals, reflectors: clean and lit",
    problems: lampProblems,
  },
  "driver-side.brake-hoses": brakeHoses,
  "driver-side.stowage": stowage,
  "driver-side.fuel": {
    label: "Fuel",
    good: "Enough for the run, tank tight, cap on, dry",
    problems: {
      leaks: "leaks",
      "tank-loose": "tank or strap loose",
      cap: "cap missing",
      low: "not enough for the run",
    },
  },
} as const satisfies Record<string, CheckText>;
