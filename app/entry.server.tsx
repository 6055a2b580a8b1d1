import { randomBytes } from "node:crypto";
import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { isbot } from "isbot";
import { renderToPipeableStream } from "react-dom/server";
import { type EntryContext, type RouterContextProvider, ServerRouter } from "react-router";
import { clientOf } from "./context";
import { contentPolicy } from "./http/content-policy";
import { loggedPath } from "./http/logged-path";
import { NonceContext } from "./ui/nonce";

export { pagePolicy } from "./http/content-policy";
export { loggedPath } from "./http/logged-path";
export { health, loadContext, start, stop } from "./lifecycle";
export { serverLog as log } from "./services/server-log";

export const streamTimeout = 5_000;

export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  _loadContext: RouterContextProvider,
): Promise<Response> | Response {
  const nonce = randomBytes(16).toString("base64");
  for (const [name, value] of Object.entries(contentPolicy([`'nonce-${nonce}'`]))) {
    headers.set(name, value);
  }
  if (request.method === "HEAD") return new Response(null, { status, headers });
  return new Promise((resolve, reject) => {
    let rendered = false;
    let code = status;
    const bot = isbot(request.headers.get("user-agent") ?? "");
    const ready = bot || routerContext.isSpaMode ? "onAllReady" : "onShellReady";
    const { pipe, abort } = renderToPipeableStream(
      <NonceContext value={nonce}>
        <ServerRouter context={routerContext} url={request.url} nonce={nonce} />
      </NonceContext>,
      {
        nonce,
        [ready]() {
          rendered = true;
          const body = new PassThrough();
          headers.set("Content-Type", "text/html; charset=utf-8");
          pipe(body);
          resolve(new Response(createReadableStreamFromReadable(body), { headers, status: code }));
        },
        onShellError: reject,
        onError(error: unknown) {
          code = 500;
          // Before the shell the framework reports it; after, nobody else would.
          if (rendered) console.error(JSON.stringify({ level: "error", error: wordless(error) }));
        },
      },
    );
    setTimeout(abort, streamTimeout + 1_000).unref();
  });
}

/** Errors of loaders, actions and rendering, without the address's query or anything typed. */
export function handleError(
  error: unknown,
  { request, context }: { request: Request; context: Readonly<RouterContextProvider> },
): void {
  if (request.signal.aborted) return;
  const path = loggedPath(new URL(request.url).pathname);
  const { requestId } = clientOf(context);
  console.error(JSON.stringify({ level: "error", requestId, path, error: wordless(error) }));
}

function wordless(error: unknown): string {
  if (!(error instanceof Error)) return "not an Error";
  // A database error's message carries its parameters, which may be personal.
  const where = error.stack?.split("\n").find((line) => line.trim().startsWith("at ")) ?? "";
  const cause = error.cause instanceof Error ? error.cause : null;
  const errno = cause && "errno" in cause ? ` errno ${String(cause.errno)}` : "";
  return `${error.name}${errno} ${where.trim()}`;
}
