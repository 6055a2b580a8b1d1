import type { ReactNode } from "react";
import { refusalText } from "~/text/en/refusals";
import { uiText } from "~/text/en/ui";
import { type FieldShape, isFaulty } from "./field-shape";

export interface FieldProps {
  field: FieldShape;
  label: string;
  /** One line that says what is wanted, and in what unit. */
  hint?: ReactNode;
  /** Marks a field that may stay empty; fields are required unless they say so. */
  optional?: boolean;
}

/** The box of every typed control: outlined at 3:1, never shorter than a thumb. */
export const CONTROL =
  "min-h-12 rounded-md border-2 border-edge bg-card px-3 py-2 text-ink hover:border-ink aria-invalid:border-red";

/** What is wrong with one field and how to put it right. */
export function FieldFaults({ field }: { field: FieldShape }) {
  if (!isFaulty(field)) return null;
  return (
    <div id={field.errorId} className="mt-1.5 flex gap-2 font-bold text-red">
      <span aria-hidden="true" className="w-1 shrink-0 rounded-full bg-red" />
      <div>
        {field.errors?.map((code) => (
          <p key={code}>{refusalText.field(code)}</p>
        ))}
      </div>
    </div>
  );
}

function FieldHint({ field, hint }: { field: FieldShape; hint: ReactNode }) {
  if (!hint) return null;
  return (
    <p id={field.descriptionId} className="mb-1.5 text-sm text-mute">
      {hint}
    </p>
  );
}

/** Label, hint, control, fault: in that order on every form. */
export function Field({
  field,
  label,
  hint,
  optional = false,
  children,
}: FieldProps & { children: ReactNode }) {
  return (
    <div>
      <label htmlFor={field.id} className="mb-1 block font-bold">
        {label}
        {optional && <span className="font-normal text-mute"> ({uiText.optional})</span>}
      </label>
      <FieldHint field={field} hint={hint} />
      {children}
      <FieldFaults field={field} />
    </div>
  );
}

/** The same for several controls under one legend. */
export function FieldGroup({
  field,
  label,
  hint,
  optional = false,
  children,
}: FieldProps & { children: ReactNode }) {
  return (
    <fieldset
      id={field.id}
      tabIndex={-1}
      className="min-w-0"
      aria-describedby={isFaulty(field) ? field.errorId : undefined}
    >
      <legend className="mb-1 font-bold">
        {label}
        {optional && <span className="font-normal text-mute"> ({uiText.optional})</span>}
      </legend>
      <FieldHint field={field} hint={hint} />
      {children}
      <FieldFaults field={field} />
    </fieldset>
  );
}
