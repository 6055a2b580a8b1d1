import type { ReactNode } from "react";
import { Link } from "react-router";
import { uiText } from "~/text/en/ui";
import type { StandingWord } from "~/trade/standing/standing";
import { type HungTag, HungTags } from "./hung-tags";
import { KeyBlade } from "./key-blade";
import { Peg } from "./peg";
import { StandingGlyph } from "./standing-glyph";

const FEET: Record<StandingWord, string> = {
  held: "bg-red",
  "walk-due": "bg-blue",
  limited: "bg-yellow",
  cleared: "bg-green",
  out: "",
};
const EDGES: Record<StandingWord, string> = {
  held: "border-ink bg-card",
  "walk-due": "border-dashed border-ink bg-card",
  limited: "border-ink bg-card",
  cleared: "border-ink bg-card",
  out: "border-dashed border-edge",
};

/** Unit numbers stay on one line: a longer one is set smaller. */
const SMALL = { short: "text-3xl", middle: "text-2xl", long: "text-lg" };
const LARGE = { short: "text-[3.5rem]", middle: "text-[2.75rem]", long: "text-3xl" };

export interface KeyTagProps {
  /** Unit number, as painted on the truck. */
  unit: string;
  standing: StandingWord;
  /** One line why, or what else to know ("No pressure off-load", "Run 31, out 05:55"). */
  why?: ReactNode;
  /** Open red tags; on an empty peg too, where they alert. */
  red?: readonly HungTag[];
  /** Where a press on the tag goes. */
  to?: string;
  /** `large` is the one tag of a brief or a review, `peg` one of many on the board. */
  size?: "peg" | "large";
  /** What the unit number is on its page, for the headings' order. */
  heading?: "h1" | "h2" | "h3" | "p";
}

/** A truck on its peg: unit number, standing, why, colored foot; an empty peg when it is out. */
export function KeyTag({
  unit,
  standing,
  why,
  red = [],
  to,
  size = "peg",
  heading: Heading = "p",
}: KeyTagProps) {
  const large = size === "large";
  const out = standing === "out";
  const fit = unit.length <= 6 ? "short" : unit.length <= 8 ? "middle" : "long";
  return (
    <article
      className={`relative isolate mt-7 flex break-inside-avoid flex-col rounded-lg outline-offset-2 outline-brass has-[a:focus-visible]:outline-3 ${
        large ? "mb-10 px-6 pb-6 pt-9 text-center" : "min-h-38 px-3.5 pb-5 pt-7"
      }`}
    >
      {!out && <KeyBlade large={large} />}
      <span
        aria-hidden="true"
        className={`absolute inset-0 -z-10 rounded-lg border-2 ${EDGES[standing]}`}
      />
      <Peg empty={out} />
      <Heading
        className={`font-stencil leading-none ${large ? LARGE[fit] : SMALL[fit]} ${out ? "text-mute" : ""}`}
      >
        {to ? (
          <Link to={to} className="no-underline outline-none after:absolute after:inset-0">
            {unit}
          </Link>
        ) : (
          unit
        )}
      </Heading>
      <div className={`flex ${large ? "mt-3 justify-center" : "mt-2"}`}>
        <StandingGlyph word={standing} large={large} />
      </div>
      {out && <span className="sr-only">{uiText.noKey}</span>}
      {why && <p className={`text-mute ${large ? "mt-2" : "mt-1 text-sm"}`}>{why}</p>}
      {red.length > 0 && (
        <div className="mt-auto pt-1">
          <HungTags tags={red} large={large} />
        </div>
      )}
      {!out && (
        <span
          aria-hidden="true"
          className={`absolute inset-x-0.5 bottom-0.5 -z-10 rounded-b-[0.75rem] ${large ? "h-3.5" : "h-2"} ${FEET[standing]}`}
        />
      )}
    </article>
  );
}
