import { redirect } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { photoObject } from "~/domain/photos/store-photo";
import { problem } from "~/http/problem";
import { storage } from "~/services/storage";
import { apiText } from "~/text/en/api";
import type { Route } from "./+types/photo-view";

const SHOWN_FOR_SECONDS = 60;

/** GET /api/v1/photos/:id/:size: a scoped way to a stored photo, by a short presigned address. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "photo.read");
  const size = params.size === "thumb" ? "thumb" : "large";
  const key = await photoObject(dbOf(context), actor, { id: params.id, size });
  if (!key) return problem(404, "not-found", { title: apiText.photoUnknown });
  const address = await storage().presign(key, SHOWN_FOR_SECONDS);
  return redirect(address, { headers: { "Cache-Control": "no-store" } });
}
