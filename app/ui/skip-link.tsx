import { uiText } from "~/text/en/ui";

/** First stop of the keyboard: past the header, to `#page`. */
export function SkipLink() {
  return (
    <a
      href="#page"
      className="sr-only z-50 bg-card px-4 py-3 font-bold underline focus:not-sr-only focus:absolute focus:top-2 focus:left-2"
    >
      {uiText.skip}
    </a>
  );
}
