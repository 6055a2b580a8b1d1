/** A tag's colour: red holds the key, yellow limits the truck, white is to watch. */
export const COLOURS = ["white", "yellow", "red"] as const;
export type Colour = (typeof COLOURS)[number];

/** Rank of a colour, 0 (white) to 2 (red), to compare "the driver may raise it, never lower it". */
export function colourRank(colour: Colour): number {
  return COLOURS.indexOf(colour);
}

/**
 * What a yellow tag forbids. Values are SI: a depth of vacuum in pascals below the
 * yard's air, a fill in litres, a hose length in metres.
 */
export type Limit =
  | { kind: "no-pressure-off-load" }
  | { kind: "no-vacuum-work" }
  | { kind: "no-towing" }
  | { kind: "no-hazmat" }
  | { kind: "vacuum-no-deeper"; vacuumPa: number }
  | { kind: "fill-no-more"; fillL: number }
  | { kind: "hose-no-longer"; hoseM: number };

export type LimitKind = Limit["kind"];

/** Bits of `limits_mask` and of a run's needs mask; the numeric limits have columns of their own. */
export const LIMIT_BITS = {
  "no-pressure-off-load": 1,
  "no-vacuum-work": 2,
  "no-towing": 4,
  "no-hazmat": 8,
} as const satisfies Partial<Record<LimitKind, number>>;

/**
 * What a run needs of a truck. Every need is answered: zero or false means "not needed",
 * and an unanswered need (null) refuses the handover.
 */
export interface Needs {
  pressureOffLoad: boolean | null;
  towing: boolean | null;
  hazmat: boolean | null;
  /** Depth of vacuum below the yard's air, Pa; 0 when no vacuum work is needed. */
  vacuumPa: number | null;
  /** Load to be carried, L; 0 when none. */
  fillL: number | null;
  /** Hose to be laid, m; 0 when none. */
  hoseM: number | null;
}

/** The limits in force on a truck, folded together. Null means no limit of that kind. */
export interface LimitsInForce {
  mask: number;
  vacuumPa: number | null;
  fillL: number | null;
  hoseMm: number | null;
}

export const NO_LIMITS: LimitsInForce = { mask: 0, vacuumPa: null, fillL: null, hoseMm: null };

function lower(a: number | null, b: number): number {
  return a === null ? b : Math.min(a, b);
}

/** Folds limits into one mask and the lowest of each numeric limit. */
export function foldLimits(limits: readonly Limit[]): LimitsInForce {
  const folded = { ...NO_LIMITS };
  for (const limit of limits) {
    switch (limit.kind) {
      case "vacuum-no-deeper":
        folded.vacuumPa = lower(folded.vacuumPa, Math.round(limit.vacuumPa));
        break;
      case "fill-no-more":
        folded.fillL = lower(folded.fillL, Math.round(limit.fillL));
        break;
      case "hose-no-longer":
        folded.hoseMm = lower(folded.hoseMm, Math.round(limit.hoseM * 1000));
        break;
      default:
        folded.mask |= LIMIT_BITS[limit.kind];
    }
  }
  return folded;
}

/** The needs as the gate compares them. Null when a need is unanswered, which refuses. */
export interface NeedsMask {
  mask: number | null;
  vacuumPa: number | null;
  fillL: number | null;
  hoseMm: number | null;
}

/** Turns needs into the gate's numbers: bits for what is forbidden, and whole Pa, L and mm, rounded as limits are: a full tank is no more than the tank. */
export function needsMask(needs: Needs): NeedsMask {
  const answered =
    needs.pressureOffLoad !== null &&
    needs.towing !== null &&
    needs.hazmat !== null &&
    needs.vacuumPa !== null;
  let mask: number | null = null;
  if (answered) {
    mask = 0;
    if (needs.pressureOffLoad) mask |= LIMIT_BITS["no-pressure-off-load"];
    if (needs.towing) mask |= LIMIT_BITS["no-towing"];
    if (needs.hazmat) mask |= LIMIT_BITS["no-hazmat"];
    if ((needs.vacuumPa ?? 0) > 0) mask |= LIMIT_BITS["no-vacuum-work"];
  }
  return {
    mask,
    vacuumPa: needs.vacuumPa === null ? null : Math.round(needs.vacuumPa),
    fillL: needs.fillL === null ? null : Math.round(needs.fillL),
    hoseMm: needs.hoseM === null ? null : Math.round(needs.hoseM * 1000),
  };
}
