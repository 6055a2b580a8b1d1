import { Link } from "react-router";
import { frameOf } from "~/auth/frame-of";
import { may } from "~/auth/permissions";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { type RoundLine, readRounds } from "~/domain/rounds/read-rounds";
import { benchText } from "~/text/en/bench";
import { loop } from "~/text/en/loop";
import { ROUND_KINDS } from "~/trade/rounds";
import { EmptyState } from "~/ui/empty-state";
import { Notice } from "~/ui/notice";
import { PageTitle } from "~/ui/page-frame";
import { PlaceFrame } from "~/ui/place-frame";
import { type Column, Table } from "~/ui/table";
import type { Route } from "./+types/rounds";

export async function loader({ context, request }: Route.LoaderArgs) {
  const actor = requirePermission(context, "bench.read");
  const said = new URL(request.url).searchParams.get("done");
  return {
    frame: frameOf(context),
    lines: await readRounds(dbOf(context), actor),
    mayRecord: may(actor, "round.record"),
    done: ROUND_KINDS.find((kind) => kind === said) ?? null,
  };
}

const words = benchText.rounds;

function columns(mayRecord: boolean): Column<RoundLine>[] {
  const every: Column<RoundLine>[] = [
    { key: "unit", head: words.unit, cell: (line) => line.unitNumber, rowHead: true },
    { key: "round", head: words.round, cell: (line) => words.kinds[line.kind] },
    { key: "due", head: words.due, cell: (line) => line.dueOn },
    { key: "last", head: words.last, cell: (line) => line.lastOn ?? words.never },
    {
      key: "state",
      head: words.stateHead,
      cell: (line) => (
        <span className={line.state === "ahead" ? "text-mute" : "font-bold"}>
          {words.state[line.state]}
        </span>
      ),
    },
  ];
  if (!mayRecord) return every;
  const record: Column<RoundLine> = {
    key: "record",
    head: words.record,
    cell: (line) => (
      <Link
        to={`/bench/rounds/${line.unitNumber}/${line.kind}`}
        aria-label={words.recordOf(words.kinds[line.kind], line.unitNumber)}
        className="inline-flex min-h-11 items-center underline"
      >
        {words.record}
      </Link>
    ),
  };
  return [...every, record];
}

function Lines(props: { caption: string; lines: RoundLine[]; mayRecord: boolean }) {
  return (
    <Table
      caption={props.caption}
      columns={columns(props.mayRecord)}
      rows={props.lines}
      rowKey={(line) => `${line.truckId} ${line.kind}`}
    />
  );
}

export default function Rounds({ loaderData }: Route.ComponentProps) {
  const { frame, lines, mayRecord, done } = loaderData;
  const now = lines.filter((line) => line.state !== "ahead");
  return (
    <PlaceFrame frame={frame}>
      <p className="mb-4">
        <Link to="/bench" className="inline-flex min-h-11 items-center underline">
          {benchText.title}
        </Link>
      </p>
      <PageTitle title={words.title} lead={words.lead} />
      {done && (
        <div className="mb-6">
          <Notice tone="good" announce>
            {words.saved(words.kinds[done])}
          </Notice>
        </div>
      )}
      {lines.length === 0 ? (
        <EmptyState title={words.none} />
      ) : (
        <>
          {now.length === 0 ? (
            <EmptyState title={words.nothingDue} />
          ) : (
            <Lines caption={words.dueNow(now.length)} lines={now} mayRecord={mayRecord} />
          )}
          <details className="mt-8">
            <summary className="min-h-11 cursor-pointer content-center text-lg font-bold underline">
              {words.ahead(lines.length - now.length)}
            </summary>
            <Lines
              caption={words.ahead(lines.length - now.length)}
              lines={lines.filter((line) => line.state === "ahead")}
              mayRecord={mayRecord}
            />
          </details>
        </>
      )}
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${words.title} · ${benchText.title} · ${loop.product}` },
];
