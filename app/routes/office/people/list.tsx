import { parseWithZod } from "@conform-to/zod/v4";
import { Link, redirect } from "react-router";
import { z } from "zod";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { listPeople, type Member, type OpenInvitation } from "~/domain/people/list-people";
import { revokeInvitation } from "~/domain/people/revoke-invitation";
import { unparsedForm } from "~/http/form-reply";
import { systemClock } from "~/services/clock";
import { office } from "~/text/en/office";
import { peopleText } from "~/text/en/people";
import { roleText } from "~/text/en/roles";
import { ButtonLink } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { PageTitle } from "~/ui/page-frame";
import { ActionButton } from "../office-form";
import { refusedForm } from "../office-reply";
import { SavedNote } from "../page-parts";
import type { Route } from "./+types/list";

const schema = z.object({ intent: z.literal("take-back"), invitationId: z.uuid() });

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "people.manage");
  const { members, invitations } = await listPeople(dbOf(context), actor, systemClock.now());
  const active = members.filter((member) => member.active);
  const onCall = active
    .filter((member) => member.onCall !== null)
    .sort((a, b) => (a.onCall ?? 0) - (b.onCall ?? 0));
  const gone = members.filter((member) => !member.active);
  return { active, gone, onCall, invitations, self: actor.personId };
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "people.manage");
  const submission = parseWithZod(await request.formData(), { schema });
  if (submission.status !== "success") return unparsedForm(submission);
  const done = await revokeInvitation(dbOf(context), actor, submission.value);
  if (!done.ok) return refusedForm(submission, done.refusal);
  return redirect("/office/people?done=invitation-revoked");
}

export default function People({ loaderData, actionData }: Route.ComponentProps) {
  const { active, gone, onCall, invitations, self } = loaderData;
  const faults = actionData?.result.error?.[""] ?? [];
  return (
    <>
      <PageTitle title={peopleText.title} lead={peopleText.lead}>
        <ButtonLink kind="main" to="/office/people/invite">
          {peopleText.invite}
        </ButtonLink>
      </PageTitle>
      <SavedNote />
      {faults.map((words) => (
        <p key={words} role="alert" className="mb-6 border-l-4 border-red bg-card p-3">
          {words}
        </p>
      ))}
      <OnCall line={onCall} />
      <Section title={peopleText.working}>
        {active.length === 1 && invitations.length === 0 && <EmptyState title={peopleText.none} />}
        <MemberRows members={active} self={self} />
      </Section>
      {invitations.length > 0 && (
        <Section title={peopleText.invited}>
          <InvitationRows invitations={invitations} />
        </Section>
      )}
      {gone.length > 0 && (
        <details className="mt-10">
          <summary className="min-h-11 cursor-pointer py-2 text-xl font-bold">
            {peopleText.gone(gone.length)}
          </summary>
          <MemberRows members={gone} self={self} />
        </details>
      )}
    </>
  );
}

function Section({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <section className="mt-10">
      <h2 className="mb-3 text-xl font-bold">{title}</h2>
      {children}
    </section>
  );
}

function OnCall({ line }: { line: Member[] }) {
  return (
    <Section title={peopleText.onCallTitle}>
      {line.length === 0 ? (
        <EmptyState title={peopleText.onCallNone} />
      ) : (
        <>
          <p className="mb-2 text-mute">{peopleText.onCallLead}</p>
          <ol className="list-inside list-decimal space-y-1">
            {line.map(({ personId, name, phone }) => (
              <li key={personId}>
                <span className="font-bold">{name}</span>{" "}
                {phone ? (
                  <a
                    href={`tel:${phone.replace(/[^+\d]/g, "")}`}
                    className="tabular-nums underline"
                  >
                    {phone}
                  </a>
                ) : (
                  <span className="text-mute">{peopleText.noPhone}</span>
                )}
              </li>
            ))}
          </ol>
        </>
      )}
    </Section>
  );
}

function MemberRows({ members, self }: { members: Member[]; self: string }) {
  return (
    <ul className="divide-y divide-line border-y border-line">
      {members.map((member) => (
        <li
          key={member.personId}
          className="grid gap-x-6 py-3 sm:grid-cols-[minmax(10rem,1.4fr)_2fr_1fr_1fr] sm:items-center"
        >
          <span>
            <Link
              to={`/office/people/${member.personId}`}
              className="inline-flex min-h-11 items-center font-bold text-enamel underline"
            >
              {member.name}
            </Link>
            {member.personId === self && <span className="text-mute"> ({peopleText.you})</span>}
          </span>
          <span>
            {member.roles.map((role) => roleText[role]).join(", ")}
            {member.certifier && <span className="font-bold"> · {peopleText.certifier}</span>}
          </span>
          <span>{member.yardName ?? peopleText.allYards}</span>
          <span className="text-mute">
            {member.onCall !== null && peopleText.onCallAt(member.onCall)}
          </span>
        </li>
      ))}
    </ul>
  );
}

function InvitationRows({ invitations }: { invitations: OpenInvitation[] }) {
  return (
    <ul className="divide-y divide-line border-y border-line">
      {invitations.map(({ id, name, email, roles, expiresAt }) => (
        <li
          key={id}
          className="grid gap-x-6 gap-y-1 py-3 sm:grid-cols-[minmax(10rem,1.4fr)_2fr_1fr_auto] sm:items-center"
        >
          <span>
            <span className="font-bold">{name}</span>
            <span className="block text-mute break-words">{email}</span>
          </span>
          <span>{roles.map((role) => roleText[role]).join(", ")}</span>
          <span className="text-mute">{peopleText.expires(expiresAt)}</span>
          <ActionButton
            name="take-back"
            fields={{ invitationId: id }}
            label={peopleText.takeBackOf(name)}
          >
            {peopleText.takeBack}
          </ActionButton>
        </li>
      ))}
    </ul>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${peopleText.title} · ${office.product}` },
];
