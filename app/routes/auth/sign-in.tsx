import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { z } from "zod";
import { askForCode } from "~/auth/ask-for-code";
import { whyEnded } from "~/auth/codes/redeem-code";
import { BROWSER_COOKIE, clearToken, SESSION_COOKIE, setToken } from "~/auth/cookies";
import { firstPlace } from "~/auth/first-place";
import { safeNext, signInPath } from "~/auth/next-path";
import { pendingCode, signInWithCode } from "~/auth/sign-in-with-code";
import { signedInOf } from "~/context";
import { emailSchema } from "~/domain/people/person-input";
import { refusedForm, unparsedForm } from "~/http/form-reply";
import { systemClock } from "~/services/clock";
import { signInText } from "~/text/en/auth";
import type { Route } from "./+types/sign-in";
import { AddressStep } from "./address-step";
import { CodeStep } from "./code-step";
import { DoorPage } from "./door-page";

/** Six digits, as typed or pasted: spaces and hyphens do not count. */
const codeSchema = z
  .string({ error: "code-form" })
  .transform((typed) => typed.replace(/[\s-]/g, ""))
  .pipe(z.string().regex(/^\d{6}$/, "code-form"));

const schema = z.discriminatedUnion("step", [
  z.object({ step: z.literal("send"), email: emailSchema }),
  z.object({ step: z.literal("again") }),
  z.object({ step: z.literal("code"), code: codeSchema }),
]);

/** Which step this browser is at. A code that has been used leads back to the address. */
export async function loader({ request, context, url }: Route.LoaderArgs) {
  const next = safeNext(url.searchParams.get("next"));
  const pending = await pendingCode(request, context);
  const ended = pending && whyEnded(pending, systemClock.now());
  const waiting = pending && ended !== "code-used";
  const changing = url.searchParams.has("change");
  if (waiting && !changing) return { step: "code" as const, email: pending.email, ended, next };
  const signedIn = signedInOf(context);
  if (signedIn) throw redirect(next ?? firstPlace(signedIn.actor));
  return { step: "address" as const, email: waiting ? pending.email : "", ended: null, next };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const next = safeNext(url.searchParams.get("next"));
  const submission = parseWithZod(await request.formData(), { schema });
  if (submission.status !== "success") return unparsedForm(submission);
  const sent = submission.value;
  if (sent.step === "code") {
    const started = await signInWithCode(request, context, sent.code);
    if (!started.ok) return refusedForm(submission, started.refusal);
    const headers = new Headers();
    headers.append("Set-Cookie", await setToken(SESSION_COOKIE, started.value.token));
    headers.append("Set-Cookie", await clearToken(BROWSER_COOKIE));
    return redirect(next ?? firstPlace(started.value), { headers });
  }
  const email = sent.step === "send" ? sent.email : (await pendingCode(request, context))?.email;
  if (!email) return redirect(signInPath(next ?? "/"));
  const asked = await askForCode(request, context, email);
  if (!asked.ok) return refusedForm(submission, asked.refusal, 429);
  return redirect(signInPath(next ?? "/"), { headers: { "Set-Cookie": asked.cookie } });
}

export default function SignIn({ loaderData, actionData }: Route.ComponentProps) {
  const result = actionData?.result;
  const { step, email, ended, next } = loaderData;
  return (
    <DoorPage title={step === "code" ? signInText.codeTitle : signInText.title}>
      {step === "code" ? (
        <CodeStep email={email} ended={ended} next={next} result={result} />
      ) : (
        <AddressStep email={email} next={next} result={result} />
      )}
    </DoorPage>
  );
}

export const meta: Route.MetaFunction = () => [{ title: signInText.metaTitle }];
