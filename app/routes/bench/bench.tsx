import { data, Form } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { type BenchTag, readBench } from "~/domain/bench/read-bench";
import { REFUSAL_STATUS } from "~/domain/refusals";
import { signOff, signOffSchema } from "~/domain/tags/sign-off";
import { limitText, tagTitle } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import { Button } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { ChoiceTiles } from "~/ui/fields/choice-tiles";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { SignatureField } from "~/ui/fields/signature-field";
import { TextAreaField, TextField } from "~/ui/fields/text-field";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { PlaceFrame } from "~/ui/place-frame";
import { TagCard } from "~/ui/tag-card";
import { Time } from "~/ui/time";
import type { Route } from "./+types/bench";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "bench.read");
  const open = await readBench(dbOf(context), actor);
  const tags = open.map((tag) => ({ ...tag, signOffId: uuidv7() }));
  return { frame: frameOf(context), tags, signer: actor.name };
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "tag.sign-off");
  const form = await request.formData();
  const text = (name: string) => String(form.get(name) ?? "");
  const typed = Object.fromEntries(
    ["kind", "work", "parts", "reason", "signature"].map((name) => [name, text(name)]),
  );
  const parsed = signOffSchema.safeParse({
    id: text("id"),
    tagId: text("tagId"),
    kind: text("kind"),
    work: text("work"),
    parts: text("parts") || null,
    roadTested: null,
    reason: text("reason"),
    signature: { name: text("signature"), wording: "sign-off" },
  });
  const about = { tagId: text("tagId"), typed };
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => refusalText.field(issue.message));
    return data({ ...about, faults, done: false }, { status: 400 });
  }
  const ended = await signOff(dbOf(context), actor, parsed.data);
  if (ended.ok) return data({ ...about, faults: [], done: true });
  const faults = [refusalText.title(ended.refusal.code)];
  return data({ ...about, faults, done: false }, { status: REFUSAL_STATUS[ended.refusal.code] });
}

export default function Bench({ loaderData, actionData }: Route.ComponentProps) {
  const { frame, tags, signer } = loaderData;
  return (
    <PlaceFrame frame={frame}>
      <PageTitle title={loop.bench.title} />
      {actionData?.done && (
        <Notice tone="good" announce>
          <p>{loop.bench.done}</p>
        </Notice>
      )}
      {tags.length === 0 && <EmptyState title={loop.bench.none} />}
      <ul className="mt-6 grid gap-6 lg:grid-cols-2">
        {tags.map((tag) => (
          <li key={tag.id}>
            <Tag
              tag={tag}
              signer={signer}
              faults={actionData?.tagId === tag.id ? actionData.faults : []}
              typed={actionData?.tagId === tag.id ? actionData.typed : {}}
            />
          </li>
        ))}
      </ul>
    </PlaceFrame>
  );
}

interface TagProps {
  tag: BenchTag & { signOffId: string };
  signer: string;
  faults: string[];
  typed: Record<string, string>;
}

function Tag({ tag, signer, faults, typed }: TagProps) {
  return (
    <TagCard
      colour={tag.colour}
      title={`${tag.unitNumber}: ${tagTitle(tag.title)}`}
      where={tag.yardName}
      since={
        <>
          <Time at={tag.raisedAt} zone={tag.zone} /> {loop.bench.raised(tag.raisedBy)}
        </>
      }
      limit={tag.limit ? limitText(tag.limit) : undefined}
      photos={tag.photos.length}
      heading="h2"
    >
      {tag.note && <p className="my-2">{tag.note}</p>}
      <ul className="my-3 flex flex-wrap gap-3">
        {tag.photos.map((photo, index) => (
          <li key={photo.id}>
            {photo.storedAt ? (
              <a href={`/api/v1/photos/${photo.id}/large`}>
                <img
                  src={`/api/v1/photos/${photo.id}/thumb`}
                  alt={loop.bench.photo(index + 1)}
                  className="h-32 rounded border border-line"
                />
              </a>
            ) : (
              <span className="text-mute">{loop.bench.awaited}</span>
            )}
          </li>
        ))}
      </ul>
      <details open={faults.length > 0}>
        <summary className="min-h-11 cursor-pointer py-2 font-bold underline">
          {loop.bench.signOff}
        </summary>
        <SignOffForm tag={tag} signer={signer} faults={faults} typed={typed} />
      </details>
    </TagCard>
  );
}

function SignOffForm({ tag, signer, faults, typed }: TagProps) {
  const field = (name: string) =>
    plainField(name, { id: `${name}-${tag.id}`, value: typed[name] ?? "" });
  const works = Object.entries(loop.bench.works).map(([value, label]) => ({ value, label }));
  return (
    <Form method="post" className="mt-3 space-y-4" aria-label={`${tag.unitNumber}: ${tag.title}`}>
      <input type="hidden" name="id" value={tag.signOffId} />
      <input type="hidden" name="tagId" value={tag.id} />
      {faults.length > 0 && (
        <Notice tone="stop" announce="now">
          {faults.map((fault) => (
            <p key={fault}>{fault}</p>
          ))}
        </Notice>
      )}
      <ChoiceTiles
        field={field("kind")}
        label={loop.bench.end}
        choices={[
          { value: "repaired", label: loop.bench.repaired },
          { value: "not-needed", label: loop.bench.notNeeded },
        ]}
      />
      <SelectField
        field={field("work")}
        label={loop.bench.work}
        options={[{ value: "", label: "–" }, ...works]}
      />
      <TextField field={field("parts")} label={loop.bench.parts} optional />
      <TextAreaField field={field("reason")} label={loop.bench.reason} optional />
      <SignatureField field={field("signature")} wording={loop.bench.certify} signer={signer} />
      <Button type="submit" kind="main">
        {loop.bench.signOff}
      </Button>
    </Form>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${loop.bench.title} · ${loop.product}` }];
