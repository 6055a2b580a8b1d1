import type { BenchTag } from "~/domain/bench/read-bench";
import type { FormFaults } from "~/http/field-faults";
import { benchText } from "~/text/en/bench";
import { limitText, tagTitle } from "~/text/en/gate";
import { TagCard } from "~/ui/tag-card";
import { Time } from "~/ui/time";
import { AllowRunForm, SignOffForm } from "./tag-forms";

/** What an action said of one tag's form. */
export interface TagAnswer {
  tagId: string;
  intent: "sign-off" | "allow-run";
  fault: string | null;
  faults: FormFaults;
  typed: Record<string, string>;
  done: boolean;
}

const SUMMARY = "min-h-12 cursor-pointer content-center font-bold underline";

/** An open tag with its photos and the ways to end it. */
export function Tag({
  tag,
  signer,
  answer,
}: {
  tag: BenchTag & { formId: string };
  signer: string;
  answer: TagAnswer | null;
}) {
  const said = (intent: TagAnswer["intent"]) => {
    const mine = answer?.intent === intent ? answer : null;
    return {
      tag,
      signer,
      fault: mine?.fault ?? null,
      faults: mine?.faults ?? {},
      typed: mine?.typed ?? {},
    };
  };
  return (
    <TagCard
      colour={tag.colour}
      title={`${tag.unitNumber}: ${tagTitle(tag.title)}`}
      where={tag.yardName}
      since={
        <>
          <Time at={tag.raisedAt} zone={tag.zone} />, {benchText.raised(tag.raisedBy)}
        </>
      }
      limit={tag.limit ? limitText(tag.limit) : undefined}
      photos={tag.photos.length}
      heading="h2"
    >
      {tag.note && <p className="mb-3">{tag.note}</p>}
      {tag.leave && (
        <p className="mb-3 font-bold">
          {tag.leave.limit
            ? benchText.run.now(limitText(tag.leave.limit), tag.leave.untilDay)
            : benchText.run.nowFree(tag.leave.untilDay)}
        </p>
      )}
      {tag.photos.length > 0 && <Photos photos={tag.photos} />}
      <details open={answer?.intent === "sign-off"} className="border-t border-line">
        <summary className={SUMMARY}>{benchText.signOff}</summary>
        <SignOffForm {...said("sign-off")} />
      </details>
      {tag.colour === "yellow" && (
        <details open={answer?.intent === "allow-run"} className="border-t border-line">
          <summary className={SUMMARY}>{benchText.run.title}</summary>
          <AllowRunForm {...said("allow-run")} />
        </details>
      )}
    </TagCard>
  );
}

function Photos({ photos }: { photos: BenchTag["photos"] }) {
  return (
    <ul className="mb-3 flex flex-wrap gap-3">
      {photos.map((photo, index) => (
        <li key={photo.id}>
          {photo.storedAt ? (
            <a href={`/api/v1/photos/${photo.id}/large`} className="inline-block">
              <img
                src={`/api/v1/photos/${photo.id}/thumb`}
                alt={benchText.photo(index + 1)}
                className="h-32 rounded border border-line"
              />
            </a>
          ) : (
            <span className="text-mute">{benchText.awaited}</span>
          )}
        </li>
      ))}
    </ul>
  );
}
