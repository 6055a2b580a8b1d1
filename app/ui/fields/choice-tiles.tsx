import type { ReactNode } from "react";
import { FieldGroup, type FieldProps } from "./field";
import { describedBy, startOf } from "./field-shape";

export interface Choice {
  value: string;
  label: string;
  /** A second line: what follows from choosing it. */
  note?: string;
  /** A tag's or a standing's drawing before the words. */
  drawing?: ReactNode;
}

/** A few answers as big tiles, one of which is chosen. A dot marks the chosen one, not its color alone. */
export function ChoiceTiles({
  field,
  label,
  hint,
  optional,
  choices,
  columns = 1,
  onChoose,
}: FieldProps & {
  choices: readonly Choice[];
  columns?: 1 | 2 | 3;
  onChoose?: (value: string) => void;
}) {
  const grid = { 1: "", 2: "sm:grid-cols-2", 3: "sm:grid-cols-3" }[columns];
  return (
    <FieldGroup field={field} label={label} hint={hint} optional={optional}>
      <div key={field.key} className={`grid grid-cols-1 gap-3 ${grid}`}>
        {choices.map((choice) => (
          <label
            key={choice.value}
            className="flex min-h-14 cursor-pointer flex-wrap items-center gap-x-3 rounded-lg border-2 border-edge bg-card px-4 py-2.5 leading-tight hover:border-ink has-checked:border-enamel has-checked:bg-enamel has-checked:text-card has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-brass"
          >
            <input
              type="radio"
              name={field.name}
              form={field.formId}
              value={choice.value}
              defaultChecked={startOf(field) === choice.value}
              aria-describedby={describedBy(field, hint)}
              onChange={() => onChoose?.(choice.value)}
              className="size-6 shrink-0 appearance-none rounded-full border-2 border-current bg-transparent outline-none checked:border-[7px]"
            />
            {choice.drawing}
            <span className="min-w-0 flex-1 basis-24">
              <span className="block font-bold">{choice.label}</span>
              {choice.note && <span className="block text-sm">{choice.note}</span>}
            </span>
          </label>
        ))}
      </div>
    </FieldGroup>
  );
}
