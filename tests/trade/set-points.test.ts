import { expect, test } from "vitest";
import { judgeSetPoint, plateLimits, type SetPointInput, stopValue } from "~/trade/set-points";
import { toSi } from "~/trade/units";
import { septic } from "./trucks";

const yard = { elevationM: 240 };
const vacuum: SetPointInput = {
  reading: "vacuum-relief",
  unit: "inHg",
  setPoint: 21,
  low: 19,
  high: 23,
  stop: null,
};

function faults(input: Partial<SetPointInput>, fittings = septic.fittings) {
  const verdict = judgeSetPoint({ ...vacuum, ...input }, fittings, yard);
  return verdict.ok ? [] : verdict.faults;
}

test("the stop value is the lowest of tank, pump and gauge", () => {
  expect(plateLimits("vacuum-relief", septic.fittings).map(({ by }) => by)).toEqual([
    "pump",
    "tank",
    "gauge",
  ]);
  expect(stopValue("vacuum-relief", septic.fittings)).toBeCloseTo(toSi(27, "inHg"), 6);
  const verdict = judgeSetPoint(vacuum, septic.fittings, yard);
  expect(verdict).toMatchObject({ ok: true, reachableHere: true });
  if (verdict.ok) expect(verdict.setPoint.stopSi).toBeCloseTo(toSi(27, "inHg"), 6);
});

test("a set point, a band or a stop over the lowest limit is refused, and says which", () => {
  expect(faults({ setPoint: 27.5, high: 28 })).toMatchObject([
    { field: "setPoint", code: "over-limit", by: "pump" },
    { field: "high", code: "over-limit", by: "pump" },
  ]);
  expect(faults({ stop: 29 })).toMatchObject([{ field: "stop", code: "over-limit", by: "pump" }]);
  const [tankOnly] = faults(
    { high: 28.5 },
    septic.fittings.filter(({ kind }) => kind === "tank"),
  );
  expect(tankOnly).toMatchObject({ field: "high", code: "over-limit", by: "tank" });
  const [gauge] = faults(
    { setPoint: 31, high: 32, low: 30 },
    septic.fittings.filter(({ kind }) => kind === "compound-gauge"),
  );
  expect(gauge).toMatchObject({ code: "over-limit", by: "gauge" });
});

test("a value equal to its limit is allowed", () => {
  expect(faults({ setPoint: 25, high: 27, stop: 27 })).toEqual([]);
});

test("a band holds its set point and a stop is not below the band", () => {
  expect(faults({ low: 22 })).toEqual([
    { field: "low", code: "band-leaves-out-set-point", setPoint: 21 },
  ]);
  expect(faults({ high: 20 })).toEqual([
    { field: "high", code: "band-leaves-out-set-point", setPoint: 21 },
  ]);
  expect(faults({ stop: 22 })).toEqual([{ field: "stop", code: "stop-below-band", high: 23 }]);
});

test("a wrong unit of measure, an unknown one and an unknown reading are refused", () => {
  expect(faults({ unit: "gal" })).toEqual([
    { field: "unit", code: "wrong-unit", expected: "pressure" },
  ]);
  expect(faults({ unit: "fathom" })).toEqual([{ field: "unit", code: "unknown-unit" }]);
  expect(faults({ reading: "mood" })).toEqual([{ field: "reading", code: "unknown-reading" }]);
  expect(faults({ setPoint: Number.NaN })).toMatchObject([{ code: "not-a-positive-number" }]);
  expect(faults({ low: -3 })).toMatchObject([{ field: "low", code: "not-a-positive-number" }]);
});

test("pump speed stays on the pump's plate", () => {
  const speed = { reading: "pump-speed", unit: "rpm", low: null, high: null };
  expect(faults({ ...speed, setPoint: 1500 })).toMatchObject([
    { field: "setPoint", code: "over-limit", by: "pump", limit: 1400 },
  ]);
  expect(faults({ ...speed, setPoint: 900 })).toEqual([
    { field: "setPoint", code: "under-plate", limit: 1000 },
  ]);
  expect(faults({ ...speed, setPoint: 1200 })).toEqual([]);
});

test("25 inHg is kept but not reachable at 5280 ft", () => {
  const high = { elevationM: toSi(5280, "ft") };
  const input = { ...vacuum, setPoint: 25, low: 24, high: 26 };
  expect(judgeSetPoint(input, septic.fittings, high)).toMatchObject({
    ok: true,
    reachableHere: false,
  });
});
