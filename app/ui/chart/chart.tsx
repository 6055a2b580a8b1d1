import { uiText } from "~/text/en/ui";
import { Table } from "../table";
import { BOX, linear, rangeOf } from "./chart-scale";

export interface ChartPoint {
  /** Milliseconds. */
  at: number;
  value: number;
  /** Day and value as the table writes them. */
  day: string;
  shown: string;
}

export interface ChartProps {
  title: string;
  unit: string;
  /** What the picture shows, in a sentence: "Sliding 0.2 a walk, below 19 since Nov 28." */
  summary: string;
  points: readonly ChartPoint[];
  band?: { from: number; to: number };
  /** The fitted line: solid from `from` to `today`, dotted to `beyond`. */
  fit?: Record<"from" | "today" | "beyond", { at: number; value: number }>;
  /** When the line is likely to leave the band, as a bar on the axis. */
  crossing?: { from: number; to: number };
  /** Days written under the axis. */
  days: readonly { at: number; label: string }[];
  /** Heads of the table: day, value. */
  heads: { day: string; value: string };
}

/** Readings over time, drawn on the server; the same numbers as a table one tap away. */
export function Chart(props: ChartProps) {
  const { title, unit, summary, points, band } = props;
  const words = uiText.chart;
  return (
    <figure className="max-w-2xl break-inside-avoid">
      <figcaption className="mb-2 text-lg font-bold">
        {title} <span className="font-normal text-mute">({unit})</span>
      </figcaption>
      <ChartDrawing {...props} />
      <p className="mt-1 text-sm text-mute">
        {[
          band && words.band(String(band.from), String(band.to), unit),
          props.fit && words.fit,
          props.crossing && words.crossing,
        ]
          .filter(Boolean)
          .join(" · ")}
      </p>
      <p className="mt-2">{summary}</p>
      <details className="mt-1">
        <summary className="inline-flex min-h-11 items-center underline">{words.table}</summary>
        <Table
          caption={title}
          captionHidden
          narrow="scroll"
          rows={points}
          rowKey={({ at }) => String(at)}
          columns={[
            { key: "day", head: props.heads.day, cell: ({ day }) => day, rowHead: true },
            { key: "value", head: props.heads.value, cell: ({ shown }) => shown, number: true },
          ]}
        />
      </details>
    </figure>
  );
}

function ChartDrawing({ points, band, fit, crossing, days, summary }: ChartProps) {
  const times = [...points, ...(fit ? Object.values(fit) : [])].map(({ at }) => at);
  const values = [...points, ...(fit ? Object.values(fit) : [])].map(({ value }) => value);
  const x = linear(rangeOf([...times, ...(crossing ? [crossing.to] : [])], 0.02), [
    BOX.left,
    BOX.width - BOX.right,
  ]);
  const y = linear(rangeOf([...values, ...(band ? [band.from, band.to] : [])], 0.12), [
    BOX.height - BOX.bottom,
    BOX.top,
  ]);
  const line = (...ends: { at: number; value: number }[]) =>
    `M${ends.map(({ at, value }) => `${x(at)} ${y(value)}`).join("L")}`;
  const axis = BOX.height - BOX.bottom;
  const right = BOX.width - BOX.right;
  const levels = band ? [band.from, (band.from + band.to) / 2, band.to] : [];
  return (
    <svg
      viewBox={`0 0 ${BOX.width} ${BOX.height}`}
      role="img"
      aria-label={summary}
      className="w-full"
    >
      {band && (
        <path
          d={`M${BOX.left} ${y(band.to)}H${right}V${y(band.from)}H${BOX.left}Z`}
          className="fill-band"
        />
      )}
      {levels.map((level) => (
        <g key={level}>
          <path d={`M${BOX.left} ${y(level)}H${right}`} className="stroke-edge" strokeWidth="1" />
          <text
            x={BOX.left - 8}
            y={y(level)}
            textAnchor="end"
            dominantBaseline="central"
            className={TEXT}
          >
            {level}
          </text>
        </g>
      ))}
      <path d={`M${BOX.left} ${axis}H${right}`} className="stroke-ink" strokeWidth="2" />
      {crossing && (
        <path
          d={`M${x(crossing.from)} ${axis}H${x(crossing.to)}`}
          className="stroke-ink"
          strokeWidth="9"
        />
      )}
      {days.map(({ at, label }) => (
        <text key={at} x={x(at)} y={axis + 24} textAnchor="middle" className={TEXT}>
          {label}
        </text>
      ))}
      {fit && (
        <g className="fill-none stroke-enamel" strokeWidth="3" strokeLinecap="round">
          <path d={line(fit.from, fit.today)} />
          <path d={line(fit.today, fit.beyond)} strokeDasharray="0.5 7" />
        </g>
      )}
      {points.map(({ at, value }) => (
        <circle
          key={at}
          cx={x(at)}
          cy={y(value)}
          r="5.5"
          className="fill-card stroke-ink"
          strokeWidth="2.5"
        />
      ))}
    </svg>
  );
}

const TEXT = "fill-ink text-[17px] sm:text-[14px] tabular-nums";
