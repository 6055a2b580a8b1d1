import fc from "fast-check";
import { expect, test } from "vitest";
import { cautions } from "~/text/en/cautions";
import { sheetText } from "~/text/en/sheet";
import { FITTING_KINDS, type Fitting } from "~/trade/fittings";
import { colourRank } from "~/trade/limits";
import type { SetPoint } from "~/trade/set-points";
import { canonicalSheet, fittingsSignature } from "~/trade/sheet/canonical-sheet";
import { CATALOGUE } from "~/trade/sheet/catalogue";
import { CAUTIONS } from "~/trade/sheet/cautions";
import { CADENCES, COULD_NOT_CHECK, NOT_FITTED, STATIONS, UNIT_KINDS } from "~/trade/sheet/check";
import { allChecks, dueChecks, roundChecks, runUpLocks } from "~/trade/sheet/due-checks";
import { makeSheet, type OwnCheck, type SheetChanges } from "~/trade/sheet/make-sheet";
import { missingParts, ROAD_SAFETY_FLOOR } from "~/trade/sheet/road-safety-floor";
import { sheetSchema } from "~/trade/sheet/sheet-schema";
import { counts } from "./readable-sheet";
import {
  FIVE_TRUCKS,
  fittings,
  grease,
  point,
  portable,
  septic,
  sheetOf,
  specification,
  towed,
} from "./trucks";

const entries = Object.values(CATALOGUE).flat();
const keysOf = (truck: Parameters<typeof sheetOf>[0]) =>
  allChecks(sheetOf(truck)).map((check) => check.key);

const anyFitting: fc.Arbitrary<Fitting> = fc.record({
  id: fc.uuid(),
  kind: fc.constantFrom(...FITTING_KINDS),
  attributes: fc.record(
    {
      type: fc.constantFrom("vane", "liquid-ring", "blower", "shaft", "hydraulic", "direct"),
      count: fc.integer({ min: 1, max: 12 }),
      volumeL: fc.integer({ min: 100, max: 20_000 }),
      maxVacuumPa: fc.integer({ min: 30_000, max: 101_000 }),
      maxPressurePa: fc.integer({ min: 30_000, max: 200_000 }),
      lengthM: fc.integer({ min: 1, max: 60 }),
    },
    { requiredKeys: [] },
  ),
});
const anySetPoints: fc.Arbitrary<SetPoint[]> = fc.subarray([
  point("vacuum-relief", "inHg", 21, [19, 23], 26),
  point("pressure-relief", "psi", 15, [14, 16], 18),
  point("pump-speed", "rpm", 1200, [1100, 1300]),
  point("tire-pressure", "psi", 100, [95, 110]),
]);
const anyOwn: fc.Arbitrary<OwnCheck> = fc.record({
  id: fc.uuid(),
  station: fc.constantFrom(...STATIONS),
  cadence: fc.constantFrom(...CADENCES),
  label: fc.constant("Mud flaps"),
  good: fc.constant("Both on"),
  colour: fc.constantFrom("white", "yellow", "red"),
});
const anyChanges: fc.Arbitrary<SheetChanges> = fc.record({
  order: fc.shuffledSubarray(entries.map((entry) => entry.key)),
  cadence: fc.dictionary(
    fc.constantFrom(...entries.map((entry) => entry.key)),
    fc.constantFrom(...CADENCES),
  ),
});

test("every part of 49 CFR 396.11(a)(1) is there every day, whatever the fittings and the carrier's changes", () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...UNIT_KINDS),
      fc.uniqueArray(anyFitting, { selector: (one) => one.id, maxLength: 30 }),
      anySetPoints,
      fc.array(anyOwn, { maxLength: 4 }),
      anyChanges,
      fc.record({ elevationM: fc.integer({ min: 0, max: 2500 }), winter: fc.boolean() }),
      (kind, fitted, setPoints, ownChecks, changes, yard) => {
        const sheet = makeSheet({
          kind,
          fittings: fitted,
          setPoints,
          ownChecks,
          changes,
          yard,
          text: sheetText,
        });
        for (const walk of ["before", "after", "takeover"] as const) {
          expect(missingParts(sheet, walk), walk).toEqual([]);
        }
        // And the sheet holds together: keys once, in walking order, a shape that can be read back.
        const keys = allChecks(sheet).map((check) => check.key);
        expect(new Set(keys).size).toBe(keys.length);
        const order = sheet.stations.map((station) => STATIONS.indexOf(station.key));
        expect(order).toEqual([...order].sort((a, b) => a - b));
        expect(sheetSchema.parse(JSON.parse(JSON.stringify(sheet)))).toEqual(
          JSON.parse(JSON.stringify(sheet)),
        );
      },
    ),
    { numRuns: 150 },
  );
});

