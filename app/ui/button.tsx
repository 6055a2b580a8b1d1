import type { ComponentProps } from "react";
import { Link } from "react-router";

/** One `main` a screen. `quiet` stands beside it; `danger` ends or refuses something. */
type ButtonKind = "main" | "quiet" | "danger";
/** `walk` is for gloves (56 px), `desk` for the bench, board and office (44 px). */
type ButtonSize = "walk" | "desk";

interface Look {
  kind?: ButtonKind;
  size?: ButtonSize;
  /** Takes the whole width of its place. */
  wide?: boolean;
}

const KINDS: Record<ButtonKind, string> = {
  main: "border-enamel bg-enamel text-card hover:border-ink active:border-ink",
  quiet: "border-ink bg-card text-ink hover:bg-line active:bg-line",
  danger: "border-red bg-card text-red hover:bg-red hover:text-card active:bg-red active:text-card",
};
const SIZES: Record<ButtonSize, string> = {
  walk: "min-h-14 rounded-lg px-5 py-3",
  desk: "min-h-11 rounded-md px-4 py-2",
};

export function buttonClass({ kind = "quiet", size = "desk", wide = false }: Look): string {
  return `inline-flex items-center justify-center gap-2 border-2 text-center font-bold leading-tight no-underline disabled:border-edge disabled:bg-transparent disabled:text-mute aria-disabled:border-edge aria-disabled:bg-transparent aria-disabled:text-mute ${KINDS[kind]} ${SIZES[size]} ${wide ? "w-full" : ""}`;
}

/** A button. While `busy` it shows the words given and takes no second press. */
export function Button({
  kind,
  size,
  wide,
  busy,
  type = "button",
  className = "",
  children,
  ...rest
}: ComponentProps<"button"> & Look & { busy?: string | false }) {
  return (
    <button
      type={type}
      {...rest}
      aria-disabled={busy ? true : undefined}
      onClick={busy ? (event) => event.preventDefault() : rest.onClick}
      className={`${buttonClass({ kind, size, wide })} ${className}`}
    >
      {busy || children}
    </button>
  );
}

/** A link that looks like a button: it goes somewhere, it changes nothing. */
export function ButtonLink({
  kind,
  size,
  wide,
  className = "",
  ...rest
}: ComponentProps<typeof Link> & Look) {
  return <Link {...rest} className={`${buttonClass({ kind, size, wide })} ${className}`} />;
}
