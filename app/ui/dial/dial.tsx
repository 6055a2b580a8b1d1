import { type ReactNode, useState } from "react";
import { uiText } from "~/text/en/ui";
import { FieldFaults } from "../fields/field";
import { controlProps, type FieldShape, startOf } from "../fields/field-shape";
import { Notice, type NoticeTone } from "../notice";
import { DialFace, type DialMarks } from "./dial-face";
import type { DialScale, DialSide } from "./dial-geometry";
import { DialLegend } from "./dial-legend";
import { StepButton } from "./step-button";
import { useDial } from "./use-dial";

interface DialVerdict {
  tone: NoticeTone;
  /** "Inside 19 to 23." */
  title: string;
  /** What follows. */
  text?: ReactNode;
}

export interface DialProps {
  field: FieldShape;
  /** What is read: "Vacuum relief, gauge when steady". */
  label: string;
  side: DialSide;
  vacuum: DialScale;
  pressure: DialScale;
  marks?: DialMarks;
  /** Half a unit unless the gauge is finer. */
  step?: number;
  /** Judges a value for the screen; the server judges again. */
  verdict?: (value: number) => DialVerdict;
  /** "20.5 to 21.5"; never shown before a value is entered, so that nobody copies it. */
  usual?: string;
  onChange?: (value: number | null) => void;
}

/** A compound gauge read by needle, by two big buttons or by typing. It starts unset. */
export function Dial(props: DialProps) {
  const { field, label, side, vacuum, pressure, marks = {}, step = 0.5, usual, onChange } = props;
  const [showUncertainty, setShowUncertainty] = useState(false);
  const scale = side === "vacuum" ? vacuum : pressure;
  const dial = useDial({ scale, side, step, start: startOf(field), onChange });
  const verdict = dial.value === null ? undefined : props.verdict?.(dial.value);
  const words = uiText.dial;
  return (
    <div className="@container mx-auto w-full max-w-sm">
      <div
        role="slider"
        tabIndex={0}
        aria-label={words.face(label)}
        aria-valuemin={0}
        aria-valuemax={scale.max}
        aria-valuenow={dial.value ?? 0}
        aria-valuetext={
          dial.value === null ? words.unset : words.value(dial.shown(dial.value), scale.unit)
        }
        onKeyDown={dial.onKeyDown}
        {...dial.drag}
        className="mx-auto max-w-[min(20rem,max(30svh,13rem))] cursor-grab touch-none rounded-full active:cursor-grabbing"
      >
        <DialFace
          vacuum={vacuum}
          pressure={pressure}
          side={side}
          marks={marks}
          value={dial.value}
          showUncertainty={showUncertainty}
        />
      </div>
      <DialLegend
        marks={marks}
        unit={scale.unit}
        shown={showUncertainty}
        onToggle={() => setShowUncertainty(!showUncertainty)}
      />
      <div className="mt-1 flex flex-wrap items-center justify-between gap-3 @3xs:flex-nowrap">
        <StepButton label={words.less(`${step} ${scale.unit}`)} onStep={() => dial.move(-1)}>
          −
        </StepButton>
        <label className="order-first flex min-w-0 basis-full items-baseline justify-center gap-1.5 border-b-2 border-edge focus-within:border-ink @3xs:order-none @3xs:basis-auto">
          <input
            {...controlProps(field, null)}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            placeholder="–"
            aria-label={words.typed(label, scale.unit)}
            value={dial.typed}
            onChange={(event) => dial.type(event.target.value)}
            className="w-[2.3em] min-w-0 bg-transparent text-right text-reading font-bold tabular-nums placeholder:text-mute"
          />
          <span className="text-lg text-mute">{scale.unit}</span>
        </label>
        <StepButton label={words.more(`${step} ${scale.unit}`)} onStep={() => dial.move(1)}>
          +
        </StepButton>
      </div>
      <FieldFaults field={field} />
      <div role="status" className="mt-3 min-h-16">
        {verdict ? (
          <Notice tone={verdict.tone} title={verdict.title}>
            {verdict.text} {usual && words.usual(usual)}
          </Notice>
        ) : (
          <p className="text-center text-sm text-mute">
            {dial.typed.trim() === "" ? words.howTo : words.offScale(String(scale.max), scale.unit)}
          </p>
        )}
      </div>
    </div>
  );
}
