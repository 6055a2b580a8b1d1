import { expect, test } from "vitest";
import { greatestVacuum, stationPressure, vacuumAtElevation } from "~/trade/atmosphere";
import { fromSi, toSi } from "~/trade/units";

// U.S. Standard Atmosphere 1976; printed tables of station pressure in inches of mercury.
const TABLE: [feet: number, inHg: number, kPa: number][] = [
  [0, 29.921256, 101.325],
  [1000, 28.855686, 97.71657],
  [2000, 27.821054, 94.2129],
  [3000, 26.816668, 90.81166],
  [5000, 24.89592, 84.30726],
  [5280, 24.636149, 83.42757],
  [8000, 22.224961, 75.26236],
  [10000, 20.576976, 69.68164],
];

test("station pressure follows the standard atmosphere", () => {
  for (const [feet, inHg, kPa] of TABLE) {
    const pressure = stationPressure(toSi(feet, "ft"));
    expect(Math.abs(fromSi(pressure, "inHg") - inHg), `${feet} ft`).toBeLessThan(0.000_05);
    expect(Math.abs(fromSi(pressure, "kPa") - kPa), `${feet} ft`).toBeLessThan(0.000_1);
  }
});

test("a 25 inHg setting cannot be reached at 5280 ft on a standard day", () => {
  expect(greatestVacuum(toSi(5280, "ft"))).toBeLessThan(toSi(25, "inHg"));
  expect(greatestVacuum(toSi(2000, "ft"))).toBeGreaterThan(toSi(25, "inHg"));
});

// Constant residual: a pump that makes 27 inHg at sea level.
test("a pump leaves the same pressure behind at every yard", () => {
  const at = (feet: number) =>
    fromSi(vacuumAtElevation(toSi(27, "inHg"), toSi(feet, "ft")), "inHg");
  expect(at(2000)).toBeCloseTo(24.9, 2);
  expect(at(5000)).toBeCloseTo(21.97, 2);
  expect(at(7500)).toBeCloseTo(19.73, 2);
});

test("an elevation no truck is parked at is refused", () => {
  expect(() => stationPressure(9000)).toThrow(RangeError);
  expect(() => stationPressure(Number.NaN)).toThrow(RangeError);
});
