import { data, Form, Link, redirect } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { truckByUnit } from "~/domain/brief/read-brief";
import { REFUSAL_STATUS } from "~/domain/refusals";
import { recordRound, recordRoundSchema } from "~/domain/rounds/record-round";
import { sheetForTruck } from "~/domain/sheets/sheet-for-truck";
import { yardOfTruck } from "~/domain/tags/yard-of-truck";
import { yardDay } from "~/domain/yard-day";
import { type FormFaults, faultsOfFields, faultsOfIssues } from "~/http/field-faults";
import { systemClock } from "~/services/clock";
import { benchText } from "~/text/en/bench";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import { ROUND_KINDS } from "~/trade/rounds";
import { cautionBefore } from "~/trade/sheet/caution-before";
import type { CautionKey } from "~/trade/sheet/cautions";
import type { Check } from "~/trade/sheet/check";
import { roundChecks } from "~/trade/sheet/due-checks";
import { Button } from "~/ui/button";
import { CautionOf } from "~/ui/caution-of";
import { EmptyState } from "~/ui/empty-state";
import { plainField } from "~/ui/fields/field-shape";
import { TextField } from "~/ui/fields/text-field";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/round";

async function roundOf({ context, params }: Route.LoaderArgs | Route.ActionArgs) {
  const actor = requirePermission(context, "round.record");
  const truck = await truckByUnit(dbOf(context), actor.carrierId, params.unit);
  const kind = ROUND_KINDS.find((one) => one === params.round);
  if (!truck || !kind) throw data({ code: "not-found" }, { status: 404 });
  return { actor, truck, kind };
}

export async function loader(args: Route.LoaderArgs) {
  const { actor, truck, kind } = await roundOf(args);
  const db = dbOf(args.context);
  const made = await sheetForTruck(db, actor, truck.id);
  if (!made.ok) throw data({ code: "not-found" }, { status: 404 });
  const { zone } = await yardOfTruck(db, actor.carrierId, truck.id);
  const { sheet } = made.value;
  const asked = new Set(roundChecks(sheet, kind).map((check) => check.key));
  return {
    frame: frameOf(args.context),
    truck,
    kind,
    today: yardDay(systemClock.now(), zone).day,
    formId: uuidv7(),
    stations: sheet.stations
      .map((one) => ({ ...one, checks: one.checks.filter(({ key }) => asked.has(key)) }))
      .filter((one) => one.checks.length > 0),
  };
}

export async function action(args: Route.ActionArgs) {
  const { actor, truck, kind } = await roundOf(args);
  const form = await args.request.formData();
  const text = (name: string) => String(form.get(name) ?? "").trim();
  const typed = { doneOn: text("doneOn"), pumpHours: text("pumpHours") };
  const hours = typed.pumpHours.replace(",", ".");
  const wrong = (faults: FormFaults, fault: string | null, status: number) =>
    data({ typed, faults, fault }, { status });
  const parsed = recordRoundSchema.safeParse({
    id: form.get("id"),
    truckId: truck.id,
    kind,
    doneOn: typed.doneOn,
    pumpHours: hours === "" ? null : Number(hours),
  });
  if (!parsed.success) return wrong(faultsOfIssues(parsed.error.issues), null, 400);
  const done = await recordRound(dbOf(args.context), actor, parsed.data);
  if (done.ok) throw redirect(`/bench/rounds?done=${kind}`);
  const { code, fields } = done.refusal;
  const over = fields ? null : refusalText.title(code);
  return wrong(fields ? faultsOfFields(fields) : {}, over, REFUSAL_STATUS[code]);
}

const words = benchText.rounds;

export default function Round({ loaderData, actionData }: Route.ComponentProps) {
  const { frame, truck, kind, stations, today, formId } = loaderData;
  const count = stations.reduce((sum, station) => sum + station.checks.length, 0);
  const field = (name: "doneOn" | "pumpHours", value: string) =>
    plainField(name, {
      value: actionData?.typed[name] ?? value,
      errors: actionData?.faults[name],
    });
  return (
    <PlaceFrame frame={frame}>
      <p className="mb-4">
        <Link to="/bench/rounds" className="inline-flex min-h-11 items-center underline">
          {words.title}
        </Link>
      </p>
      <PageTitle
        title={
          <>
            <span className="font-stencil font-normal">{truck.unitNumber}</span> {words.kinds[kind]}
          </>
        }
        lead={words.checks(count)}
      />
      {count === 0 && <EmptyState title={words.nothing} />}
      {stations.map((station) => (
        <section key={station.key} aria-labelledby={station.key} className="mb-8 max-w-3xl">
          <h2 id={station.key} className="mb-2 text-xl font-bold">
            {station.label}
          </h2>
          {station.caution && <CautionOf name={station.caution} />}
          <ul className="mt-3 divide-y divide-line border-y border-line">
            {station.checks.map((check, index) => (
              <li key={check.key} className="space-y-2 py-4">
                <RoundCheck check={check} caution={cautionBefore(station, index)} />
              </li>
            ))}
          </ul>
        </section>
      ))}
      <p className="mb-6 max-w-prose">{words.finding}</p>
      <Form method="post" className="max-w-md space-y-5">
        <input type="hidden" name="id" value={formId} />
        {actionData?.fault && (
          <Notice tone="stop" announce="now">
            {actionData.fault}
          </Notice>
        )}
        <TextField field={field("doneOn", today)} label={words.doneOn} type="date" max={today} />
        <TextField
          field={field("pumpHours", "")}
          label={words.pumpHours}
          inputMode="decimal"
          optional
        />
        <p className="border-l-4 border-brass pl-3">{words.certify}</p>
        <Button type="submit" kind="main">
          {words.save}
        </Button>
      </Form>
    </PlaceFrame>
  );
}

function RoundCheck({ check, caution }: { check: Check; caution: CautionKey | null }) {
  return (
    <>
      {caution && <CautionOf name={caution} />}
      <p className="font-bold">{check.label}</p>
      <p>{check.good}</p>
      {check.steps.length > 0 && (
        <ol className="list-decimal space-y-1 pl-6 text-mute">
          {check.steps.map((step) => (
            <li key={step}>{step}</li>
          ))}
        </ol>
      )}
    </>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.unit} · ${words.title} · ${loop.product}` },
];
