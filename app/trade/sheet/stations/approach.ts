import { type CheckEntry, NO_VACUUM, red, white, yellow } from "../catalogue-entry";
import { plainReading } from "../reading-specs";
import type { TruckParts } from "../truck-parts";

const powered = (truck: TruckParts) => truck.kind === "powered";
const towed = (truck: TruckParts) => truck.kind === "towed";

/** Engine off, chocked: what can be seen walking up to the truck. */
export const approach: readonly CheckEntry[] = [
  {
    key: "approach.stance",
    kind: "look",
    roadSafety: true,
    walks: ["before", "takeover"],
    problems: [
      red("leans", { atTheTruck: "suspension" }),
      red("spring-or-air-bag", { atTheTruck: "suspension" }),
      red("frame", { atTheTruck: "frame" }),
      red("part-hanging"),
      white("dent"),
    ],
  },
  {
    key: "approach.leaks",
    kind: "look",
    walks: ["before", "takeover"],
    problems: [
      red("fuel", { when: powered }),
      red("brake-fluid", {
        part: "service-brakes",
        atTheTruck: "brakes",
        when: (truck) => truck.has("hydraulic-brakes"),
      }),
      red("load"),
      red("oil-runs"),
      yellow("coolant", { when: powered }),
      white("oil-drips"),
    ],
    // Snow or a wet yard hides the ground; the parts themselves are looked at further on.
    couldNotCheck: { colour: "yellow", lowest: "white" },
  },
  {
    key: "approach.coupling",
    kind: "look",
    part: "coupling",
    caution: "chocks",
    when: towed,
    walks: ["before", "takeover"],
    problems: [
      red("worn-or-cracked", { atTheTruck: "coupling" }),
      red("pin-or-latch", { atTheTruck: "coupling" }),
      red("chain", { atTheTruck: "coupling" }),
      red("breakaway", { part: "service-brakes", atTheTruck: "brakes" }),
      red("air-line", { part: "service-brakes", atTheTruck: "brakes" }),
      yellow("light-cord", { part: "lighting" }),
      yellow("landing-gear", { atTheTruck: "coupling" }),
    ],
  },
  {
    key: "approach.parking-brake",
    kind: "look",
    part: "parking-brake",
    when: towed,
    caution: "chocks",
    walks: ["before", "takeover"],
    problems: [
      red("does-not-hold", { atTheTruck: "brakes" }),
      red("does-not-release", { atTheTruck: "brakes" }),
      yellow("chocks-missing"),
    ],
  },
  {
    key: "approach.load-aboard",
    kind: "reading",
    from: ["tank"],
    walks: ["before", "after", "takeover"],
    problems: [yellow("load-unknown", { limit: { kind: "no-hazmat" } })],
    reading: (truck) =>
      plainReading("volume", "gal", {
        scaleHigh: truck.first("tank")?.attributes.volumeL ?? 40_000,
        scaleUnit: "L",
        step: 1,
      }),
  },
  {
    // The report at the end of the day's work: every part of 49 CFR 396.11(a)(1) is asked by name.
    key: "approach.wrong-today",
    kind: "look",
    roadSafety: true,
    walks: ["after"],
    problems: [
      red("service-brakes", { part: "service-brakes", atTheTruck: "brakes" }),
      red("parking-brake", { part: "parking-brake", atTheTruck: "brakes" }),
      red("steering", { part: "steering", atTheTruck: "steering", when: powered }),
      red("tires", { part: "tires" }),
      red("wheels", { part: "wheels", atTheTruck: "wheels" }),
      red("coupling", { part: "coupling", atTheTruck: "coupling" }),
      yellow("lighting", { part: "lighting" }),
      yellow("horn", { part: "horn", when: powered }),
      yellow("wipers", { part: "wipers", when: powered }),
      yellow("mirrors", { part: "mirrors", when: powered }),
      yellow("emergency-equipment", { part: "emergency-equipment", when: powered }),
      red("collision"),
      yellow("engine", { when: powered }),
      yellow("pump", { limit: NO_VACUUM, when: (truck) => truck.has("pump") }),
      yellow("tank"),
      white("other"),
    ],
  },
];
