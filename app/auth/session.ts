import type { MiddlewareFunction } from "react-router";
import { askedContext, dbOf, signedInContext } from "../context";
import { systemClock } from "../services/clock";
import { readToken, SESSION_COOKIE } from "./cookies";
import { openSession } from "./sessions/open-session";

/**
 * Signs the person in for this request. Person, membership and carrier are read every time, so
 * that what a manager took away is gone with the next request.
 */
export const sessionMiddleware: MiddlewareFunction<Response> = async (args, next) => {
  const { request, context, url } = args;
  const api = url.pathname.startsWith("/api/");
  context.set(askedContext, { path: url.pathname + url.search, api });
  const token = await readToken(request, SESSION_COOKIE);
  if (!token) return next();
  context.set(signedInContext, await openSession(dbOf(context), token, systemClock.now()));
  const response = await next();
  if (!response.headers.has("Cache-Control")) {
    response.headers.set("Cache-Control", "private, no-cache");
  }
  return response;
};
