const MONTHS = "Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec".split(" ");

export type TimeShow = "clock" | "day" | "day-clock";

/** "05:12", "Dec 1" or "Dec 1, 05:12" on the yard's clock. */
function shownTime(at: Date, zone: string, show: TimeShow): string {
  const format = new Intl.DateTimeFormat("en-US", {
    timeZone: zone,
    month: "numeric",
    day: "numeric",
    hour: "2-digit",
    minute: "2-digit",
    hourCycle: "h23",
  });
  const part = Object.fromEntries(format.formatToParts(at).map(({ type, value }) => [type, value]));
  const day = `${MONTHS[Number(part.month) - 1]} ${part.day}`;
  const clock = `${part.hour}:${part.minute}`;
  return { clock, day, "day-clock": `${day}, ${clock}` }[show];
}

/** An instant, in the yard's zone. */
export function Time({
  at,
  zone,
  show = "day-clock",
}: {
  at: Date;
  /** The yard's zone, "America/Denver". */
  zone: string;
  show?: TimeShow;
}) {
  // An old phone's zone data may differ: what the server wrote stays.
  return (
    <time
      dateTime={at.toISOString()}
      suppressHydrationWarning
      className="whitespace-nowrap tabular-nums"
    >
      {shownTime(at, zone, show)}
    </time>
  );
}
