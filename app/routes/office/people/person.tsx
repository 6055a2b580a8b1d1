import { getInputProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { listPeople, readMember } from "~/domain/people/list-people";
import { listYards } from "~/domain/yards/read-yards";
import { unparsedForm } from "~/http/form-reply";
import { systemClock } from "~/services/clock";
import { office } from "~/text/en/office";
import { peopleText } from "~/text/en/people";
import { SelectField } from "~/ui/fields/select-field";
import { PageTitle } from "~/ui/page-frame";
import { ActionButton, OfficeForm } from "../office-form";
import { idOr404, notFound, refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/person";
import { personIntents, runPersonIntent } from "./person-commands";
import { PlaceFields, type ShownPlace } from "./place-fields";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "people.manage");
  const db = dbOf(context);
  const found = await readMember(db, actor, idOr404(params.personId));
  if (!found.ok) notFound("other");
  const { members } = await listPeople(db, actor, systemClock.now());
  const inLine = members.filter((member) => member.active && member.onCall !== null).length;
  const yards = (await listYards(db, actor)).map(({ id, name }) => ({ id, name }));
  const places = inLine + (found.value.onCall === null ? 1 : 0);
  return { member: found.value, yards, places };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "people.manage");
  const form = await request.formData();
  form.set("personId", idOr404(params.personId));
  const submission = parseWithZod(form, { schema: personIntents });
  if (submission.status !== "success") return unparsedForm(submission);
  const { done, note } = await runPersonIntent(dbOf(context), actor, submission.value);
  if (!done.ok) return refusedForm(submission, done.refusal);
  return redirect(`/office/people?done=${note}`);
}

type Member = Route.ComponentProps["loaderData"]["member"];

export default function Person({ loaderData, actionData }: Route.ComponentProps) {
  const { member } = loaderData;
  const result = actionData?.result;
  const ofForm = result?.initialValue?.intent === "change";
  const faults = ofForm ? [] : (result?.error?.[""] ?? []);
  return (
    <>
      <PageTitle title={member.name} lead={`${member.email} · ${peopleText.phone(member.phone)}`} />
      {faults.map((words) => (
        <p key={words} role="alert" className="mb-6 border-l-4 border-red bg-card p-3">
          {words}
        </p>
      ))}
      {member.active ? (
        <>
          <PlaceForm {...loaderData} result={ofForm ? result : undefined} />
          <Sessions />
          <Deactivate member={member} />
        </>
      ) : (
        <>
          <p className="mb-4 max-w-prose">{peopleText.gonePerson(member.name, member.roles)}</p>
          <ActionButton name="reactivate">{peopleText.reactivate}</ActionButton>
        </>
      )}
    </>
  );
}

type PlaceFormProps = Route.ComponentProps["loaderData"] & {
  result: NonNullable<Route.ComponentProps["actionData"]>["result"] | undefined;
};

function PlaceForm({ member, yards, places, result }: PlaceFormProps) {
  const [form, fields] = useForm<ShownPlace & { intent: string; onCall: string }>({
    id: "person",
    lastResult: result,
    defaultValue: {
      intent: "change",
      roles: member.roles,
      certifier: member.certifier ? "on" : undefined,
      yardId: member.yardId ?? "",
      onCall: member.onCall === null ? "" : String(member.onCall),
    },
  });
  const { key, ...intent } = getInputProps(fields.intent, { type: "hidden", value: false });
  const line = Array.from({ length: places }, (_, index) => index + 1);
  return (
    <OfficeForm
      form={form}
      submit={peopleText.save}
      cancelTo={<TextLink to="/office/people">{office.cancel}</TextLink>}
    >
      <input key={key} {...intent} value="change" />
      <PlaceFields fields={fields} yards={yards} />
      <SelectField
        field={fields.onCall}
        label={peopleText.onCall}
        hint={peopleText.onCallHint}
        options={[
          { value: "", label: peopleText.onCallNever },
          ...line.map((n) => ({ value: String(n), label: peopleText.onCallOption(n) })),
        ]}
      />
    </OfficeForm>
  );
}

function Sessions() {
  return (
    <section className="mt-12 max-w-xl border-t border-line pt-6">
      <h2 className="text-xl font-bold">{peopleText.sessions}</h2>
      <p className="mt-1 mb-4 text-mute">{peopleText.sessionsWhat}</p>
      <ActionButton name="end-sessions">{peopleText.endSessions}</ActionButton>
    </section>
  );
}

/** Two presses, with what it means between them; works without scripts. */
function Deactivate({ member }: { member: Member }) {
  return (
    <details className="mt-10 max-w-xl border-t border-line pt-6">
      <summary className="min-h-11 cursor-pointer text-xl font-bold">
        {peopleText.deactivateTitle(member.name)}
      </summary>
      <p className="mt-2 mb-4">{peopleText.deactivateWhat(member.name)}</p>
      <ActionButton name="deactivate">{peopleText.deactivateTitle(member.name)}</ActionButton>
    </details>
  );
}

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.member.name ?? peopleText.title} · ${office.product}` },
];
