import type { ReactNode } from "react";
import { Link, NavLink } from "react-router";
import { uiText } from "~/text/en/ui";
import { SkipLink } from "./skip-link";
import { ThemeSwitch } from "./theme-switch";
import { Wordmark } from "./wordmark";

/** A part of the product the signed-in person may enter; the caller asks the permission table. */
interface Place {
  to: string;
  label: string;
}

export interface PageFrameProps {
  places?: readonly Place[];
  /** Who is signed in, and where they change what is theirs. */
  person?: { name: string; carrier: string; to: string };
  /** The way out, as a form or a link, beside the person. */
  out?: ReactNode;
  /** Fills the screen's width: boards and wide tables. */
  wide?: boolean;
  children: ReactNode;
}

/** Every screen's frame but the walk's: skip link, wordmark, places, person, then the page. */
export function PageFrame({ places = [], person, out, wide = false, children }: PageFrameProps) {
  const width = wide ? "max-w-[100rem]" : "max-w-6xl";
  return (
    <>
      <SkipLink />
      <header className={`mx-auto px-4 pt-3 sm:px-6 print:hidden ${width}`}>
        <div className="flex flex-wrap items-center gap-x-6 gap-y-1 border-b-2 border-ink">
          <Link to="/" className="mr-auto inline-flex min-h-14 items-center no-underline">
            <Wordmark />
          </Link>
          <ThemeSwitch />
          <div className="flex flex-wrap items-center gap-x-4 max-sm:w-full max-sm:justify-between empty:hidden">
            {person && (
              <Link
                to={person.to}
                className="inline-flex min-h-11 flex-col justify-center leading-tight"
              >
                <span className="sr-only">{uiText.account}: </span>
                <span className="font-bold underline">{person.name}</span>
                <span className="text-sm text-mute">{person.carrier}</span>
              </Link>
            )}
            {out}
          </div>
          {places.length > 0 && (
            <nav aria-label={uiText.places} className="w-full">
              <ul className="flex flex-wrap gap-x-6">
                {places.map(({ to, label }) => (
                  <li key={to}>
                    <NavLink
                      to={to}
                      className="inline-flex min-h-12 items-center border-b-[5px] border-transparent no-underline hover:border-line aria-[current=page]:border-enamel aria-[current=page]:font-bold"
                    >
                      {label}
                    </NavLink>
                  </li>
                ))}
              </ul>
            </nav>
          )}
        </div>
      </header>
      <main
        id="page"
        tabIndex={-1}
        className={`mx-auto px-4 pb-16 pt-6 outline-none sm:px-6 ${width}`}
      >
        {children}
      </main>
    </>
  );
}

/** A page's title, a line under it, and what can be done from here. */
export function PageTitle({
  title,
  lead,
  children,
}: {
  title: ReactNode;
  lead?: ReactNode;
  /** Buttons and links. */
  children?: ReactNode;
}) {
  return (
    <div className="mb-6 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <h1 className="text-3xl font-bold">{title}</h1>
        {lead && <p className="mt-1 max-w-prose text-mute">{lead}</p>}
      </div>
      {children && <div className="flex flex-wrap items-center gap-3 print:hidden">{children}</div>}
    </div>
  );
}
