import { getFormProps, getInputProps, type SubmissionResult, useForm } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { signInPath } from "~/auth/next-path";
import { signInText } from "~/text/en/auth";
import { refusalText } from "~/text/en/refusals";
import { DoorButton, DoorField, Fault } from "./door-form";

interface AddressStepProps {
  email: string;
  next: string | null;
  result: SubmissionResult<string[]> | undefined;
}

/** First step: whose door is it. */
export function AddressStep({ email, next, result }: AddressStepProps) {
  const [form, fields] = useForm<{ email: string }>({
    id: "address",
    lastResult: result,
    defaultValue: { email },
  });
  const busy = useNavigation().state !== "idle";
  return (
    <Form
      method="post"
      action={signInPath(next ?? "/")}
      {...getFormProps(form)}
      className="space-y-5"
    >
      <input type="hidden" name="step" value="send" />
      <DoorField
        field={fields.email}
        label={signInText.emailLabel}
        hint={signInText.emailHint}
        input={{
          ...getInputProps(fields.email, { type: "email" }),
          autoComplete: "email",
          autoCapitalize: "none",
          spellCheck: false,
        }}
      />
      {/* A code that led back here: it was used, or replaced by a newer one. */}
      {result?.error?.code?.map((words) => (
        <Fault key={words}>{refusalText.field(words)}</Fault>
      ))}
      <DoorButton busy={busy} busyLabel={signInText.sending}>
        {signInText.send}
      </DoorButton>
    </Form>
  );
}
