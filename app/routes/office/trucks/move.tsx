import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { moveTruckSchema, moveTruckToYard } from "~/domain/trucks/move-truck";
import { listYards } from "~/domain/yards/read-yards";
import { unparsedForm } from "~/http/form-reply";
import { office } from "~/text/en/office";
import { SelectField } from "~/ui/fields/select-field";
import { PageTitle } from "~/ui/page-frame";
import { OfficeForm } from "../office-form";
import { refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/move";
import { truckOr404 } from "./truck-or-404";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck, yard } = await truckOr404(db, actor, params.unit);
  const yards = await listYards(db, actor);
  return {
    unitNumber: truck.unitNumber,
    yardId: yard.id,
    yards: yards.map(({ id, name }) => ({ value: id, label: name })),
  };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const submission = parseWithZod(await request.formData(), { schema: moveTruckSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const moved = await moveTruckToYard(db, actor, { ...submission.value, truckId: truck.id });
  if (!moved.ok) return refusedForm(submission, moved.refusal);
  const done = moved.value.moved ? "moved" : "unchanged";
  throw redirect(`/office/trucks/${truck.unitNumber}?done=${done}`);
}

export default function MoveTruck({ loaderData, actionData }: Route.ComponentProps) {
  const { unitNumber, yardId, yards } = loaderData;
  const [form, fields] = useForm<{ yardId: string }>({
    id: "move",
    lastResult: actionData?.result,
    defaultValue: { yardId },
  });
  return (
    <>
      <PageTitle title={office.truck.moveTitle(unitNumber)} />
      <OfficeForm
        form={form}
        submit={office.truck.moveSubmit}
        cancelTo={<TextLink to={`/office/trucks/${unitNumber}`}>{office.cancel}</TextLink>}
      >
        <SelectField
          field={fields.yardId}
          label={office.trucks.yard}
          hint={office.truck.moveHint}
          options={yards}
        />
      </OfficeForm>
    </>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${office.truck.moveTitle(params.unit)} · ${office.product}` },
];
