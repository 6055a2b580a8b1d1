import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { addFitting, addFittingSchema } from "~/domain/trucks/add-fitting";
import { mayCarrySeveral } from "~/domain/trucks/fitting-fields";
import { unparsedForm } from "~/http/form-reply";
import { fittingGroups, fittingKinds, office } from "~/text/en/office";
import { FITTING_KINDS, type FittingKind } from "~/trade/fittings";
import { Button } from "~/ui/button";
import { PageTitle } from "~/ui/page-frame";
import { refusedForm } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/add-fitting";
import { FittingForm } from "./fitting-form";
import { truckOr404 } from "./truck-or-404";

function kindIn(url: string): FittingKind | null {
  const asked = new URL(url).searchParams.get("kind");
  return FITTING_KINDS.find((kind) => kind === asked) ?? null;
}

export async function loader({ context, params, request }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const { truck, fittings } = await truckOr404(dbOf(context), actor, params.unit);
  const carried = new Set(fittings.map((fitting) => fitting.kind));
  return {
    id: uuidv7(),
    unitNumber: truck.unitNumber,
    kind: kindIn(request.url),
    free: FITTING_KINDS.filter((kind) => mayCarrySeveral(kind) || !carried.has(kind)),
  };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const submission = parseWithZod(await request.formData(), { schema: addFittingSchema });
  if (submission.status !== "success") return unparsedForm(submission);
  const added = await addFitting(db, actor, { ...submission.value, truckId: truck.id });
  if (!added.ok) return refusedForm(submission, added.refusal);
  throw redirect(`/office/trucks/${truck.unitNumber}?done=fitting`);
}

export default function AddFitting({ loaderData, actionData }: Route.ComponentProps) {
  const { id, unitNumber, kind, free } = loaderData;
  const back = `/office/trucks/${unitNumber}`;
  if (kind === null) {
    return (
      <>
        <PageTitle title={office.truck.addFittingTo(unitNumber)} />
        <ChooseKind free={free} back={back} />
      </>
    );
  }
  return (
    <>
      <PageTitle
        title={office.truck.fittingTitle(unitNumber, fittingKinds[kind])}
        lead={office.truck.endsWalks}
      />
      <FittingForm
        key={kind}
        id={id}
        kind={kind}
        plate={{}}
        submit={office.truck.addIt}
        cancelTo={<TextLink to={back}>{office.cancel}</TextLink>}
        result={actionData?.result}
      />
    </>
  );
}

function ChooseKind({ free, back }: { free: readonly FittingKind[]; back: string }) {
  return (
    <Form method="get" className="max-w-xl space-y-5">
      <div>
        <label htmlFor="kind" className="font-bold">
          {office.truck.whichFitting}
        </label>
        <select
          id="kind"
          name="kind"
          className="min-h-11 w-full rounded-sm border border-mute bg-card px-3 py-2"
        >
          {fittingGroups.map(({ label, kinds }) => {
            const offered = kinds.filter((kind) => free.includes(kind));
            return offered.length === 0 ? null : (
              <optgroup key={label} label={label}>
                {offered.map((kind) => (
                  <option key={kind} value={kind}>
                    {fittingKinds[kind]}
                  </option>
                ))}
              </optgroup>
            );
          })}
        </select>
      </div>
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" kind="main">
          {office.truck.next}
        </Button>
        <TextLink to={back}>{office.cancel}</TextLink>
      </div>
    </Form>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${office.truck.addFittingTo(params.unit)} · ${office.product}` },
];