test("the floor of a powered truck is all eleven parts; a towed unit has no steering wheel", () => {
  expect(ROAD_SAFETY_FLOOR.powered).toHaveLength(11);
  expect(ROAD_SAFETY_FLOOR.towed).toEqual([
    "service-brakes",
    "parking-brake",
    "lighting",
    "tires",
    "coupling",
    "wheels",
  ]);
});

test("a truck with nothing entered is still walked for the road", () => {
  const bare = sheetOf({ kind: "powered", fittings: [], setPoints: [], yard: { elevationM: 0 } });
  expect(missingParts(bare, "before")).toEqual([]);
  expect(allChecks(bare).map((check) => check.key)).toContain("cab.brake-pedal");
  expect(bare.cannot.map((limit) => limit.kind)).toEqual([
    "no-vacuum-work",
    "no-pressure-off-load",
    "no-towing",
  ]);
});

test("about 45 checks on a plain day for a powered truck, and a short after walk and takeover", () => {
  const daily = Object.entries(FIVE_TRUCKS).map(([name, truck]) => [
    name,
    counts(sheetOf(truck)).daily,
  ]);
  expect(Object.fromEntries(daily)).toEqual({
    septic: 48,
    grease: 48,
    specification: 49,
    portable: 46,
    towed: 22,
  });
  for (const truck of Object.values(FIVE_TRUCKS)) {
    const { after, takeover } = counts(sheetOf(truck));
    expect(after).toBeLessThanOrEqual(12);
    expect(takeover).toBeLessThanOrEqual(20);
  }
});

test("no check is about what a truck has not", () => {
  expect(keysOf(septic)).toContain("pump-side.can");
  expect(keysOf(grease)).not.toContain("pump-side.can");
  expect(keysOf(grease)).not.toContain("shop.deodorizer-can");
  expect(keysOf(grease)).toContain("pump-side.hydraulic-oil");
  expect(keysOf(grease)).not.toContain("pump-side.pto-shaft");
  expect(keysOf(specification)).toContain("pump-side.gearbox-oil");
  expect(keysOf(specification)).toContain("rear.hitch");
  expect(keysOf(specification)).not.toContain("rear.coupling");
  expect(keysOf(portable)).not.toContain("run-up.pressure");
  expect(keysOf(portable)).not.toContain("cab.applied-leak-down");
  expect(keysOf(portable)).toContain("hood.brake-fluid");
  expect(sheetOf(towed).stations.map((station) => station.key)).not.toContain("cab");
  expect(keysOf(towed).filter((key) => key.startsWith("pump-side"))).toEqual([]);
});

test("several alike are several checks, the first with the plain key", () => {
  expect(keysOf(specification).filter((key) => key.includes("trap-drain"))).toEqual([
    "pump-side.trap-drain",
    "pump-side.trap-drain.2",
  ]);
  const glasses = allChecks(sheetOf(grease)).filter((check) =>
    check.key.startsWith("rear.sight-glass"),
  );
  expect(glasses.map((check) => check.label)).toEqual(["Sight glass 1", "Sight glass 2"]);
  expect(new Set(glasses.map((check) => check.fittingId)).size).toBe(2);
});

test("what nobody signs off from photos or puts right themselves stays with a certifier at the truck", () => {
  for (const truck of Object.values(FIVE_TRUCKS)) {
    for (const check of allChecks(sheetOf(truck))) {
      const entry = entries.find(
        (one) => check.key === one.key || check.key.startsWith(`${one.key}.`),
      );
      for (const problem of check.problems) {
        const rule = entry?.problems.find((one) => one.key === problem.key);
        if (rule?.atTheTruck) {
          expect([problem.driverFix, problem.remote], `${check.key} ${problem.key}`).toEqual([
            false,
            false,
          ]);
        }
        if (check.roadSafety || problem.part) expect(problem.remote, check.key).toBe(false);
      }
    }
  }
  // K10 by part: everything on these parts is marked, however it is reached.
  for (const entry of entries) {
    for (const problem of entry.problems) {
      const part = problem.part ?? entry.part;
      if (part && ["service-brakes", "parking-brake", "steering", "wheels"].includes(part)) {
        const dash = entry.key === "cab.horn" || entry.key === "approach.parking-brake";
        if (!dash) expect(problem.atTheTruck, `${entry.key} ${problem.key}`).toBeDefined();
      }
    }
  }
});

