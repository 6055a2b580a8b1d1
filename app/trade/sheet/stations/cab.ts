import { type CheckEntry, NO_VACUUM, red, white, yellow } from "../catalogue-entry";
import { plainReading, tireReading } from "../reading-specs";
import type { TruckParts } from "../truck-parts";

const airBrakes = (truck: TruckParts) => truck.has("air-brakes");

/** Engine off, then on, off for a minute, on again. Powered trucks only. */
export const cab: readonly CheckEntry[] = [
  {
    key: "cab.papers",
    kind: "look",
    problems: [red("out-of-date"), yellow("missing", { remote: true })],
  },
  {
    key: "cab.emergency",
    kind: "look",
    part: "emergency-equipment",
    walks: ["before", "takeover"],
    problems: [
      red("extinguisher-missing"),
      red("extinguisher-charge"),
      yellow("extinguisher-loose"),
      red("triangles", { driverFix: true }),
      yellow("fuses", { driverFix: true }),
    ],
  },
  {
    key: "cab.ppe",
    kind: "look",
    problems: [
      yellow("ppe-missing", { limit: NO_VACUUM }),
      yellow("spill-kit-short", {
        limit: { kind: "no-hazmat" },
        when: (truck) => truck.has("spill-kit"),
      }),
      white("worn"),
    ],
  },
  {
    key: "cab.wipers",
    kind: "look",
    part: "wipers",
    walks: ["before", "takeover"],
    problems: [
      red("wiper-out", { driverFix: true }),
      yellow("blade", { driverFix: true }),
      yellow("washer-empty", { driverFix: true }),
      red("glass-cracked", { atTheTruck: "cracked-glass" }),
      white("glass-chipped"),
    ],
  },
  {
    key: "cab.mirrors",
    kind: "look",
    part: "mirrors",
    walks: ["before", "takeover"],
    problems: [
      red("missing"),
      red("cracked", { atTheTruck: "cracked-glass" }),
      yellow("will-not-stay"),
      red("belt-does-not-latch"),
      red("belt-cut"),
      yellow("seat-loose"),
    ],
  },
  {
    key: "cab.horn",
    kind: "look",
    part: "horn",
    walks: ["before", "takeover"],
    problems: [
      red("silent"),
      yellow("weak"),
      red("brake-lamp-on", { part: "service-brakes", atTheTruck: "brakes" }),
      red("air-slow", { part: "service-brakes", atTheTruck: "brakes", when: airBrakes }),
      red("engine-stop-lamp"),
      yellow("engine-lamp"),
      yellow("lamp-dead"),
    ],
  },
  {
    key: "cab.parking-brake",
    kind: "look",
    part: "parking-brake",
    caution: "chocks",
    walks: ["before", "takeover"],
    problems: [
      red("does-not-hold", { atTheTruck: "brakes" }),
      red("does-not-release", { atTheTruck: "brakes" }),
    ],
  },
  {
    // CDL manual 5.3: engine off, brakes applied, 3 psi in a minute at most for a single vehicle.
    key: "cab.applied-leak-down",
    kind: "timed",
    part: "service-brakes",
    when: airBrakes,
    caution: "chocks",
    problems: [
      red("over", { atTheTruck: "brakes" }),
      red("heard", { atTheTruck: "brakes" }),
      red("gauge-dead", { atTheTruck: "brakes" }),
    ],
    reading: () =>
      plainReading("pressure", "psi", {
        scaleHigh: 60,
        step: 0.5,
        high: 3,
        seconds: 60,
        above: "over",
      }),
  },
  {
    key: "cab.brake-pedal",
    kind: "look",
    part: "service-brakes",
    when: (truck) => !airBrakes(truck),
    caution: "chocks",
    problems: [
      red("sinks", { atTheTruck: "brakes" }),
      red("low", { atTheTruck: "brakes" }),
      red("spongy", { atTheTruck: "brakes" }),
    ],
  },
  {
    key: "cab.pump-hours",
    kind: "reading",
    from: ["pump"],
    walks: ["before", "after", "takeover"],
    problems: [white("meter-dead")],
    reading: () => plainReading("pump-hours", "h", { scaleHigh: 200_000, step: 0.1 }),
  },
  {
    key: "cab.odometer",
    kind: "reading",
    walks: ["before", "after", "takeover"],
    problems: [white("meter-dead")],
    reading: () => plainReading("odometer", "mi", { scaleHigh: 3_000_000, step: 1 }),
  },
  {
    // 49 CFR 393.75(b): 4/32 in on the steer axle.
    key: "cab.steer-tread",
    kind: "reading",
    cadence: "weekly",
    part: "tires",
    problems: [red("worn"), yellow("uneven")],
    reading: () =>
      plainReading("tread", "in/32", { scaleHigh: 40, step: 1, low: 4, below: "worn" }),
  },
  {
    // 49 CFR 393.75(c): 2/32 in on every other tire.
    key: "cab.tread",
    kind: "reading",
    cadence: "weekly",
    part: "tires",
    problems: [red("worn"), yellow("uneven")],
    reading: () =>
      plainReading("tread", "in/32", { scaleHigh: 40, step: 1, low: 2, below: "worn" }),
  },
  {
    key: "cab.steer-pressure",
    kind: "reading",
    cadence: "weekly",
    part: "tires",
    problems: [yellow("low", { driverFix: true }), yellow("high", { driverFix: true })],
    reading: (truck) => tireReading(truck, "tire-pressure-steer"),
  },
  {
    key: "cab.tire-pressure",
    kind: "reading",
    cadence: "weekly",
    part: "tires",
    problems: [yellow("low", { driverFix: true }), yellow("high", { driverFix: true })],
    reading: (truck) => tireReading(truck, "tire-pressure"),
  },
  {
    key: "cab.tires-by-gauge",
    kind: "look",
    cadence: "weekly",
    part: "tires",
    when: (truck) => truck.setPoint("tire-pressure") === null,
    problems: [red("flat"), yellow("low", { driverFix: true })],
  },
  {
    // CDL manual 5.3: brakes released, under 2 psi in a minute for a single vehicle.
    key: "cab.released-leak-down",
    kind: "timed",
    cadence: "weekly",
    part: "service-brakes",
    when: airBrakes,
    caution: "chocks",
    problems: [red("over", { atTheTruck: "brakes" })],
    reading: () =>
      plainReading("pressure", "psi", {
        scaleHigh: 60,
        step: 0.5,
        high: 2,
        highExcluded: true,
        seconds: 60,
        above: "over",
      }),
  },
  {
    // CDL manual 5.3: the warning acts before 60 psi.
    key: "cab.low-air-warning",
    kind: "reading",
    cadence: "weekly",
    part: "service-brakes",
    when: airBrakes,
    caution: "chocks",
    problems: [red("late", { atTheTruck: "brakes" }), red("silent", { atTheTruck: "brakes" })],
    reading: () =>
      plainReading("pressure", "psi", { scaleHigh: 150, step: 1, low: 60, below: "late" }),
  },
  {
    // CDL manual 5.3: the valve pops between 20 and 45 psi.
    key: "cab.spring-brake",
    kind: "reading",
    cadence: "weekly",
    part: "parking-brake",
    when: airBrakes,
    caution: "chocks",
    problems: [
      red("late", { atTheTruck: "brakes" }),
      red("early", { atTheTruck: "brakes" }),
      red("did-not-pop", { atTheTruck: "brakes" }),
    ],
    reading: () =>
      plainReading("pressure", "psi", {
        scaleHigh: 150,
        step: 1,
        low: 20,
        high: 45,
        below: "late",
        above: "early",
      }),
  },
];
