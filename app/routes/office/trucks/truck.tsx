import { Fragment } from "react";
import { data, redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { type FieldFault, REFUSAL_STATUS } from "~/domain/refusals";
import { reasonText } from "~/text/en/gate";
import { fittingKinds, office, unitKinds, vinWarnings } from "~/text/en/office";
import { refusalText } from "~/text/en/refusals";
import { ButtonLink } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { Reasons } from "~/ui/reasons";
import { ActionButton, ConfirmedButton } from "../office-form";
import { notFound } from "../office-reply";
import { SavedNote } from "../page-parts";
import { StandingOf } from "../standing-of";
import type { Route } from "./+types/truck";
import { doneNote, runTruckCommand, truckCommandSchema } from "./truck-commands";
import { truckOr404 } from "./truck-or-404";
import { type TruckView, truckView } from "./truck-view";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  return truckView(await truckOr404(dbOf(context), actor, params.unit));
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const asked = truckCommandSchema.safeParse(Object.fromEntries(await request.formData()));
  if (!asked.success) {
    return data({ faults: [refusalText.title("invalid")] }, { status: 400 });
  }
  const done = await runTruckCommand(db, actor, truck.id, asked.data);
  if (done.ok) {
    throw redirect(`/office/trucks/${truck.unitNumber}?done=${doneNote(asked.data)}`);
  }
  const { code, fields } = done.refusal;
  if (code === "not-found") notFound("other");
  const words = ({ code: fault, values }: FieldFault) => refusalText.field(fault, values);
  const faults = fields ? fields.map(words) : [refusalText.title(code)];
  return data({ faults }, { status: REFUSAL_STATUS[code] });
}

export default function Truck({ loaderData, actionData }: Route.ComponentProps) {
  const { truck, yard } = loaderData;
  const words = office.truck;
  const base = `/office/trucks/${truck.unitNumber}`;
  return (
    <>
      <PageTitle
        title={<span className="font-stencil font-normal">{truck.unitNumber}</span>}
        lead={
          <span className="text-ink">
            <StandingOf standing={truck.standing} inService={truck.inService} />
          </span>
        }
      >
        <ButtonLink kind="main" to={`${base}/sheet`}>
          {words.sheet}
        </ButtonLink>
      </PageTitle>
      <SavedNote undo={(done) => done === "removed" && <PutBackLast view={loaderData} />} />
      {actionData?.faults.map((fault) => (
        <div key={fault} className="mb-6">
          <Notice tone="stop" announce="now">
            {fault}
          </Notice>
        </div>
      ))}
      {truck.gateFault && (
        <div className="mb-6">
          <Notice
            tone="stop"
            action={<ActionButton name="clear-fault">{words.workOut}</ActionButton>}
          >
            {words.gateFault}
          </Notice>
        </div>
      )}
      <div className="mb-8 max-w-prose">
        <Reasons told={(truck.detail?.reasons ?? []).map(reasonText)} />
      </div>
      <dl className="mb-4 grid grid-cols-[4rem_1fr] gap-y-2 sm:grid-cols-[8rem_1fr]">
        <dt className="text-mute">{office.trucks.kind}</dt>
        <dd>{unitKinds[truck.kind]}</dd>
        <dt className="text-mute">{office.trucks.yard}</dt>
        <dd>{yard.name}</dd>
        <dt className="text-mute">{office.trucks.vin}</dt>
        <dd className="break-words">
          {truck.vin ?? words.noVin}
          {truck.vinWarning && <p className="text-mute">{vinWarnings[truck.vinWarning]}</p>}
        </dd>
      </dl>
      <p className="mb-10 flex flex-wrap gap-3">
        <ButtonLink to={`${base}/details`}>{words.changeDetails}</ButtonLink>
        <ButtonLink to={`${base}/move`}>{words.move}</ButtonLink>
      </p>
      <Fittings base={base} view={loaderData} />
      <SetPoints base={base} view={loaderData} />
      <Tests base={base} view={loaderData} />
      <Section id="service" title={truck.inService ? words.inService : words.outOfService}>
        <p className="mb-3 max-w-prose text-mute">{words.serviceNote}</p>
        <ActionButton name={truck.inService ? "out-of-service" : "in-service"}>
          {truck.inService ? words.takeOut : words.putBack}
        </ActionButton>
      </Section>
    </>
  );
}

/** The way back from the last "take off", beside the words that say it happened. */
function PutBackLast({ view: { removed } }: { view: TruckView }) {
  const [last] = removed;
  if (!last) return null;
  const label = office.truck.putBackOf(fittingKinds[last.kind]);
  return (
    <ActionButton name="restore-fitting" fields={{ fittingId: last.id }}>
      {label}
    </ActionButton>
  );
}

function Section(props: {
  id: string;
  title: string;
  what?: string;
  action?: React.ReactNode;
  children: React.ReactNode;
}) {
  const { id, title, what, action, children } = props;
  return (
    <section aria-labelledby={id} className="mb-12">
      <div className="mb-3 flex flex-wrap items-end justify-between gap-3">
        <div>
          <h2 id={id} className="text-2xl font-bold">
            {title}
          </h2>
          {what && <p className="max-w-prose text-mute">{what}</p>}
        </div>
        {action}
      </div>
      {children}
    </section>
  );
}

const ROWS = "divide-y divide-line border-y border-line";
const FITTED =
  "grid grid-cols-[1fr_auto] items-center gap-x-6 py-2 sm:grid-cols-[14rem_1fr_auto] sm:py-3";
