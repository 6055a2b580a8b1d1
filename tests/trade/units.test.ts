import { spawnSync } from "node:child_process";
import { expect, test } from "vitest";
import {
  convert,
  fromSi,
  groupOf,
  toSi,
  UNIT_KEYS,
  UnitError,
  type UnitKey,
  unitsOf,
} from "~/trade/units";

function close(actual: number, wanted: number, relative = 1e-9) {
  const off = wanted === 0 ? Math.abs(actual) : Math.abs(actual / wanted - 1);
  expect(off, `${actual} against ${wanted}`).toBeLessThan(relative);
}

// NIST SP 811 appendix B.8, and values computed from it with Debian's `units`.
test("the trade's constants are those of NIST SP 811", () => {
  close(toSi(1, "inHg"), 3386.388640341, 1e-12);
  close(toSi(1, "psi"), 6894.757293168361, 1e-12);
  close(toSi(1, "gal"), 3.785411784e-3, 1e-12);
  close(toSi(1, "fl-oz"), 29.57352956e-6);
  close(toSi(1, "qt"), 0.946352946e-3);
  close(convert(25, "inHg", "kPa"), 84.65971601);
  close(convert(20, "psi", "bar"), 1.378951459);
  close(convert(400, "cfm", "m3/h"), 679.6043182);
  close(convert(1, "cfm", "m3/h"), 1.699010796);
});

test("minus forty is the same in Fahrenheit and Celsius", () => {
  expect(convert(-40, "degF", "degC")).toBeCloseTo(-40, 10);
  expect(toSi(0, "degC")).toBe(273.15);
  expect(convert(212, "degF", "degC")).toBeCloseTo(100, 10);
});

test("the inch of mercury is the conventional one, not the 60 °F inch", () => {
  expect(Math.abs(toSi(1, "inHg") - 3376.85)).toBeGreaterThan(9);
});

test("the gallon is the US one, not the imperial one", () => {
  expect(convert(1, "gal", "L")).not.toBeCloseTo(4.54609, 3);
});

test("a value goes to SI and back unchanged", () => {
  for (const unit of UNIT_KEYS) close(fromSi(toSi(12.5, unit), unit), 12.5, 1e-12);
});

test("a unit that measures something else is refused by name", () => {
  expect(() => toSi(25, "gal", "pressure")).toThrowError(UnitError);
  expect(() => toSi(25, "furlong")).toThrowError(/unknown unit "furlong"/);
  expect(() => convert(25, "inHg", "ft")).toThrowError(/does not measure length/);
  expect(() => toSi(1, "toString")).toThrowError(UnitError);
  try {
    toSi(25, "psi", "volume");
    expect.unreachable();
  } catch (error) {
    expect(error).toMatchObject({ code: "wrong-unit", unit: "psi", expected: "volume" });
  }
});

test("units of one group start with its base", () => {
  expect(unitsOf("pressure")).toEqual(["Pa", "kPa", "bar", "psi", "inHg", "mmHg"]);
  expect(unitsOf("volume")[0]).toBe("m3");
  expect(groupOf("in/32")).toBe("length");
});

/** Names of ours in Debian's `units`, with the SI unit to print. */
const IN_UNITS: Record<Exclude<UnitKey, "degC" | "degF" | "rpm">, [string, string]> = {
  Pa: ["Pa", "Pa"],
  kPa: ["kPa", "Pa"],
  bar: ["bar", "Pa"],
  psi: ["psi", "Pa"],
  inHg: ["inHg", "Pa"],
  mmHg: ["mmHg", "Pa"],
  m: ["m", "m"],
  mm: ["mm", "m"],
  km: ["km", "m"],
  in: ["inch", "m"],
  "in/32": ["inch/32", "m"],
  ft: ["ft", "m"],
  mi: ["mile", "m"],
  m3: ["m^3", "m^3"],
  L: ["liter", "m^3"],
  gal: ["usgallon", "m^3"],
  qt: ["usquart", "m^3"],
  cup: ["uscup", "m^3"],
  "fl-oz": ["usfloz", "m^3"],
  "m3/s": ["m^3/s", "m^3/s"],
  "m3/h": ["m^3/hour", "m^3/s"],
  "L/s": ["liter/s", "m^3/s"],
  cfm: ["ft^3/min", "m^3/s"],
  K: ["K", "K"],
  s: ["s", "s"],
  min: ["min", "s"],
  h: ["hour", "hour"],
};

function gnuUnits(from: string, to: string): number {
  const run = spawnSync("units", ["-t", "-d", "15", from, to], { encoding: "utf8" });
  if (run.error) throw new Error("Debian's `units` is not installed: apt-get install units");
  const value = Number(run.stdout.trim());
  if (run.status !== 0 || !Number.isFinite(value)) throw new Error(`units: ${run.stdout}`);
  return value;
}

test("every factor agrees with Debian's units to 1e-9", () => {
  for (const [unit, [name, si]] of Object.entries(IN_UNITS)) {
    close(toSi(1, unit), gnuUnits(name, si));
  }
  for (const celsius of [-40, 0, 37, 121.5]) {
    close(toSi(celsius, "degC"), gnuUnits(`tempC(${celsius})`, "K"));
    close(toSi(celsius, "degF"), gnuUnits(`tempF(${celsius})`, "K"));
  }
});
