import type { Fitting } from "../fittings";
import type { SetPoint } from "../set-points";
import type { Sheet, UnitKind } from "./check";

/** JSON with keys in one order and nothing undefined, so that equal records are equal text. */
function canonical(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonical).join(",")}]`;
  if (value !== null && typeof value === "object") {
    const members = Object.entries(value)
      .filter(([, member]) => member !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, member]) => `${JSON.stringify(key)}:${canonical(member)}`);
    return `{${members.join(",")}}`;
  }
  return JSON.stringify(value) ?? "null";
}

/** The text a sheet's hash is taken of. */
export function canonicalSheet(sheet: Sheet): string {
  return canonical(sheet);
}

/**
 * What a walk stands on: when it changes, a walk made before no longer counts. Wording, the
 * carrier's own checks and the order of fittings are not in it.
 */
export function fittingsSignature(
  kind: UnitKind,
  fittings: readonly Fitting[],
  setPoints: readonly SetPoint[],
): string {
  return canonical({
    kind,
    fittings: fittings
      .map(({ id, kind, attributes }) => ({ id, kind, attributes }))
      .sort((a, b) => (a.id < b.id ? -1 : 1)),
    setPoints: setPoints
      .map(({ reading, unit, setPointSi, lowSi, highSi, stopSi }) => ({
        reading,
        unit,
        setPointSi,
        lowSi,
        highSi,
        stopSi,
      }))
      .sort((a, b) => (a.reading < b.reading ? -1 : 1)),
  });
}
