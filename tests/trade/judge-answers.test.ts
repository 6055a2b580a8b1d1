import fc from "fast-check";
import { expect, test } from "vitest";
import { colourRank } from "~/trade/limits";
import { type Answer, type Answers, answersSchema } from "~/trade/sheet/answers";
import type { Check } from "~/trade/sheet/check";
import { allChecks, dueChecks } from "~/trade/sheet/due-checks";
import { judgeAnswers, type WalkContext } from "~/trade/sheet/judge-answers";
import { toSi } from "~/trade/units";
import { goodAnswers } from "../../fixtures/good-answers";
import { gallons, grease, portable, septic, sheetOf, type TestTruck, towed } from "./trucks";

interface Day {
  truck?: TestTruck;
  change?: Record<string, Answer | null>;
  pressure?: boolean;
  context?: WalkContext;
}

/** A good morning's walk with some answers changed, or left out (null). */
function walk({ truck = septic, change = {}, pressure = false, context = {} }: Day) {
  const sheet = sheetOf(truck);
  const walkKind = context.walkKind ?? "before";
  const due = dueChecks(sheet, {
    walkKind,
    halves: pressure ? ["vacuum", "pressure"] : ["vacuum"],
  });
  const answers: Answers = goodAnswers(due);
  for (const [key, answer] of Object.entries(change)) {
    if (answer === null) delete answers[key];
    else answers[key] = answer;
  }
  return judgeAnswers(sheet, due, answersSchema.parse(answers), context);
}

const problem = (key: string, more: object = {}): Answer => ({
  kind: "problem",
  problems: [{ key, ...more }],
});
const drained = (more: Partial<Extract<Answer, { kind: "drain" }>>): Answer => ({
  kind: "drain",
  cracked: true,
  saw: "ran",
  amount: "cup",
  what: "clean-oil",
  shutAgain: true,
  ...more,
});
const noVacuum = { kind: "no-vacuum-work" };
const noPressure = { kind: "no-pressure-off-load" };

test("a good walk with both halves is complete, hangs nothing and limits nothing", () => {
  const judged = walk({ pressure: true });
  expect(judged).toMatchObject({ complete: true, missing: [], tags: [], limits: [], faults: [] });
});

test("without the pressure half the truck may not off-load by pressure", () => {
  expect(walk({})).toMatchObject({ complete: true, limits: [noPressure] });
});

test("without a run-up there is no vacuum work, and the walk is still whole", () => {
  const runUp = Object.fromEntries(
    ["pto-in", "speed", "oil-feed", "vacuum", "pto-out"].map((key) => [`run-up.${key}`, null]),
  );
  expect(walk({ change: runUp })).toMatchObject({
    complete: true,
    limits: [noVacuum, noPressure],
  });
});

test("a run-up left half way is reported stopped before the walk is whole", () => {
  const judged = walk({ change: { "run-up.vacuum": null, "run-up.pto-out": null } });
  expect(judged).toMatchObject({ complete: false, missing: ["run-up.pto-out"] });
  expect(judged.limits).toEqual([noVacuum, noPressure]);
});

test("pressure without vacuum does not count: vacuum comes first", () => {
  const judged = walk({ pressure: true, change: { "run-up.vacuum": null } });
  expect(judged.limits).toEqual([noVacuum, noPressure]);
});

test("a loaded truck does its run-up at first empty", () => {
  const judged = walk({
    pressure: true,
    change: { "approach.load-aboard": { kind: "reading", value: 900, unit: "gal" } },
  });
  expect(judged).toMatchObject({ complete: true, limits: [noVacuum, noPressure] });
});

test("a run-up done with a lock open does not count", () => {
  for (const [key, answer] of Object.entries({
    "pump-side.guard": problem("shavings"),
    "rear.manway": { kind: "could-not-check", reason: "ladder iced" },
    "pump-side.trap-drain": drained({ saw: "frozen", amount: "none", what: "nothing" }),
    "rear.caps": { kind: "count", counted: 7 },
  } satisfies Record<string, Answer>)) {
    expect(walk({ pressure: true, change: { [key]: answer } }).limits, key).toEqual([
      noVacuum,
      noPressure,
    ]);
  }
});