const ROW = "grid gap-x-6 gap-y-1 py-3 sm:grid-cols-[14rem_1fr_auto] sm:items-center";

function Fittings({ base, view: { fittings, removed } }: { base: string; view: TruckView }) {
  const words = office.truck;
  return (
    <Section
      id="fittings"
      title={words.fittings}
      what={`${words.fittingsWhat} ${words.endsWalks}`}
      action={<ButtonLink to={`${base}/fittings/new`}>{words.addFitting}</ButtonLink>}
    >
      {fittings.length === 0 && <EmptyState title={words.noFittings} />}
      {fittings.map(({ label, fitted }) => (
        <Fragment key={label}>
          <h3 className="mt-6 mb-2 text-xl font-bold">{label}</h3>
          <ul className={ROWS}>
            {fitted.map(({ id, kind, line, hasPlate }) => (
              <li key={id} className={FITTED}>
                <span className="font-bold">{fittingKinds[kind]}</span>
                <span className="col-start-1 sm:col-start-2">{line}</span>
                <span className="col-start-2 row-span-2 row-start-1 flex flex-col sm:row-span-1 gap-2 sm:col-start-3 sm:flex-row sm:gap-3">
                  {hasPlate && (
                    <ButtonLink
                      to={`${base}/fittings/${id}`}
                      aria-label={words.changeOf(fittingKinds[kind])}
                    >
                      {words.change}
                    </ButtonLink>
                  )}
                  <ActionButton
                    name="remove-fitting"
                    fields={{ fittingId: id }}
                    label={words.takeOffOf(fittingKinds[kind])}
                  >
                    {words.takeOff}
                  </ActionButton>
                </span>
              </li>
            ))}
          </ul>
        </Fragment>
      ))}
      {removed.length > 0 && (
        <>
          <h3 className="mt-6 mb-2 text-xl font-bold">{words.takenOff}</h3>
          <ul className={ROWS}>
            {removed.map(({ id, kind, line, on }) => (
              <li key={id} className={ROW}>
                <span>{fittingKinds[kind]}</span>
                <span className="text-mute">
                  {[line, words.takenOffOn(on)].filter(Boolean).join(", ")}
                </span>
                <ActionButton
                  name="restore-fitting"
                  fields={{ fittingId: id }}
                  label={words.putBackOf(fittingKinds[kind])}
                >
                  {words.putBackFitting}
                </ActionButton>
              </li>
            ))}
          </ul>
        </>
      )}
    </Section>
  );
}

function SetPoints({ base, view: { setPoints } }: { base: string; view: TruckView }) {
  const words = office.truck;
  return (
    <Section id="set-points" title={words.setPoints} what={words.setPointsWhat}>
      <ul className={ROWS}>
        {setPoints.map((line) => (
          <li key={line.reading} className={ROW}>
            <span className="font-bold">{line.label}</span>
            <span>
              {line.value ?? words.notSet}
              {line.rest && <span className="text-mute"> {line.rest}</span>}
              {line.owed && <p className="font-bold text-blue">{words.owed}</p>}
              {line.unreachable && <p className="font-bold">{line.unreachable}</p>}
            </span>
            <span className="flex gap-3">
              <ButtonLink
                to={`${base}/set-points/${line.reading}`}
                aria-label={line.set ? words.changeOf(line.label) : words.setOf(line.label)}
              >
                {line.set ? words.change : words.setIt}
              </ButtonLink>
              {line.set && (
                <ConfirmedButton
                  name="remove-set-point"
                  fields={{ reading: line.reading }}
                  label={words.clearOf(line.label)}
                  question={words.clearQuestion}
                >
                  {words.clear}
                </ConfirmedButton>
              )}
            </span>
          </li>
        ))}
      </ul>
    </Section>
  );
}

function Tests({ base, view: { tests, testsLeftOver } }: { base: string; view: TruckView }) {
  const words = office.truck;
  return (
    <Section id="tests" title={words.tests} what={words.testsWhat}>
      <ul className={ROWS}>
        {tests.map((line) => (
          <li key={line.test} className={ROW}>
            <span>
              <span className="font-bold">{line.label}</span>
              <span className="block text-mute">{line.rule}</span>
            </span>
            <span>
              <span className={line.state === "past" ? "font-bold text-red" : "font-bold"}>
                {words.testStates[line.state]}
              </span>{" "}
              {line.dates}
              {line.note && <span className="block text-mute">{line.note}</span>}
            </span>
            <span className="flex gap-3">
              <ButtonLink to={`${base}/tests/${line.test}`} aria-label={words.recordOf(line.label)}>
                {words.record}
              </ButtonLink>
              {line.mayEnd && (
                <ConfirmedButton
                  name="end-test"
                  fields={{ kind: line.test }}
                  label={words.endOf(line.label)}
                  question={words.endQuestion}
                >
                  {words.end}
                </ConfirmedButton>
              )}
            </span>
          </li>
        ))}
        {testsLeftOver.map((line) => (
          <li key={line.kind} className={ROW}>
            <span className="font-bold">{line.label}</span>
            <span>
              {line.dates}
              <span className="block text-mute">{words.leftOver}</span>
            </span>
            <ConfirmedButton
              name="end-test"
              fields={{ kind: line.kind }}
              label={words.endOf(line.label)}
              question={words.endQuestion}
            >
              {words.end}
            </ConfirmedButton>
          </li>
        ))}
      </ul>
    </Section>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.unit} · ${office.product}` },
];
