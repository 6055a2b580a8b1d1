import type { Submission } from "@conform-to/react";
import { data } from "react-router";
import { z } from "zod";
import { REFUSAL_STATUS, type Refusal } from "~/domain/refusals";
import { refusalText } from "~/text/en/refusals";

/** There is no such row for this carrier. */
export function notFound(what: "truck" | "other"): never {
  throw data({ what }, { status: 404 });
}

/** What was typed does not parse: words at each field, and all of it kept. */
export function unparsed<T>(submission: Submission<T, string[], unknown>) {
  return data({ result: submission.reply() }, { status: 400 });
}

/** A refused command as the form's answer: words at each field, what was typed kept. */
export function refusedForm<T>(submission: Submission<T, string[], unknown>, refusal: Refusal) {
  if (refusal.code === "not-found") notFound("other");
  const fieldErrors: Record<string, string[]> = {};
  const formErrors: string[] = [];
  for (const { pointer, code, values } of refusal.fields ?? []) {
    const words = refusalText.field(code, values);
    const name = pointer.slice(1).replaceAll("/", ".");
    if (name === "") formErrors.push(words);
    else fieldErrors[name] = [...(fieldErrors[name] ?? []), words];
  }
  if (!refusal.fields) formErrors.push(refusalText.title(refusal.code));
  const status = REFUSAL_STATUS[refusal.code];
  return data({ result: submission.reply({ formErrors, fieldErrors }) }, { status });
}

/** An id from the path. One that is no id names nothing. */
export function idOr404(text: string): string {
  return z.uuid().safeParse(text).success ? text.toLowerCase() : notFound("other");
}
