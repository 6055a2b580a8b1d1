import type { ReactNode } from "react";
import { uiText } from "~/text/en/ui";

export type CautionShape = "warning" | "must" | "must-not";

/** Shapes of ISO 3864-1: a yellow triangle warns, a blue disc says must, a red ring says must not. */
const SIGNS: Record<CautionShape, ReactNode> = {
  warning: (
    <>
      <path
        d="M24 5 44 41H4z"
        className="fill-safety-yellow stroke-tag-ink"
        strokeWidth="3.5"
        strokeLinejoin="round"
      />
      <path
        d="M24 17v11M24 34v.5"
        className="stroke-tag-ink"
        strokeWidth="4.5"
        strokeLinecap="round"
      />
    </>
  ),
  must: (
    <>
      <circle
        cx="24"
        cy="24"
        r="21"
        className="fill-safety-blue stroke-tag-white"
        strokeWidth="2"
      />
      <path
        d="M24 11v16M24 36v.5"
        className="stroke-tag-white"
        strokeWidth="5.5"
        strokeLinecap="round"
      />
    </>
  ),
  "must-not": (
    <>
      <circle cx="24" cy="24" r="22.5" className="fill-tag-white" />
      <circle cx="24" cy="24" r="19" className="fill-none stroke-safety-red" strokeWidth="5" />
      <path d="m11 11 26 26" className="stroke-safety-red" strokeWidth="5" />
    </>
  ),
};

/** A caution before the check it belongs to, in one or two lines. The only place of these shapes. */
export function Caution({
  shape,
  title,
  children,
}: {
  shape: CautionShape;
  title: string;
  children: ReactNode;
}) {
  return (
    <div className="flex flex-wrap items-start gap-x-4 gap-y-2 rounded-lg border-2 border-ink bg-card p-3 pr-4">
      <svg
        viewBox="0 0 48 48"
        role="img"
        aria-label={uiText.caution[shape]}
        className="size-12 shrink-0"
      >
        {SIGNS[shape]}
      </svg>
      <div className="min-w-0 flex-1 basis-40 self-center">
        <p className="font-bold leading-tight">{title}</p>
        <p className="mt-0.5 leading-snug">{children}</p>
      </div>
    </div>
  );
}
