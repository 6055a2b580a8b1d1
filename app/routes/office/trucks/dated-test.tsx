import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { datedTestSchema, recordDatedTest } from "~/domain/trucks/record-dated-test";
import { unparsedForm } from "~/http/form-reply";
import { office, testLabel } from "~/text/en/office";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { OfficeForm } from "../office-form";
import { notFound, refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/dated-test";
import { truckOr404 } from "./truck-or-404";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const { truck, tests } = await truckOr404(dbOf(context), actor, params.unit);
  const { required } =
    tests.find((line) => line.required.test === params.test) ?? notFound("other");
  return { unitNumber: truck.unitNumber, ...required };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const form = await request.formData();
  form.set("kind", params.test);
  const submission = parseWithZod(form, { schema: datedTestSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const recorded = await recordDatedTest(db, actor, { ...submission.value, truckId: truck.id });
  if (!recorded.ok) return refusedForm(submission, recorded.refusal);
  throw redirect(`/office/trucks/${truck.unitNumber}?done=test#tests`);
}

export default function RecordTest({ loaderData, actionData }: Route.ComponentProps) {
  const { unitNumber, test, everyMonths, source } = loaderData;
  const words = office.truck;
  const [form, fields] = useForm<{ passedOn: string; dueOn: string; note: string }>({
    id: "test",
    lastResult: actionData?.result,
  });
  return (
    <>
      <PageTitle
        title={words.testTitle(unitNumber, testLabel(test))}
        lead={everyMonths === null ? words.permitLead : words.everyLine(everyMonths, source)}
      />
      <OfficeForm
        form={form}
        submit={words.saveTest}
        cancelTo={<TextLink to={`/office/trucks/${unitNumber}`}>{office.cancel}</TextLink>}
      >
        {everyMonths !== null && (
          <TextField
            field={fields.passedOn}
            type="date"
            label={words.passedOn}
            hint={words.passedOnHint}
          />
        )}
        <TextField
          field={fields.dueOn}
          type="date"
          label={words.dueOn}
          hint={everyMonths === null ? words.permitDueHint : words.dueOnHint}
        />
        <TextField field={fields.note} label={words.note} hint={words.noteHint} />
      </OfficeForm>
    </>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${office.truck.testTitle(params.unit, testLabel(params.test))} · ${office.product}` },
];
