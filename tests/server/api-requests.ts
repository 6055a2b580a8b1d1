import { eq } from "drizzle-orm";
import { SESSION_COOKIE, setToken } from "~/auth/cookies";
import { startSession } from "~/auth/sessions/start-session";
import { config } from "~/config";
import { people } from "~/db/schema/people";
import type { Actor } from "~/domain/actor";
import { testDb } from "./database";
import { type Answer, TestBrowser, type TestRoute } from "./requests";

/** A browser in which this person is signed in, each call with a session of its own. */
export async function signedIn(actor: Actor): Promise<TestBrowser> {
  const db = testDb();
  const [row] = await db
    .select({ email: people.email })
    .from(people)
    .where(eq(people.id, actor.personId));
  const who = { email: row?.email ?? "", device: "Test", previousToken: null };
  const started = await startSession(db, who, new Date());
  if (!started) throw new Error("nobody here has that address");
  const browser = new TestBrowser();
  const cookie = await setToken(SESSION_COOKIE, started.token);
  const [, name = "", value = ""] = /^([^=]+)=([^;]*)/.exec(cookie) ?? [];
  browser.cookies.set(name, value);
  return browser;
}

export interface Sent {
  method?: string;
  body?: BodyInit;
  headers?: Record<string, string>;
  params?: object;
}

/** Sends bytes as they are, through the same middleware as a form. */
export function sendBytes(
  browser: TestBrowser,
  route: TestRoute,
  path: string,
  { method = "POST", body, headers = {}, params }: Sent,
): Promise<Answer> {
  const action = ({ request, ...rest }: { request: Request }) => {
    const kept = new Headers(request.headers);
    kept.delete("Content-Type");
    for (const [name, value] of Object.entries(headers)) kept.set(name, value);
    const sent = new Request(request.url, { method, headers: kept, body });
    return (route.action as (args: unknown) => unknown)({ request: sent, ...rest });
  };
  const origin = { Origin: config().publicOrigin };
  return browser.send({ action } as TestRoute, path, { form: {}, headers: origin, params });
}

export interface ProblemBody {
  type: string;
  status: number;
  code: string;
  title: string;
  errors?: { pointer: string; code: string; detail: string }[];
}

export const problemOf = (answer: Answer) => answer.data as ProblemBody;
