import { Chart, type ChartPoint } from "~/ui/chart/chart";
import { Measure } from "~/ui/measure";
import { ShowMore } from "~/ui/show-more";
import { Table } from "~/ui/table";
import { Time } from "~/ui/time";
import { Shown } from "./piece-section";

const DAY = 86_400_000;
const start = Date.UTC(2026, 10, 14, 12);
const VALUES = [21.5, 22, 21.3, 21.5, 21, 20.8, 20.8, 20.4, 20.6, 19.9, 20, 19.4, 19.3, 18.8];
const points: readonly ChartPoint[] = VALUES.map((value, index) => ({
  at: start + index * DAY,
  value,
  day: `Nov ${14 + index}`,
  shown: `${value.toFixed(1)} inHg`,
}));

const ROWS = [
  { part: "Primary shutoff, float ball", truck: "T-109", last: "Nov 30", mornings: 3 },
  { part: "Vacuum relief", truck: "T-131", last: "Nov 27", mornings: 2 },
  { part: "Camlock gasket, rear 3 in", truck: "T-118", last: "Nov 24", mornings: 1 },
];

export function ShowNumbers() {
  return (
    <div className="grid grid-cols-1 items-start gap-10 lg:grid-cols-2">
      <Chart
        title="Vacuum relief, last 14 walks"
        unit="inHg"
        summary="Sliding 0.2 a walk. Crossed 19 on Nov 27; forecast was Nov 24 to Dec 1."
        points={points}
        band={{ from: 19, to: 23 }}
        fit={{
          from: { at: start, value: 21.9 },
          today: { at: start + 13 * DAY, value: 19 },
          beyond: { at: start + 18 * DAY, value: 17.9 },
        }}
        crossing={{ from: start + 10 * DAY, to: start + 16 * DAY }}
        days={[
          { at: start + DAY / 2, label: "Nov 14" },
          { at: start + 13 * DAY, label: "today" },
        ]}
        heads={{ day: "Day", value: "Opened at" }}
      />
      <div className="space-y-6">
        <Shown name="Table: stacks when narrow">
          <Table
            caption="Parts that cost mornings"
            rows={ROWS}
            rowKey={({ part }) => part}
            columns={[
              { key: "part", head: "Part", cell: ({ part }) => part, rowHead: true },
              { key: "truck", head: "Truck", cell: ({ truck }) => truck },
              { key: "last", head: "Last", cell: ({ last }) => last },
              { key: "mornings", head: "Mornings", cell: ({ mornings }) => mornings, number: true },
            ]}
          />
          <ShowMore shown={3} total={17} to="/pieces?more=1" />
        </Shown>
        <Shown name="Table: scrolls by itself when narrow">
          <Table
            caption="Readings of T-118"
            narrow="scroll"
            rows={points.slice(0, 3)}
            rowKey={({ day }) => day}
            columns={[
              {
                key: "day",
                head: "Day",
                cell: ({ day }) => <span className="whitespace-nowrap">{day}</span>,
                rowHead: true,
              },
              ...["Vacuum relief", "Pressure relief", "Oil level", "Pump hours"].map((head) => ({
                key: head,
                head,
                cell: ({ shown }: ChartPoint) => <span className="whitespace-nowrap">{shown}</span>,
                number: true,
              })),
            ]}
          />
        </Shown>
        <Shown name="Measures and times">
          <p>
            <Measure value="21.0" unit="inHg" size="reading" />
          </p>
          <p>
            <Measure value="3,000" unit="gal" />, walked{" "}
            <Time at={new Date("2026-12-01T12:20:00Z")} zone="America/Denver" show="clock" />, since{" "}
            <Time at={new Date("2026-11-30T23:20:00Z")} zone="America/Denver" />, until{" "}
            <Time at={new Date("2026-12-04T23:20:00Z")} zone="America/Denver" show="day" />
          </p>
        </Shown>
      </div>
    </div>
  );
}
