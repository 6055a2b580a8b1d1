import { wordmark } from "~/text/en/ui";
import {
  angleOf,
  arcPath,
  CENTER,
  type DialScale,
  type DialSide,
  pointAt,
  spokePath,
  ticks,
} from "./dial-geometry";

/** What is marked on the side being read, in that side's unit. */
export interface DialMarks {
  band?: { from: number; to: number };
  /** Where the operator stops. */
  stop?: number;
  /** The deepest vacuum this yard's air allows. */
  greatest?: number;
  /** How far the gauge itself may be off, either way. */
  uncertainty?: number;
}

export interface DialFaceProps {
  vacuum: DialScale;
  pressure: DialScale;
  side: DialSide;
  marks: DialMarks;
  value: number | null;
  showUncertainty: boolean;
}

/** The enamel face, drawn whole; the slider round it carries what a screen reader says. */
export function DialFace({ vacuum, pressure, side, marks, value, showUncertainty }: DialFaceProps) {
  const scale = side === "vacuum" ? vacuum : pressure;
  return (
    <svg viewBox="0 0 320 320" aria-hidden="true" className="block w-full select-none">
      <circle cx={CENTER} cy={CENTER} r="156" className="fill-brass stroke-ink" strokeWidth="2.5" />
      <circle cx={CENTER} cy={CENTER} r="149" className="fill-card stroke-ink" strokeWidth="2" />
      <Marks marks={marks} scale={scale} side={side} />
      <Scale scale={vacuum} side="vacuum" muted={side !== "vacuum"} />
      <Scale scale={pressure} side="pressure" muted={side !== "pressure"} />
      {showUncertainty && value !== null && marks.uncertainty !== undefined && (
        <Uncertainty
          from={angleOf(value - marks.uncertainty, scale, side)}
          to={angleOf(value + marks.uncertainty, scale, side)}
        />
      )}
      <text
        x={CENTER}
        y="290"
        textAnchor="middle"
        className="fill-ink font-stencil text-[14px] tracking-wide"
      >
        {wordmark}
      </text>
      <Needle angle={angleOf(value ?? 0, scale, side)} set={value !== null} />
    </svg>
  );
}

function Scale({ scale, side, muted }: { scale: DialScale; side: DialSide; muted: boolean }) {
  const [unitX, unitY] = pointAt(side === "vacuum" ? -152 : 152, 108);
  const path = (every: number, inner: number) =>
    ticks(scale, every)
      .map((value) => spokePath(angleOf(value, scale, side), inner, 140))
      .join("");
  return (
    <g className={muted ? "fill-mute stroke-mute" : "fill-ink stroke-ink"}>
      <path d={path(scale.numbered / 10, 134)} className="fill-none" strokeWidth="1.2" />
      <path d={path(scale.numbered / 2, 130)} className="fill-none" strokeWidth="2" />
      <path d={path(scale.numbered, 123)} className="fill-none" strokeWidth="4" />
      {ticks(scale, scale.numbered).map((value) => {
        const [x, y] = pointAt(angleOf(value, scale, side), 104);
        return (
          <text
            key={value}
            x={x}
            y={y}
            textAnchor="middle"
            dominantBaseline="central"
            className="stroke-none text-[21px] font-bold"
          >
            {value}
          </text>
        );
      })}
      <text
        x={unitX}
        y={unitY}
        textAnchor="middle"
        dominantBaseline="central"
        className={`stroke-none text-[17px] ${muted ? "" : "font-bold"}`}
      >
        {scale.unit}
      </text>
    </g>
  );
}

function Marks({ marks, scale, side }: { marks: DialMarks; scale: DialScale; side: DialSide }) {
  const at = (value: number) => angleOf(value, scale, side);
  const { band, stop, greatest } = marks;
  return (
    <g className="fill-none">
      {greatest !== undefined && (
        <path
          d={arcPath(at(greatest), at(scale.max), 131.5)}
          className="stroke-edge"
          strokeWidth="17"
          strokeDasharray="2 4"
        />
      )}
      {band && (
        <>
          <path
            d={arcPath(at(band.from), at(band.to), 131.5)}
            className="stroke-green"
            strokeWidth="17"
          />
          <path
            d={spokePath(at(band.from), 119, 140) + spokePath(at(band.to), 119, 140)}
            className="stroke-green"
            strokeWidth="3"
          />
        </>
      )}
      {greatest !== undefined && (
        <path d={spokePath(at(greatest), 117, 140)} className="stroke-ink" strokeWidth="2.5" />
      )}
      {stop !== undefined && <StopMark angle={at(stop)} />}
    </g>
  );
}

/** A red wedge that points at the stop value from outside the scale. */
function StopMark({ angle }: { angle: number }) {
  const tip = pointAt(angle, 118);
  const left = pointAt(angle - 5, 142);
  const right = pointAt(angle + 5, 142);
  return (
    <path
      d={`M${tip.join(" ")}L${left.join(" ")}L${right.join(" ")}Z`}
      className="fill-red stroke-card"
      strokeWidth="1.5"
    />
  );
}

/** Where the true value may be: a pale field behind the needle, with a bar along the rim. */
function Uncertainty({ from, to }: { from: number; to: number }) {
  return (
    <g className="fill-none stroke-enamel">
      <path d={arcPath(from, to, 70)} className="opacity-30" strokeWidth="136" />
      <path d={arcPath(from, to, 144.5)} strokeWidth="5" />
      <path d={spokePath(from, 122, 147) + spokePath(to, 122, 147)} strokeWidth="2" />
    </g>
  );
}

function Needle({ angle, set }: { angle: number; set: boolean }) {
  return (
    <>
      <path
        d="M158.5 41h3L166.5 160 163 196h-6L153.5 160Z"
        transform={`rotate(${angle} ${CENTER} ${CENTER})`}
        className={set ? "fill-ink stroke-ink" : "fill-card stroke-mute"}
        strokeWidth="1.5"
        strokeDasharray={set ? undefined : "4 3"}
        strokeLinejoin="round"
      />
      <circle cx={CENTER} cy={CENTER} r="13" className="fill-brass stroke-ink" strokeWidth="2" />
      <circle cx={CENTER} cy={CENTER} r="4" className="fill-brass-dark" />
    </>
  );
}
