import { AsyncLocalStorage } from "node:async_hooks";
import { randomUUID } from "node:crypto";
import { readFileSync } from "node:fs";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import { createRequestListener } from "@react-router/node";
import type { RouterContextProvider, ServerBuild } from "react-router";
import sirv from "sirv";

/** What the built app hands to this server: one copy of each of its modules, one pool. */
interface AppEntry {
  start(): Promise<{ host: string; port: number; trustedProxies: readonly string[] }>;
  health(): Promise<{ ok: boolean; checks: Record<string, boolean> }>;
  stop(): Promise<void>;
  loadContext(client: { address: string; requestId: string }): RouterContextProvider;
  pagePolicy(scriptSources: readonly string[]): Record<string, string>;
  loggedPath(path: string): string;
  log: Record<"info" | "error", (detail: object, message: string) => void>;
}

const MEGABYTE = 1024 * 1024;
/** After a SIGTERM: how long requests may run on, and when the process is gone whatever runs. */
const REQUESTS_WITHIN_MS = 8_000;
const STOP_WITHIN_MS = 9_500;
/** How long the body of a refused request is still taken off the wire, so that its sender can read why. */
const LINGER_MS = 5_000;
const METHODS = new Set(["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"]);
const here = new URL(".", import.meta.url);
const build: ServerBuild = await import(new URL("./server/index.js", here).href);
const app = build.entry.module as unknown as AppEntry;
const scriptHashes: Record<string, string[]> = JSON.parse(
  readFileSync(new URL("script-hashes.json", here), "utf8"),
);

const { host, port, trustedProxies } = await app.start().catch((error: unknown) => {
  // What is wrong with the environment is told in lines of its own: a stack would bury them.
  console.error(error instanceof Error && error.name === "ConfigError" ? error.message : error);
  process.exit(1);
});
const trusted = new Set(trustedProxies);

const files = sirv(new URL("client", here).pathname, {
  brotli: true,
  gzip: true,
  etag: true,
  extensions: ["html"],
  setHeaders: (response, path) => {
    const immutable = path.startsWith("/assets/");
    response.setHeader(
      "Cache-Control",
      immutable ? "public, max-age=31536000, immutable" : "no-cache",
    );
    const page = scriptHashes[path.replace(/\/$/, "") || "/"];
    setAll(response, app.pagePolicy(page ?? []));
  },
});

function setAll(response: ServerResponse, headers: Record<string, string>): void {
  for (const [name, value] of Object.entries(headers)) response.setHeader(name, value);
}

/** The listener copies a request's raw headers, so the id travels beside it. */
const currentId = new AsyncLocalStorage<string>();

const listener = createRequestListener({
  build,
  mode: "production",
  getLoadContext: (request, client) =>
    app.loadContext({
      address: clientAddress(client.address, request.headers.get("x-forwarded-for")),
      requestId: currentId.getStore() ?? "",
    }) as never,
});

/** The nearest address that is not a proxy of ours; proxies are named in the environment. */
function clientAddress(socket: string, forwarded: string | null): string {
  let address = socket;
  const hops = forwarded?.split(",").map((hop) => hop.trim()) ?? [];
  while (trusted.has(address) && hops.length > 0) address = hops.pop() ?? address;
  return address;
}

/** A caller's own id, if it is plain enough to stand in a log. */
function requestIdOf(request: IncomingMessage): string {
  const given = request.headers["x-request-id"];
  return typeof given === "string" && /^[\w.-]{8,64}$/.test(given) ? given : randomUUID();
}

/**
 * Can the framework make an address of it? Its listener throws outside every catch if it cannot.
 * Two slashes in front would be read as the name of another host.
 */
function isReadable(request: IncomingMessage): boolean {
  if (request.url?.startsWith("//")) return false;
  return URL.canParse(request.url ?? "", `http://${request.headers.host ?? "localhost"}`);
}

function answer(response: ServerResponse, status: number, code: string, title: string): void {
  response.writeHead(status, {
    "Content-Type": "application/problem+json",
    "Cache-Control": "no-store",
  });
  response.end(JSON.stringify({ type: `urn:keypeg:problem:${code}`, status, code, title }));
}

/**
 * Ends a connection whose refused body does not end. Ending it at once would reset it, and a
 * sender in the middle of its body would never see the answer.
 */
function linger(request: IncomingMessage): void {
  const timer = setTimeout(() => request.socket.destroy(), LINGER_MS);
  request.on("close", () => clearTimeout(timer));
  request.resume();
}

