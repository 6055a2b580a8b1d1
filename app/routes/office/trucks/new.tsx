import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { addTruck, addTruckSchema } from "~/domain/trucks/add-truck";
import { USUAL_TRUCKS } from "~/domain/trucks/usual-trucks";
import { listYards } from "~/domain/yards/read-yards";
import { unparsedForm } from "~/http/form-reply";
import { office, unitKinds, usualTrucks } from "~/text/en/office";
import { UNIT_KINDS } from "~/trade/sheet/check";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { HiddenField, OfficeForm } from "../office-form";
import { refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/new";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const yards = await listYards(dbOf(context), actor);
  return {
    id: uuidv7(),
    yards: yards.map(({ id, name }) => ({ value: id, label: name })),
  };
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const submission = parseWithZod(await request.formData(), { schema: addTruckSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const added = await addTruck(dbOf(context), actor, submission.value);
  if (!added.ok) return refusedForm(submission, added.refusal);
  throw redirect(`/office/trucks/${added.value.unitNumber}?done=truck`);
}

type ShownTruck = {
  id: string;
  unitNumber: string;
  kind: string;
  vin: string;
  yardId: string;
  start: string;
};

export default function NewTruck({ loaderData: { id, yards }, actionData }: Route.ComponentProps) {
  const words = office.trucks;
  const [form, fields] = useForm<ShownTruck>({
    id: "truck",
    lastResult: actionData?.result,
    defaultValue: {
      id,
      kind: "powered",
      start: USUAL_TRUCKS[0],
      yardId: yards.length === 1 ? yards[0]?.value : "",
    },
  });
  return (
    <>
      <PageTitle title={words.add} />
      <OfficeForm
        form={form}
        submit={words.submit}
        cancelTo={<TextLink to="/office/trucks">{office.cancel}</TextLink>}
      >
        <HiddenField field={fields.id} />
        <TextField field={fields.unitNumber} label={words.unit} hint={words.unitHint} />
        <SelectField
          field={fields.kind}
          label={words.kind}
          options={UNIT_KINDS.map((kind) => ({ value: kind, label: unitKinds[kind] }))}
        />
        <SelectField
          field={fields.yardId}
          label={words.yard}
          options={[{ value: "", label: office.choose }, ...yards]}
        />
        <SelectField
          field={fields.start}
          label={words.start}
          hint={words.startHint}
          options={[
            ...USUAL_TRUCKS.map((start) => ({ value: start, label: usualTrucks[start] })),
            { value: "", label: words.startNothing },
          ]}
        />
        <TextField field={fields.vin} label={words.vin} hint={words.vinHint} />
      </OfficeForm>
    </>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${office.trucks.add} · ${office.product}` },
];
