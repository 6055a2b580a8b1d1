import { data } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { readBench } from "~/domain/bench/read-bench";
import { REFUSAL_STATUS, type Result } from "~/domain/refusals";
import { allowRun } from "~/domain/tags/allow-run";
import { limitOfTag } from "~/domain/tags/open-tag";
import { signOff } from "~/domain/tags/sign-off";
import { faultsOfFields, faultsOfIssues } from "~/http/field-faults";
import { benchText } from "~/text/en/bench";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import { ButtonLink } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/bench";
import { LIMIT_NAMES, readAllowRun, readSignOff, TYPED } from "./read-tag-form";
import { Tag, type TagAnswer } from "./tag";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "bench.read");
  const open = await readBench(dbOf(context), actor);
  const tags = open.map((tag) => ({ ...tag, formId: uuidv7() }));
  return { frame: frameOf(context), tags, signer: actor.name };
}

function answered(about: Pick<TagAnswer, "tagId" | "intent" | "typed">, result: Result<unknown>) {
  if (result.ok) return data({ ...about, fault: null, faults: {}, done: true });
  const { code, fields } = result.refusal;
  const faults = fields ? faultsOfFields(fields, LIMIT_NAMES) : {};
  const fault = fields ? null : refusalText.title(code);
  return data({ ...about, fault, faults, done: false }, { status: REFUSAL_STATUS[code] });
}

export async function action({ context, request }: Route.ActionArgs) {
  const form = await request.formData();
  const intent = form.get("intent") === "allow-run" ? "allow-run" : "sign-off";
  const actor = requirePermission(
    context,
    intent === "sign-off" ? "tag.sign-off" : "run-limit.sign",
  );
  const db = dbOf(context);
  const tagId = String(form.get("tagId") ?? "");
  const typed = Object.fromEntries(TYPED.map((name) => [name, String(form.get(name) ?? "")]));
  const about = { tagId, intent, typed } as const;
  const wrong = (issues: Parameters<typeof faultsOfIssues>[0]) =>
    data(
      { ...about, fault: null, faults: faultsOfIssues(issues, LIMIT_NAMES), done: false },
      { status: 400 },
    );
  if (intent === "allow-run") {
    const asked = readAllowRun(form, await limitOfTag(db, actor.carrierId, tagId));
    if (!asked.success) return wrong(asked.error.issues);
    return answered(about, await allowRun(db, actor, asked.data));
  }
  const ended = readSignOff(form);
  if (!ended.success) {
    // Which end it is decides what else is asked, so the form's own name stands for it here.
    return data(
      { ...about, fault: null, faults: faultsOfIssues(ended.error.issues), done: false },
      { status: 400 },
    );
  }
  return answered(about, await signOff(db, actor, ended.data));
}

export default function Bench({ loaderData, actionData }: Route.ComponentProps) {
  const { frame, tags, signer } = loaderData;
  const answer = actionData ?? null;
  return (
    <PlaceFrame frame={frame}>
      <PageTitle
        title={benchText.title}
        lead={tags.length > 0 && `${benchText.count(tags.length)}. ${benchText.order}`}
      >
        <ButtonLink to="/bench/rounds">{benchText.rounds.title}</ButtonLink>
      </PageTitle>
      {answer?.done && (
        <Notice tone="good" announce>
          <p>{answer.intent === "sign-off" ? benchText.done : benchText.run.done}</p>
        </Notice>
      )}
      {tags.length === 0 && <EmptyState title={benchText.none} />}
      <ul className="mt-6 grid gap-6 lg:grid-cols-2">
        {tags.map((tag) => (
          <li key={tag.id}>
            <Tag
              tag={tag}
              signer={signer}
              answer={answer?.tagId === tag.id && !answer.done ? answer : null}
            />
          </li>
        ))}
      </ul>
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${benchText.title} · ${loop.product}` }];
