import type { Fitting, FittingKind } from "../fittings";
import type { SetPoint, SetPointReading } from "../set-points";
import type { UnitKind } from "./check";

export interface Yard {
  elevationM: number;
  /** The yard's winter: drains can freeze and ladders ice up. */
  winter?: boolean;
}

/** What the catalogue asks of a truck: its fittings, its set points, its yard. */
export interface TruckParts {
  kind: UnitKind;
  yard: Yard;
  all(...kinds: FittingKind[]): Fitting[];
  first(kind: FittingKind): Fitting | null;
  has(...kinds: FittingKind[]): boolean;
  /** How many there are: the sum of `count` over the fittings of the kind, one where it is not set. */
  count(kind: FittingKind): number;
  setPoint(reading: SetPointReading): SetPoint | null;
}

/** Fittings in the order of their ids, which is the order they were fitted in. */
export function truckParts(
  kind: UnitKind,
  fittings: readonly Fitting[],
  setPoints: readonly SetPoint[],
  yard: Yard,
): TruckParts {
  const ordered = [...fittings].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  const all = (...kinds: FittingKind[]) => ordered.filter((one) => kinds.includes(one.kind));
  return {
    kind,
    yard,
    all,
    first: (one) => all(one)[0] ?? null,
    has: (...kinds) => all(...kinds).length > 0,
    count: (one) => all(one).reduce((sum, { attributes }) => sum + (attributes.count ?? 1), 0),
    setPoint: (reading) => setPoints.find((one) => one.reading === reading) ?? null,
  };
}
