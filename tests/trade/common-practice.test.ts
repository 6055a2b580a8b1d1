import { expect, test } from "vitest";
import type { Check } from "~/trade/sheet/check";
import { allChecks, dueChecks } from "~/trade/sheet/due-checks";
import { fromSi } from "~/trade/units";
import { fittings, septic, sheetOf, type TestTruck } from "./trucks";

// What the trade does, without a published source. Each is marked "common practice".

const sheet = sheetOf(septic);

function check(key: string, truck: TestTruck = septic): Check {
  const found = allChecks(sheetOf(truck)).find((one) => one.key === key);
  if (!found) throw new Error(`no check ${key}`);
  return found;
}
const says = (one: Check) => [one.label, one.good, ...one.steps].join(" ");
const place = (key: string) => allChecks(sheet).findIndex((one) => one.key === key);
const labels = (one: Check) => one.problems.map((problem) => problem.label).join("; ");

test("common practice: a gallon of spare pump oil is aboard", () => {
  const oil = check("pump-side.oil-level");
  expect(says(oil)).toMatch(/spare gallon aboard/);
  expect(oil.problems).toContainEqual(
    expect.objectContaining({ key: "no-spare", colour: "white" }),
  );
});

test("common practice: a deodorizer can takes about a quart", () => {
  expect(says(check("pump-side.can"))).toMatch(/about a quart/);
  expect(says(check("shop.deodorizer-can"))).toMatch(/about a quart/i);
});

test("common practice: a small three-shaft gearbox takes about 24 fl oz, to the bottom third of the shaft", () => {
  const geared = (type: string): TestTruck => ({
    ...septic,
    fittings: fittings("tank", "pump", "drive", ["gearbox", { type }]),
  });
  expect(says(check("pump-side.gearbox-oil", geared("three-shaft")))).toMatch(
    /bottom third of the shaft.*24 fl oz/,
  );
  expect(says(check("pump-side.gearbox-oil", geared("right-angle")))).not.toMatch(/24 fl oz/);
});

test("common practice: vacuum in inches of mercury and pressure in psi on one compound gauge", () => {
  const plain: TestTruck = {
    ...septic,
    fittings: septic.fittings.map((one) =>
      one.kind === "compound-gauge" ? { ...one, attributes: {} } : one,
    ),
  };
  const vacuum = check("run-up.vacuum", plain).reading;
  const pressure = check("run-up.pressure", plain).reading;
  expect([vacuum?.unit, pressure?.unit]).toEqual(["inHg", "psi"]);
  expect(fromSi(vacuum?.scaleHigh ?? 0, "inHg")).toBeCloseTo(30, 9);
  expect(fromSi(pressure?.scaleHigh ?? 0, "psi")).toBeCloseTo(30, 9);
});

test("common practice: traps and oil catch are drained before the day, and before the pump runs", () => {
  const due = dueChecks(sheet, { walkKind: "before" }).map((one) => one.key);
  for (const key of ["pump-side.trap-drain", "pump-side.catch-drain"]) {
    expect(due).toContain(key);
    expect(check(key).locksRunUp).toBe(true);
    expect(place(key)).toBeLessThan(place("run-up.pto-in"));
  }
});

test("common practice: the pump is started unloaded, at neutral, the tank bled", () => {
  expect(check("pump-side.at-rest").locksRunUp).toBe(true);
  expect(says(check("pump-side.at-rest"))).toMatch(/neutral.*tank vented, gauge on zero/);
  expect(says(check("run-up.pto-in"))).toMatch(/Valve at neutral, tank vented/);
});

test("common practice: vacuum is checked before pressure, bleeding between", () => {
  const order = ["run-up.vacuum", "run-up.bled", "run-up.pressure", "run-up.pto-out"].map(place);
  expect(order).toEqual([...order].sort((a, b) => a - b));
  expect(order).not.toContain(-1);
});

test("common practice: air hoses are looked at from inside, in the order they fail", () => {
  const order = ["shop.hose-separator", "shop.hose-pump-inlet", "shop.hose-trap"];
  expect(order.map(place)).toEqual([...order.map(place)].sort((a, b) => a - b));
  expect(says(check("shop.hose-separator"))).toMatch(/pump to oil separator/);
  expect(says(check("shop.hose-separator"))).toMatch(/One end off. Outside sound means nothing/);
});

test("common practice: black rubber in the pre-filter points at a hose lining", () => {
  const filter = check("pump-side.pre-filter");
  expect(labels(filter)).toMatch(/black rubber: a hose lining is going/);
  expect(says(filter)).toMatch(/hose lining, though the hose feels sound outside/);
});

test("common practice: lids are snugged again under vacuum, with the guard on and people clear", () => {
  const vacuum = check("run-up.vacuum");
  expect(vacuum.caution).toBe("snug-under-vacuum");
  expect(says(vacuum)).toMatch(/snugged now, under vacuum: guard on, people clear, lock off first/);
  expect(check("rear.door").caution).toBe("clamp-under-pressure");
});

test("common practice: a deep groove in the primary's gasket leaks, a ring of build-up shuts off early", () => {
  const seat = says(check("shop.primary-seat"));
  expect(seat).toMatch(/deep groove leaks/);
  expect(seat).toMatch(/ring of build-up holds the ball up and shuts off early/);
  expect(check("shop.primary-seat").problems.map((problem) => problem.key)).toEqual(
    expect.arrayContaining(["gasket-groove", "build-up-ring"]),
  );
});

test("common practice: washing the trap, plenty comes out of its open drain", () => {
  expect(says(check("shop.secondary"))).toMatch(/drain open. Plenty should come out/);
  expect(check("shop.secondary").problems.map((problem) => problem.key)).toContain("drain-slow");
});
