import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { addOwnCheck, ownCheckSchema } from "~/domain/own-checks/add-own-check";
import { listOwnChecks, type OwnCheckRow } from "~/domain/own-checks/read-own-checks";
import { removeOwnCheck, restoreOwnCheck } from "~/domain/own-checks/remove-own-check";
import { listTrucks } from "~/domain/trucks/list-trucks";
import { unparsedForm } from "~/http/form-reply";
import { cadences, colours, office, stations } from "~/text/en/office";
import { CADENCES, STATIONS } from "~/trade/sheet/check";
import { EmptyState } from "~/ui/empty-state";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { PageTitle } from "~/ui/page-frame";
import { ActionButton, HiddenField, OfficeForm } from "../office-form";
import { idOr404, notFound, refusedForm } from "../office-reply";
import { SavedNote } from "../page-parts";
import type { Route } from "./+types/checks";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const checks = await listOwnChecks(db, actor);
  return {
    id: uuidv7(),
    asked: checks.filter((check) => check.removedAt === null),
    takenOff: checks.filter((check) => check.removedAt !== null),
    trucks: (await listTrucks(db, actor)).map(({ id, unitNumber }) => ({
      value: id,
      label: unitNumber,
    })),
  };
}

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const form = await request.formData();
  const intent = form.get("intent");
  if (intent === "remove" || intent === "restore") {
    const checkId = idOr404(String(form.get("checkId")));
    const command = intent === "remove" ? removeOwnCheck : restoreOwnCheck;
    const changed = await command(db, actor, { checkId });
    if (!changed.ok) notFound("other");
    throw redirect(`/office/checks?done=check-${intent}d`);
  }
  const submission = parseWithZod(form, { schema: ownCheckSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const added = await addOwnCheck(db, actor, submission.value);
  if (!added.ok) return refusedForm(submission, added.refusal);
  throw redirect("/office/checks?done=check");
}

export default function OwnChecks({ loaderData, actionData }: Route.ComponentProps) {
  const words = office.checks;
  const { id, asked, takenOff, trucks } = loaderData;
  return (
    <>
      <PageTitle title={words.title} lead={words.what} />
      <SavedNote />
      {asked.length === 0 ? (
        <EmptyState title={words.none} />
      ) : (
        <List rows={asked} intent="remove" action={words.remove} actionOf={words.removeOf} />
      )}
      <h2 className="mt-12 mb-4 text-2xl font-bold">{words.add}</h2>
      <AddCheck key={asked.length} id={id} trucks={trucks} result={actionData?.result} />
      {takenOff.length > 0 && (
        <>
          <h2 className="mt-12 mb-4 text-2xl font-bold">{words.takenOff}</h2>
          <List
            rows={takenOff}
            intent="restore"
            action={words.restore}
            actionOf={words.restoreOf}
          />
        </>
      )}
    </>
  );
}

function List(props: {
  rows: readonly OwnCheckRow[];
  intent: "remove" | "restore";
  action: string;
  actionOf: (label: string) => string;
}) {
  const { rows, intent, action: label, actionOf } = props;
  return (
    <ul className="divide-y divide-line border-y border-line">
      {rows.map((row) => (
        <li
          key={row.id}
          className="grid gap-x-6 gap-y-1 py-3 sm:grid-cols-[1fr_14rem_auto] sm:items-center"
        >
          <span>
            <span className="font-bold">{row.label}</span>
            <span className="block">{row.good}</span>
          </span>
          <span className="text-mute">
            {stations[row.station as keyof typeof stations] ?? row.station},{" "}
            {cadences[row.cadence].toLowerCase()},{" "}
            {(row.unitNumber ?? office.checks.everyTruck).replace(/^E/, "e")},{" "}
            {colours[row.colour].toLowerCase()}
          </span>
          <ActionButton name={intent} fields={{ checkId: row.id }} label={actionOf(row.label)}>
            {label}
          </ActionButton>
        </li>
      ))}
    </ul>
  );
}

type Shown = Record<"id" | "label" | "good" | "station" | "cadence" | "colour" | "truckId", string>;
type Trucks = Route.ComponentProps["loaderData"]["trucks"];
type Answer = NonNullable<Route.ComponentProps["actionData"]>["result"];

function AddCheck({
  id,
  trucks,
  result,
}: {
  id: string;
  trucks: Trucks;
  result: Answer | undefined;
}) {
  const words = office.checks;
  const [form, fields] = useForm<Shown>({
    id: "own-check",
    lastResult: result,
    defaultValue: { id, cadence: "daily", colour: "yellow" },
  });
  return (
    <OfficeForm form={form} submit={words.submit}>
      <HiddenField field={fields.id} />
      <TextField field={fields.label} label={words.label} hint={words.labelHint} />
      <TextField field={fields.good} label={words.good} hint={words.goodHint} />
      <SelectField
        field={fields.station}
        label={words.station}
        options={[
          { value: "", label: office.choose },
          // Nothing goes between the steps of the run-up.
          ...STATIONS.filter((key) => key !== "run-up").map((key) => ({
            value: key,
            label: stations[key],
          })),
        ]}
      />
      <SelectField
        field={fields.cadence}
        label={words.cadence}
        options={CADENCES.map((key) => ({ value: key, label: cadences[key] }))}
      />
      <SelectField
        field={fields.colour}
        label={words.colour}
        hint={words.colourHint}
        options={(["red", "yellow", "white"] as const).map((key) => ({
          value: key,
          label: colours[key],
        }))}
      />
      <SelectField
        field={fields.truckId}
        label={words.truck}
        options={[{ value: "", label: words.everyTruck }, ...trucks]}
      />
    </OfficeForm>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${office.checks.title} · ${office.product}` },
];
