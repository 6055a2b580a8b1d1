import { data, Form, Link, redirect, useNavigation } from "react-router";
import { askForCode } from "~/auth/ask-for-code";
import { dbOf } from "~/context";
import { acceptInvitation } from "~/domain/people/accept-invitation";
import { readInvitation } from "~/domain/people/read-invitation";
import { REFUSAL_STATUS, type Refusal } from "~/domain/refusals";
import { systemClock } from "~/services/clock";
import { invitationText } from "~/text/en/auth";
import { roleList } from "~/text/en/roles";
import type { Route } from "./+types/invitation";
import { DoorButton } from "./door-form";
import { DoorPage } from "./door-page";

function refused(refusal: Refusal) {
  return data({ ended: refusal.code } as const, { status: REFUSAL_STATUS[refusal.code] });
}

/** Shows what the link offers. Reading it changes nothing: mail programs follow links. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const found = await readInvitation(dbOf(context), params.token, systemClock.now());
  if (!found.ok) return refused(found.refusal);
  const { carrierName, invitedBy, email, name, roles, accepted } = found.value;
  return data({ ended: null, carrierName, invitedBy, email, name, roles, accepted } as const);
}

/** Joins, then sends the code that signs in: the link alone opens nothing. */
export async function action({ request, params, context }: Route.ActionArgs) {
  const joined = await acceptInvitation(dbOf(context), params.token);
  if (!joined.ok) return refused(joined.refusal);
  const asked = await askForCode(request, context, joined.value.email);
  return redirect("/sign-in", asked.ok ? { headers: { "Set-Cookie": asked.cookie } } : {});
}

export default function InvitationPage({ loaderData, actionData }: Route.ComponentProps) {
  const busy = useNavigation().state !== "idle";
  const ended = actionData?.ended ?? loaderData.ended;
  if (ended !== null || loaderData.ended !== null) return <Ended unknown={ended === "not-found"} />;
  const { carrierName, invitedBy, email, name, roles, accepted } = loaderData;
  if (accepted) {
    return (
      <DoorPage title={invitationText.acceptedTitle}>
        <p>{invitationText.accepted(carrierName)}</p>
        <ToSignIn />
      </DoorPage>
    );
  }
  return (
    <DoorPage title={invitationText.title(carrierName)}>
      <p>{invitationText.offer(invitedBy, carrierName, roleList(roles))}</p>
      <dl className="space-y-3">
        <Said term={invitationText.name}>{name}</Said>
        <Said term={invitationText.address}>{email}</Said>
      </dl>
      <Form method="post" className="space-y-5">
        <DoorButton busy={busy} busyLabel={invitationText.accepting}>
          {invitationText.accept}
        </DoorButton>
      </Form>
      <p className="text-mute">{invitationText.after}</p>
    </DoorPage>
  );
}

function Said({ term, children }: { term: string; children: string }) {
  return (
    <div>
      <dt className="text-mute">{term}</dt>
      <dd className="font-bold break-words">{children}</dd>
    </div>
  );
}

function ToSignIn() {
  return (
    <Link
      to="/sign-in"
      className="inline-flex min-h-11 items-center font-bold underline underline-offset-4"
    >
      {invitationText.signIn}
    </Link>
  );
}

function Ended({ unknown }: { unknown: boolean }) {
  return (
    <DoorPage title={unknown ? invitationText.unknownTitle : invitationText.endedTitle}>
      <p>{unknown ? invitationText.unknown : invitationText.ended}</p>
      <ToSignIn />
    </DoorPage>
  );
}

export const meta: Route.MetaFunction = () => [{ title: invitationText.metaTitle }];
