const ANY_ORIGIN = "https://here.invalid";

/** A path of this site to go on to after sign-in; anything else is dropped. */
export function safeNext(next: string | null): string | null {
  if (!next?.startsWith("/") || !URL.canParse(next, ANY_ORIGIN)) return null;
  const url = new URL(next, ANY_ORIGIN);
  if (url.origin !== ANY_ORIGIN) return null;
  return url.pathname + url.search;
}

/** The sign-in page, told where to go on to. */
export function signInPath(next: string): string {
  return next === "/" ? "/sign-in" : `/sign-in?next=${encodeURIComponent(next)}`;
}
