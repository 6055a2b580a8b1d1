import type { Submission } from "@conform-to/react";
import { data } from "react-router";
import { z } from "zod";
import type { Refusal } from "~/domain/refusals";
import * as formReply from "~/http/form-reply";

/** There is no such row for this carrier. */
export function notFound(what: "truck" | "other"): never {
  throw data({ what }, { status: 404 });
}

/** An id from the path. One that is no id names nothing. */
export function idOr404(text: string): string {
  return z.uuid().safeParse(text).success ? text.toLowerCase() : notFound("other");
}

/** A refused command as the form's answer; a row that is not there is a page that is not there. */
export function refusedForm<T>(submission: Submission<T, string[], unknown>, refusal: Refusal) {
  if (refusal.code === "not-found") notFound("other");
  return formReply.refusedForm(submission, refusal);
}
