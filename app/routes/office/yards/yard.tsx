import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { zoneNames } from "~/domain/yard-day";
import { changeYard } from "~/domain/yards/change-yard";
import { readYard } from "~/domain/yards/read-yards";
import { shownClock } from "~/domain/yards/shown-clock";
import { shownElevation, yardSchema } from "~/domain/yards/yard-input";
import { unparsedForm } from "~/http/form-reply";
import { office } from "~/text/en/office";
import { PageTitle } from "~/ui/page-frame";
import { idOr404, notFound, refusedForm } from "../office-reply";
import type { Route } from "./+types/yard";
import { YardForm } from "./yard-form";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const yard = await readYard(dbOf(context), actor.carrierId, idOr404(params.yardId));
  if (!yard) notFound("other");
  const { name, zone, phone, winter } = yard;
  return {
    zones: zoneNames(),
    yard: {
      name,
      zone,
      phone,
      winter,
      elevation: shownElevation(yard.elevationM),
      elevationUnit: "ft",
      shopOpens: shownClock(yard.shopOpensMinute),
    },
  };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const yardId = idOr404(params.yardId);
  const submission = parseWithZod(await request.formData(), { schema: yardSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const changed = await changeYard(dbOf(context), actor, { ...submission.value, yardId });
  if (!changed.ok) return refusedForm(submission, changed.refusal);
  throw redirect("/office/yards?done=yard");
}

export default function Yard({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageTitle title={loaderData.yard.name} />
      <YardForm yard={loaderData.yard} zones={loaderData.zones} result={actionData?.result} />
    </>
  );
}

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.yard.name ?? office.yards.title} · ${office.product}` },
];
