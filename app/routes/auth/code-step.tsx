import { getFormProps, getInputProps, type SubmissionResult, useForm } from "@conform-to/react";
import { Form, Link, useNavigation } from "react-router";
import { signInPath } from "~/auth/next-path";
import { signInText } from "~/text/en/auth";
import { refusalText } from "~/text/en/refusals";
import { DoorButton, DoorField, Fault } from "./door-form";

interface CodeStepProps {
  email: string;
  /** Why the code no longer counts, or null. */
  ended: string | null;
  next: string | null;
  result: SubmissionResult<string[]> | undefined;
}

/** Second step: the six digits from the mail. Ways out: a new code, another address. */
export function CodeStep({ email, ended, next, result }: CodeStepProps) {
  const [form, fields] = useForm<{ code: string }>({ id: "code", lastResult: result });
  const navigation = useNavigation();
  const busy = navigation.state === "idle" ? null : navigation.formData?.get("step");
  const here = signInPath(next ?? "/");
  const change = `${here}${here.includes("?") ? "&" : "?"}change=1`;
  return (
    <>
      <p>{signInText.sentTo(email)}</p>
      {ended && !fields.code.errors && <Fault>{refusalText.field(ended)}</Fault>}
      <Form method="post" action={here} {...getFormProps(form)} className="space-y-5">
        <input type="hidden" name="step" value="code" />
        <DoorField
          field={fields.code}
          label={signInText.codeLabel}
          hint={signInText.codeHint}
          input={{
            ...getInputProps(fields.code, { type: "text" }),
            autoComplete: "one-time-code",
            inputMode: "numeric",
            className: "text-center text-3xl font-bold tracking-[0.3em] tabular-nums",
          }}
        />
        <DoorButton busy={busy === "code"} busyLabel={signInText.checking}>
          {signInText.signIn}
        </DoorButton>
      </Form>
      <div className="border-t border-line pt-5">
        <p className="text-mute">{signInText.notThere}</p>
        <div className="mt-3 flex flex-wrap items-center gap-4">
          <Form method="post" action={here}>
            <DoorButton
              name="step"
              value="again"
              quiet
              busy={busy === "again"}
              busyLabel={signInText.sending}
            >
              {signInText.again}
            </DoorButton>
          </Form>
          <Link
            to={change}
            className="inline-flex min-h-11 items-center underline underline-offset-4"
          >
            {signInText.change}
          </Link>
        </div>
        {result?.error?.email?.map((words) => (
          <Fault key={words}>{words}</Fault>
        ))}
      </div>
    </>
  );
}
