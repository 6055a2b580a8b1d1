import { Link } from "react-router";
import type { readBrief } from "~/domain/brief/read-brief";
import { walkText } from "~/text/en/walk";
import { WALK_KINDS, type WalkKind } from "~/trade/sheet/check";
import { Time } from "~/ui/time";

type BriefData = Awaited<ReturnType<typeof readBrief>>;

/** The three passes over the truck; a takeover is offered where there is a walk to rest on. */
export function WalkKinds({
  unit,
  kind,
  brief,
}: {
  unit: string;
  kind: WalkKind;
  brief: BriefData;
}) {
  const { base, ownWalk, yard } = brief;
  const offered = WALK_KINDS.filter((one) => one !== "takeover" || base || kind === one);
  return (
    <div className="space-y-3">
      <nav aria-label={walkText.kindsLabel}>
        <ul className="flex flex-wrap gap-3">
          {offered.map((one) => (
            <li key={one} className="grow">
              <Link
                to={`/walk/${unit}?kind=${one}`}
                preventScrollReset
                aria-current={one === kind ? "page" : undefined}
                className="flex min-h-14 items-center justify-center rounded-lg border-2 border-edge bg-card px-4 text-center no-underline hover:border-ink aria-[current=page]:border-enamel aria-[current=page]:bg-enamel aria-[current=page]:font-bold aria-[current=page]:text-card"
              >
                {walkText.kinds[one]}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      {kind === "takeover" && base && (
        <p className="text-mute">
          {walkText.takesOver(base.driver)} <Time at={base.countsFrom} zone={yard.zone} />.
        </p>
      )}
      {kind !== "after" && ownWalk && (
        <p className="text-mute">
          {walkText.yours} <Time at={new Date(ownWalk.validUntil)} zone={yard.zone} />.
        </p>
      )}
    </div>
  );
}
