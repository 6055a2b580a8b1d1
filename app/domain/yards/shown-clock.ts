/** Minutes after midnight as a clock shows them: 330 is "05:30". */
export function shownClock(minute: number): string {
  const part = (count: number) => String(count).padStart(2, "0");
  return `${part(Math.floor(minute / 60))}:${part(minute % 60)}`;
}
