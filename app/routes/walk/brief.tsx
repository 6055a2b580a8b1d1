import { Form } from "react-router";
import type { readBrief } from "~/domain/brief/read-brief";
import { limitText, tagTitle } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { tagText } from "~/text/en/ui";
import { Button } from "~/ui/button";
import { plainField } from "~/ui/fields/field-shape";
import { SignatureField } from "~/ui/fields/signature-field";
import { TextAreaField } from "~/ui/fields/text-field";
import { TagCard } from "~/ui/tag-card";
import { Time } from "~/ui/time";

type BriefData = Awaited<ReturnType<typeof readBrief>>;

/** What was repaired and what is open, and the driver's signature that it was seen. */
export function Brief({ brief, id, driver }: { brief: BriefData; id: string; driver: string }) {
  const { zone } = brief.yard;
  const nothing = brief.openTags.length === 0 && brief.signedOff.length === 0;
  return (
    <section aria-labelledby="brief" className="space-y-4">
      <h2 id="brief" className="text-2xl font-bold">
        {loop.walk.brief}
      </h2>
      {nothing && <p className="text-mute">{loop.walk.nothing}</p>}
      {brief.openTags.length > 0 && <h3 className="font-bold">{loop.walk.open}</h3>}
      {brief.openTags.map((tag) => (
        <TagCard
          key={tag.id}
          colour={tag.colour}
          title={tagTitle(tag.title)}
          where={tagText[tag.colour]}
          since={<Time at={new Date(tag.raisedAt)} zone={zone} />}
          limit={tag.limit ? limitText(tag.limit) : undefined}
          heading="h3"
        />
      ))}
      {brief.signedOff.length > 0 && <h3 className="font-bold">{loop.walk.signedOff}</h3>}
      <ul className="space-y-3">
        {brief.signedOff.map((done) => (
          <li key={done.id} className="rounded-lg border border-line bg-card p-4">
            <p className="font-bold">{tagTitle(done.title)}</p>
            <p>
              {done.work ? loop.bench.works[done.work] : loop.bench.notNeeded}
              {done.parts && `: ${done.parts}`}
              {done.reason && `: ${done.reason}`}
            </p>
            <p className="text-sm text-mute">
              {done.signedBy}, <Time at={done.signedAt} zone={zone} />
            </p>
          </li>
        ))}
      </ul>
      {brief.toAcknowledge.length > 0 && (
        <Form method="post" className="space-y-4">
          <input type="hidden" name="id" value={id} />
          {brief.toAcknowledge.map((item) => (
            <input key={item} type="hidden" name="item" value={item} />
          ))}
          {brief.signedOff[0] && (
            <input type="hidden" name="disputes" value={brief.signedOff[0].id} />
          )}
          <SignatureField
            field={plainField("signature", { id: "seen-signature" })}
            wording={loop.walk.wording}
            signer={driver}
          />
          <TextAreaField
            field={plainField("note", { id: "seen-note" })}
            label={loop.walk.why}
            optional
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" kind="main" size="walk" name="intent" value="seen">
              {loop.walk.acknowledge}
            </Button>
            <Button type="submit" size="walk" name="intent" value="not-satisfied">
              {loop.walk.notSatisfied}
            </Button>
          </div>
        </Form>
      )}
    </section>
  );
}
