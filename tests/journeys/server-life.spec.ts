import { type APIRequestContext, expect, type Page, test } from "@playwright/test";
import type { Sheet } from "../../app/trade/sheet/check";
import { allChecks } from "../../app/trade/sheet/due-checks";
import { goodAnswers } from "../../fixtures/good-answers";
import { OwnServer } from "./own-server";
import { newCode } from "./people";
import { Wire } from "./wire";

const HOST = "tallowcreek.example";

let server: OwnServer;

test.beforeEach(async () => {
  server = await OwnServer.start();
});

test.afterEach(async () => {
  await server.end();
});

const statusOf = async (path: string) => (await fetch(`${server.origin}${path}`)).status;

/** Signs in by the code in the mail, without a page: answers with the code and what the server set. */
async function signInHere(request: APIRequestContext, email: string) {
  const { origin } = server;
  const post = (form: Record<string, string>) =>
    request.post(`${origin}/sign-in`, { form, headers: { Origin: origin }, maxRedirects: 0 });
  const code = await newCode(email, async () => {
    expect((await post({ step: "send", email })).status()).toBe(302);
  });
  const answer = await post({ step: "code", code });
  expect(answer.status()).toBe(302);
  const lines = answer.headersArray().filter(({ name }) => name.toLowerCase() === "set-cookie");
  return { code, cookies: lines.map(({ value }) => value) };
}

test("healthz says what is away, and that it is back", async () => {
  const health = async () => {
    const answer = await fetch(`${server.origin}/healthz`);
    expect(answer.headers.get("cache-control")).toBe("no-store");
    return [answer.status, ((await answer.json()) as { checks: object }).checks];
  };
  const well = [200, { database: true, storage: true }];
  expect(await health()).toEqual(well);
  await server.database.cut();
  expect(await health()).toEqual([503, { database: false, storage: true }]);
  await server.database.join();
  expect(await health()).toEqual(well);
  await server.store.cut();
  expect(await health()).toEqual([503, { database: true, storage: false }]);
  await server.store.join();
  expect(await health()).toEqual(well);
});

test("signing in sets the session and clears the browser's mark, both out of reach of scripts", async ({
  request,
}) => {
  const { cookies } = await signInHere(request, `otto.brandvold@${HOST}`);
  expect(cookies).toHaveLength(2);
  const [session = "", mark = ""] = cookies;
  expect(session).toMatch(/^keypeg=[^;]{20,}; Max-Age=15552000;/);
  expect(mark).toMatch(/^keypeg-browser=[^;]*; Max-Age=0;/);
  for (const cookie of cookies) {
    expect(cookie).toMatch(/; Path=\/(;|$)/);
    expect(cookie).toMatch(/; HttpOnly(;|$)/);
    expect(cookie).toMatch(/; SameSite=Lax(;|$)/);
  }
});

interface RouterWindow {
  __reactRouterDataRouter: { state: { loaderData: Record<string, unknown> } };
}

interface WalkPageData {
  sheet: Sheet;
  due: string[];
  sheetHash: string;
  walkId: string;
  truck: { id: string };
}

/** What the walk's page has to work with, once its scripts run. */
async function walkPageData(page: Page): Promise<WalkPageData> {
  await page.waitForFunction(() => "__reactRouterDataRouter" in window);
  return page.evaluate(() => {
    const { state } = (window as unknown as RouterWindow).__reactRouterDataRouter;
    return state.loaderData["routes/walk/walk"] as WalkPageData;
  });
}

test("while a person signs in and a walk is posted, the log has no word about them", async ({
  page,
}) => {
  const email = `ines.calder@${HOST}`;
  const { code, cookies } = await signInHere(page.request, email);
  await page.goto(`${server.origin}/walk/T-112?kind=before&note=Secretnote`);
  const { sheet, due, sheetHash, walkId, truck } = await walkPageData(page);
  const signature = { name: "Ines Calder", wording: "walk" };
  const checks = allChecks(sheet).filter(({ key }) => due.includes(key));
  const answer = await page.request.post(`${server.origin}/api/v1/walks?name=Ines`, {
    headers: { Origin: server.origin, "Keypeg-Age": "1000" },
    data: {
      id: walkId,
      truckId: truck.id,
      kind: "before",
      sheetHash,
      signedAt: new Date().toISOString(),
      answers: goodAnswers(checks),
      signature,
    },
  });
  expect(await answer.text()).toContain(walkId);
  expect(answer.headers()["keypeg-receipt"]).toBe(walkId);
  await expect.poll(() => server.output).toMatch(/"path":"\/api\/v1\/walks","status":200/);
  expect(server.output).toMatch(/"path":"\/sign-in","status":302/);
  const token = cookies[0]?.match(/^keypeg=([^;]+)/)?.[1] ?? "";
  expect(token).not.toBe("");
  for (const personal of [email, "@", "Ines", "Calder", token, code, "Secretnote", "kind=", "?"]) {
    expect(server.output).not.toContain(personal);
  }
});

