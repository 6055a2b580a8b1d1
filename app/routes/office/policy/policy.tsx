import { type FieldMetadata, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { changePolicy } from "~/domain/policy/change-policy";
import { readPolicy } from "~/domain/policy/read-policy";
import type { PolicySettings } from "~/domain/policy/settings";
import { unparsedForm } from "~/http/form-reply";
import { office } from "~/text/en/office";
import { policyText, settingText } from "~/text/en/policy";
import { CheckField } from "~/ui/fields/check-field";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { OfficeForm } from "../office-form";
import { refusedForm } from "../office-reply";
import { SavedNote } from "../page-parts";
import type { Route } from "./+types/policy";
import { type NumberSetting, numberFault, policyForm } from "./policy-form";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "policy.manage");
  return await readPolicy(dbOf(context), actor.carrierId);
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "policy.manage");
  const submission = parseWithZod(await request.formData(), {
    schema: policyForm,
    formatError: (issues: { path: PropertyKey[] }[]) =>
      issues.map((issue) => numberFault(String(issue.path[0]))),
  });
  if (submission.status !== "success") return unparsedForm(submission);
  const changed = await changePolicy(dbOf(context), actor, submission.value);
  if (!changed.ok) return refusedForm(submission, changed.refusal);
  return redirect("/office/policy?done=policy");
}

type Shown = Record<keyof PolicySettings, string | undefined>;

/** The settings as the form's fields hold them. */
function shown(settings: PolicySettings): Shown {
  const entries = Object.entries(settings).map(([name, value]) => {
    if (name === "limitsBlock") return [name, value ? "block" : "warn"];
    if (typeof value === "boolean") return [name, value ? "on" : undefined];
    return [name, value === null ? "" : String(value)];
  });
  return Object.fromEntries(entries) as Shown;
}

export default function Policy({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm<Shown>({
    id: "policy",
    lastResult: actionData?.result,
    defaultValue: shown(loaderData.settings),
  });
  const number = (name: NumberSetting) => <NumberField name={name} field={fields[name]} />;
  const { groups } = policyText;
  return (
    <>
      <PageTitle title={policyText.title} lead={policyText.lead} />
      <SavedNote />
      <p className="max-w-prose">{policyText.floor}</p>
      <p className="mt-2 mb-8 text-mute">{policyText.version(loaderData.version)}</p>
      <OfficeForm form={form} submit={policyText.save}>
        <Group title={groups.walks}>
          {number("walkHours")}
          <CheckField field={fields.afterWalkRequired} {...settingText.afterWalkRequired} />
          {number("reviewDays")}
          <CheckField field={fields.bothHalvesDaily} {...settingText.bothHalvesDaily} />
        </Group>
        <Group title={groups.rounds}>
          {number("weeklyEveryDays")}
          {number("weeklyGraceDays")}
          {number("monthlyEveryMonths")}
          {number("monthlyGraceDays")}
          {number("monthlyEveryHours")}
          {number("monthlyGraceHours")}
        </Group>
        <Group title={groups.tests}>{number("testWarnDays")}</Group>
        <Group title={groups.runs}>
          <SelectField
            field={fields.limitsBlock}
            {...settingText.limitsBlock}
            options={[
              { value: "block", label: policyText.blocks },
              { value: "warn", label: policyText.warns },
            ]}
          />
        </Group>
        <Group title={groups.signs}>
          <CheckField field={fields.driverFix} {...settingText.driverFix} />
          <CheckField field={fields.twoPeople} {...settingText.twoPeople} />
        </Group>
      </OfficeForm>
    </>
  );
}

function Group({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <fieldset className="space-y-5 border-t border-line pt-4">
      <legend className="pr-4 text-xl font-bold">{title}</legend>
      {children}
    </fieldset>
  );
}

function NumberField({ name, field }: { name: NumberSetting; field: FieldMetadata<unknown> }) {
  return <TextField field={field} {...settingText[name]} inputMode="numeric" />;
}

export const meta: Route.MetaFunction = () => [
  { title: `${policyText.title} · ${office.product}` },
];
