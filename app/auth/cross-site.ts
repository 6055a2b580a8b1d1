import type { MiddlewareFunction } from "react-router";
import { config } from "../config";
import { problem } from "../http/problem";
import { authText } from "../text/en/auth";

const READS = new Set(["GET", "HEAD", "OPTIONS"]);

/** Did this site's own page send it? The public origin is told, so a proxy that ends TLS changes nothing. */
function isSameSite(headers: Headers, publicOrigin: string): boolean {
  return headers.get("Origin") === publicOrigin || headers.get("Sec-Fetch-Site") === "same-origin";
}

/** Refuses what another site's page sends with our cookie: every request that changes something. */
export const crossSiteMiddleware: MiddlewareFunction<Response> = async ({ request }, next) => {
  if (!READS.has(request.method) && !isSameSite(request.headers, config().publicOrigin)) {
    return problem(403, "cross-site", { title: authText.crossSite });
  }
  return next();
};
