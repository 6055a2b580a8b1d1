import type { ReactNode } from "react";
import { isRouteErrorResponse, Link, useRouteError, useSearchParams } from "react-router";
import { isSavedNote, type SavedNote as Note, office, savedNotes } from "~/text/en/office";

export function PageHead({
  title,
  lead,
  children,
}: {
  title: ReactNode;
  lead?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <div className="mb-6 flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
      <div>
        <h1 className="text-3xl font-bold">{title}</h1>
        {lead && <p className="mt-1 max-w-prose text-mute">{lead}</p>}
      </div>
      {children && <div className="flex flex-wrap items-center gap-3 print:hidden">{children}</div>}
    </div>
  );
}

/** What the last change did, from the word it left in the address. */
export function SavedNote({ undo }: { undo?: (done: Note) => ReactNode }) {
  const [search] = useSearchParams();
  const word = search.get("done");
  if (!isSavedNote(word)) return null;
  return (
    <div
      role="status"
      className="mb-6 flex flex-wrap items-center justify-between gap-3 border-l-4 border-green bg-card p-3 print:hidden"
    >
      <p>{savedNotes[word]}</p>
      {undo?.(word)}
    </div>
  );
}

export function Empty({ children }: { children: ReactNode }) {
  return <p className="border border-dashed border-mute p-4 text-mute">{children}</p>;
}

export function ActionLink({
  to,
  children,
  label,
}: {
  to: string;
  children: ReactNode;
  label?: string;
}) {
  return (
    <Link
      to={to}
      aria-label={label}
      className="inline-flex min-h-11 items-center rounded-sm border border-mute px-3 py-1"
    >
      {children}
    </Link>
  );
}

export function MainLink({ to, children }: { to: string; children: ReactNode }) {
  return (
    <Link
      to={to}
      className="inline-flex min-h-11 items-center rounded-sm bg-enamel px-5 py-2 font-bold text-card no-underline"
    >
      {children}
    </Link>
  );
}

export function TextLink({ to, children }: { to: string; children: ReactNode }) {
  return (
    <Link to={to} className="inline-flex min-h-11 items-center text-enamel underline">
      {children}
    </Link>
  );
}

/** What is left of a page when it cannot be shown, with the way back. */
export function OfficeError() {
  const error = useRouteError();
  const known = isRouteErrorResponse(error);
  const words = office.notFound;
  if (known && error.status === 404) {
    return (
      <>
        <PageHead
          title={words.title}
          lead={error.data?.what === "truck" ? words.truck : words.other}
        />
        <TextLink to="/office">{words.back}</TextLink>
      </>
    );
  }
  if (known && error.status === 403) throw error;
  return (
    <>
      <PageHead title={office.failed.title} lead={office.failed.text} />
      <TextLink to="/office">{words.back}</TextLink>
    </>
  );
}
