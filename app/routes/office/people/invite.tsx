import { getInputProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { invitePerson } from "~/domain/people/invite-person";
import { inviteSchema } from "~/domain/people/person-input";
import { listYards } from "~/domain/yards/read-yards";
import { unparsedForm } from "~/http/form-reply";
import { office } from "~/text/en/office";
import { peopleText } from "~/text/en/people";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { OfficeForm } from "../office-form";
import { refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/invite";
import { PlaceFields, type ShownPlace } from "./place-fields";

/** The invitation's id is made with the form, so that the form sent twice is one invitation. */
export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "people.manage");
  const yards = await listYards(dbOf(context), actor);
  return { id: uuidv7(), yards: yards.map(({ id, name }) => ({ id, name })) };
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "people.manage");
  const submission = parseWithZod(await request.formData(), { schema: inviteSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const invited = await invitePerson(dbOf(context), actor, submission.value);
  if (!invited.ok) return refusedForm(submission, invited.refusal);
  return redirect("/office/people?done=invited");
}

type ShownInvitation = ShownPlace & { id: string; name: string; email: string };

export default function Invite({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm<ShownInvitation>({
    id: "invite",
    lastResult: actionData?.result,
    defaultValue: { id: loaderData.id, roles: ["driver"] },
  });
  const { key, ...id } = getInputProps(fields.id, { type: "hidden" });
  return (
    <>
      <PageTitle title={peopleText.inviteTitle} lead={peopleText.inviteLead} />
      <OfficeForm
        form={form}
        submit={peopleText.send}
        cancelTo={<TextLink to="/office/people">{office.cancel}</TextLink>}
      >
        <input key={key} {...id} />
        <TextField field={fields.name} label={peopleText.name} hint={peopleText.nameHint} />
        <TextField
          field={fields.email}
          label={peopleText.email}
          hint={peopleText.emailHint}
          inputMode="email"
        />
        <PlaceFields fields={fields} yards={loaderData.yards} />
      </OfficeForm>
    </>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${peopleText.inviteTitle} · ${office.product}` },
];
