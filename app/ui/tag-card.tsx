import type { ReactNode } from "react";
import { Link } from "react-router";
import { uiText } from "~/text/en/ui";
import type { Colour } from "~/trade/limits";
import { TagGlyph } from "./tag-glyph";

const TOPS: Record<Colour, string> = {
  red: "bg-tag-red",
  yellow: "bg-yellow",
  white: "bg-tag-white border-b-2 border-ink",
};

export interface TagCardProps {
  colour: Colour;
  /** What is wrong: "Float ball missing". */
  title: string;
  /** Part or place: "Primary trap". */
  where?: string;
  /** When and by whom, as a `<Time>` or words. */
  since: ReactNode;
  /** What a yellow tag forbids, in words. */
  limit?: string;
  /** How many there are; left out where they are not shown. */
  photos?: number;
  to?: string;
  heading?: "h2" | "h3";
  /** Photos, notes, a sign-off: what else belongs to it. */
  children?: ReactNode;
}

/** A defect's tag in full. */
export function TagCard({
  colour,
  title,
  where,
  since,
  limit,
  photos,
  to,
  heading: Heading = "h3",
  children,
}: TagCardProps) {
  return (
    <article className="relative break-inside-avoid overflow-hidden rounded-lg border-2 border-ink bg-card">
      <div aria-hidden="true" className={`h-3 ${TOPS[colour]}`} />
      <div className="p-4">
        <p className="flex flex-wrap items-center justify-between gap-x-4 text-sm">
          <TagGlyph colour={colour} />
          {photos !== undefined && <span className="text-mute">{uiText.photos(photos)}</span>}
        </p>
        <Heading className="mt-2 text-lg font-bold leading-tight">
          {to ? (
            <Link to={to} className="no-underline after:absolute after:inset-0">
              {title}
            </Link>
          ) : (
            title
          )}
        </Heading>
        {where && <p className="text-mute">{where}</p>}
        {limit && (
          <p className="mt-2 border-l-4 border-yellow pl-3">
            <strong>{uiText.limit}:</strong> {limit}
          </p>
        )}
        <p className="mt-2 text-sm text-mute">
          {uiText.since} {since}
        </p>
        {children && <div className="relative mt-4">{children}</div>}
      </div>
    </article>
  );
}
