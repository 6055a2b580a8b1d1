import type { ReactNode } from "react";
import { uiText } from "~/text/en/ui";
import { SkipLink } from "./skip-link";
import { ThemeSwitch } from "./theme-switch";

/** A walk's screen: the truck and the place in the walk on top, one thing to do, answers in the thumb's reach. */
export function WalkFrame({
  unit,
  place,
  strip,
  title,
  children,
  actions,
}: {
  unit: string;
  /** "Station 8 of 9", and the station's name under it. */
  place: ReactNode;
  /** A `StationStrip`. */
  strip?: ReactNode;
  title: string;
  children: ReactNode;
  /** The answers, `walk` size, the main one last: under a right thumb. */
  actions?: ReactNode;
}) {
  return (
    <div className="mx-auto flex min-h-dvh max-w-2xl flex-col">
      <SkipLink />
      <header className="px-4 pt-2">
        <div className="flex flex-wrap items-center justify-between gap-x-4">
          <p className="font-stencil text-3xl leading-none">{unit}</p>
          <p className="mr-auto text-sm leading-tight text-mute">{place}</p>
          <ThemeSwitch size="walk" />
        </div>
        {strip}
      </header>
      <main id="page" tabIndex={-1} className="flex-1 px-4 pt-4 pb-6 outline-none">
        <h1 className="mb-4 text-2xl font-bold">{title}</h1>
        {children}
      </main>
      {actions && <ActionBar>{actions}</ActionBar>}
    </div>
  );
}

/** The answers, always in the same place at the foot of the screen. */
function ActionBar({ children }: { children: ReactNode }) {
  return (
    <section
      aria-label={uiText.answers}
      className="bottom-0 z-20 flex flex-wrap gap-3 border-t border-line bg-card px-4 pt-3 pb-[max(1rem,env(safe-area-inset-bottom))] *:grow print:hidden [@media(min-height:36rem)]:sticky"
    >
      {children}
    </section>
  );
}
