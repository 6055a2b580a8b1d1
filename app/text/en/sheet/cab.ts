import type { CheckText } from "../../../trade/sheet/sheet-text";

export const cab = {
  "cab.papers": {
    label: "Papers and dates",
    good: "Registration, insurance, permit and annual inspection aboard and in date",
    problems: { "out-of-date": "past its date", missing: "not aboard" },
  },
  "cab.emergency": {
    label: "Extinguisher, triangles, fuses",
    good: "Extinguisher charged and clamped, three triangles, spare fuses",
    problems: {
      "extinguisher-missing": "extinguisher missing",
      "extinguisher-charge": "extinguisher not charged",
      "extinguisher-loose": "extinguisher loose",
      triangles: "fewer than three triangles",
      fuses: "no spare fuses",
    },
  },
  "cab.ppe": {
    label: "Protective and spill gear",
    good: "Gloves, goggles, boots, ears, vest, wash water; spill kit whole where there is one",
    problems: {
      "ppe-missing": "gloves, goggles or other gear missing",
      "spill-kit-short": "spill kit used or short",
      worn: "gear worn",
    },
  },
  "cab.wipers": {
    label: "Windshield, wipers, washer",
    good: "Glass clear and whole, both wipers wipe clean, washer sprays",
    problems: {
      "wiper-out": "wiper does not work",
      blade: "blade torn or streaking",
      "washer-empty": "washer empty",
      "glass-cracked": "glass cracked",
      "glass-chipped": "glass chipped",
    },
  },
  "cab.mirrors": {
    label: "Mirrors, seat and belt",
    good: "Mirrors whole and set for you; seat locks, belt latches and has no cut",
    problems: {
      missing: "mirror missing",
      cracked: "mirror cracked",
      "will-not-stay": "mirror will not stay set",
      "belt-does-not-latch": "belt does not latch",
      "belt-cut": "belt cut or frayed",
      "seat-loose": "seat does not lock",
    },
  },
  "cab.horn": {
    label: ({ has }) => (has("air-brakes") ? "Horn, warning lamps, air" : "Horn, warning lamps"),
    good: ({ has }) =>
      has("air-brakes")
        ? "Horn loud; lamps prove, then go out; air builds to the governor's cut-out"
        : "Horn loud; lamps prove, then go out",
    problems: {
      silent: "horn silent",
      weak: "horn weak",
      "brake-lamp-on": "brake or ABS lamp stays on",
      "air-slow": "air builds slowly or not at all",
      "engine-stop-lamp": "engine stop lamp on",
      "engine-lamp": "engine lamp stays on",
      "lamp-dead": "a warning lamp does not prove",
    },
  },
  "cab.parking-brake": {
    label: "Parking brake",
    good: "Holds against a light pull in low gear; releases fully",
    problems: { "does-not-hold": "does not hold", "does-not-release": "does not release" },
  },
  "cab.applied-leak-down": {
    label: "Air lost, brakes applied",
    good: "Engine off, pedal held one minute after the first drop: 3 psi at most",
    problems: {
      over: "loses more than 3 psi in a minute",
      heard: "leak heard",
      "gauge-dead": "air gauge does not work",
    },
    steps: [
      "Chocks in. Full air, engine off, parking brake released.",
      "Press and hold the pedal. Let the gauge settle after the first drop.",
      "Hold for one minute by the clock. Enter what was lost.",
    ],
  },
  "cab.brake-pedal": {
    label: "Brake pedal",
    good: "Firm and high, holds for a minute without sinking",
    problems: { sinks: "sinks under the foot", low: "low", spongy: "spongy" },
  },
  "cab.pump-hours": {
    label: "Pump hours",
    good: "As the meter shows, with the tenth",
    problems: { "meter-dead": "meter does not run" },
  },
  "cab.odometer": {
    label: "Odometer",
    good: "As it shows, whole miles",
    problems: { "meter-dead": "odometer does not run" },
  },
  "cab.steer-tread": {
    label: "Tread, lowest steer tire",
    good: "4/32 in or more in a major groove, never on a bar or hump",
    problems: { worn: "under 4/32 in", uneven: "worn unevenly" },
  },
  "cab.tread": {
    label: "Tread, lowest other tire",
    good: "2/32 in or more in a major groove, never on a bar or hump",
    problems: { worn: "under 2/32 in", uneven: "worn unevenly" },
  },
  "cab.steer-pressure": {
    label: "Pressure, lowest steer tire",
    good: ({ low, unit }) => `Cold, by gauge${low === null ? "" : `: ${low} ${unit} or more`}`,
    problems: { low: "low", high: "high" },
  },
  "cab.tire-pressure": {
    label: "Pressure, lowest other tire",
    good: ({ low, unit }) => `Cold, by gauge${low === null ? "" : `: ${low} ${unit} or more`}`,
    problems: { low: "low", high: "high" },
  },
  "cab.tires-by-gauge": {
    label: "Tire pressures by gauge",
    good: "Every tire, inner duals too, cold, at the pressure on its card",
    problems: { flat: "flat or leaking", low: "low" },
  },
  "cab.released-leak-down": {
    label: "Air lost, brakes released",
    good: "Engine off, pedal up, one minute: under 2 psi",
    problems: { over: "loses 2 psi or more in a minute" },
    steps: [
      "Chocks in. Full air, engine off, parking brake released.",
      "Wait one minute by the clock. Enter what was lost.",
    ],
  },
  "cab.low-air-warning": {
    label: "Low-air warning comes on at",
    good: "60 psi or above, lamp and buzzer",
    problems: { late: "comes on below 60 psi", silent: "does not come on" },
    steps: ["Chocks in. Engine off, key on.", "Pump the pedal down slowly. Enter the pressure."],
  },
  "cab.spring-brake": {
    label: "Spring brake pops out at",
    good: "Between 20 and 45 psi, by itself",
    problems: {
      late: "pops below 20 psi",
      early: "pops above 45 psi",
      "did-not-pop": "does not pop out",
    },
    steps: ["Chocks in. Go on pumping the pedal down.", "Enter the pressure when the knob pops."],
  },
} as const satisfies Record<string, CheckText>;
