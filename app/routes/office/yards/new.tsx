import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { zoneNames } from "~/domain/yard-day";
import { addYard } from "~/domain/yards/add-yard";
import { yardSchema } from "~/domain/yards/yard-input";
import { unparsedForm } from "~/http/form-reply";
import { office } from "~/text/en/office";
import { PageTitle } from "~/ui/page-frame";
import { refusedForm } from "../office-reply";
import type { Route } from "./+types/new";
import { YardForm } from "./yard-form";

export function loader({ context }: Route.LoaderArgs) {
  requirePermission(context, "truck.manage");
  return { zones: zoneNames() };
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const submission = parseWithZod(await request.formData(), { schema: yardSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const added = await addYard(dbOf(context), actor, submission.value);
  if (!added.ok) return refusedForm(submission, added.refusal);
  throw redirect("/office/yards?done=yard");
}

export default function NewYard({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageTitle title={office.yards.addTitle} />
      <YardForm
        yard={{ elevationUnit: "ft", shopOpens: "06:00" }}
        zones={loaderData.zones}
        result={actionData?.result}
      />
    </>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${office.yards.addTitle} · ${office.product}` },
];
