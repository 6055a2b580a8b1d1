import type { z } from "zod";
import type { FieldFault, Refusal } from "../domain/refusals";
import { REFUSAL_STATUS } from "../domain/refusals";
import { refusalText } from "../text/en/refusals";
import { issueFault } from "./issue-fault";

export interface ProblemError {
  /** Stable name of the fault. */
  code: string;
  /** What to do about it. */
  detail: string;
  /** JSON pointer to the field at fault. */
  pointer: string;
}

/** RFC 9457 problem details. `code` is stable; `detail` is for people. */
export function problem(
  status: number,
  code: string,
  more: { title: string; detail?: string; errors?: ProblemError[]; reasons?: unknown[] },
): Response {
  return new Response(
    JSON.stringify({ type: `urn:keypeg:problem:${code}`, status, code, ...more }),
    {
      status,
      headers: { "Content-Type": "application/problem+json", "Cache-Control": "no-store" },
    },
  );
}

function fieldErrors(fields: readonly FieldFault[]): ProblemError[] {
  return fields.map(({ pointer, code, values }) => ({
    pointer: `#${pointer}`,
    code,
    detail: refusalText.field(code, values),
  }));
}

/** A command's refusal as problem details. */
export function refusalProblem(refusal: Refusal): Response {
  return problem(REFUSAL_STATUS[refusal.code], refusal.code, {
    title: refusalText.title(refusal.code),
    ...(refusal.fields && { errors: fieldErrors(refusal.fields) }),
    ...(refusal.reasons && { reasons: refusal.reasons }),
  });
}

/** A schema's issues as problem details: one error a field, each with its pointer. */
export function invalidProblem(issues: readonly z.core.$ZodIssue[]): Response {
  return problem(400, "invalid", {
    title: refusalText.title("invalid"),
    errors: fieldErrors(issues.map(issueFault)),
  });
}
