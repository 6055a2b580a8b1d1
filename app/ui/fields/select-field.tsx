import { CONTROL, Field, type FieldProps } from "./field";
import { controlProps, startOf } from "./field-shape";

export interface Option {
  value: string;
  label: string;
}
export interface OptionGroup {
  label: string;
  options: readonly Option[];
}

/** One of a known few, by the phone's own list. For more than a screenful use `ComboboxField`. */
export function SelectField({
  field,
  label,
  hint,
  optional,
  options,
  alone,
}: FieldProps & {
  options: readonly (Option | OptionGroup)[];
  /** Always answered by itself: a press that answers several leaves it out. */
  alone?: boolean;
}) {
  return (
    <Field field={field} label={label} hint={hint} optional={optional}>
      <select
        key={field.key}
        // An empty choice comes back as nothing, and is a choice all the same.
        defaultValue={startOf(field) ?? ""}
        {...controlProps(field, hint)}
        data-alone={alone || undefined}
        className={`${CONTROL} w-full`}
      >
        {options.map((option) =>
          "options" in option ? (
            <optgroup key={option.label} label={option.label}>
              <Options options={option.options} />
            </optgroup>
          ) : (
            <Options key={option.value} options={[option]} />
          ),
        )}
      </select>
    </Field>
  );
}

export function Options({ options }: { options: readonly Option[] }) {
  return options.map((one) => (
    <option key={one.value} value={one.value}>
      {one.label}
    </option>
  ));
}
