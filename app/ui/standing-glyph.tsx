import type { ReactNode } from "react";
import { standingText } from "~/text/en/ui";
import type { StandingWord } from "~/trade/standing/standing";

const TAG = "M8 1.5h8L22.5 8v16a2.5 2.5 0 0 1-2.5 2.5H4A2.5 2.5 0 0 1 1.5 24V8z";
const LOWER_HALF = "M1.5 15h21v9a2.5 2.5 0 0 1-2.5 2.5H4A2.5 2.5 0 0 1 1.5 24z";

function Hole({ className }: { className: string }) {
  return <circle cx="12" cy="6.5" r="2" className={className} />;
}

const DRAWINGS: Record<StandingWord, ReactNode> = {
  cleared: (
    <>
      <path d={TAG} className="fill-green stroke-green" />
      <Hole className="fill-card" />
      <path d="m6.5 17.5 4 4 7-8.5" className="fill-none stroke-card" strokeWidth="3" />
    </>
  ),
  limited: (
    <>
      <path d={TAG} className="fill-card" />
      <path d={LOWER_HALF} className="fill-yellow" />
      <path d={`${TAG}M1.5 15h21`} className="fill-none stroke-ink" strokeWidth="2" />
      <Hole className="fill-ink" />
    </>
  ),
  held: (
    <>
      <path d={TAG} className="fill-red stroke-red" />
      <Hole className="fill-card" />
      <path d="M6 17h12" className="stroke-card" strokeWidth="4" />
    </>
  ),
  "walk-due": (
    <>
      <path d={TAG} className="fill-card stroke-blue" strokeWidth="2" strokeDasharray="4 2.4" />
      <Hole className="fill-blue" />
      <path d="M12 11.5V18l4.5 3" className="fill-none stroke-blue" strokeWidth="2.5" />
    </>
  ),
  out: (
    <>
      <path d="M1.5 14h21" className="stroke-edge" strokeWidth="3" />
      <circle cx="12" cy="14" r="7.5" className="fill-brass stroke-ink" />
      <circle cx="12" cy="14" r="3.5" className="fill-none stroke-ink" />
    </>
  ),
};

/** The drawing alone, hidden from screen readers: always beside its word. */
function StandingDrawing({
  word,
  className = "h-7 w-6",
}: {
  word: StandingWord;
  className?: string;
}) {
  return (
    <svg
      viewBox="0 0 24 28"
      aria-hidden="true"
      strokeWidth="1.5"
      strokeLinecap="round"
      strokeLinejoin="round"
      className={`shrink-0 ${className}`}
    >
      {DRAWINGS[word]}
    </svg>
  );
}

/** A truck's standing: glyph and word. `large` for the one word a driver waits for. */
export function StandingGlyph({ word, large = false }: { word: StandingWord; large?: boolean }) {
  return (
    <span
      className={`inline-flex items-center font-bold ${large ? "flex-wrap justify-center gap-x-3 text-3xl" : "gap-2 text-lg leading-tight"}`}
    >
      <StandingDrawing word={word} className={large ? "h-12 w-10" : undefined} />
      {standingText[word]}
    </span>
  );
}
