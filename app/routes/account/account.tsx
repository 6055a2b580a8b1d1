import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, redirect } from "react-router";
import { z } from "zod";
import { firstPlace } from "~/auth/first-place";
import { frameOf } from "~/auth/frame-of";
import { requirePermission, requireSignedIn } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { changeOwnPhone, readOwnAccount, switchCarrier } from "~/domain/people/own-account";
import {
  listSessions,
  type OwnSession,
  revokeOtherSessions,
  revokeSession,
} from "~/domain/people/own-sessions";
import { phoneSchema } from "~/domain/people/person-input";
import { refusedForm, unparsedForm } from "~/http/form-reply";
import { systemClock } from "~/services/clock";
import { accountText } from "~/text/en/people";
import { roleText } from "~/text/en/roles";
import { Button, ButtonLink } from "~/ui/button";
import { TextField } from "~/ui/fields/text-field";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/account";

const schema = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("phone"), phone: phoneSchema }),
  z.object({ intent: z.literal("end"), sessionId: z.uuid() }),
  z.object({ intent: z.literal("end-others") }),
  z.object({ intent: z.literal("switch"), carrierId: z.uuid() }),
]);

export async function loader({ context, url }: Route.LoaderArgs) {
  const actor = requirePermission(context, "account.own");
  const { sessionId, carrierName } = requireSignedIn(context);
  const db = dbOf(context);
  const account = await readOwnAccount(db, actor);
  const sessions = await listSessions(db, actor, systemClock.now());
  const { name, roles, carrierId } = actor;
  const done = url.searchParams.get("done");
  const frame = frameOf(context);
  return { ...account, frame, sessions, sessionId, name, roles, carrierId, carrierName, done };
}

export async function action({ request, context }: Route.ActionArgs) {
  const actor = requirePermission(context, "account.own");
  const { sessionId } = requireSignedIn(context);
  const db = dbOf(context);
  const submission = parseWithZod(await request.formData(), { schema });
  if (submission.status !== "success") return unparsedForm(submission);
  const asked = submission.value;
  const run = () => {
    switch (asked.intent) {
      case "phone":
        return changeOwnPhone(db, actor, asked);
      case "end":
        return revokeSession(db, actor, asked);
      case "end-others":
        return revokeOtherSessions(db, actor, { keep: sessionId });
      case "switch":
        return switchCarrier(db, actor, { sessionId, carrierId: asked.carrierId });
    }
  };
  const done = await run();
  if (!done.ok && done.refusal.code === "not-found") throw data(null, { status: 404 });
  if (!done.ok) return refusedForm(submission, done.refusal);
  return redirect(asked.intent === "switch" ? "/" : `/account?done=${asked.intent}`);
}

export default function Account({ loaderData, actionData }: Route.ComponentProps) {
  const { frame, name, roles, carrierName, carriers, email, sessions, sessionId, done } =
    loaderData;
  const words = roles.map((role) => roleText[role]).join(", ");
  return (
    <PlaceFrame frame={frame}>
      <div className="max-w-2xl">
        <PageTitle
          title={accountText.title}
          lead={`${name}. ${accountText.as(words, carrierName)}`}
        >
          <ButtonLink kind="main" to={firstPlace(loaderData)}>
            {accountText.toWork}
          </ButtonLink>
        </PageTitle>
        {isNote(done) && (
          <Notice tone="good" announce>
            {NOTES[done]}
          </Notice>
        )}
        <Section title={accountText.email}>
          <p className="break-words">{email}</p>
          <p className="text-base text-mute">{accountText.emailHint}</p>
        </Section>
        <Phone phone={loaderData.phone} result={actionData?.result} />
        {carriers.length > 1 && <Carriers carriers={carriers} here={loaderData.carrierId} />}
        <Devices sessions={sessions} current={sessionId} />
      </div>
    </PlaceFrame>
  );
}

const NOTES = {
  phone: accountText.phoneSaved,
  end: accountText.ended,
  "end-others": accountText.endedOthers,
} as const;

function isNote(word: string | null): word is keyof typeof NOTES {
  return word !== null && Object.hasOwn(NOTES, word);
}

function Section({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <section className="mt-10 border-t border-line pt-5">
      <h2 className="mb-3 text-xl font-bold">{title}</h2>
      {children}
    </section>
  );
}

type Reply = NonNullable<Route.ComponentProps["actionData"]>["result"];

function Phone({ phone, result }: { phone: string | null; result: Reply | undefined }) {
  const [form, fields] = useForm<{ phone: string }>({
    id: "phone",
    lastResult: result,
    defaultValue: { phone: phone ?? "" },
  });
  return (
    <Section title={accountText.phone}>
      <Form method="post" {...getFormProps(form)} className="max-w-sm space-y-3">
        <input type="hidden" name="intent" value="phone" />
        <TextField
          field={fields.phone}
          label={accountText.phone}
          hint={accountText.phoneHint}
          type="tel"
          autoComplete="tel"
          optional
        />
        <Button type="submit">{accountText.savePhone}</Button>
      </Form>
    </Section>
  );
}

function Carriers({ carriers, here }: { carriers: { id: string; name: string }[]; here: string }) {
  return (
    <Section title={accountText.carriers}>
      <p className="mb-3 text-mute">{accountText.carriersWhat}</p>
      <Form method="post" className="flex flex-wrap gap-3">
        <input type="hidden" name="intent" value="switch" />
        {carriers.map(({ id, name }) =>
          id === here ? (
            <p
              key={id}
              className="inline-flex min-h-11 items-center border-b-4 border-enamel px-2 font-bold"
            >
              {name} · {accountText.here}
            </p>
          ) : (
            <Button type="submit" key={id} name="carrierId" value={id}>
              {accountText.switchTo(name)}
            </Button>
          ),
        )}
      </Form>
    </Section>
  );
}

function Devices({ sessions, current }: { sessions: OwnSession[]; current: string }) {
  return (
    <Section title={accountText.devices}>
      <ul className="divide-y divide-line border-y border-line">
        {sessions.map(({ id, device, createdAt, lastSeenAt }) => {
          const name = device || accountText.unknownDevice;
          return (
            <li key={id} className="flex flex-wrap items-center justify-between gap-3 py-3">
              <span>
                <span className="block font-bold">{name}</span>
                <span className="text-base text-mute">
                  {accountText.since(createdAt)}, {accountText.lastUsed(lastSeenAt)}
                </span>
              </span>
              {id === current ? (
                <span className="font-bold">{accountText.thisDevice}</span>
              ) : (
                <Form method="post">
                  <input type="hidden" name="sessionId" value={id} />
                  <Button
                    type="submit"
                    name="intent"
                    value="end"
                    aria-label={accountText.endOf(name, createdAt)}
                  >
                    {accountText.end}
                  </Button>
                </Form>
              )}
            </li>
          );
        })}
      </ul>
      {sessions.length > 1 && (
        <Form method="post" className="mt-4">
          <Button type="submit" name="intent" value="end-others">
            {accountText.endOthers}
          </Button>
        </Form>
      )}
    </Section>
  );
}

export const meta: Route.MetaFunction = () => [{ title: accountText.metaTitle }];
