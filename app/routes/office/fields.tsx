import {
  type FieldMetadata,
  type FormMetadata,
  getFormProps,
  getInputProps,
  getSelectProps,
} from "@conform-to/react";
import type { ComponentProps, ReactNode } from "react";
import { Form, useNavigation } from "react-router";
import { office } from "~/text/en/office";
import { refusalText } from "~/text/en/refusals";

interface FieldProps {
  field: FieldMetadata<unknown>;
  label: string;
  hint?: string | null;
}

export interface Option {
  value: string;
  label: string;
}

const BOX =
  "min-h-11 rounded-sm border border-mute bg-card px-3 py-2 text-ink aria-invalid:border-2 aria-invalid:border-red";

function Errors({ id, errors }: { id: string; errors: readonly string[] | undefined }) {
  if (!errors?.length) return null;
  return (
    <div id={id} className="mt-1 font-bold text-red">
      {errors.map((code) => (
        <p key={code}>{refusalText.field(code)}</p>
      ))}
    </div>
  );
}

function Hint({ id, hint }: { id: string; hint: string | null | undefined }) {
  if (!hint) return null;
  return (
    <p id={id} className="mt-1 text-base text-mute">
      {hint}
    </p>
  );
}

function described({ field, hint }: Pick<FieldProps, "field" | "hint">) {
  return { ariaDescribedBy: hint ? field.descriptionId : undefined };
}

export function HiddenField({ field }: { field: FieldMetadata<unknown> }) {
  const { key, ...input } = getInputProps(field, { type: "hidden" });
  return <input key={key} {...input} />;
}

export function TextField({
  type = "text",
  ...props
}: FieldProps & { type?: "text" | "date" | "time" | "tel" } & Pick<
    ComponentProps<"input">,
    "inputMode" | "maxLength" | "list"
  >) {
  const { field, label, hint, ...rest } = props;
  const { key, ...input } = getInputProps(field, { type, ...described(props) });
  return (
    <div>
      <label htmlFor={field.id} className="font-bold">
        {label}
      </label>
      <input key={key} {...input} {...rest} autoComplete="off" className={`${BOX} w-full`} />
      <Hint id={field.descriptionId} hint={hint} />
      <Errors id={field.errorId} errors={field.errors} />
    </div>
  );
}

export function SelectField({
  options,
  ...props
}: FieldProps & { options: readonly (Option | { label: string; options: readonly Option[] })[] }) {
  const { field, label, hint } = props;
  const { key, ...select } = getSelectProps(field, described(props));
  return (
    <div>
      <label htmlFor={field.id} className="font-bold">
        {label}
      </label>
      <select key={key} {...select} className={`${BOX} w-full`}>
        {options.map((option) =>
          "options" in option ? (
            <optgroup key={option.label} label={option.label}>
              {option.options.map((one) => (
                <option key={one.value} value={one.value}>
                  {one.label}
                </option>
              ))}
            </optgroup>
          ) : (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ),
        )}
      </select>
      <Hint id={field.descriptionId} hint={hint} />
      <Errors id={field.errorId} errors={field.errors} />
    </div>
  );
}

/** A measure: a number and, beside it, the unit it is typed in. */
export function AmountField({
  unit,
  units,
  ...props
}: FieldProps & { unit: FieldMetadata<unknown>; units: readonly Option[] }) {
  const { field, label, hint } = props;
  const { key, ...input } = getInputProps(field, { type: "text", ...described(props) });
  const { key: unitKey, ...select } = getSelectProps(unit);
  return (
    <div>
      <label htmlFor={field.id} className="font-bold">
        {label}
      </label>
      <div className="flex gap-2">
        <input
          key={key}
          {...input}
          inputMode="decimal"
          autoComplete="off"
          className={`${BOX} min-w-0 flex-1 tabular-nums`}
        />
        <select
          key={unitKey}
          {...select}
          aria-label={office.unitOf(label)}
          className={`${BOX} w-28 shrink-0`}
        >
          {units.map((one) => (
            <option key={one.value} value={one.value}>
              {one.label}
            </option>
          ))}
        </select>
      </div>
      <Hint id={field.descriptionId} hint={hint} />
      <Errors id={field.errorId} errors={field.errors} />
      <Errors id={unit.errorId} errors={unit.errors} />
    </div>
  );
}

export function CheckField(props: FieldProps) {
  const { field, label, hint } = props;
  const { key, ...input } = getInputProps(field, { type: "checkbox", ...described(props) });
  return (
    <div>
      <label htmlFor={field.id} className="flex min-h-11 items-center gap-3">
        <input key={key} {...input} className="size-6 shrink-0 accent-enamel" />
        {label}
      </label>
      <Hint id={field.descriptionId} hint={hint} />
      <Errors id={field.errorId} errors={field.errors} />
    </div>
  );
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
  const faulty = form.status === "error";
  return (
    <Form method="post" {...getFormProps(form)} className="max-w-xl space-y-5">
      {faulty && (
        <div role="alert" id={form.errorId} className="border-l-4 border-red bg-card p-3">
          {form.errors?.length ? (
            form.errors.map((code) => <p key={code}>{refusalText.field(code)}</p>)
          ) : (
            <p>{office.formFault}</p>
          )}
        </div>
      )}
      {children}
      <div className="flex flex-wrap items-center gap-4">
        <SubmitButton disabled={saving}>{submit}</SubmitButton>
        {cancelTo}
      </div>
    </Form>
  );
}

export function SubmitButton(props: ComponentProps<"button">) {
  return (
    <button
      type="submit"
      {...props}
      className="min-h-11 rounded-sm bg-enamel px-5 py-2 font-bold text-card"
    />
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
      <button
        type="submit"
        name="intent"
        value={name}
        aria-label={label}
        className="min-h-11 rounded-sm border border-mute px-3 py-1 text-ink"
      >
        {children}
      </button>
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
    <details className="relative">
      <summary
        aria-label={label}
        className="inline-flex min-h-11 cursor-pointer items-center rounded-sm border border-mute px-3 py-1"
      >
        {children}
      </summary>
      <div className="mt-2 max-w-xs border-l-4 border-yellow bg-card p-3">
        <p className="mb-2">{question}</p>
        <ActionButton {...button} label={label}>
          {children}
        </ActionButton>
      </div>
    </details>
  );
}