test("a tag to watch locks no run-up, an open yellow does", () => {
  expect(walk({ pressure: true, change: { "rear.sight-glass": problem("hazed") } }).limits).toEqual(
    [],
  );
  const open = (colour: "white" | "yellow") => ({
    openTags: [{ checkKey: "rear.door", problemKey: "seal-weeps", colour, limit: null }],
  });
  expect(walk({ pressure: true, context: open("white") }).limits).toEqual([]);
  expect(walk({ pressure: true, context: open("yellow") }).limits).toEqual([noVacuum, noPressure]);
});

test("every due check needs an answer, and the missing are named in walking order", () => {
  const judged = walk({ change: { "rear.lamps": null, "approach.stance": null } });
  expect(judged).toMatchObject({ complete: false, missing: ["approach.stance", "rear.lamps"] });
});

test("a problem proposes its own colour, limit and title", () => {
  const [tag] = walk({
    change: { "pump-side.leaks": problem("air-hose", { note: "behind the pump" }) },
  }).tags;
  expect(tag).toMatchObject({
    checkKey: "pump-side.leaks",
    problemKey: "air-hose",
    colour: "yellow",
    limit: noVacuum,
    title: "Pump and drive leaks: air hose split, soft or loose",
    note: "behind the pump",
    roadSafety: false,
    part: null,
  });
});

test("a driver may raise a colour and never lower it", () => {
  const raise = (key: string, problemKey: string, raisedColour: string) =>
    walk({ change: { [key]: problem(problemKey, { raisedColour }) } }).tags[0];
  expect(raise("pump-side.leaks", "air-hose", "red")).toMatchObject({ colour: "red", limit: null });
  expect(raise("pump-side.leaks", "air-hose", "white")).toMatchObject({ colour: "yellow" });
  expect(raise("curb-side.tires", "cut", "white")).toMatchObject({ colour: "red" });
});

test("a problem on a road-safety part says which part, even beside another", () => {
  const [nut] = walk({ change: { "curb-side.tires": problem("nut") } }).tags;
  expect(nut).toMatchObject({ part: "wheels", roadSafety: true, remote: false, driverFix: false });
  const [leak] = walk({ change: { "cab.horn": problem("air-slow") } }).tags;
  expect(leak).toMatchObject({ part: "service-brakes", roadSafety: true });
});

test("could not check proposes the check's own tag, which stays on road-safety parts and the run-up", () => {
  const could = (key: string, colour?: "white" | "yellow" | "red") =>
    walk({ change: { [key]: { kind: "could-not-check", reason: "dark", colour } } }).tags[0];
  expect(could("curb-side.lamps", "white")).toMatchObject({ colour: "red" });
  expect(could("cab.applied-leak-down", "yellow")).toMatchObject({ colour: "red" });
  expect(could("run-up.vacuum", "white")).toMatchObject({ colour: "yellow", limit: noVacuum });
  expect(could("hood.engine-oil")).toMatchObject({ colour: "red", note: "dark" });
  expect(could("hood.engine-oil", "yellow")).toMatchObject({ colour: "yellow" });
  expect(could("hood.engine-oil", "white")).toMatchObject({ colour: "yellow" });
});

test("not fitted counts only where a check was made from a fitting", () => {
  const fitted = walk({ change: { "pump-side.can": { kind: "not-fitted" } } });
  expect(fitted.tags).toMatchObject([{ problemKey: "not-fitted", colour: "white" }]);
  expect(fitted.complete).toBe(true);
  for (const key of [
    "rear.lamps",
    "pump-side.guard",
    "pump-side.oil-level",
    "approach.load-aboard",
  ]) {
    const judged = walk({ change: { [key]: { kind: "not-fitted" } } });
    expect(judged).toMatchObject({
      complete: false,
      missing: [key],
      faults: [{ code: "always-fitted" }],
    });
  }
});

test("sewage in the oil catch is red whatever the amount", () => {
  for (const amount of ["none", "cup", "quart", "gallon", "more"] as const) {
    const { tags } = walk({
      change: { "pump-side.catch-drain": drained({ what: "sewage", amount }) },
    });
    expect(tags, amount).toMatchObject([{ problemKey: "sewage", colour: "red" }]);
  }
});

