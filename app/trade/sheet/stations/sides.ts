import { type CheckEntry, hoseLeft, red, white, yellow } from "../catalogue-entry";
import { plainReading } from "../reading-specs";
import type { TruckParts } from "../truck-parts";

const hasHose = (truck: TruckParts) => truck.has("hose");

/** Engine on, lights on: what both sides of a truck have. */
function side(station: "curb-side" | "driver-side"): CheckEntry[] {
  // The way from the cab to the curb side leads round the front.
  const front = (truck: TruckParts) => station === "curb-side" && truck.kind === "powered";
  return [
    {
      key: `${station}.tires`,
      kind: "look",
      part: "tires",
      walks: ["before", "takeover"],
      problems: [
        red("flat"),
        red("cut"),
        red("worn"),
        yellow("low", { driverFix: true }),
        yellow("stone-between"),
        red("nut", { part: "wheels", atTheTruck: "wheels" }),
        red("wheel-cracked", { part: "wheels", atTheTruck: "wheels" }),
        red("hub-leaks", { part: "wheels", atTheTruck: "wheels" }),
      ],
    },
    {
      key: `${station}.lamps`,
      kind: "look",
      part: "lighting",
      walks: ["before", "takeover"],
      problems: [
        red("head", { driverFix: true, when: front }),
        red("turn", { driverFix: true }),
        yellow("marker", { driverFix: true }),
        yellow("lens"),
        yellow("reflector"),
      ],
    },
    {
      key: `${station}.brake-hoses`,
      kind: "look",
      part: "service-brakes",
      problems: [
        red("hose-chafed", { atTheTruck: "brakes" }),
        red("leaks", { atTheTruck: "brakes" }),
        red("chamber-or-drum", { atTheTruck: "brakes" }),
        red("spring-broken", { atTheTruck: "suspension" }),
      ],
    },
    {
      key: `${station}.stowage`,
      kind: "look",
      from: ["hose-tray", "toolbox", "hose"],
      problems: [
        red("loose"),
        red("latch", { driverFix: true }),
        yellow("hose-damaged", { limit: hoseLeft, when: hasHose }),
        yellow("hose-short", { limit: hoseLeft, when: hasHose }),
        white("gasket-dry", { when: hasHose }),
      ],
    },
  ];
}

export const curbSide: readonly CheckEntry[] = [
  ...side("curb-side"),
  {
    // A towed unit has no cab station to do it at. 49 CFR 393.75(c): 2/32 in.
    key: "curb-side.tread",
    kind: "reading",
    cadence: "weekly",
    part: "tires",
    when: (truck) => truck.kind === "towed",
    problems: [red("worn"), yellow("uneven")],
    reading: () =>
      plainReading("tread", "in/32", { scaleHigh: 40, step: 1, low: 2, below: "worn" }),
  },
];

export const driverSide: readonly CheckEntry[] = [
  ...side("driver-side"),
  {
    key: "driver-side.fuel",
    kind: "look",
    when: (truck) => truck.kind === "powered",
    problems: [
      red("leaks"),
      red("tank-loose"),
      red("cap", { driverFix: true }),
      white("low", { driverFix: true }),
    ],
  },
];
