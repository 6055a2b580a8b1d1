import { tagText, uiText } from "~/text/en/ui";

/** An open red tag as it hangs on a key tag: what is wrong, and where. */
export interface HungTag {
  id: string;
  title: string;
  where?: string;
}

const SHOWN = 2;

/** Red tags across a key tag's lower corner, one above another; past two, their number. */
export function HungTags({ tags, large = false }: { tags: readonly HungTag[]; large?: boolean }) {
  const left = tags.length - SHOWN;
  return (
    <ul
      aria-label={uiText.openRed}
      className={`relative z-10 -mb-6 mt-2 flex flex-col items-end text-left ${large ? "-mr-6" : "-mr-5"}`}
    >
      {tags.slice(0, SHOWN).map((tag) => (
        <li
          key={tag.id}
          className="relative -mt-1 w-11/12 -rotate-3 rounded-sm border border-tag-edge bg-tag-red py-1.5 pl-6 pr-2 text-tag-white even:rotate-2 even:-translate-x-1"
        >
          <span
            aria-hidden="true"
            className="absolute left-2 top-2.5 size-2.5 rounded-full border border-tag-edge bg-card"
          />
          <span className="sr-only">{tagText.red}: </span>
          <span className={`block font-bold leading-tight ${large ? "" : "text-sm"}`}>
            {tag.title}
          </span>
          {tag.where && (
            <span className={`block leading-tight ${large ? "text-sm" : "text-xs"}`}>
              {tag.where}
            </span>
          )}
        </li>
      ))}
      {left > 0 && (
        <li className="relative -mt-1 -rotate-3 rounded-sm border border-tag-edge bg-tag-red px-2 py-1 text-sm font-bold text-tag-white">
          {uiText.moreTags(left)}
        </li>
      )}
    </ul>
  );
}