test("what came out of a drain decides first, how much second", () => {
  const found = (key: string, more: Parameters<typeof drained>[0]) =>
    walk({ change: { [key]: drained(more) } }).tags.map((tag) => [tag.problemKey, tag.colour]);
  const trap = "pump-side.trap-drain";
  expect(found(trap, { what: "water", amount: "cup" })).toEqual([]);
  expect(found(trap, { what: "water", amount: "gallon" })).toEqual([["water-some", "yellow"]]);
  expect(found(trap, { what: "water", amount: "more" })).toEqual([["water-much", "red"]]);
  expect(found(trap, { what: "sewage", amount: "cup" })).toEqual([["sewage", "yellow"]]);
  expect(found(trap, { what: "sewage", amount: "gallon" })).toEqual([["sewage-much", "red"]]);
  const oil = "pump-side.catch-drain";
  expect(found(oil, { what: "clean-oil", amount: "quart" })).toEqual([]);
  expect(found(oil, { what: "clean-oil", amount: "gallon" })).toEqual([["oil-some", "white"]]);
  expect(found(oil, { what: "milky-oil", amount: "cup" })).toEqual([["milky-oil", "yellow"]]);
  expect(found(oil, { shutAgain: false })).toEqual([["will-not-shut", "yellow"]]);
});

test("a frozen drain is not zero: it is tagged and no amount is kept", () => {
  const judged = walk({
    truck: grease,
    change: { "pump-side.trap-drain": drained({ saw: "frozen", amount: "none", what: "nothing" }) },
  });
  expect(judged.tags).toMatchObject([{ problemKey: "frozen", colour: "yellow", limit: noVacuum }]);
  expect(
    judged.readings.filter((one) => one.quantity === "drained").map((one) => one.checkKey),
  ).toEqual(["pump-side.catch-drain"]);
});

test("a drain's answer agrees with itself", () => {
  const parse = (more: object) =>
    answersSchema.safeParse({ "pump-side.trap-drain": drained(more) }).success;
  expect(parse({ saw: "dry", amount: "cup" })).toBe(false);
  expect(parse({ saw: "ran", what: "nothing", amount: "none" })).toBe(false);
  expect(parse({ saw: "dry", amount: "none", what: "nothing" })).toBe(true);
});

test("amounts drained and topped up are readings", () => {
  const { readings, tags } = walk({
    change: {
      "pump-side.catch-drain": drained({ amount: "quart" }),
      "pump-side.oil-level": { kind: "level", level: "ok", toppedUp: { amount: 1, unit: "qt" } },
    },
  });
  expect(tags).toEqual([]);
  const of = (key: string) => readings.find((one) => one.checkKey === key);
  expect(of("pump-side.catch-drain")).toMatchObject({
    quantity: "drained",
    entered: 1,
    unit: "qt",
  });
  expect(of("pump-side.oil-level")).toMatchObject({
    quantity: "topped-up",
    entered: 1,
    unit: "qt",
  });
  expect(of("pump-side.oil-level")?.si).toBeCloseTo(0.946352946e-3, 12);
});

test("a relief that opens early limits the vacuum to what it held", () => {
  const { tags, readings } = walk({
    change: { "run-up.vacuum": { kind: "reading", value: 18, unit: "inHg", heardItOpen: true } },
  });
  expect(tags).toMatchObject([
    {
      problemKey: "opens-low",
      limit: { kind: "vacuum-no-deeper", vacuumPa: Math.floor(toSi(18, "inHg")) },
      driverFix: false,
      remote: false,
    },
  ]);
  expect(readings.find((one) => one.quantity === "vacuum")).toMatchObject({
    entered: 18,
    verdict: "below",
  });
});

test("a weak relief named without a number allows no vacuum at all", () => {
  const { tags } = walk({ change: { "run-up.vacuum": problem("opens-low") } });
  expect(tags).toMatchObject([{ problemKey: "opens-low", limit: noVacuum }]);
});

test("at the stop with no relief the key is held", () => {
  const { tags } = walk({
    change: { "run-up.vacuum": { kind: "reading", value: 26, unit: "inHg", heardItOpen: false } },
  });
  expect(tags).toMatchObject([{ problemKey: "did-not-open", colour: "red", limit: null }]);
});

