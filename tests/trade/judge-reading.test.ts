import { expect, test } from "vitest";
import { greatestVacuum } from "~/trade/atmosphere";
import type { ReadingSpec } from "~/trade/sheet/check";
import { allChecks } from "~/trade/sheet/due-checks";
import { judgeReading } from "~/trade/sheet/judge-reading";
import { fromSi, toSi } from "~/trade/units";
import { grease, point, septic, sheetOf } from "./trucks";

function specOf(key: string, truck = septic): ReadingSpec {
  const check = allChecks(sheetOf(truck)).find((one) => one.key === key);
  if (!check?.reading) throw new Error(`no reading at ${key}`);
  return check.reading;
}

const inHg = (value: number, heard?: boolean, truck = septic) =>
  judgeReading(specOf("run-up.vacuum", truck), toSi(value, "inHg"), heard);

// Set point 21, band 19 to 23, stop 26 inHg.
test("a relief heard to open is judged by its band, ends of the band included", () => {
  expect(inHg(21, true)).toEqual({ word: "in-band", problemKey: null });
  expect(inHg(19, true).word).toBe("in-band");
  expect(inHg(23, true).word).toBe("in-band");
  expect(inHg(18.5, true)).toEqual({ word: "below", problemKey: "opens-low" });
  expect(inHg(23.5, true)).toEqual({ word: "above", problemKey: "opens-high" });
});

test("not heard, the number is the pump's end vacuum and not the relief", () => {
  expect(inHg(21, false)).toEqual({ word: "in-band", problemKey: "not-heard" });
  expect(inHg(18, false)).toEqual({ word: "below", problemKey: "weak" });
});

test("past the stop, or at it with no relief, the operator stops", () => {
  expect(inHg(26.5, true)).toEqual({ word: "past-stop", problemKey: "did-not-open" });
  expect(inHg(26, false)).toEqual({ word: "past-stop", problemKey: "did-not-open" });
  expect(inHg(26, true)).toEqual({ word: "above", problemKey: "opens-high" });
});

test("a value off the gauge's scale is refused, not judged", () => {
  for (const value of [30.5, -1, Number.NaN, Number.POSITIVE_INFINITY]) {
    expect(inHg(value, true)).toEqual({ word: "off-scale", problemKey: null });
  }
});

// 25 inHg cannot be reached at 5280 ft on a standard day (24.64 inHg): a third verdict.
test("a set point above the yard's ceiling is not reachable here, which is no fault", () => {
  const yard = { elevationM: toSi(5280, "ft") };
  const high = { ...grease, yard };
  expect(fromSi(greatestVacuum(yard.elevationM), "inHg")).toBeCloseTo(24.636149, 5);
  expect(inHg(22, false, high)).toEqual({ word: "not-reachable-here", problemKey: null });
  // Least for a pump that should make 24 at sea level: 24.64 - (29.92 - 24) = 18.71 inHg.
  expect(inHg(18.8, false, high).problemKey).toBeNull();
  expect(inHg(18.6, false, high)).toEqual({ word: "not-reachable-here", problemKey: "weak" });
  // Heard to open that early, it is the relief after all.
  expect(inHg(22, true, high)).toEqual({ word: "below", problemKey: "opens-low" });
});

test("a set point the yard can reach is judged as everywhere", () => {
  const high = { ...septic, yard: { elevationM: toSi(5280, "ft") } };
  expect(inHg(18, false, high)).toEqual({ word: "below", problemKey: "weak" });
});

// CDL manual 5.3: 3.0 psi a minute passes applied, 2.0 fails released; the warning acts before 60.
test("air brakes are judged to the letter of the manual", () => {
  const psi = (key: string, value: number) => judgeReading(specOf(key), toSi(value, "psi")).word;
  expect(psi("cab.applied-leak-down", 3)).toBe("in-band");
  expect(psi("cab.applied-leak-down", 3.5)).toBe("above");
  expect(psi("cab.released-leak-down", 1.5)).toBe("in-band");
  expect(psi("cab.released-leak-down", 2)).toBe("above");
  expect(psi("cab.low-air-warning", 60)).toBe("in-band");
  expect(psi("cab.low-air-warning", 59)).toBe("below");
  expect(psi("cab.spring-brake", 20)).toBe("in-band");
  expect(psi("cab.spring-brake", 46)).toBe("above");
});

// 49 CFR 393.75(b) and (c).
test("tread under 4/32 on the steer axle or 2/32 elsewhere fails", () => {
  const tread = (key: string, value: number) =>
    judgeReading(specOf(key), toSi(value, "in/32")).word;
  expect([tread("cab.steer-tread", 4), tread("cab.steer-tread", 3)]).toEqual(["in-band", "below"]);
  expect([tread("cab.tread", 2), tread("cab.tread", 1)]).toEqual(["in-band", "below"]);
});

test("a reading without a band is kept and not judged", () => {
  expect(judgeReading(specOf("cab.pump-hours"), 4211.3)).toEqual({
    word: "recorded",
    problemKey: null,
  });
});

test("a reading typed in another unit is the same reading", () => {
  const kPa = judgeReading(
    specOf("run-up.vacuum"),
    toSi(fromSi(toSi(19, "inHg"), "kPa"), "kPa"),
    true,
  );
  expect(kPa.word).toBe("in-band");
});

test("a set point without a band is only held against its stop", () => {
  const truck = { ...septic, setPoints: [point("vacuum-relief", "inHg", 21, [null, null], 26)] };
  expect(inHg(12, true, truck).word).toBe("recorded");
  expect(inHg(27, true, truck).word).toBe("past-stop");
});
