/** A number and its unit, never apart. `reading` is the one number a screen is about. */
export function Measure({
  value,
  unit,
  size = "text",
}: {
  /** Already rounded and formatted. */
  value: string;
  unit: string;
  size?: "text" | "reading";
}) {
  const reading = size === "reading";
  return (
    <span className={`whitespace-nowrap tabular-nums ${reading ? "text-reading font-bold" : ""}`}>
      {value} <span className={reading ? "text-lg font-normal text-mute" : ""}>{unit}</span>
    </span>
  );
}
