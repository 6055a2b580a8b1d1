import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { type PhotoOutcome, storePhoto } from "~/domain/photos/store-photo";
import { problem } from "~/http/problem";
import { serverLog } from "~/services/server-log";
import { storage } from "~/services/storage";
import { apiText } from "~/text/en/api";
import type { Route } from "./+types/photo";

type Refused = Exclude<PhotoOutcome["state"], "stored" | "store-away">;

const REFUSED: Record<Refused, [status: number, title: string]> = {
  "not-found": [404, apiText.photoUnknown],
  "not-yours": [404, apiText.photoUnknown],
  "other-picture": [422, apiText.photoHash],
  "not-a-picture": [415, apiText.photoType],
};

/** PUT /api/v1/photos/:id: the bytes of a photo that a record promised. */
export async function action({ request, params, context }: Route.ActionArgs) {
  const actor = requirePermission(context, "photo.put");
  if (request.method !== "PUT") return problem(405, "method", { title: apiText.method });
  const bytes = new Uint8Array(await request.arrayBuffer());
  const outcome = await storePhoto(dbOf(context), actor, storage(), { id: params.id, bytes });
  if (outcome.state === "store-away") {
    const error = outcome.cause instanceof Error ? outcome.cause.name : "unknown";
    serverLog.error({ error }, "object store");
    const away = problem(503, outcome.state, { title: apiText.photoStoreAway });
    away.headers.set("Retry-After", "10");
    return away;
  }
  if (outcome.state !== "stored") {
    const [status, title] = REFUSED[outcome.state];
    return problem(status, outcome.state, { title });
  }
  return Response.json(outcome, {
    headers: { "Keypeg-Receipt": outcome.id, "Cache-Control": "no-store" },
  });
}
