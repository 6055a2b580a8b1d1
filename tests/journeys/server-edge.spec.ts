import { readdirSync } from "node:fs";
import { type IncomingMessage, request as send } from "node:http";
import { expect, test } from "@playwright/test";
import { OwnServer } from "./own-server";
import { signIn } from "./people";
import { Wire } from "./wire";

const ORIGIN = process.env.KEYPEG_ORIGIN ?? "";
const FIFTY_MB = 50 * 1024 * 1024;
const YEAR = "public, max-age=31536000, immutable";
const SENDERS = [
  ["POST", "/sign-in"],
  ["POST", "/office/yards/new"],
  ["POST", "/api/v1/walks"],
  ["PUT", "/api/v1/photos/018f5a3e-0000-7000-8000-000000000001"],
] as const;

interface Got {
  status: number;
  headers: IncomingMessage["headers"];
  bytes: Buffer;
}

/** A request whose path and headers go out just as written. */
function get(path: string, headers: Record<string, string> = {}): Promise<Got> {
  const { hostname, port } = new URL(ORIGIN);
  return new Promise((resolve, reject) => {
    const request = send({ hostname, port, path, headers, agent: false }, (answer) => {
      const parts: Buffer[] = [];
      answer.on("data", (part: Buffer) => parts.push(part));
      answer.on("end", () =>
        resolve({
          status: answer.statusCode ?? 0,
          headers: answer.headers,
          bytes: Buffer.concat(parts),
        }),
      );
    });
    request.on("error", reject);
    request.end();
  });
}

function asset(ending: string): string {
  const names = readdirSync("build-test/client/assets");
  const name = names.find((one) => one.endsWith(ending) && names.includes(`${one}.br`));
  if (!name) throw new Error(`no ${ending} in the build`);
  return `/assets/${name}`;
}

for (const [ending, type] of [
  [".js", "text/javascript"],
  [".css", "text/css"],
] as const) {
  for (const encoding of ["br", "gzip", undefined]) {
    test(`a ${ending} asset is kept for a year and comes in ${encoding ?? "plain"}`, async () => {
      const headers = encoding ? { "Accept-Encoding": encoding } : {};
      const answer = await get(asset(ending), headers as Record<string, string>);
      expect(answer.status).toBe(200);
      expect(answer.headers["content-encoding"]).toBe(encoding);
      expect(answer.headers["content-type"]).toContain(type);
      expect(answer.headers["cache-control"]).toBe(YEAR);
      expect(answer.headers.vary).toMatch(/accept-encoding/i);
      expect(answer.headers["x-content-type-options"]).toBe("nosniff");
      expect(answer.bytes.length).toBe(Number(answer.headers["content-length"]));
    });
  }
}

test("an asset the reader has already is not sent again", async () => {
  const path = asset(".js");
  const { headers } = await get(path);
  const again = await get(path, { "If-None-Match": String(headers.etag) });
  expect(again.status).toBe(304);
  expect(again.bytes.length).toBe(0);
});

test("no page, no page's data and no answer of the API may be kept by a shared cache", async ({
  browser,
}) => {
  const manager = await signIn(browser, "maren.tull@tallowcreek.example");
  const paths = [
    "/",
    "/safety",
    "/sign-in",
    "/office/trucks",
    "/office/trucks.data",
    "/api/v1/walks",
  ];
  for (const path of paths) {
    const answer = await manager.request.get(path);
    expect(answer.headers()["cache-control"], path).toMatch(/no-store|no-cache/);
    expect(answer.headers()["cache-control"], path).not.toMatch(/public/);
    expect(answer.headers()["x-content-type-options"], path).toBe("nosniff");
  }
});

for (const path of [
  "/assets/../server.mjs",
  "/assets/../../server.mjs",
  "/assets/%2e%2e/server.mjs",
  "/assets/%2e%2e/%2e%2e/package.json",
  "/assets/..%2f..%2fserver.mjs",
  "/assets/..%5c..%5cserver.mjs",
  "/../server/index.js",
  "/..%2fscript-hashes.json",
  "//server.mjs",
  "/%00",
  "/%",
  "/assets/no-such-file.js",
  "/server.mjs",
  "/.env",
]) {
  test(`${path} is not there, and nothing of the server's own files comes out`, async () => {
    const answer = await get(path);
    expect([400, 404]).toContain(answer.status);
    expect(answer.headers["cache-control"] ?? "").not.toContain("immutable");
    const text = answer.bytes.toString();
    expect(text).not.toMatch(/createServer|createRequestListener|"dependencies"|sha256-/);
    expect(text).not.toMatch(/node_modules|\n\s+at /);
  });
}