test("at a high yard an unreachable set point hangs no tag", () => {
  const judged = walk({
    truck: grease,
    pressure: true,
    change: { "run-up.vacuum": { kind: "reading", value: 21, unit: "inHg", heardItOpen: false } },
  });
  expect(judged.tags).toEqual([]);
  expect(judged.limits).toEqual([]);
  expect(judged.readings.find((one) => one.quantity === "vacuum")?.verdict).toBe(
    "not-reachable-here",
  );
});

test("an answer that cannot stand is missing, and says why", () => {
  const faults = (key: string, answer: Answer) => {
    const judged = walk({ change: { [key]: answer } });
    return judged.faults.map((fault) => fault.code);
  };
  const vacuum = { kind: "reading", unit: "inHg", heardItOpen: true } as const;
  expect(faults("run-up.vacuum", { ...vacuum, value: 31 })).toEqual(["off-scale"]);
  expect(faults("run-up.vacuum", { ...vacuum, value: 21, unit: "gal" })).toEqual(["wrong-unit"]);
  expect(faults("run-up.vacuum", { ...vacuum, value: 21, unit: "cubit" })).toEqual([
    "unknown-unit",
  ]);
  expect(faults("run-up.vacuum", { kind: "reading", value: 21, unit: "inHg" })).toEqual([
    "heard-it-open-missing",
  ]);
  expect(
    faults("cab.applied-leak-down", { kind: "timed", value: 1, unit: "psi", seconds: 30 }),
  ).toEqual(["too-short"]);
  expect(faults("rear.caps", { kind: "look", ok: true })).toEqual(["wrong-kind"]);
  expect(faults("cab.pump-hours", { kind: "look", ok: true })).toEqual(["wrong-kind"]);
  expect(faults("rear.lamps", problem("gremlins"))).toEqual(["unknown-problem"]);
  expect(faults("rear.lamps", { kind: "tag-seen", seen: "same" })).toEqual(["no-open-tag"]);
  expect(faults("rear.moonroof", { kind: "look", ok: true })).toEqual(["unknown-check"]);
  expect(
    faults("pump-side.oil-level", {
      kind: "level",
      level: "ok",
      toppedUp: { amount: 1, unit: "psi" },
    }),
  ).toEqual(["wrong-unit"]);
  const lamps = walk({ change: { "rear.lamps": problem("gremlins") } });
  expect(lamps).toMatchObject({ complete: false, missing: ["rear.lamps"] });
});

test("a problem named beside a number that cannot stand still hangs its tag (K2)", () => {
  const judged = walk({
    pressure: true,
    change: {
      "run-up.pressure": {
        kind: "reading",
        value: 99,
        unit: "psi",
        heardItOpen: true,
        problems: [{ key: "leaks", raisedColour: "red" }],
      },
    },
  });
  expect(judged.faults).toEqual([{ checkKey: "run-up.pressure", code: "off-scale" }]);
  expect(judged.tags).toMatchObject([{ problemKey: "leaks", colour: "red" }]);
  expect(judged.limits).toEqual([noPressure]);
});

test("a problem at a check that is not due hangs its tag all the same (K2)", () => {
  const judged = walk({ change: { "pump-side.pre-filter": problem("black-rubber") } });
  expect(judged.tags).toMatchObject([{ checkKey: "pump-side.pre-filter", colour: "yellow" }]);
});

test("an open tag seen again answers a look, and never stands in for a number", () => {
  const openTags = [
    {
      checkKey: "rear.valves",
      problemKey: "drips",
      colour: "yellow" as const,
      limit: noPressure as never,
    },
    { checkKey: "run-up.vacuum", problemKey: "opens-low", colour: "yellow" as const, limit: null },
  ];
  const seen: Answer = { kind: "tag-seen", seen: "same" };
  expect(walk({ change: { "rear.valves": seen }, context: { openTags } })).toMatchObject({
    complete: true,
    tags: [],
  });
  const number = walk({ change: { "run-up.vacuum": seen }, context: { openTags } });
  expect(number.faults).toEqual([{ checkKey: "run-up.vacuum", code: "no-open-tag" }]);
});

test("a finding already tagged hangs no second tag, a worse one does", () => {
  const openTags = [
    {
      checkKey: "run-up.vacuum",
      problemKey: "opens-low",
      colour: "yellow" as const,
      limit: { kind: "vacuum-no-deeper" as const, vacuumPa: Math.floor(toSi(18, "inHg")) },
    },
  ];
  const at = (value: number) =>
    walk({
      change: { "run-up.vacuum": { kind: "reading", value, unit: "inHg", heardItOpen: true } },
      context: { openTags },
    }).tags.length;
  expect([at(18.5), at(18), at(17)]).toEqual([0, 0, 1]);
});

