import { type FieldMetadata, type SubmissionResult, useForm } from "@conform-to/react";
import type { ReactNode } from "react";
import {
  type AmountName,
  type FittingField,
  type FlagName,
  fittingFields,
} from "~/domain/trucks/fitting-fields";
import {
  amountHint,
  amountNames,
  choiceLabels,
  flagNames,
  office,
  optionLabel,
  unitOptions,
} from "~/text/en/office";
import type { FittingKind } from "~/trade/fittings";
import { AmountField } from "~/ui/fields/amount-field";
import { CheckField } from "~/ui/fields/check-field";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { HiddenField, OfficeForm } from "../office-form";

interface Amount {
  value: string | number | undefined;
  unit: string;
}
/** A plate as its form shows it. */
export interface ShownPlate extends Partial<Record<AmountName, Amount>> {
  type?: string;
  grade?: string;
  count?: string | number;
  flags?: readonly FlagName[];
}

type Typed = {
  id?: string;
  attributes: Partial<Record<AmountName, Amount>> &
    Partial<Record<FlagName, string>> & { type?: string; grade?: string; count?: string | number };
};

type Fields = Required<ReturnType<FieldMetadata<Typed["attributes"]>["getFieldset"]>>;

function asTyped(kind: FittingKind, { flags = [], ...plate }: ShownPlate): Typed {
  const attributes: Typed["attributes"] = { ...plate };
  for (const field of fittingFields(kind)) {
    if (field.as === "amount") {
      attributes[field.name] = plate[field.name] ?? { value: undefined, unit: field.units[0] };
    }
    if (field.as === "flag" && flags.includes(field.name)) attributes[field.name] = "on";
  }
  return { attributes };
}

/** The plate of one fitting: which fields it has follows from its kind. */
export function FittingForm({
  id,
  kind,
  plate,
  submit,
  cancelTo,
  result,
}: {
  /** Of a fitting that is not there yet. */
  id?: string;
  kind: FittingKind;
  plate: ShownPlate;
  submit: string;
  cancelTo: ReactNode;
  result: SubmissionResult | undefined;
}) {
  const [form, fields] = useForm<Typed>({
    id: "fitting",
    lastResult: result,
    defaultValue: { id, ...asTyped(kind, plate) },
  });
  const attributes = fields.attributes.getFieldset();
  const shown = fittingFields(kind);
  return (
    <OfficeForm form={form} submit={submit} cancelTo={cancelTo}>
      <input type="hidden" name="kind" value={kind} />
      {id && <HiddenField field={fields.id} />}
      {shown.length === 0 && <p>{office.truck.nothingToFill}</p>}
      {shown.map((field) => (
        <PlateField key={field.name} kind={kind} field={field} attributes={attributes} />
      ))}
    </OfficeForm>
  );
}

function PlateField({
  kind,
  field,
  attributes,
}: {
  kind: FittingKind;
  field: FittingField;
  attributes: Fields;
}) {
  switch (field.as) {
    case "amount": {
      const { value, unit } = attributes[field.name].getFieldset();
      return (
        <AmountField
          field={value}
          unit={unit}
          units={unitOptions(field.units)}
          label={amountNames[field.name]}
          hint={amountHint(kind, field.name)}
        />
      );
    }
    case "count":
      return <TextField field={attributes.count} label={choiceLabels.count} inputMode="numeric" />;
    case "choice":
      return (
        <SelectField
          field={attributes[field.name]}
          label={choiceLabels[field.name]}
          options={[
            { value: "", label: field.required ? office.choose : office.truck.notSaid },
            ...field.options.map((option) => ({ value: option, label: optionLabel(option) })),
          ]}
        />
      );
    case "flag":
      return <CheckField field={attributes[field.name]} label={flagNames[field.name]} />;
  }
}
