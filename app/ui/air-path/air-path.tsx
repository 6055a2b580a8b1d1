import { Link } from "react-router";
import { uiText } from "~/text/en/ui";
import { PART_SHAPES, type PartShape } from "./part-shapes";

export type PartState = "good" | "watch" | "limit" | "held" | "to-check";

export interface AirPathPart {
  key: string;
  label: string;
  shape: PartShape;
  state: PartState;
  /** What its state comes from: "Float ball missing". */
  note?: string;
  /** Opens the part: an address, or what to do. */
  to?: string;
  onOpen?: () => void;
}

const FRAMES: Record<PartState, string> = {
  good: "border-edge bg-card stroke-ink",
  watch: "border-ink bg-card stroke-ink",
  limit: "border-ink bg-yellow stroke-tag-ink",
  held: "border-tag-edge bg-tag-red stroke-tag-white",
  "to-check": "border-dashed border-blue bg-card stroke-blue",
};

/**
 * The truck's own line from tank to outlet. Under vacuum air runs from the tank to the outlet; in
 * pressure mode it is drawn back in, and the arrows turn. A column on a phone, a row where it fits.
 */
export function AirPath({
  parts,
  mode,
}: {
  parts: readonly AirPathPart[];
  mode: "vacuum" | "pressure";
}) {
  return (
    <div className="@container">
      <ol
        aria-label={uiText.airPath.label[mode]}
        className="flex flex-col @4xl:grid @4xl:auto-cols-fr @4xl:grid-flow-col"
      >
        {parts.map((part, index) => (
          <li key={part.key} className="relative pb-7 last:pb-0 @4xl:pb-0">
            {index < parts.length - 1 && <Pipe back={mode === "pressure"} />}
            <Part part={part} />
          </li>
        ))}
      </ol>
    </div>
  );
}

function Part({ part }: { part: AirPathPart }) {
  const { label, state, note, to, onOpen } = part;
  const className =
    "relative flex w-full items-center gap-4 rounded-md text-left no-underline @4xl:flex-col @4xl:gap-2 @4xl:px-1 @4xl:text-center";
  const inside = (
    <>
      <svg
        viewBox="-8 -8 64 64"
        aria-hidden="true"
        strokeWidth="2.5"
        strokeLinecap="round"
        strokeLinejoin="round"
        className={`size-16 shrink-0 rounded-lg border-2 fill-none ${FRAMES[state]}`}
      >
        {PART_SHAPES[part.shape]}
      </svg>
      <span className="min-w-0">
        <span className={`block font-bold leading-tight ${to || onOpen ? "underline" : ""}`}>
          {label}
        </span>
        <span className="block text-sm leading-tight text-mute">
          {uiText.airPath.state[state]}
          {note && `: ${note}`}
        </span>
      </span>
    </>
  );
  if (to) {
    return (
      <Link to={to} className={className}>
        {inside}
      </Link>
    );
  }
  if (onOpen) {
    return (
      <button type="button" onClick={onOpen} className={className}>
        {inside}
      </button>
    );
  }
  return <div className={className}>{inside}</div>;
}

/** From one part to the next: down on a phone, to the right in a row. The head says which way air goes. */
function Pipe({ back }: { back: boolean }) {
  return (
    <svg
      viewBox="0 0 28 12"
      aria-hidden="true"
      className="absolute bottom-2 left-4.5 h-3 w-7 rotate-90 @4xl:bottom-auto @4xl:left-full @4xl:top-[1.625rem] @4xl:-translate-x-1/2 @4xl:rotate-0"
    >
      <path d="M0 3.5h28M0 8.5h28" className="stroke-line" strokeWidth="2" />
      <path
        d={back ? "M18 1 9 6l9 5Z" : "M10 1l9 5-9 5Z"}
        className="fill-ink stroke-paper"
        strokeWidth="1"
      />
    </svg>
  );
}
