import type { z } from "zod";
import type { FaultValues, FieldFault } from "../domain/refusals";
import { refusalText } from "../text/en/refusals";

type Issue = z.core.$ZodIssue;

/** RFC 6901 section 3: "~" and "/" inside a name are escaped. */
function pointerTo(path: readonly PropertyKey[]): string {
  return path
    .map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`)
    .join("");
}

function limitFault(issue: Extract<Issue, { code: "too_big" | "too_small" }>) {
  const big = issue.code === "too_big";
  const values = { limit: Number(big ? issue.maximum : issue.minimum) };
  if (issue.origin === "string") return { code: big ? "text-too-long" : "text-too-short", values };
  if (issue.origin === "array") return { code: big ? "list-too-long" : "list-too-short", values };
  return { code: big ? "number-too-large" : "number-too-small", values };
}

function formatFault(format: string): string {
  if (format === "uuid") return "not-an-id";
  return format === "datetime" ? "not-a-time" : "wrong-form";
}

function kindOf(issue: Issue): { code: string; values?: FaultValues } {
  switch (issue.code) {
    case "invalid_type":
      // Issues leave the input out, so that no log carries it; only their words tell.
      if (issue.message.endsWith("received undefined")) return { code: "missing" };
      return { code: "wrong-type", values: { expected: issue.expected } };
    case "too_big":
    case "too_small":
      return limitFault(issue);
    case "invalid_format":
      return { code: formatFault(issue.format) };
    case "invalid_value":
      return { code: "not-one-of", values: { choices: issue.values.map(String).join(", ") } };
    case "invalid_union":
      return { code: "kind-unknown" };
    case "invalid_key": {
      const [inner] = issue.issues;
      return inner ? kindWithWords(inner) : { code: "wrong-form" };
    }
    default:
      return { code: "wrong-form" };
  }
}

/** A schema that names a fault of its own is taken at its word. */
function kindWithWords(issue: Issue): { code: string; values?: FaultValues } {
  return refusalText.knows(issue.message) ? { code: issue.message } : kindOf(issue);
}

/** One of the schema's issues as a field at fault: where, which fault, and what its words name. */
export function issueFault(issue: Issue): FieldFault {
  return { pointer: pointerTo(issue.path), ...kindWithWords(issue) };
}
