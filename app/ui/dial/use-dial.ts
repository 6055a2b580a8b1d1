import { type KeyboardEvent, type PointerEvent, useState } from "react";
import { type DialScale, type DialSide, onStep, valueAt } from "./dial-geometry";

/** Steps a key moves the needle; the ends of the scale are infinitely far. */
const STEPS: Record<string, number> = {
  ArrowUp: 1,
  ArrowRight: 1,
  ArrowDown: -1,
  ArrowLeft: -1,
  PageUp: 10,
  PageDown: -10,
  Home: Number.NEGATIVE_INFINITY,
  End: Number.POSITIVE_INFINITY,
};

/** A typed number, or null for nothing, for words and for what is off the scale. */
function readTyped(typed: string, scale: DialScale): number | null {
  const text = typed.trim().replace(",", ".");
  const value = Number(text);
  return text !== "" && value >= 0 && value <= scale.max ? value : null;
}

/** One value behind needle, buttons and typing. What was typed is kept as it was typed. */
export function useDial({
  scale,
  side,
  step,
  start = "",
  onChange,
}: {
  scale: DialScale;
  side: DialSide;
  step: number;
  start?: string;
  onChange?: (value: number | null) => void;
}) {
  const [typed, setTyped] = useState(start);
  const value = readTyped(typed, scale);
  const shown = (next: number) => next.toFixed(step < 1 ? 1 : 0);

  function type(text: string) {
    setTyped(text);
    onChange?.(readTyped(text, scale));
  }
  function set(next: number) {
    type(shown(onStep(next, scale, step)));
  }
  /** From an odd value to the next step, then step by step; from unset, up from zero. */
  function move(steps: number) {
    const at = value ?? 0;
    const whole = steps > 0 ? Math.floor(at / step) : Math.ceil(at / step);
    set((whole + steps) * step);
  }
  function onKeyDown(event: KeyboardEvent) {
    const steps = STEPS[event.key];
    if (steps === undefined) return;
    event.preventDefault();
    if (Number.isFinite(steps)) move(steps);
    else set(steps > 0 ? scale.max : 0);
  }
  function follow(event: PointerEvent<HTMLElement>) {
    const box = event.currentTarget.getBoundingClientRect();
    const x = event.clientX - box.left - box.width / 2;
    const y = event.clientY - box.top - box.height / 2;
    set(valueAt(x, y, scale, side, step));
  }
  const drag = {
    onPointerDown(event: PointerEvent<HTMLElement>) {
      event.currentTarget.setPointerCapture(event.pointerId);
      follow(event);
    },
    onPointerMove(event: PointerEvent<HTMLElement>) {
      if (event.currentTarget.hasPointerCapture(event.pointerId)) follow(event);
    },
  };
  return { typed, value, shown, type, move, onKeyDown, drag };
}
