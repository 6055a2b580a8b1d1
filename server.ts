import { randomUUID } from "node:crypto";
import { readFileSync } from "node:fs";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import { createRequestListener } from "@react-router/node";
import type { RouterContextProvider, ServerBuild } from "react-router";
import sirv from "sirv";

/** What the built app hands to this server: one copy of each of its modules, one pool. */
interface AppEntry {
  start(): Promise<void>;
  health(): Promise<{ ok: boolean; checks: Record<string, boolean> }>;
  stop(): Promise<void>;
  loadContext(client: { address: string; requestId: string }): RouterContextProvider;
  pagePolicy(scriptSources: readonly string[]): Record<string, string>;
  loggedPath(path: string): string;
  log: Record<"info" | "error", (detail: object, message: string) => void>;
}

const MEGABYTE = 1024 * 1024;
const STOP_WITHIN_MS = 10_000;
const here = new URL(".", import.meta.url);
const build: ServerBuild = await import(new URL("./server/index.js", here).href);
const app = build.entry.module as unknown as AppEntry;
const scriptHashes: Record<string, string[]> = JSON.parse(
  readFileSync(new URL("script-hashes.json", here), "utf8"),
);

await app.start();

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
    for (const [name, value] of Object.entries(app.pagePolicy(page ?? []))) {
      response.setHeader(name, value);
    }
  },
});

const routes = createRequestListener({
  build,
  mode: "production",
  getLoadContext: (request, client) =>
    app.loadContext({
      address: clientAddress(client.address, request.headers.get("x-forwarded-for")),
      requestId: request.headers.get("x-request-id") ?? randomUUID(),
    }) as never,
});

/** The nearest address that is not a proxy of ours; proxies are named in the environment. */
function clientAddress(socket: string, forwarded: string | null): string {
  const trusted = new Set((process.env.KEYPEG_TRUSTED_PROXIES ?? "").split(",").filter(Boolean));
  let address = socket;
  const hops = forwarded?.split(",").map((hop) => hop.trim()) ?? [];
  while (trusted.has(address) && hops.length > 0) address = hops.pop() ?? address;
  return address;
}

function answer(response: ServerResponse, status: number, code: string, title: string): void {
  response.writeHead(status, {
    "Content-Type": "application/problem+json",
    "Cache-Control": "no-store",
    Connection: "close",
  });
  response.end(JSON.stringify({ type: `urn:keypeg:problem:${code}`, status, code, title }));
}

/** Refuses a body before a byte of it is read: too long, or of a length not said. */
function bodyRefused(request: IncomingMessage, response: ServerResponse): boolean {
  if (request.method === "GET" || request.method === "HEAD") return false;
  const said = request.headers["content-length"];
  if (said === undefined && request.headers["transfer-encoding"] !== undefined) {
    answer(response, 411, "length-required", "Say how long the body is.");
    return true;
  }
  const photo = request.method === "PUT" && request.url?.startsWith("/api/v1/photos/");
  if (Number(said ?? 0) <= (photo ? 12 : 1) * MEGABYTE) return false;
  answer(response, 413, "too-large", "This is too large to take.");
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
      response.appendHeader(pairs[n] ?? "", pairs[n + 1] ?? "");
    }
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

const server = createServer((request, response) => {
  const started = performance.now();
  const requestId = randomUUID();
  const path = (request.url ?? "/").split("?")[0] ?? "/";
  request.headers["x-request-id"] = requestId;
  response.setHeader("X-Request-Id", requestId);
  response.on("close", () => {
    const ms = Math.round(performance.now() - started);
    const entry = { requestId, method: request.method, path: app.loggedPath(path) };
    app.log.info({ ...entry, status: response.statusCode, ms }, "request");
  });
  if (bodyRefused(request, response)) return;
  if (path === "/healthz") {
    health(response).catch(() => answer(response, 503, "unhealthy", "Not well."));
    return;
  }
  if (request.method === "GET" || request.method === "HEAD") {
    files(request, response, () => routes(request, keepingRepeated(response)));
    return;
  }
  routes(request, keepingRepeated(response));
});

let stopping = false;
/** Stops accepting, lets what runs end, then closes the database. */
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  const timer = setTimeout(() => server.closeAllConnections(), STOP_WITHIN_MS);
  await closed;
  clearTimeout(timer);
  await app.stop();
  process.exit(0);
}
process.on("SIGTERM", stop);
process.on("SIGINT", stop);

const port = Number(process.env.PORT ?? 4180);
server.listen(port, process.env.HOST ?? "127.0.0.1", () => {
  app.log.info({ port }, "listening");
});
