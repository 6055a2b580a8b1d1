import { type Cookie, createCookie } from "react-router";
import { config } from "../config";
import { days, hours } from "../domain/durations";

/** Lax, so that a link in a mail opens signed in; `__Host-` where the browser accepts it. */
function hostCookie(name: string, maxAgeMs: number): Cookie {
  const secure = config().publicOrigin.startsWith("https:");
  return createCookie(secure ? `__Host-${name}` : name, {
    path: "/",
    httpOnly: true,
    sameSite: "lax",
    secure,
    maxAge: maxAgeMs / 1000,
  });
}

/** Holds the session's token. The table decides how long it lasts. */
export const SESSION_COOKIE = { name: "keypeg", maxAge: days(180) };
/** Marks the browser that asked for a code. Says nothing about who asked. */
export const BROWSER_COOKIE = { name: "keypeg-browser", maxAge: hours(1) };

type HostCookie = typeof SESSION_COOKIE;

/** The token in a cookie of ours, or null. Reads no configuration when no cookie came. */
export async function readToken(request: Request, which: HostCookie): Promise<string | null> {
  const header = request.headers.get("Cookie");
  if (!header?.includes(which.name)) return null;
  const value: unknown = await hostCookie(which.name, which.maxAge).parse(header);
  return typeof value === "string" && value.length === 43 ? value : null;
}

export function setToken(which: HostCookie, token: string): Promise<string> {
  return hostCookie(which.name, which.maxAge).serialize(token);
}

export function clearToken(which: HostCookie): Promise<string> {
  return hostCookie(which.name, 0).serialize("", { maxAge: 0 });
}
