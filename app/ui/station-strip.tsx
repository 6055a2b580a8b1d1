import { Link } from "react-router";
import { uiText } from "~/text/en/ui";
import type { Colour } from "~/trade/limits";

export type StationState = "done" | "now" | "tagged" | "to-come";

export interface StripStation {
  key: string;
  name: string;
  state: StationState;
  /** The worst tag raised at a tagged station. */
  colour?: Colour;
  to?: string;
}

const LOOKS: Record<StationState, string> = {
  done: "border-enamel bg-enamel text-card",
  now: "border-ink bg-card text-ink border-[3px] font-bold",
  tagged: "",
  "to-come": "border-line text-mute",
};
const TAGGED: Record<Colour, string> = {
  red: "border-tag-edge bg-tag-red text-tag-white",
  yellow: "border-ink bg-yellow text-tag-ink",
  white: "border-ink bg-tag-white text-tag-ink",
};

/** The walk's stations in walking order. A tagged one has a tag's hole, so that color is not its only sign. */
export function StationStrip({ stations }: { stations: readonly StripStation[] }) {
  const done = stations.filter(({ state }) => state === "done" || state === "tagged").length;
  return (
    <ol aria-label={uiText.strip.label(done, stations.length)} className="flex gap-1 sm:gap-1.5">
      {stations.map((station, index) => (
        <li
          key={station.key}
          aria-current={station.state === "now" ? "step" : undefined}
          className="min-w-0 flex-1"
        >
          <Cell station={station} number={index + 1} />
        </li>
      ))}
    </ol>
  );
}

function Cell({ station, number }: { station: StripStation; number: number }) {
  const { name, state, colour = "yellow", to } = station;
  const look = state === "tagged" ? TAGGED[colour] : LOOKS[state];
  const className = `relative flex h-11 items-center justify-center rounded-sm border-2 tabular-nums no-underline ${look}`;
  const inside = (
    <>
      {state === "tagged" && (
        <span
          aria-hidden="true"
          className="absolute left-1/2 top-1 size-1.5 -translate-x-1/2 rounded-full bg-current"
        />
      )}
      <span aria-hidden="true">{number}</span>
      <span className="sr-only">{uiText.strip.station(number, name, uiText.strip[state])}</span>
    </>
  );
  if (to) {
    return (
      <Link to={to} className={className}>
        {inside}
      </Link>
    );
  }
  return <div className={className}>{inside}</div>;
}
