import { type Cookie, createCookie } from "react-router";
import { config } from "../config";
import { days, hours } from "../domain/durations";

interface HostCookie {
  name: string;
  lastsMs: number;
}

/** Holds the session's token. The table decides how long it lasts. */
export const SESSION_COOKIE: HostCookie = { name: "keypeg", lastsMs: days(180) };
/** Marks the browser that asked for a code. Says nothing about who asked. */
export const BROWSER_COOKIE: HostCookie = { name: "keypeg-browser", lastsMs: hours(1) };

/** Lax, so that a link in a mail opens signed in; `__Host-` wherever there is TLS. */
export function cookieFor({ name, lastsMs }: HostCookie, publicOrigin: string): Cookie {
  const secure = publicOrigin.startsWith("https:");
  return createCookie(secure ? `__Host-${name}` : name, {
    path: "/",
    httpOnly: true,
    sameSite: "lax",
    secure,
    maxAge: lastsMs / 1000,
  });
}

/** The token in a cookie of ours, or null. Reads no configuration when no cookie came. */
export async function readToken(request: Request, which: HostCookie): Promise<string | null> {
  const header = request.headers.get("Cookie");
  if (!header?.includes(which.name)) return null;
  const value: unknown = await cookieFor(which, config().publicOrigin).parse(header);
  return typeof value === "string" && value.length === 43 ? value : null;
}

export function setToken(which: HostCookie, token: string): Promise<string> {
  return cookieFor(which, config().publicOrigin).serialize(token);
}

export function clearToken(which: HostCookie): Promise<string> {
  return cookieFor(which, config().publicOrigin).serialize("", { maxAge: 0 });
}
