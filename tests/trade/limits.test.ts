import fc from "fast-check";
import { expect, test } from "vitest";
import { foldLimits, type Needs, needsMask } from "~/trade/limits";
import { toSi } from "~/trade/units";

const none: Needs = {
  pressureOffLoad: false,
  towing: false,
  hazmat: false,
  vacuumPa: 0,
  fillL: 0,
  hoseM: 0,
};
const liters = (gallons: number) => toSi(gallons, "gal") * 1000;
const meters = (feet: number) => toSi(feet, "ft");

test("a load of just the limit is inside it, and one gallon more is not", () => {
  fc.assert(
    fc.property(fc.integer({ min: 100, max: 9000 }), (gallons) => {
      const { fillL } = foldLimits([{ kind: "fill-no-more", fillL: liters(gallons) }]);
      const asks = (load: number) => needsMask({ ...none, fillL: liters(load) }).fillL!;
      expect(asks(gallons)).toBeLessThanOrEqual(fillL!);
      expect(asks(gallons + 1)).toBeGreaterThan(fillL!);
    }),
  );
});

test("a hose of just the limit is inside it, and one foot more is not", () => {
  fc.assert(
    fc.property(fc.integer({ min: 10, max: 600 }), (feet) => {
      const { hoseMm } = foldLimits([{ kind: "hose-no-longer", hoseM: meters(feet) }]);
      const asks = (length: number) => needsMask({ ...none, hoseM: meters(length) }).hoseMm!;
      expect(asks(feet)).toBeLessThanOrEqual(hoseMm!);
      expect(asks(feet + 1)).toBeGreaterThan(hoseMm!);
    }),
  );
});
