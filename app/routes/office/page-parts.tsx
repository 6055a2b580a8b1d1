import type { ReactNode } from "react";
import { isRouteErrorResponse, Link, useRouteError, useSearchParams } from "react-router";
import { isSavedNote, type SavedNote as Note, office, savedNotes } from "~/text/en/office";
import { ButtonLink } from "~/ui/button";
import { ErrorState } from "~/ui/error-state";
import { Notice } from "~/ui/notice";

/** What the last change did, from the word it left in the address. */
export function SavedNote({ undo }: { undo?: (done: Note) => ReactNode }) {
  const [search] = useSearchParams();
  const word = search.get("done");
  if (!isSavedNote(word)) return null;
  return (
    <div className="mb-6 print:hidden">
      <Notice tone="good" announce action={undo?.(word)}>
        {savedNotes[word]}
      </Notice>
    </div>
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
  if (known && error.status === 403) throw error;
  const { notFound, failed } = office;
  const missing = known && error.status === 404;
  const next = missing
    ? error.data?.what === "truck"
      ? notFound.truck
      : notFound.other
    : failed.text;
  const title = missing ? notFound.title : failed.title;
  return (
    <>
      <title>{`${title} · ${office.product}`}</title>
      <ErrorState
        heading="h1"
        title={title}
        next={next}
        action={<ButtonLink to="/office">{notFound.back}</ButtonLink>}
      />
    </>
  );
}
