import type { ReactNode } from "react";
import { tagText } from "~/text/en/ui";
import type { Colour } from "~/trade/limits";

const HANG_TAG = "M7 2h16.5A2.5 2.5 0 0 1 26 4.5v11a2.5 2.5 0 0 1-2.5 2.5H7l-5.5-5v-6z";

const DRAWINGS: Record<Colour, ReactNode> = {
  red: (
    <>
      <path d={HANG_TAG} className="fill-tag-red stroke-tag-edge" />
      <circle cx="7" cy="10" r="1.6" className="fill-tag-white" />
      <path d="M12.5 10h9" className="stroke-tag-white" strokeWidth="3.5" />
    </>
  ),
  yellow: (
    <>
      <path d={HANG_TAG} className="fill-tag-white" />
      <path d="M4.8 10H26v5.5a2.5 2.5 0 0 1-2.5 2.5H7l-5.5-5v-3z" className="fill-yellow" />
      <path d={`${HANG_TAG}M1.5 10H26`} className="fill-none stroke-ink" />
      <circle cx="7" cy="7" r="1.6" className="fill-tag-ink" />
    </>
  ),
  white: (
    <>
      <path d={HANG_TAG} className="fill-tag-white stroke-ink" />
      <circle cx="7" cy="10" r="1.6" className="fill-tag-ink" />
      <circle cx="17" cy="10" r="2.6" className="fill-none stroke-tag-ink" strokeWidth="2" />
    </>
  ),
};

/** A defect tag drawn small, hidden from screen readers: always beside its words. */
export function TagDrawing({ colour }: { colour: Colour }) {
  return (
    <svg
      viewBox="0 0 28 20"
      aria-hidden="true"
      strokeWidth="1.5"
      strokeLinecap="round"
      strokeLinejoin="round"
      className="h-5 w-7 shrink-0"
    >
      {DRAWINGS[colour]}
    </svg>
  );
}

/** A tag's color: drawing and words. */
export function TagGlyph({ colour }: { colour: Colour }) {
  return (
    <span className="inline-flex items-center gap-2 font-bold">
      <TagDrawing colour={colour} />
      {tagText[colour]}
    </span>
  );
}
