import type { ReactNode } from "react";
import { uiText } from "~/text/en/ui";
import { CONTROL, Field, type FieldProps } from "./field";
import { controlProps, startOf } from "./field-shape";

/** The certification, and under it the name that signs it, typed by the person themself. */
export function SignatureField({
  field,
  wording,
  signer,
  label = uiText.signature.label,
  hint,
}: Omit<FieldProps, "label"> & {
  label?: string;
  /** What is certified, in full and in the first person. */
  wording: ReactNode;
  /** Who is signed in. */
  signer: string;
}) {
  return (
    <div className="rounded-lg border-2 border-ink bg-card p-4">
      <div className="mb-4 max-w-prose border-l-4 border-brass pl-3">{wording}</div>
      <Field field={field} label={label} hint={hint ?? uiText.signature.as(signer)}>
        <input
          key={field.key}
          type="text"
          autoComplete="off"
          autoCapitalize="words"
          spellCheck={false}
          defaultValue={startOf(field)}
          {...controlProps(field, true)}
          className={`${CONTROL} min-h-14 w-full border-x-0 border-t-0 rounded-none bg-transparent px-1 text-xl font-bold`}
        />
      </Field>
    </div>
  );
}
