import type { ReactNode } from "react";
import { uiText } from "~/text/en/ui";
import type { DialMarks } from "./dial-face";

/** The marks on the face in words and numbers; the gauge's own uncertainty behind a tap. */
export function DialLegend({
  marks: { band, stop, greatest, uncertainty },
  unit,
  shown,
  onToggle,
}: {
  marks: DialMarks;
  unit: string;
  shown: boolean;
  onToggle: () => void;
}) {
  const words = uiText.dial;
  return (
    <div className="mt-2 text-sm">
      <ul className="flex flex-wrap justify-center gap-x-4 gap-y-1">
        {band && (
          <Mark drawing={<rect x="1" y="3" width="14" height="10" className="fill-green" />}>
            {words.band(String(band.from), String(band.to), unit)}
          </Mark>
        )}
        {stop !== undefined && (
          <Mark drawing={<path d="M2 2h12L8 14z" className="fill-red" />}>
            {words.stop(String(stop), unit)}
          </Mark>
        )}
        {greatest !== undefined && (
          <Mark
            drawing={
              <path d="M2 8h14" className="stroke-edge" strokeWidth="11" strokeDasharray="2 3" />
            }
          >
            {words.greatest(String(greatest), unit)}
          </Mark>
        )}
      </ul>
      {uncertainty !== undefined && (
        <p className="text-center">
          <button
            type="button"
            aria-pressed={shown}
            onClick={onToggle}
            className="min-h-11 underline"
          >
            {words.gauge(String(uncertainty), unit)}
          </button>
        </p>
      )}
    </div>
  );
}

function Mark({ drawing, children }: { drawing: ReactNode; children: ReactNode }) {
  return (
    <li className="flex items-center gap-1.5">
      <svg viewBox="0 0 16 16" aria-hidden="true" className="size-4 shrink-0">
        {drawing}
      </svg>
      {children}
    </li>
  );
}
