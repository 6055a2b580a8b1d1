/** The drawing's box, in its own units; the page scales it. */
export const BOX = { width: 480, height: 270, left: 46, right: 14, top: 14, bottom: 40 };

/** From a range of values to a range of the drawing. */
export function linear(from: readonly [number, number], to: readonly [number, number]) {
  const span = from[1] - from[0] || 1;
  return (value: number) =>
    Math.round((to[0] + ((value - from[0]) / span) * (to[1] - to[0])) * 10) / 10;
}

/** The least and the greatest of what must be seen, with a little air round it. */
export function rangeOf(values: readonly number[], air: number): [number, number] {
  const least = Math.min(...values);
  const greatest = Math.max(...values);
  const room = (greatest - least || 1) * air;
  return [least - room, greatest + room];
}
