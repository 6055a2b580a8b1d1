import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { readPolicy } from "~/domain/policy/read-policy";
import { sheetForTruck } from "~/domain/sheets/sheet-for-truck";
import { cautions } from "~/text/en/cautions";
import { office, readings } from "~/text/en/office";
import { isSetPointReading } from "~/trade/set-points";
import type { CautionKey } from "~/trade/sheet/cautions";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { TagDrawing } from "~/ui/tag-glyph";
import { notFound } from "../office-reply";
import { TextLink } from "../page-parts";
import type { Route } from "./+types/sheet";
import { type ProblemLine, type SheetView, sheetView } from "./sheet-view";
import { truckOr404 } from "./truck-or-404";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  const { truck } = await truckOr404(db, actor, params.unit);
  const made = await sheetForTruck(db, actor, truck.id);
  if (!made.ok) notFound("truck");
  const { settings } = await readPolicy(db, actor.carrierId);
  return { unitNumber: truck.unitNumber, view: sheetView(made.value.sheet, settings) };
}

export default function TruckSheet({ loaderData: { unitNumber, view } }: Route.ComponentProps) {
  const words = office.sheet;
  const back = `/office/trucks/${unitNumber}`;
  return (
    <>
      <PageTitle title={words.title(unitNumber)} lead={words.what}>
        <TextLink to={back}>{words.back(unitNumber)}</TextLink>
      </PageTitle>
      <Counts view={view} back={back} />
      {view.stations.map((station, index) => (
        <section
          key={station.key}
          aria-labelledby={station.key}
          className="mb-10 print:mb-4 print:text-[10px] print:leading-snug"
        >
          <h2
            id={station.key}
            className="mb-2 border-b-2 border-ink pb-1 text-2xl font-bold break-after-avoid print:mb-0 print:text-base"
          >
            {words.station(station.label, index + 1)}
            <span className="ml-3 text-base font-normal text-mute print:text-[10px]">
              {station.engine}
            </span>
          </h2>
          {station.caution && <Caution caution={station.caution} />}
          <ul className="divide-y divide-line">
            {station.checks.map((check) => (
              <CheckOnSheet key={check.key} check={check} />
            ))}
          </ul>
        </section>
      ))}
    </>
  );
}

function Counts({ view, back }: { view: SheetView; back: string }) {
  const words = office.sheet;
  const more = [
    view.pressure > 0 && words.pressure(view.pressure),
    view.weekly > 0 && words.weekly(view.weekly),
    view.monthly > 0 && words.monthly(view.monthly),
    view.after > 0 && words.after(view.after),
  ].filter((line) => line !== false);
  return (
    <div className="mb-10 space-y-4">
      <div>
        <p className="text-xl font-bold">{words.daily(view.daily)}</p>
        <ul className="text-mute">
          {more.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      </div>
      {view.missingSetPoints.length > 0 && (
        <Notice tone="must" title={words.missing}>
          <ul className="list-disc pl-6">
            {view.missingSetPoints.map((reading) => (
              <li key={reading}>
                {isSetPointReading(reading) ? (
                  <TextLink to={`${back}/set-points/${reading}`}>
                    {readings[reading].label}
                  </TextLink>
                ) : (
                  reading
                )}
              </li>
            ))}
          </ul>
        </Notice>
      )}
      {view.cannot.length > 0 && (
        <p>
          {words.cannot} {view.cannot.join(", ")}.
        </p>
      )}
    </div>
  );
}

function CheckOnSheet({ check }: { check: SheetView["stations"][number]["checks"][number] }) {
  const words = office.sheet;
  return (
    <li className="grid gap-x-6 gap-y-2 py-4 break-inside-avoid md:grid-cols-2 print:grid-cols-2 print:py-1">
      <div>
        <h3 className="font-bold">{check.label}</h3>
        <p>{check.good}</p>
        {check.numbers.length > 0 && <p className="tabular-nums">{check.numbers.join(", ")}</p>}
        {check.caution && <Caution caution={check.caution} />}
        {check.steps.length > 0 && (
          <ol className="mt-2 list-decimal pl-6" aria-label={words.steps}>
            {check.steps.map((step) => (
              <li key={step}>{step}</li>
            ))}
          </ol>
        )}
        {check.marks.length > 0 && (
          <p className="mt-1 text-base text-mute print:mt-0 print:text-[10px]">
            {check.marks.join(" · ")}
          </p>
        )}
      </div>
      <ul aria-label={words.ifNot} className="space-y-1 print:space-y-0">
        {check.problems.map((line) => (
          <Problems key={`${line.colour} ${line.limit}`} line={line} />
        ))}
      </ul>
    </li>
  );
}

function Problems({ line }: { line: ProblemLine }) {
  return (
    <li className="flex items-baseline gap-3">
      <span className="inline-flex w-28 shrink-0 items-center gap-2 font-bold print:w-20">
        <TagDrawing colour={line.colour} />
        {line.word}
      </span>
      <span>
        {line.labels.join(", ")}
        {line.limit && <span className="block text-mute">{line.limit}</span>}
      </span>
    </li>
  );
}

function Caution({ caution }: { caution: CautionKey }) {
  const { title, text } = cautions[caution];
  return (
    <p className="my-2 border border-mute p-2 print:my-1 print:p-1">
      <span className="font-bold">{title}.</span> {text}
    </p>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${office.sheet.title(params.unit)} · ${office.product}` },
];
