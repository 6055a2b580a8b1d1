import { type MiddlewareFunction, RouterContextProvider } from "react-router";
import { crossSiteMiddleware } from "~/auth/cross-site";
import { sessionMiddleware } from "~/auth/session";
import { config } from "~/config";
import { clientContext, databaseContext } from "~/context";
import { testDatabase } from "./database";

type Handler = (args: never) => unknown;

export interface TestRoute {
  loader?: Handler;
  action?: Handler;
}

export interface Answer {
  status: number;
  headers: Headers;
  /** What the loader or action answered with, or the body of its response. */
  data: unknown;
}

interface DataWithInit {
  type: "DataWithResponseInit";
  data: unknown;
  init: ResponseInit | null;
}

function isDataWithInit(value: unknown): value is DataWithInit {
  return typeof value === "object" && value !== null && "init" in value && "data" in value;
}

/** As the framework does it: what a handler returned or threw, as a response. */
async function respond(handle: () => Promise<unknown>): Promise<Response> {
  const outcome = await handle().catch((thrown: unknown) => {
    if (thrown instanceof Response || isDataWithInit(thrown)) return thrown;
    throw thrown;
  });
  if (outcome instanceof Response) return outcome;
  if (isDataWithInit(outcome)) return Response.json(outcome.data, outcome.init ?? {});
  return Response.json(outcome ?? null);
}

const chain = [crossSiteMiddleware, sessionMiddleware] as MiddlewareFunction<Response>[];

/** A browser with its cookies, which sends requests through the root's middleware to one route. */
export class TestBrowser {
  readonly cookies = new Map<string, string>();
  constructor(private readonly address = "192.0.2.1") {}

  async send(
    route: TestRoute,
    path: string,
    more: { form?: Record<string, string | string[]>; headers?: HeadersInit; params?: object } = {},
  ): Promise<Answer> {
    const url = new URL(path, config().publicOrigin);
    const method = more.form ? "POST" : "GET";
    const headers = new Headers(more.headers ?? { Origin: config().publicOrigin });
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join("; ");
    if (cookie) headers.set("Cookie", cookie);
    const body = more.form && new URLSearchParams(formEntries(more.form));
    const request = new Request(url, { method, headers, body });
    const context = new RouterContextProvider();
    context.set(databaseContext, testDatabase());
    context.set(clientContext, { address: this.address, requestId: "test" });
    const args = { request, context, url, params: more.params ?? {}, pattern: path };
    const handler = method === "GET" ? route.loader : route.action;
    if (!handler) throw new Error(`no ${method} here`);
    const run = chain.reduceRight<() => Promise<Response>>(
      (next, middleware) => async () => (await middleware(args as never, next)) ?? next(),
      () => respond(async () => handler(args as never)),
    );
    return this.take(await respond(run));
  }

  private async take(response: Response): Promise<Answer> {
    for (const line of response.headers.getSetCookie()) {
      const [, name = "", value = ""] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
      if (/max-age=0/i.test(line)) this.cookies.delete(name);
      else this.cookies.set(name, value);
    }
    const text = await response.text();
    const isJson = response.headers.get("Content-Type")?.includes("json");
    const data: unknown = isJson ? JSON.parse(text) : text;
    return { status: response.status, headers: response.headers, data };
  }
}

function formEntries(form: Record<string, string | string[]>): string[][] {
  return Object.entries(form).flatMap(([name, value]) =>
    (Array.isArray(value) ? value : [value]).map((one) => [name, one]),
  );
}
