import { type SubmissionResult, useForm } from "@conform-to/react";
import { office, unitOptions } from "~/text/en/office";
import { AmountField } from "~/ui/fields/amount-field";
import { CheckField } from "~/ui/fields/check-field";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { OfficeForm } from "../office-form";
import { TextLink } from "../page-parts";

/** A yard as its form shows it. */
export type ShownYard = {
  name: string;
  zone: string;
  elevation: number | string;
  elevationUnit: string;
  phone: string | null;
  shopOpens: string;
  winter: boolean;
};

const UNITS = unitOptions(["ft", "m"]);

export function YardForm({
  yard,
  zones,
  result,
}: {
  yard: Partial<ShownYard>;
  zones: readonly string[];
  result: SubmissionResult | undefined;
}) {
  const words = office.yards;
  const [form, fields] = useForm<ShownYard>({
    id: "yard",
    lastResult: result,
    defaultValue: { ...yard, winter: yard.winter ? "on" : undefined },
  });
  return (
    <OfficeForm
      form={form}
      submit={office.save}
      cancelTo={<TextLink to="/office/yards">{office.cancel}</TextLink>}
    >
      <TextField field={fields.name} label={words.name} />
      <SelectField
        field={fields.zone}
        label={words.zone}
        hint={words.zoneHint}
        options={[
          { value: "", label: office.choose },
          ...zones.map((zone) => ({ value: zone, label: zone.replaceAll("_", " ") })),
        ]}
      />
      <AmountField
        field={fields.elevation}
        unit={fields.elevationUnit}
        units={UNITS}
        label={words.elevation}
        hint={words.elevationHint}
      />
      <TextField
        field={fields.shopOpens}
        type="time"
        label={words.shopOpens}
        hint={words.shopOpensHint}
      />
      <TextField
        field={fields.phone}
        type="tel"
        inputMode="tel"
        label={words.phone}
        hint={words.phoneHint}
      />
      <CheckField field={fields.winter} label={words.winter} hint={words.winterHint} />
    </OfficeForm>
  );
}
