import { Form } from "react-router";
import type { readBrief } from "~/domain/brief/read-brief";
import { benchText } from "~/text/en/bench";
import { limitText, tagTitle } from "~/text/en/gate";
import { walkText } from "~/text/en/walk";
import { Button } from "~/ui/button";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { SignatureField } from "~/ui/fields/signature-field";
import { TextAreaField } from "~/ui/fields/text-field";
import { Notice } from "~/ui/notice";
import { TagCard } from "~/ui/tag-card";
import { Time } from "~/ui/time";

type BriefData = Awaited<ReturnType<typeof readBrief>>;

interface BriefProps {
  brief: BriefData;
  id: string;
  driver: string;
  typed: { note: string; disputes: string } | null;
  /** Faults of the signature. */
  faults: readonly string[];
}

/** What was repaired and what is open, and the driver's signature that it was seen. */
export function Brief({ brief, ...form }: BriefProps) {
  const { aboard, openTags, signedOff, yard } = brief;
  const nothing = openTags.length === 0 && signedOff.length === 0;
  return (
    <section aria-labelledby="brief" className="space-y-4">
      <h2 id="brief" className="text-2xl font-bold">
        {walkText.brief}
      </h2>
      {nothing && <p className="text-mute">{walkText.nothing}</p>}
      {aboard && (
        <p>
          {walkText.aboard[aboard.aboard]}, <Time at={aboard.at} zone={yard.zone} />.
        </p>
      )}
      {brief.weeklyDue && <Notice tone="must">{walkText.weekly}</Notice>}
      {openTags.length > 0 && <h3 className="text-lg font-bold">{walkText.open}</h3>}
      {openTags.map((tag) => (
        <TagCard
          key={tag.id}
          colour={tag.colour}
          title={tagTitle(tag.title)}
          since={<Time at={new Date(tag.raisedAt)} zone={yard.zone} />}
          limit={limitOf(tag)}
          heading="h3"
        />
      ))}
      {signedOff.length > 0 && <h3 className="text-lg font-bold">{walkText.signedOff}</h3>}
      <ul className="space-y-3">
        {signedOff.map((done) => (
          <li key={done.id} className="rounded-lg border border-line bg-card p-4">
            <p className="font-bold">{tagTitle(done.title)}</p>
            <p>
              {done.work ? benchText.works[done.work] : benchText.notNeeded}
              {done.parts && `: ${done.parts}`}
              {done.reason && `: ${done.reason}`}
            </p>
            <p className="text-sm text-mute">
              {done.signedBy}, <Time at={done.signedAt} zone={yard.zone} />
            </p>
          </li>
        ))}
      </ul>
      {brief.toAcknowledge.length > 0 && <SeenForm brief={brief} {...form} />}
    </section>
  );
}

/** What the tag forbids now: a certifier's leave to run has a limit of its own. */
function limitOf(tag: BriefData["openTags"][number]): string | undefined {
  const limit = tag.runUntil === null ? tag.limit : tag.runLimit;
  return limit ? limitText(limit) : undefined;
}

function SeenForm({ brief, id, driver, typed, faults }: BriefProps) {
  const disputes = brief.signedOff.map((done) => ({ value: done.id, label: tagTitle(done.title) }));
  return (
    <Form method="post" preventScrollReset className="space-y-4">
      <input type="hidden" name="id" value={id} />
      {brief.toAcknowledge.map((item) => (
        <input key={item} type="hidden" name="item" value={item} />
      ))}
      <SignatureField
        field={plainField("signature", { id: "seen-signature", errors: faults })}
        wording={walkText.wording}
        signer={driver}
      />
      {disputes.length > 0 && (
        <SelectField
          field={plainField("disputes", { value: typed?.disputes })}
          label={walkText.disputes}
          hint={walkText.disputesHint}
          optional
          options={[{ value: "", label: walkText.disputesNone }, ...disputes]}
        />
      )}
      <TextAreaField
        field={plainField("note", { id: "seen-note", value: typed?.note })}
        label={walkText.why}
        optional
      />
      <div className="flex flex-wrap gap-3">
        <Button type="submit" size="walk" name="intent" value="not-satisfied">
          {walkText.notSatisfied}
        </Button>
        <Button type="submit" kind="main" size="walk" name="intent" value="seen">
          {walkText.acknowledge}
        </Button>
      </div>
    </Form>
  );
}
