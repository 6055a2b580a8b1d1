import { Link } from "react-router";
import { uiText } from "~/text/en/ui";
import { PART_SHAPES, type PartShape } from "./part-shapes";

type PartState = "good" | "watch" | "limit" | "held" | "to-check";

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
    "relative flex w-full items-start gap-4 rounded-md text-left no-underline @4xl:flex-col @4xl:items-center @4xl:gap-2 @4xl:px-1 @4xl:text-center";
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
      <span className="min-w-0 pt-2 @4xl:pt-0">
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
    <span
      aria-hidden="true"
      className="absolute bottom-0 left-[1.625rem] top-16 flex w-3 items-center justify-center border-x-2 border-edge @4xl:bottom-auto @4xl:left-[calc(50%+2rem)] @4xl:top-[1.625rem] @4xl:h-3 @4xl:w-[calc(100%-4rem)] @4xl:border-x-0 @4xl:border-y-2"
    >
      <svg
        aria-hidden="true"
        viewBox="0 0 20 20"
        className={`size-5 shrink-0 ${back ? "-rotate-90 @4xl:rotate-180" : "rotate-90 @4xl:rotate-0"}`}
      >
        <path d="M3 2l15 8-15 8Z" className="fill-ink stroke-paper" strokeWidth="2" />
      </svg>
    </span>
  );
}
