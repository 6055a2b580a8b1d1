import { uiText } from "~/text/en/ui";
import { ButtonLink } from "./button";

/** The end of a long list: how much of it is shown, and the next part. */
export function ShowMore({
  shown,
  total,
  to,
}: {
  shown: number;
  /** Null when counting would cost too much. */
  total: number | null;
  /** Address of the longer list; none when all is shown. */
  to?: string;
}) {
  return (
    <div className="mt-4 flex flex-wrap items-center gap-4">
      {to && (
        <ButtonLink to={to} preventScrollReset>
          {uiText.more(total === null ? null : total - shown)}
        </ButtonLink>
      )}
      {total !== null && <p className="text-sm text-mute">{uiText.shown(shown, total)}</p>}
    </div>
  );
}