test("each answer has an id: the caller's if it is well formed, one of ours if not", async () => {
  const ids = new Set<string>();
  for (const path of ["/", "/safety", "/healthz", asset(".js"), "/no-such-page", "/api/v1/walks"]) {
    ids.add(String((await get(path)).headers["x-request-id"]));
    const echoed = await get(path, { "X-Request-Id": "edge-01.7f3a_92" });
    expect(echoed.headers["x-request-id"], path).toBe("edge-01.7f3a_92");
  }
  expect(ids.size).toBe(6);
  for (const malformed of [
    "short",
    "x".repeat(65),
    "two words here",
    '{"level":"error"}',
    "<b>bold</b>",
  ]) {
    const answer = await get("/", { "X-Request-Id": malformed });
    expect(answer.headers["x-request-id"]).toMatch(/^[0-9a-f-]{36}$/);
  }
});

for (const [method, path] of SENDERS) {
  test(`50 MB for ${method} ${path} is refused by the length said, before a byte of it`, async () => {
    const wire = await Wire.open(ORIGIN);
    const head = [`${method} ${path} HTTP/1.1`, "Host: 127.0.0.1", `Origin: ${ORIGIN}`];
    wire.send(...head, `Content-Length: ${FIFTY_MB}`);
    await expect.poll(() => wire.status).toBe(413);
    expect(wire.received).toMatch(/application\/problem\+json/i);
    wire.socket.destroy();

    const asking = await Wire.open(ORIGIN);
    asking.send(...head, `Content-Length: ${FIFTY_MB}`, "Expect: 100-continue");
    await expect.poll(() => asking.received).toMatch(/^HTTP\/1\.1 413/);
    asking.socket.destroy();
  });

  test(`a sender of 50 MB to ${method} ${path} reads why it was refused`, async ({ request }) => {
    const answer = await request.fetch(path, {
      method,
      headers: { Origin: ORIGIN, "Content-Type": "application/octet-stream" },
      data: Buffer.alloc(FIFTY_MB),
    });
    expect(answer.status()).toBe(413);
    expect(((await answer.json()) as { code: string }).code).toBe("too-large");
  });

  test(`${method} ${path} wants to know the length of a body first`, async () => {
    const wire = await Wire.open(ORIGIN);
    wire.send(
      `${method} ${path} HTTP/1.1`,
      "Host: 127.0.0.1",
      `Origin: ${ORIGIN}`,
      "Transfer-Encoding: chunked",
    );
    await expect.poll(() => wire.status).toBe(411);
    wire.socket.destroy();
  });
}

test("a refused body that never ends is cut off", async () => {
  const wire = await Wire.open(ORIGIN);
  wire.send("POST /sign-in HTTP/1.1", "Host: 127.0.0.1", `Content-Length: ${FIFTY_MB}`);
  await expect.poll(() => wire.status).toBe(413);
  await expect.poll(() => wire.closed).toBe(true);
});

test("a body within the limit still comes in after 100-continue", async () => {
  const wire = await Wire.open(ORIGIN);
  const form = "step=send&email=";
  wire.send(
    "POST /sign-in HTTP/1.1",
    "Host: 127.0.0.1",
    `Origin: ${ORIGIN}`,
    "Content-Type: application/x-www-form-urlencoded",
    `Content-Length: ${form.length}`,
    "Expect: 100-continue",
  );
  await expect.poll(() => wire.received).toMatch(/^HTTP\/1\.1 100/);
  wire.socket.write(form);
  await expect.poll(() => wire.received).toMatch(/HTTP\/1\.1 400/);
  wire.socket.destroy();
});

