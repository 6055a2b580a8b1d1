import { type ReactNode, useEffect, useRef } from "react";

const REPEAT_AFTER_MS = 450;
const REPEAT_EVERY_MS = 90;

/** A big button that steps once a press, and on and on while held. */
export function StepButton({
  label,
  onStep,
  children,
}: {
  label: string;
  onStep: () => void;
  children: ReactNode;
}) {
  const latest = useRef(onStep);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const repeated = useRef(false);
  useEffect(() => {
    latest.current = onStep;
  });
  useEffect(() => () => clearTimeout(timer.current), []);

  function repeat() {
    repeated.current = true;
    latest.current();
    timer.current = setTimeout(repeat, REPEAT_EVERY_MS);
  }
  function release() {
    clearTimeout(timer.current);
  }
  return (
    <button
      type="button"
      aria-label={label}
      onPointerDown={() => {
        repeated.current = false;
        timer.current = setTimeout(repeat, REPEAT_AFTER_MS);
      }}
      onPointerUp={release}
      onPointerLeave={release}
      onPointerCancel={release}
      onContextMenu={(event) => event.preventDefault()}
      onClick={() => {
        if (!repeated.current) onStep();
        repeated.current = false;
      }}
      className="flex h-16 min-w-16 shrink-0 select-none items-center justify-center rounded-lg border-2 border-ink bg-card text-3xl font-bold leading-none active:bg-line"
    >
      <span aria-hidden="true">{children}</span>
    </button>
  );
}