test("drivers put right only what is on the driver-fix list", () => {
  const fixes = new Set(
    entries.flatMap((entry) =>
      entry.problems
        .filter((problem) => problem.driverFix)
        .map((problem) => `${entry.key} ${problem.key}`),
    ),
  );
  expect([...fixes].sort()).toEqual([
    "cab.emergency fuses",
    "cab.emergency triangles",
    "cab.steer-pressure high",
    "cab.steer-pressure low",
    "cab.tire-pressure high",
    "cab.tire-pressure low",
    "cab.tires-by-gauge low",
    "cab.wipers blade",
    "cab.wipers washer-empty",
    "cab.wipers wiper-out",
    "curb-side.lamps head",
    "curb-side.lamps marker",
    "curb-side.lamps turn",
    "curb-side.stowage latch",
    "curb-side.tires low",
    "driver-side.fuel cap",
    "driver-side.fuel low",
    "driver-side.lamps head",
    "driver-side.lamps marker",
    "driver-side.lamps turn",
    "driver-side.stowage latch",
    "driver-side.tires low",
    "hood.coolant low",
    "hood.engine-oil low",
    "pump-side.can empty",
    "pump-side.can low",
    "pump-side.gearbox-oil low",
    "pump-side.hydraulic-oil low",
    "pump-side.oil-level low",
    "pump-side.oil-level no-spare",
    "rear.caps gasket-weeps",
    "rear.caps missing",
    "rear.lamps brake-or-turn",
    "rear.lamps marker-or-plate",
    "rear.lamps tail",
  ]);
});

test("every check can be answered could-not-check, and on the road and at the run-up it stays as it is", () => {
  for (const truck of Object.values(FIVE_TRUCKS)) {
    for (const check of allChecks(sheetOf(truck))) {
      const could = check.problems.filter((problem) => problem.key === COULD_NOT_CHECK);
      expect(could, check.key).toHaveLength(1);
      const { colour, lowest, driverFix, remote } = could[0]!;
      expect([driverFix, remote]).toEqual([false, false]);
      if (check.roadSafety || check.half) expect(lowest, check.key).toBe(colour);
      if (check.roadSafety) {
        const others = check.problems.filter((problem) => problem.key !== COULD_NOT_CHECK);
        const worst = Math.max(...others.map((problem) => colourRank(problem.colour)));
        expect(colourRank(colour), check.key).toBe(worst);
      }
    }
  }
});

test("not-fitted is offered only on checks made from a fitting, never on safety or the run-up", () => {
  for (const truck of Object.values(FIVE_TRUCKS)) {
    for (const check of allChecks(sheetOf(truck))) {
      expect(check.problems.some((problem) => problem.key === NOT_FITTED)).toBe(
        check.mayBeNotFitted,
      );
      if (check.mayBeNotFitted) {
        expect(check.fittingId).not.toBeNull();
        expect([check.roadSafety, check.locksRunUp, check.half]).toEqual([false, false, null]);
      }
    }
  }
});

test("every kind of check has the problems its answers lead to", () => {
  for (const truck of Object.values(FIVE_TRUCKS)) {
    for (const check of allChecks(sheetOf(truck))) {
      const has = (key: string | null) =>
        key === null || check.problems.some((problem) => problem.key === key);
      const needed: (string | null)[] = [];
      if (check.kind === "level") needed.push("low", "over", "empty");
      if (check.kind === "count") needed.push("missing");
      if (check.drain) {
        const { findings, notCracked, frozen, notShut } = check.drain;
        needed.push(notCracked, frozen, notShut, ...findings.map((one) => one.problem));
      }
      if (check.reading) {
        const { below, above, pastStop, belowUnheard, inBandUnheard } = check.reading;
        needed.push(below, above, pastStop, belowUnheard, inBandUnheard);
      }
      expect(
        needed.filter((key) => !has(key)),
        check.key,
      ).toEqual([]);
      expect(check.kind === "drain").toBe(check.drain !== null);
      expect(["reading", "timed"].includes(check.kind)).toBe(check.reading !== null);
    }
  }
});

test("a limit hangs only on yellow, and a truck's own numbers are in it", () => {
  for (const check of allChecks(sheetOf(septic))) {
    for (const problem of check.problems) {
      if (problem.limit) expect([problem.colour, problem.lowest]).toContain("yellow");
    }
  }
  const problem = (key: string, problemKey: string) =>
    allChecks(sheetOf(septic))
      .find((check) => check.key === key)
      ?.problems.find((one) => one.key === problemKey);
  // Four lengths of 9 m: three are left.
  expect(problem("curb-side.stowage", "hose-damaged")?.limit).toEqual({
    kind: "hose-no-longer",
    hoseM: 27,
  });
  expect(problem("rear.sight-glass", "cannot-read")?.limit).toMatchObject({ kind: "fill-no-more" });
  const single = allChecks(sheetOf(grease)).find((check) => check.key === "curb-side.stowage");
  expect(single?.problems.find((one) => one.key === "hose-damaged")?.limit).toEqual({
    kind: "no-vacuum-work",
  });
});

