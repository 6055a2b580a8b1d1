/** One half of a compound gauge: vacuum runs left of zero, pressure right of it. */
export type DialSide = "vacuum" | "pressure";

export interface DialScale {
  /** As written on the gauge: "inHg", "psi". */
  unit: string;
  /** The scale's end, in that unit; it starts at zero. */
  max: number;
  /** Every how many units a number stands. */
  numbered: number;
}

export const CENTER = 160;
/** Degrees from zero, at the top, to either end of the scale. */
const SWEEP = 135;

/** Degrees clockwise from the top for a value on one side, 0 to ±135. */
export function angleOf(value: number, scale: DialScale, side: DialSide): number {
  const turn = (Math.min(Math.max(value, 0), scale.max) / scale.max) * SWEEP;
  return side === "vacuum" ? -turn : turn;
}

/** The value under a point given from the dial's center (x right, y down), on a step of the scale. */
export function valueAt(
  x: number,
  y: number,
  scale: DialScale,
  side: DialSide,
  step: number,
): number {
  const clockwise = (Math.atan2(x, -y) * 180) / Math.PI;
  const turn = side === "vacuum" ? -clockwise : clockwise;
  return onStep((turn / SWEEP) * scale.max, scale, step);
}

/** The nearest step, kept on the scale. */
export function onStep(value: number, scale: DialScale, step: number): number {
  return Math.min(Math.max(Math.round(value / step) * step, 0), scale.max);
}

export function pointAt(angle: number, radius: number): [x: number, y: number] {
  const turn = (angle * Math.PI) / 180;
  return [round(CENTER + radius * Math.sin(turn)), round(CENTER - radius * Math.cos(turn))];
}

/** An arc's path between two angles, either way round. */
export function arcPath(from: number, to: number, radius: number): string {
  const [a, b] = from < to ? [from, to] : [to, from];
  const large = b - a > 180 ? 1 : 0;
  return `M${pointAt(a, radius).join(" ")}A${radius} ${radius} 0 ${large} 1 ${pointAt(b, radius).join(" ")}`;
}

/** A line along the radius. */
export function spokePath(angle: number, inner: number, outer: number): string {
  return `M${pointAt(angle, inner).join(" ")}L${pointAt(angle, outer).join(" ")}`;
}

/** Values from zero to the end, `every` apart. */
export function ticks(scale: DialScale, every: number): number[] {
  return Array.from({ length: Math.floor(scale.max / every) + 1 }, (_, n) => n * every);
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
