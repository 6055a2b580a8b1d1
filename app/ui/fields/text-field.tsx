import type { ComponentProps } from "react";
import { CONTROL, Field, type FieldProps } from "./field";
import { controlProps, startOf } from "./field-shape";

type InputProps = Pick<
  ComponentProps<"input">,
  | "inputMode"
  | "autoComplete"
  | "autoCapitalize"
  | "spellCheck"
  | "list"
  | "min"
  | "max"
  | "onChange"
>;

/** One line of text, a date, a time, an address. Numbers with a unit are `AmountField`. */
export function TextField({
  field,
  label,
  hint,
  optional,
  type = "text",
  ...input
}: FieldProps & InputProps & { type?: "text" | "date" | "time" | "email" | "tel" | "search" }) {
  return (
    <Field field={field} label={label} hint={hint} optional={optional}>
      <input
        key={field.key}
        type={type}
        defaultValue={startOf(field)}
        autoComplete="off"
        {...controlProps(field, hint)}
        {...input}
        className={`${CONTROL} w-full`}
      />
    </Field>
  );
}

/** Several lines of text. */
export function TextAreaField({
  field,
  label,
  hint,
  optional,
  rows = 3,
}: FieldProps & { rows?: number }) {
  return (
    <Field field={field} label={label} hint={hint} optional={optional}>
      <textarea
        key={field.key}
        rows={rows}
        defaultValue={startOf(field)}
        {...controlProps(field, hint)}
        className={`${CONTROL} w-full`}
      />
    </Field>
  );
}
