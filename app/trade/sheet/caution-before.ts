import type { CautionKey } from "./cautions";
import type { Station } from "./check";

/** The caution that stands before a check: its own, unless the station has said it already. */
export function cautionBefore(station: Station, index: number): CautionKey | null {
  const caution = station.checks[index]?.caution ?? null;
  const said = station.checks.slice(0, index).map((check) => check.caution);
  return caution === station.caution || said.includes(caution) ? null : caution;
}
