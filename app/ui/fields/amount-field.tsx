import { uiText } from "~/text/en/ui";
import { CONTROL, Field, FieldFaults, type FieldProps } from "./field";
import { controlProps, type FieldShape, startOf } from "./field-shape";
import { type Option, Options } from "./select-field";

/** A number and the unit it is typed in. One unit is shown as text, several as a choice. */
export function AmountField({
  field,
  label,
  hint,
  optional,
  unit,
  units,
}: FieldProps & { unit: FieldShape; units: readonly [Option, ...Option[]] }) {
  return (
    <div>
      <Field field={field} label={label} hint={hint} optional={optional}>
        <div className="flex flex-wrap gap-2">
          <input
            key={field.key}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            defaultValue={startOf(field)}
            {...controlProps(field, hint)}
            className={`${CONTROL} min-w-0 max-w-48 flex-1 basis-24 tabular-nums`}
          />
          {units.length === 1 ? (
            <span className="self-center text-mute">
              {units[0].label}
              <input type="hidden" name={unit.name} form={unit.formId} value={units[0].value} />
            </span>
          ) : (
            <select
              key={unit.key}
              defaultValue={startOf(unit)}
              aria-label={uiText.unitOf(label)}
              {...controlProps(unit, null)}
              className={`${CONTROL} w-28 shrink-0`}
            >
              <Options options={units} />
            </select>
          )}
        </div>
      </Field>
      <FieldFaults field={unit} />
    </div>
  );
}
