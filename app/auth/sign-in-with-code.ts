import type { RouterContextProvider } from "react-router";
import { config } from "../config";
import { dbOf } from "../context";
import { type Result, refuse } from "../domain/refusals";
import { systemClock } from "../services/clock";
import { redeem } from "./authenticator";
import { newestCode, type PendingCode } from "./codes/pending-code";
import { BROWSER_COOKIE, readToken, SESSION_COOKIE } from "./cookies";
import { deviceName } from "./sessions/device-name";
import type { Started } from "./sessions/start-session";

type Context = Readonly<RouterContextProvider>;

/** The newest code asked for by the browser behind this request. */
export async function pendingCode(request: Request, context: Context): Promise<PendingCode | null> {
  const token = await readToken(request, BROWSER_COOKIE);
  if (!token) return null;
  return newestCode(dbOf(context), { token, secret: config().secret });
}

/** Judges a code typed in the browser behind this request. */
export async function signInWithCode(
  request: Request,
  context: Context,
  code: string,
): Promise<Result<Started>> {
  const browser = await readToken(request, BROWSER_COOKIE);
  if (!browser) return refuse("invalid", { fields: [{ pointer: "/code", code: "code-none" }] });
  const at = { db: dbOf(context), secret: config().secret, browser, now: systemClock.now() };
  const device = deviceName(request.headers.get("User-Agent"));
  const previousToken = await readToken(request, SESSION_COOKIE);
  return redeem(at, { code, device, previousToken });
}
