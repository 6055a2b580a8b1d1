import { useEffect, useRef } from "react";
import { refusalText } from "~/text/en/refusals";
import { uiText } from "~/text/en/ui";
import { type FieldShape, isFaulty } from "./fields/field-shape";

/** Fields in the form's order, each with its label. */
export type SummaryField = readonly [label: string, field: FieldShape];

/**
 * Over a form that was refused: what is wrong with it as a whole, then a link to every field that
 * needs another look. It takes the focus when it appears.
 */
export function ErrorSummary({
  fields,
  errors = [],
}: {
  fields: readonly SummaryField[];
  /** Faults of the form as a whole, in words or as keys of `refusalText.field`. */
  errors?: readonly string[];
}) {
  const box = useRef<HTMLDivElement>(null);
  const faulty = fields.filter(([, field]) => isFaulty(field));
  const count = faulty.length + errors.length;
  const shown = count > 0;
  useEffect(() => {
    if (shown) box.current?.focus();
  }, [shown]);
  if (!shown) return null;
  return (
    <div
      ref={box}
      role="alert"
      tabIndex={-1}
      className="rounded-md border-2 border-red bg-card p-4 [&_a]:inline-flex [&_a]:min-h-11 [&_a]:items-center"
    >
      <h2 className="text-lg font-bold text-red">{uiText.faults(count)}</h2>
      {errors.map((code) => (
        <p key={code} className="mt-1">
          {refusalText.field(code)}
        </p>
      ))}
      <ul className="mt-1">
        {faulty.map(([label, field]) => (
          <li key={field.id}>
            <a href={`#${field.id}`} className="underline">
              {label}: {field.errors?.map((code) => refusalText.field(code)).join(" ")}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}
