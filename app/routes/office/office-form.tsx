import {
  type FieldMetadata,
  type FormMetadata,
  getFormProps,
  getInputProps,
} from "@conform-to/react";
import type { ComponentProps, ReactNode } from "react";
import { Form, useNavigation } from "react-router";
import { office } from "~/text/en/office";
import { refusalText } from "~/text/en/refusals";
import { uiText } from "~/text/en/ui";
import { Button, buttonClass } from "~/ui/button";
import { Notice } from "~/ui/notice";

export function HiddenField({ field }: { field: FieldMetadata<unknown> }) {
  const { key, ...input } = getInputProps(field, { type: "hidden" });
  return <input key={key} {...input} />;
}

/** A form of the office: what is wrong with it as a whole comes first, its fields after. */
export function OfficeForm<Shown extends Record<string, unknown>>({
  form,
  submit,
  cancelTo,
  children,
}: {
  form: FormMetadata<Shown>;
  submit: string;
  cancelTo?: ReactNode;
  children: ReactNode;
}) {
  const saving = useNavigation().state === "submitting";
  const faults = form.errors?.length ? form.errors : [office.formFault];
  return (
    <Form method="post" {...getFormProps(form)} className="max-w-xl space-y-5">
      {form.status === "error" && (
        <Notice tone="stop" announce="now">
          {faults.map((code) => (
            <p key={code} id={form.errorId}>
              {refusalText.field(code)}
            </p>
          ))}
        </Notice>
      )}
      {children}
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" kind="main" busy={saving && uiText.working}>
          {submit}
        </Button>
        {cancelTo}
      </div>
    </Form>
  );
}

/** A command that needs no fields: one button, its ids hidden beside it. */
export function ActionButton({
  name,
  fields = {},
  children,
  label,
}: {
  name: string;
  fields?: Record<string, string>;
  children: ReactNode;
  label?: string;
}) {
  return (
    <Form method="post" className="inline">
      {Object.entries(fields).map(([key, value]) => (
        <input key={key} type="hidden" name={key} value={value} />
      ))}
      <Button type="submit" name="intent" value={name} aria-label={label}>
        {children}
      </Button>
    </Form>
  );
}

/** A command that is not taken back with one press: asked once more, without a script as well. */
export function ConfirmedButton({
  question,
  children,
  label,
  ...button
}: ComponentProps<typeof ActionButton> & { question: string }) {
  return (
    <details>
      <summary aria-label={label} className={`${buttonClass({})} list-none`}>
        {children}
      </summary>
      <div className="mt-2 max-w-xs">
        <Notice tone="limit">
          <p className="mb-3">{question}</p>
          <ActionButton {...button} label={label}>
            {children}
          </ActionButton>
        </Notice>
      </div>
    </details>
  );
}
