import type { FieldFault } from "../domain/refusals";

/** Text keys of what is wrong, by the name of the form's field. */
export type FormFaults = Record<string, string[]>;

interface Issue {
  code?: string | undefined;
  message: string;
  path: readonly PropertyKey[];
  origin?: unknown;
  format?: unknown;
  input?: unknown;
}

/** A schema's own message is a text key; a bare one of the library is answered by its kind. */
function keyOf(issue: Issue): string {
  if (/^[a-z][a-z0-9]*(-[a-z0-9]+)+$/.test(issue.message)) return issue.message;
  if (issue.code === "too_small") return issue.origin === "string" ? "fill-in" : "zero-or-more";
  if (issue.code === "too_big") return issue.origin === "string" ? "too-long" : "too-large";
  if (/NaN|expected number/.test(issue.message)) return "not-a-number";
  return issue.format === "date" ? "date-form" : "choose-one";
}

/** What a schema found wrong, at the form's fields. `names` renames where the form's name is another. */
export function faultsOfIssues(
  issues: readonly Issue[],
  names: Readonly<Record<string, string>> = {},
): FormFaults {
  const faults: FormFaults = {};
  for (const issue of issues) {
    const last = String(issue.path.filter((part) => part !== "name").at(-1) ?? "");
    const field = names[last] ?? last;
    faults[field] = [...(faults[field] ?? []), keyOf(issue)];
  }
  return faults;
}

/** What a command refused, at the form's fields. */
export function faultsOfFields(
  fields: readonly FieldFault[],
  names: Readonly<Record<string, string>> = {},
): FormFaults {
  return faultsOfIssues(
    fields.map(({ pointer, code }) => ({ path: pointer.split("/").slice(1), message: code })),
    names,
  );
}