/** Refuses a body before a byte of it is read: too long, or of a length not said. */
function bodyRefused(request: IncomingMessage, response: ServerResponse): boolean {
  if (request.method === "GET" || request.method === "HEAD") return false;
  const said = request.headers["content-length"];
  if (said === undefined && request.headers["transfer-encoding"] !== undefined) {
    answer(response, 411, "length-required", "Say how long the body is.");
    linger(request);
    return true;
  }
  const photo = request.method === "PUT" && request.url?.startsWith("/api/v1/photos/");
  if (Number(said ?? 0) <= (photo ? 12 : 1) * MEGABYTE) return false;
  answer(response, 413, "too-large", "This is too large to take.");
  linger(request);
  return true;
}

/**
 * Node 20 writes repeated headers one over the other once any header was set before: of two
 * cookies one is lost. What the routes' listener hands over in pairs is appended instead.
 */
function keepingRepeated(response: ServerResponse): ServerResponse {
  const writeHead = response.writeHead.bind(response);
  response.writeHead = ((status: number, pairs: readonly string[] = []) => {
    for (let n = 0; n + 1 < pairs.length; n += 2) {
      const [name = "", value = ""] = [pairs[n], pairs[n + 1]];
      if (name.toLowerCase() === "set-cookie") response.appendHeader(name, value);
      else response.setHeader(name, value);
    }
    // A page or its data may show what only this person may see.
    if (!response.hasHeader("Cache-Control"))
      response.setHeader("Cache-Control", "private, no-cache");
    return writeHead(status);
  }) as typeof response.writeHead;
  return response;
}

async function health(response: ServerResponse): Promise<void> {
  const state = await app.health();
  response.writeHead(state.ok ? 200 : 503, {
    "Content-Type": "application/json",
    "Cache-Control": "no-store",
  });
  response.end(JSON.stringify(state));
}

/** An unknown file among the assets is not there: no page is made to say so. */
function noSuchFile(response: ServerResponse): void {
  response.writeHead(404, { "Content-Type": "text/plain", "Cache-Control": "no-store" });
  response.end("Not found");
}

/** Hands a request to the framework. What it throws ends this request, never the process. */
function routes(request: IncomingMessage, response: ServerResponse, requestId: string): void {
  const run = async () => listener(request, keepingRepeated(response));
  currentId.run(requestId, run).catch((error: unknown) => {
    const name = error instanceof Error ? error.name : "unknown";
    app.log.error({ requestId, error: name }, "request");
    if (response.headersSent) response.destroy();
    else answer(response, 500, "failed", "Something went wrong here.");
  });
}

function serve(request: IncomingMessage, response: ServerResponse): void {
  const started = performance.now();
  const requestId = requestIdOf(request);
  const path = (request.url ?? "/").split("?")[0] ?? "/";
  response.setHeader("X-Request-Id", requestId);
  setAll(response, app.pagePolicy([]));
  response.on("close", () => {
    const ms = Math.round(performance.now() - started);
    const entry = { requestId, method: request.method, path: app.loggedPath(path) };
    app.log.info({ ...entry, status: response.statusCode, ms }, "request");
    // A connection that was busy at the SIGTERM is idle only after this event.
    if (stopping) setImmediate(() => server.closeIdleConnections());
  });
  if (!METHODS.has(request.method ?? "")) {
    answer(response, 405, "method", "This method is not known here.");
    return;
  }
  if (!isReadable(request)) {
    answer(response, 400, "bad-address", "This address cannot be read.");
    return;
  }
  if (bodyRefused(request, response)) return;
  if (request.headers.expect) response.writeContinue();
  if (path === "/healthz") {
    health(response).catch(() => answer(response, 503, "unhealthy", "Not well."));
    return;
  }
  if (request.method === "GET" || request.method === "HEAD") {
    files(request, response, () => {
      if (path.startsWith("/assets/")) noSuchFile(response);
      else routes(request, response, requestId);
    });
    return;
  }
  routes(request, response, requestId);
}

const server = createServer(serve);
// Whoever asks first is refused before they send.
server.on("checkContinue", serve);

let stopping = false;
/** Stops accepting, lets what runs end, then closes the database. */
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  setTimeout(() => process.exit(1), STOP_WITHIN_MS).unref();
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  const timer = setTimeout(() => server.closeAllConnections(), REQUESTS_WITHIN_MS);
  await closed;
  clearTimeout(timer);
  await app.stop();
  process.exit(0);
}
process.on("SIGTERM", stop);
process.on("SIGINT", stop);

server.listen(port, host, () => {
  app.log.info({ port }, "listening");
});
