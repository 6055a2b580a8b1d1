import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { figures } from "~/domain/trucks/fitting-attributes";
import { setSetPoint, setSetPointSchema } from "~/domain/trucks/set-set-point";
import { unparsedForm } from "~/http/form-reply";
import { limitedBy, office, readings, unitLabel, withUnit } from "~/text/en/office";
import { isSetPointReading, SET_POINT_READINGS } from "~/trade/set-points";
import { fromSi, unitsOf } from "~/trade/units";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { OfficeForm } from "../office-form";
import { notFound, refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/set-point";
import { truckOr404 } from "./truck-or-404";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const { truck, setPoints } = await truckOr404(dbOf(context), actor, params.unit);
  const line = setPoints.find((one) => one.reading === params.reading) ?? notFound("other");
  const { reading, set, limit } = line;
  const unit = set?.unit ?? readings[reading].unit;
  return {
    unitNumber: truck.unitNumber,
    reading,
    limit: limit && { by: limit.by, value: withUnit(figures(fromSi(limit.valueSi, unit)), unit) },
    shown: { unit, ...set?.entered },
  };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  if (!isSetPointReading(params.reading)) notFound("other");
  const form = await request.formData();
  form.set("reading", params.reading);
  const submission = parseWithZod(form, { schema: setSetPointSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const set = await setSetPoint(db, actor, { ...submission.value, truckId: truck.id });
  if (!set.ok) return refusedForm(submission, set.refusal);
  const done = set.value.changed ? "set-point" : "unchanged";
  throw redirect(`/office/trucks/${truck.unitNumber}?done=${done}#set-points`);
}

type ShownSetPoint = {
  unit: string;
  setPoint?: number;
  low?: number | null;
  high?: number | null;
  stop?: number | null;
};

export default function SetPoint({ loaderData, actionData }: Route.ComponentProps) {
  const { unitNumber, reading, limit, shown } = loaderData;
  const words = office.truck;
  const { label, hint } = readings[reading];
  const stops = reading === "vacuum-relief" || reading === "pressure-relief";
  const [form, fields] = useForm<ShownSetPoint>({
    id: "set-point",
    lastResult: actionData?.result,
    defaultValue: shown,
  });
  return (
    <>
      <PageTitle
        title={words.setPointTitle(unitNumber, label)}
        lead={
          <>
            {hint} {limit ? words.limit(limit.value, limitedBy[limit.by]) : stops && words.noLimit}{" "}
            {words.endsWalks}
          </>
        }
      />
      <OfficeForm
        form={form}
        submit={words.saveSetPoint}
        cancelTo={<TextLink to={`/office/trucks/${unitNumber}`}>{office.cancel}</TextLink>}
      >
        <SelectField
          field={fields.unit}
          label={words.unit}
          hint={words.unitHint}
          options={unitsOf(SET_POINT_READINGS[reading]).map((unit) => ({
            value: unit,
            label: unitLabel(unit),
          }))}
        />
        <TextField field={fields.setPoint} label={words.point} inputMode="decimal" />
        <TextField field={fields.low} label={words.low} inputMode="decimal" />
        <TextField field={fields.high} label={words.high} inputMode="decimal" />
        {stops && (
          <TextField
            field={fields.stop}
            label={words.stop}
            hint={words.stopHint(limit?.value ?? null)}
            inputMode="decimal"
          />
        )}
      </OfficeForm>
    </>
  );
}

export const meta: Route.MetaFunction = ({ loaderData, params }) => [
  {
    title: `${office.truck.setPointTitle(params.unit, loaderData ? readings[loaderData.reading].label : "")} · ${office.product}`,
  },
];