test("a request nobody can read is answered, and the server lives on", async () => {
  const server = await OwnServer.start();
  try {
    for (const [first, host, status] of [
      ["GET / HTTP/1.1", "a[b", 400],
      ["GET / HTTP/1.1", "127.0.0.1:port", 400],
      ["GET http://[ HTTP/1.1", "127.0.0.1", 400],
      ["TRACE / HTTP/1.1", "127.0.0.1", 405],
      ["PROPFIND / HTTP/1.1", "127.0.0.1", 405],
    ] as const) {
      const wire = await Wire.open(server.origin);
      wire.send(first, `Host: ${host}`);
      await expect.poll(() => wire.status, { message: `${first}, ${host}` }).toBe(status);
      wire.socket.destroy();
    }
    expect((await fetch(`${server.origin}/healthz`)).status).toBe(200);
  } finally {
    await server.end();
  }
});

function policyOf(header: unknown): Map<string, string> {
  const parts = String(header).split("; ");
  return new Map(
    parts.map((part) => [part.split(" ")[0] ?? "", part.split(" ").slice(1).join(" ")]),
  );
}

const inlineScripts = (html: string) =>
  [...html.matchAll(/<script(?![^>]*\ssrc=)([^>]*)>([\s\S]*?)<\/script>/g)].map(
    ([, attributes = "", code = ""]) => ({ attributes, code }),
  );

test("a page's scripts run by a nonce that no other answer has", async () => {
  const nonces = new Set<string>();
  for (const path of ["/sign-in", "/sign-in", "/no-such-page"]) {
    const answer = await get(path);
    const policy = policyOf(answer.headers["content-security-policy"]);
    const nonce = policy.get("script-src")?.match(/^'self' 'nonce-([\w+/=]{22,})'$/)?.[1] ?? "";
    expect(nonce, path).not.toBe("");
    nonces.add(nonce);
    const scripts = inlineScripts(answer.bytes.toString());
    expect(scripts.length, path).toBeGreaterThan(1);
    for (const { attributes } of scripts) expect(attributes).toContain(`nonce="${nonce}"`);
    expect(policy.get("default-src")).toBe("'self'");
    expect(policy.get("frame-ancestors")).toBe("'none'");
    expect(policy.get("object-src")).toBe("'none'");
    expect(policy.get("base-uri")).toBe("'none'");
    expect(answer.headers["x-content-type-options"]).toBe("nosniff");
    expect(answer.headers["referrer-policy"]).toBe("same-origin");
  }
  expect(nonces.size).toBe(3);
});

test("the page made at build time names each of its inline scripts by hash", async () => {
  const { createHash } = await import("node:crypto");
  for (const path of ["/safety", "/safety/"]) {
    const answer = await get(path);
    expect(answer.status, path).toBe(200);
    const policy = policyOf(answer.headers["content-security-policy"]);
    const allowed = policy.get("script-src") ?? "";
    expect(allowed).not.toMatch(/unsafe|nonce/);
    const scripts = inlineScripts(answer.bytes.toString());
    expect(scripts.length).toBeGreaterThan(0);
    for (const { code } of scripts) {
      const hash = createHash("sha256").update(code).digest("base64");
      expect(allowed).toContain(`'sha256-${hash}'`);
    }
    expect(policy.get("frame-ancestors")).toBe("'none'");
    expect(answer.headers["referrer-policy"]).toBe("same-origin");
  }
});

test("an asset that is not there is said so without making a page", async () => {
  const answer = await get("/assets/no-such-file.js");
  expect([answer.status, answer.bytes.toString()]).toEqual([404, "Not found"]);
  expect(answer.headers["content-type"]).toBe("text/plain");
});

for (const path of [
  "/sign-in",
  "/sign-in.data",
  "/nowhere",
  "/account",
  "/api/v1/walks",
  "/healthz",
  "/safety",
  "/assets/no-such-file.js",
  "//",
]) {
  test(`what ${path} answers is kept in its place by its headers, each sent once`, async () => {
    const { headers } = await get(path);
    const policy = String(headers["content-security-policy"]);
    for (const part of ["default-src 'self'", "frame-ancestors 'none'", "object-src 'none'"]) {
      expect(policy.split(part), part).toHaveLength(2);
    }
    expect(headers["x-content-type-options"]).toBe("nosniff");
    expect(headers["referrer-policy"]).toBe("same-origin");
    expect(headers["permissions-policy"]).toContain("geolocation=()");
    expect(headers["x-powered-by"]).toBeUndefined();
  });
}
