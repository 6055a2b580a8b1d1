import type { Submission } from "@conform-to/react";
import { data } from "react-router";
import { REFUSAL_STATUS, type Refusal } from "../domain/refusals";
import { refusalText } from "../text/en/refusals";

/** What was typed does not parse: text keys at each field, and all of it kept. */
export function unparsedForm<T>(submission: Submission<T, string[], unknown>) {
  return data({ result: submission.reply() }, { status: 400 });
}

/** A refusal as a form's answer: words at each field it names, or over the form, and what was typed kept. */
export function refusedForm<T>(
  submission: Submission<T, string[], unknown>,
  refusal: Refusal,
  status: number = REFUSAL_STATUS[refusal.code],
) {
  const fieldErrors: Record<string, string[]> = {};
  for (const { pointer, code, values } of refusal.fields ?? []) {
    const name = pointer.slice(1).replaceAll("/", ".");
    fieldErrors[name] = [...(fieldErrors[name] ?? []), refusalText.field(code, values)];
  }
  const formErrors = refusal.fields ? [] : [refusalText.title(refusal.code)];
  return data({ result: submission.reply({ formErrors, fieldErrors }) }, { status });
}
