import { useEffect, useRef } from "react";
import { walkText } from "~/text/en/walk";
import { Notice } from "~/ui/notice";

/** A check without an answer that stands. */
export interface Gap {
  key: string;
  label: string;
  /** What is wrong with the answer; null where there is none. */
  fault: string | null;
}

/** The id of a check's place on the page. */
export function placeOf(key: string): string {
  return `check-${key.replaceAll(".", "-")}`;
}

/** What is still missing before the walk can clear anything, each a way to its check. */
export function WalkGaps({ gaps }: { gaps: readonly Gap[] }) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (gaps.length > 0) box.current?.focus();
  }, [gaps]);
  if (gaps.length === 0) return null;
  return (
    <div ref={box} tabIndex={-1} className="outline-none">
      <Notice tone="limit" announce="now" title={walkText.missing(gaps.length)}>
        <ul className="my-2 list-disc pl-5">
          {gaps.map(({ key, label, fault }) => (
            <li key={key}>
              <a href={`#${placeOf(key)}`} className="inline-flex min-h-11 items-center underline">
                {label}
              </a>
              {fault && <p>{fault}</p>}
            </li>
          ))}
        </ul>
        <p>{walkText.missingNote}</p>
      </Notice>
    </div>
  );
}