test("only the walk before the day answers for the run-up", () => {
  for (const walkKind of ["after", "takeover"] as const) {
    const judged = walk({ context: { walkKind } });
    expect(judged).toMatchObject({ complete: true, limits: [], faults: [] });
  }
});

test("a truck with no pump, or no pressure side, has no such half to skip", () => {
  expect(walk({ truck: towed })).toMatchObject({ complete: true, limits: [] });
  expect(walk({ truck: portable })).toMatchObject({ complete: true, limits: [] });
});

test("a half that lacks its set point is a half not done", () => {
  expect(walk({ truck: { ...septic, setPoints: [] } }).limits).toEqual([noVacuum, noPressure]);
});

test("a whole day's answers stay small enough to carry as a code", () => {
  const due = dueChecks(sheetOf(septic), { walkKind: "before" });
  expect(JSON.stringify(goodAnswers(due)).length).toBeLessThan(3500);
});

const anyAnswer = (check: Check): fc.Arbitrary<Answer> =>
  fc.oneof(
    fc.constant<Answer>({ kind: "look", ok: true }),
    fc.constantFrom(...check.problems.map((one) => one.key)).map((key): Answer => problem(key)),
    fc.record({
      kind: fc.constant("could-not-check" as const),
      reason: fc.constant("dark"),
      colour: fc.constantFrom("white" as const, "yellow" as const, "red" as const),
    }),
    fc.constant<Answer>({ kind: "not-fitted" }),
    fc.constant<Answer>({ kind: "tag-seen", seen: "gone" }),
    fc.record({
      kind: fc.constant("reading" as const),
      value: fc.double({ min: -10, max: 200, noNaN: true }),
      unit: fc.constantFrom("inHg", "psi", "gal", "h", "mi", "rpm"),
      heardItOpen: fc.boolean(),
    }),
    fc.record({ kind: fc.constant("count" as const), counted: fc.integer({ min: 0, max: 12 }) }),
    fc.record({
      kind: fc.constant("level" as const),
      level: fc.constantFrom("ok" as const, "low" as const, "over" as const, "empty" as const),
    }),
  );

test("whatever is answered: tags are never below their floor, limits only on yellow, and missing is exact", () => {
  const sheet = sheetOf(septic);
  const due = dueChecks(sheet, { walkKind: "before" });
  const checks = new Map(allChecks(sheet).map((check) => [check.key, check]));
  const anyAnswers = fc
    .subarray(due)
    .chain((some) =>
      fc.tuple(
        ...some.map((check) => anyAnswer(check).map((answer) => [check.key, answer] as const)),
      ),
    )
    .map((entries): Answers => Object.fromEntries(entries));
  fc.assert(
    fc.property(anyAnswers, (answers) => {
      const judged = judgeAnswers(sheet, due, answers);
      for (const tag of judged.tags) {
        const known = checks.get(tag.checkKey)?.problems.find((one) => one.key === tag.problemKey);
        expect(colourRank(tag.colour)).toBeGreaterThanOrEqual(colourRank(known?.lowest ?? "red"));
        if (tag.limit) expect(tag.colour).toBe("yellow");
      }
      const faulty = new Set(judged.faults.map((fault) => fault.checkKey));
      for (const check of due.filter((one) => one.half === null)) {
        const stands = answers[check.key] !== undefined && !faulty.has(check.key);
        expect(judged.missing.includes(check.key)).toBe(!stands);
      }
      expect(judged.complete).toBe(judged.missing.length === 0);
      // The same in any order, the same twice.
      const reversed = Object.fromEntries(Object.entries(answers).reverse());
      expect(judgeAnswers(sheet, due, reversed).tags).toEqual(judged.tags);
    }),
    { numRuns: 300 },
  );
});

test("a tank that holds nothing reads empty, and gallons are the truck's own", () => {
  const { readings } = walk({});
  expect(readings.find((one) => one.checkKey === "approach.load-aboard")).toMatchObject({
    si: 0,
    unit: "gal",
  });
  expect(gallons(1)).toBeCloseTo(3.785411784, 9);
});