test("every check and problem of the catalogue has words, and no words are left over", () => {
  const spare: string[] = [];
  for (const [key, words] of Object.entries(sheetText.checks)) {
    const entry = entries.find((one) => one.key === key);
    if (!entry) spare.push(key);
    const known = new Set(entry?.problems.map((problem) => problem.key));
    for (const problem of Object.keys(words.problems)) {
      if (!known.has(problem)) spare.push(`${key} ${problem}`);
    }
  }
  for (const entry of entries) {
    const words = sheetText.checks[entry.key];
    for (const problem of entry.problems) {
      if (words?.problems[problem.key] === undefined)
        spare.push(`no words: ${entry.key} ${problem.key}`);
    }
  }
  expect(spare).toEqual([]);
});

test("a line fits a phone: labels up to 44 letters, what good looks like up to 110, titles up to 160", () => {
  for (const truck of Object.values(FIVE_TRUCKS)) {
    for (const check of allChecks(sheetOf(truck))) {
      expect(check.label.length, check.label).toBeLessThanOrEqual(44);
      expect(check.good.length, check.good).toBeLessThanOrEqual(110);
      for (const problem of check.problems) {
        expect(`${check.label}: ${problem.label}`.length).toBeLessThanOrEqual(160);
      }
      for (const step of check.steps) expect(step.length, step).toBeLessThanOrEqual(120);
    }
  }
});

test("every caution has words of one or two lines and is shown somewhere", () => {
  const shown = new Set(
    [septic, grease].flatMap((truck) =>
      sheetOf(truck).stations.flatMap((station) => [
        station.caution,
        ...station.checks.map((check) => check.caution),
      ]),
    ),
  );
  for (const key of CAUTIONS) {
    expect(cautions[key].text.length, key).toBeLessThanOrEqual(110);
    expect(shown.has(key), key).toBe(true);
  }
});

test("the pressure half is asked for by the run or the week, the vacuum half every day", () => {
  const sheet = sheetOf(septic);
  const keys = (due: Parameters<typeof dueChecks>[1]) =>
    dueChecks(sheet, due).map((check) => check.key);
  expect(keys({ walkKind: "before" })).toContain("run-up.vacuum");
  expect(keys({ walkKind: "before" })).not.toContain("run-up.pressure");
  expect(keys({ walkKind: "before", halves: ["vacuum", "pressure"] })).toContain("run-up.pressure");
  expect(keys({ walkKind: "before", weeklyDue: true })).toContain("run-up.pressure");
  expect(keys({ walkKind: "before", weeklyDue: true })).toContain("pump-side.pre-filter");
  expect(
    keys({ walkKind: "before", halves: [] }).filter((key) => key.startsWith("run-up")),
  ).toEqual([]);
  expect(keys({ walkKind: "after" }).filter((key) => key.startsWith("run-up"))).toEqual([]);
});

test("shop checks are the bench's: never on a driver's walk", () => {
  const sheet = sheetOf(septic);
  const everything = { weeklyDue: true, monthlyDue: true };
  for (const walkKind of ["before", "after", "takeover"] as const) {
    expect(
      dueChecks(sheet, { walkKind, ...everything }).every((check) => check.who === "driver"),
    ).toBe(true);
  }
  expect(roundChecks(sheet, "weekly-shop").map((check) => check.key)).toContain(
    "pump-side.coupling",
  );
  expect(roundChecks(sheet, "monthly").map((check) => check.key)).toContain("shop.hose-separator");
});

test("the run-up is locked by all that must be seen first", () => {
  expect(runUpLocks(sheetOf(septic)).map((check) => check.key)).toEqual([
    "pump-side.at-rest",
    "pump-side.trap-drain",
    "pump-side.catch-drain",
    "pump-side.guard",
    "pump-side.reliefs",
    "rear.door",
    "rear.manway",
    "rear.caps",
    "rear.sight-glass",
  ]);
});

