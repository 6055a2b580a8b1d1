import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { recordWalk } from "~/domain/walks/record-walk";
import { walkSchema } from "~/domain/walks/walk-schema";
import { invalidProblem, problem, refusalProblem } from "~/http/problem";
import { apiText } from "~/text/en/api";
import type { Route } from "./+types/walks";

/** POST /api/v1/walks: a signed walk; the answer is its receipt. The hash is over the bytes as sent. */
export async function action({ request, context }: Route.ActionArgs) {
  const actor = requirePermission(context, "walk.sign");
  if (request.method !== "POST") return problem(405, "method", { title: apiText.method });
  const bytes = await request.text();
  const json = parseJson(bytes);
  if (json === undefined) return problem(400, "not-json", { title: apiText.notJson });
  const parsed = walkSchema.safeParse(json);
  if (!parsed.success) return invalidProblem(parsed.error.issues);
  const age = {
    ageMs: ageOf(request.headers.get("Keypeg-Age")),
    clockJumped: request.headers.get("Keypeg-Clock-Jumped") === "1",
  };
  const result = await recordWalk(dbOf(context), actor, { body: parsed.data, bytes, age });
  if (!result.ok) return refusalProblem(result.refusal);
  return Response.json(result.value, {
    headers: { "Keypeg-Receipt": result.value.id, "Cache-Control": "no-store" },
  });
}

/** Milliseconds between signature and this send, or null when the phone did not say. */
function ageOf(header: string | null): number | null {
  if (header === null || !/^-?\d{1,12}$/.test(header)) return null;
  return Number(header);
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
