import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { changeFitting, changeFittingSchema } from "~/domain/trucks/change-fitting";
import { unparsedForm } from "~/http/form-reply";
import { fittingKinds, office } from "~/text/en/office";
import { PageTitle } from "~/ui/page-frame";
import { idOr404, notFound, refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/fitting";
import { FittingForm } from "./fitting-form";
import { shownPlate } from "./shown-plate";
import { truckOr404 } from "./truck-or-404";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const { truck, fittings } = await truckOr404(dbOf(context), actor, params.unit);
  const fittingId = idOr404(params.fittingId);
  const fitting = fittings.find((one) => one.id === fittingId) ?? notFound("other");
  return { unitNumber: truck.unitNumber, kind: fitting.kind, plate: shownPlate(fitting) };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const fittingId = idOr404(params.fittingId);
  const submission = parseWithZod(await request.formData(), { schema: changeFittingSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const input = { ...submission.value, truckId: truck.id, fittingId };
  const changed = await changeFitting(db, actor, input);
  if (!changed.ok) return refusedForm(submission, changed.refusal);
  const done = changed.value.changed ? "fitting" : "unchanged";
  throw redirect(`/office/trucks/${truck.unitNumber}?done=${done}`);
}

export default function ChangeFitting({ loaderData, actionData }: Route.ComponentProps) {
  const { unitNumber, kind, plate } = loaderData;
  const words = office.truck;
  return (
    <>
      <PageTitle
        title={words.fittingTitle(unitNumber, fittingKinds[kind])}
        lead={words.endsWalks}
      />
      <FittingForm
        kind={kind}
        plate={plate}
        submit={words.saveFitting}
        cancelTo={<TextLink to={`/office/trucks/${unitNumber}`}>{office.cancel}</TextLink>}
        result={actionData?.result}
      />
    </>
  );
}

export const meta: Route.MetaFunction = ({ loaderData, params }) => [
  {
    title: `${office.truck.fittingTitle(params.unit, loaderData ? fittingKinds[loaderData.kind] : "")} · ${office.product}`,
  },
];