test("without a set point or a stop value no relief is run up, and the sheet says what is owed", () => {
  const owing = sheetOf({ ...septic, setPoints: [] });
  expect(owing.halves).toEqual(["vacuum", "pressure"]);
  expect(owing.missingSetPoints).toEqual(["vacuum-relief", "pressure-relief"]);
  expect(allChecks(owing).some((check) => check.half !== null)).toBe(false);
  const noPlates = sheetOf({
    kind: "powered",
    fittings: fittings("tank", "pump", "vacuum-relief"),
    setPoints: [point("vacuum-relief", "inHg", 21, [19, 23])],
    yard: { elevationM: 240 },
  });
  expect(noPlates.missingSetPoints).toEqual(["vacuum-relief"]);
});

test("a carrier's own check goes where it was put, but never between the steps of the run-up", () => {
  const own = (station: OwnCheck["station"], id: string): OwnCheck => ({
    id,
    station,
    cadence: "daily",
    label: "Mud flaps",
    good: "Both on",
    colour: "yellow",
  });
  const sheet = sheetOf(septic, [own("rear", "a"), own("run-up", "b")]);
  const at = (key: string) => allChecks(sheet).find((check) => check.key === key)?.station;
  expect(at("own.a")).toBe("rear");
  expect(at("own.b")).toBe("pull-out");
  expect(allChecks(sheetOf(towed, [own("hood", "c")])).some((check) => check.own)).toBe(false);
});

test("a carrier may ask oftener and in another order, but no road-safety check gets rarer", () => {
  const changes: SheetChanges = {
    order: ["rear.caps", "rear.lamps", "run-up.pto-out"],
    cadence: {
      "rear.lamps": "monthly",
      "pump-side.pre-filter": "daily",
      "cab.papers": "weekly",
      "rear.caps": "weekly",
    },
  };
  const sheet = makeSheet({ ...septic, ownChecks: [], changes, text: sheetText });
  const check = (key: string) => allChecks(sheet).find((one) => one.key === key);
  expect(check("rear.lamps")?.cadence).toBe("daily");
  expect(check("rear.caps")?.cadence).toBe("daily");
  expect(check("pump-side.pre-filter")?.cadence).toBe("daily");
  expect(check("cab.papers")?.cadence).toBe("weekly");
  const keys = allChecks(sheet).map((one) => one.key);
  expect(keys.indexOf("rear.caps")).toBeLessThan(keys.indexOf("rear.lamps"));
  expect(keys.indexOf("run-up.pto-out")).toBeGreaterThan(keys.indexOf("run-up.vacuum"));
});

test("the same truck gives the same sheet, whatever order its fittings come in", () => {
  const shuffled = { ...septic, fittings: [...septic.fittings].reverse() };
  expect(canonicalSheet(sheetOf(shuffled))).toBe(canonicalSheet(sheetOf(septic)));
});

test("wording changes the sheet but not what a walk stands on; fittings and set points change both", () => {
  const reworded = makeSheet({
    ...septic,
    ownChecks: [],
    text: { ...sheetText, couldNotCheck: "not seen" },
  });
  expect(canonicalSheet(reworded)).not.toBe(canonicalSheet(sheetOf(septic)));
  const sign = (truck: typeof septic) =>
    fittingsSignature(truck.kind, truck.fittings, truck.setPoints);
  expect(sign({ ...septic, fittings: [...septic.fittings].reverse() })).toBe(sign(septic));
  expect(sign({ ...septic, fittings: septic.fittings.slice(1) })).not.toBe(sign(septic));
  expect(sign({ ...septic, setPoints: [] })).not.toBe(sign(septic));
});

test("in winter a frozen drain is named and an iced ladder is not climbed", () => {
  const winter = allChecks(sheetOf(grease));
  const drain = winter.find((check) => check.key === "pump-side.trap-drain");
  expect(drain?.steps.join(" ")).toMatch(/frozen drain is not an empty one/);
  const manway = winter.find((check) => check.key === "rear.manway");
  expect(manway?.caution).toBe("iced-ladder");
  expect(manway?.problems.find((problem) => problem.key === COULD_NOT_CHECK)).toMatchObject({
    colour: "yellow",
    limit: { kind: "no-pressure-off-load" },
  });
});

test("what could not be checked at a lock of the run-up keeps it locked: never white, never lowered", () => {
  for (const truck of Object.values(FIVE_TRUCKS)) {
    for (const yard of [{ elevationM: 240 }, { elevationM: 240, winter: true }]) {
      for (const check of runUpLocks(sheetOf({ ...truck, yard }))) {
        const problem = check.problems.find((one) => one.key === "could-not-check");
        expect(problem?.colour, check.key).not.toBe("white");
        expect(problem?.lowest, check.key).toBe(problem?.colour);
      }
    }
  }
});
