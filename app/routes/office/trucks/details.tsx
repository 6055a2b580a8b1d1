import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { changeTruckDetails, truckDetailsSchema } from "~/domain/trucks/change-truck-details";
import { unparsedForm } from "~/http/form-reply";
import { office, unitKinds } from "~/text/en/office";
import { UNIT_KINDS } from "~/trade/sheet/check";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { OfficeForm } from "../office-form";
import { refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/details";
import { truckOr404 } from "./truck-or-404";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const { truck } = await truckOr404(dbOf(context), actor, params.unit);
  return { unitNumber: truck.unitNumber, kind: truck.kind, vin: truck.vin };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const submission = parseWithZod(await request.formData(), { schema: truckDetailsSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const changed = await changeTruckDetails(db, actor, { ...submission.value, truckId: truck.id });
  if (!changed.ok) return refusedForm(submission, changed.refusal);
  throw redirect(`/office/trucks/${changed.value.unitNumber}?done=details`);
}

export default function TruckDetails({ loaderData, actionData }: Route.ComponentProps) {
  const words = office.trucks;
  const { unitNumber, kind, vin } = loaderData;
  const [form, fields] = useForm<{ unitNumber: string; kind: string; vin: string | null }>({
    id: "details",
    lastResult: actionData?.result,
    defaultValue: { unitNumber, kind, vin },
  });
  return (
    <>
      <PageTitle title={office.truck.detailsTitle(unitNumber)} />
      <OfficeForm
        form={form}
        submit={office.truck.saveDetails}
        cancelTo={<TextLink to={`/office/trucks/${unitNumber}`}>{office.cancel}</TextLink>}
      >
        <TextField field={fields.unitNumber} label={words.unit} hint={words.unitHint} />
        <SelectField
          field={fields.kind}
          label={words.kind}
          hint={office.truck.kindHint}
          options={UNIT_KINDS.map((one) => ({ value: one, label: unitKinds[one] }))}
        />
        <TextField field={fields.vin} label={words.vin} hint={words.vinHint} />
      </OfficeForm>
    </>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${office.truck.detailsTitle(params.unit)} · ${office.product}` },
];