test("without its database a page says so plainly, with an id that the log has too", async ({
  page,
}) => {
  await signInHere(page.request, `desmond.achterberg@${HOST}`);
  await server.database.cut();
  const id = "edge-test.0001";
  const board = await page.request.get(`${server.origin}/board`, {
    headers: { "X-Request-Id": id },
  });
  expect(board.headers()["content-type"]).toContain("text/html");
  expect(board.headers()["content-security-policy"]).toContain("'nonce-");
  const posted = await page.request.post(`${server.origin}/sign-in`, {
    form: { step: "send", email: `amos.delacroix@${HOST}` },
    headers: { Origin: server.origin, "X-Request-Id": id },
  });
  const data = await page.request.get(`${server.origin}/board.data`, {
    headers: { "X-Request-Id": id },
  });
  const api = await page.request.post(`${server.origin}/api/v1/walks`, {
    data: {},
    headers: { Origin: server.origin, "X-Request-Id": id },
  });
  for (const answer of [board, posted, data, api]) {
    expect(answer.status(), answer.url()).toBe(500);
    expect(answer.headers()["x-request-id"]).toBe(id);
    const text = await answer.text();
    expect(text).not.toMatch(/ECONN|PROTOCOL_|node_modules|build-test|select |\n\s+at |\.js:\d+/i);
  }
  expect(await board.text()).toContain("Something went wrong here");
  await expect.poll(() => server.output).toContain(`"level":"error","requestId":"${id}"`);
  expect(server.output).not.toMatch(/amos|delacroix|@/i);
  await server.database.join();
  expect((await page.request.get(`${server.origin}/board`)).status()).toBe(200);
});

const FORM = "step=send&email=";

/** A form of which the server has the headers and is waiting for the rest. */
async function halfSent(): Promise<Wire> {
  const wire = await Wire.open(server.origin);
  wire.send(
    "POST /sign-in HTTP/1.1",
    "Host: 127.0.0.1",
    `Origin: ${server.origin}`,
    "Content-Type: application/x-www-form-urlencoded",
    `Content-Length: ${FORM.length}`,
    "Expect: 100-continue",
  );
  await expect.poll(() => wire.received).toMatch(/^HTTP\/1\.1 100/);
  wire.socket.write(FORM.slice(0, 5));
  return wire;
}

test("after SIGTERM a slow request is finished, idle connections are closed, and a second signal does no harm", async () => {
  const idle = await Wire.open(server.origin);
  idle.send("GET /safety HTTP/1.1", "Host: 127.0.0.1", "Connection: keep-alive");
  await expect.poll(() => idle.received).toMatch(/^HTTP\/1\.1 200[\s\S]*<\/html>/);
  expect(idle.closed).toBe(false);
  const slow = await halfSent();
  const started = Date.now();
  server.process.kill("SIGTERM");
  await expect.poll(() => idle.closed).toBe(true);
  await expect.poll(() => statusOf("/healthz").catch(() => "refused")).toBe("refused");
  server.process.kill("SIGTERM");
  slow.socket.write(FORM.slice(5));
  await expect.poll(() => slow.received).toMatch(/HTTP\/1\.1 400[\s\S]*<\/html>/);
  expect(await server.exitCode()).toBe(0);
  expect(Date.now() - started).toBeLessThan(5_000);
});

test("a request that never ends holds a stop up for less than ten seconds", async () => {
  const never = await halfSent();
  const started = Date.now();
  server.process.kill("SIGTERM");
  expect(await server.exitCode()).toBe(0);
  expect(Date.now() - started).toBeLessThan(10_000);
  await expect.poll(() => never.closed).toBe(true);
});

test("a server whose database is away still stops on SIGTERM", async () => {
  expect(await statusOf("/healthz")).toBe(200);
  await server.database.cut();
  expect(await statusOf("/healthz")).toBe(503);
  const started = Date.now();
  server.process.kill("SIGTERM");
  expect(await server.exitCode()).toBe(0);
  expect(Date.now() - started).toBeLessThan(10_000);
});
