import { desc, eq } from "drizzle-orm";
import { data } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { expect, test } from "vitest";
import { BROWSER_COOKIE, cookieFor, SESSION_COOKIE } from "~/auth/cookies";
import { requirePermission } from "~/auth/require-permission";
import { config } from "~/config";
import { mailOutbox, memberships, people, sessions } from "~/db/schema/people";
import type { Role } from "~/domain/actor";
import { invitePerson } from "~/domain/people/invite-person";
import { makeToken } from "~/domain/tokens";
import { loggedPath } from "~/http/logged-path";
import * as invitation from "~/routes/auth/invitation";
import * as signIn from "~/routes/auth/sign-in";
import * as signOut from "~/routes/auth/sign-out";
import { testDb } from "./database";
import { makeCarrier, makePerson, TestClock } from "./factories";
import { type Answer, TestBrowser, type TestRoute } from "./requests";

let serial = 0;
/** A browser at an address of its own, so that one test's codes do not use up another's. */
function openBrowser(): TestBrowser {
  serial += 1;
  return new TestBrowser(`198.51.100.${serial}`);
}

async function makeReader(roles: Role[] = ["driver"]) {
  const carrier = await makeCarrier(testDb(), new TestClock());
  const person = await makePerson(testDb(), carrier, roles);
  const [row] = await testDb().select().from(people).where(eq(people.id, person.personId));
  return { carrier, person, email: row!.email };
}

/** What the newest mail to an address carries. */
async function propsFor<T>(email: string): Promise<T> {
  const [mail] = await testDb()
    .select()
    .from(mailOutbox)
    .where(eq(mailOutbox.recipient, email))
    .orderBy(desc(mailOutbox.id));
  return mail!.props as T;
}

async function codeFor(email: string): Promise<string> {
  return (await propsFor<{ code: string }>(email)).code;
}

const ask = (browser: TestBrowser, email: string, path = "/sign-in") =>
  browser.send(signIn, path, { form: { step: "send", email } });
const type = (browser: TestBrowser, code: string, path = "/sign-in") =>
  browser.send(signIn, path, { form: { step: "code", code } });

async function signedInBrowser(roles: Role[] = ["driver"]) {
  const reader = await makeReader(roles);
  const browser = openBrowser();
  await ask(browser, reader.email);
  const answer = await type(browser, await codeFor(reader.email));
  return { ...reader, browser, answer };
}

/** What a form shows at its fields, and what it keeps of what was typed. */
function replyOf(answer: Answer) {
  const { result } = answer.data as {
    result: { error?: Record<string, string[]>; initialValue?: Record<string, string> };
  };
  return { error: result.error ?? {}, kept: result.initialValue ?? {} };
}

const guarded: TestRoute = {
  loader: ({ context }: { context: Parameters<typeof requirePermission>[0] }) =>
    requirePermission(context, "people.manage").personId,
};

test("a person signs in: address, code, first place of their role", async () => {
  const { email } = await makeReader(["mechanic"]);
  const browser = openBrowser();
  expect((await browser.send(signIn, "/sign-in")).data).toMatchObject({ step: "address" });
  const sent = await ask(browser, `  ${email.toUpperCase()} `);
  expect([sent.status, sent.headers.get("Location")]).toEqual([302, "/sign-in"]);
  expect((await browser.send(signIn, "/sign-in")).data).toMatchObject({ step: "code", email });
  const code = await codeFor(email);
  const done = await type(browser, ` ${code.slice(0, 3)} ${code.slice(3)} `);
  expect([done.status, done.headers.get("Location")]).toEqual([302, "/bench"]);
  expect([...browser.cookies.keys()]).toEqual(["keypeg"]);
});

test("each role starts at its own place, and a wanted page of this site comes first", async () => {
  const places: [Role[], string][] = [
    [["driver", "manager"], "/walk"],
    [["dispatcher"], "/board"],
    [["manager"], "/office"],
  ];
  for (const [roles, place] of places) {
    const { answer } = await signedInBrowser(roles);
    expect(answer.headers.get("Location")).toBe(place);
  }
  const { email } = await makeReader();
  const browser = openBrowser();
  const wanted = "/sign-in?next=%2Fwalk%2FT-118";
  const sent = await ask(browser, email, wanted);
  expect(sent.headers.get("Location")).toBe(wanted);
  const done = await type(browser, await codeFor(email), wanted);
  expect(done.headers.get("Location")).toBe("/walk/T-118");
});

test("a way out to another site is not taken", async () => {
  const { email } = await makeReader();
  const browser = openBrowser();
  await ask(browser, email);
  const done = await type(browser, await codeFor(email), "/sign-in?next=//evil.example/");
  expect(done.headers.get("Location")).toBe("/walk");
});

test("known and unknown addresses get the same answers", async () => {
  const { email } = await makeReader();
  const [known, unknown] = [openBrowser(), openBrowser()];
  const shape = ({ status, headers, data: body }: Answer) => {
    const names = [...headers.keys()].sort();
    return { status, names, location: headers.get("Location"), body };
  };
  const [a, b] = [await ask(known, email), await ask(unknown, "nobody@example.test")];
  expect(shape(a)).toEqual(shape(b));
  const wrong = async (browser: TestBrowser, address: string) => {
    const right = await codeFor(address);
    return replyOf(await type(browser, right === "000000" ? "000001" : "000000")).error;
  };
  expect(await wrong(known, email)).toEqual(await wrong(unknown, "nobody@example.test"));
});

test("attack: a cookie that carries another address does not change who signs in", async () => {
  const victim = await makeReader(["manager"]);
  const attacker = await makeReader(["driver"]);
  const browser = openBrowser();
  await ask(browser, attacker.email);
  const code = await codeFor(attacker.email);
  browser.cookies.set("_totp", encodeURIComponent(`email=${victim.email}&totp={"jwe":"x"}`));
  browser.cookies.set("email", victim.email);
  const done = await browser.send(signIn, "/sign-in", {
    form: { step: "code", code, email: victim.email },
  });
  expect(done.headers.get("Location")).toBe("/walk");
  const made = async (personId: string) =>
    (await testDb().select().from(sessions).where(eq(sessions.personId, personId))).length;
  expect(await made(victim.person.personId)).toBe(0);
  expect(await made(attacker.person.personId)).toBe(1);
});

test("attack: a forged browser cookie finds no code, and another browser's code does not fit", async () => {
  const victim = await makeReader();
  const [browser, thief] = [openBrowser(), openBrowser()];
  await ask(browser, victim.email);
  const code = await codeFor(victim.email);
  thief.cookies.set("keypeg-browser", Buffer.from(JSON.stringify(makeToken())).toString("base64"));
  expect(replyOf(await type(thief, code)).error.code?.[0]).toContain("No code was asked for");
  thief.cookies.set("keypeg-browser", "not a token; at=all");
  expect((await type(thief, code)).status).toBe(400);
  await ask(thief, victim.email);
  const thiefs = await codeFor(victim.email);
  if (thiefs !== code) expect((await type(thief, code)).status).toBe(400);
});

test("attack: a used code is refused, in the same browser and with its cookie put back", async () => {
  const { email } = await makeReader();
  const browser = openBrowser();
  await ask(browser, email);
  const kept = browser.cookies.get("keypeg-browser")!;
  const code = await codeFor(email);
  await type(browser, code);
  browser.cookies.delete("keypeg");
  expect((await type(browser, code)).status).toBe(400);
  browser.cookies.set("keypeg-browser", kept);
  const again = await type(browser, code);
  expect(replyOf(again).error.code?.[0]).toContain("was used");
  expect(browser.cookies.has("keypeg")).toBe(false);
});

test("nothing signs in by GET", async () => {
  const { email } = await makeReader();
  const browser = openBrowser();
  await ask(browser, email);
  const code = await codeFor(email);
  const read = await browser.send(signIn, `/sign-in?step=code&code=${code}&t=${code}`);
  expect(read.data).toMatchObject({ step: "code" });
  expect(browser.cookies.has("keypeg")).toBe(false);
});

test("a bad address and a bad code are named at their field, and what was typed is kept", async () => {
  const browser = openBrowser();
  const address = await ask(browser, "lou at home");
  expect(address.status).toBe(400);
  expect(replyOf(address)).toEqual({
    error: { email: ["email-form"] },
    kept: { step: "send", email: "lou at home" },
  });
  for (const code of ["", "12345", "12345x", "1234567"]) {
    const answer = await type(browser, code);
    expect(answer.status).toBe(400);
    expect(replyOf(answer).error).toEqual({ code: ["code-form"] });
  }
  expect((await browser.send(signIn, "/sign-in", { form: { step: "nonsense" } })).status).toBe(400);
});

test("the sixth code of an hour is refused with the minutes to wait", async () => {
  const browser = openBrowser();
  for (let n = 0; n < 5; n += 1) expect((await ask(browser, "six@example.test")).status).toBe(302);
  const sixth = await ask(browser, "six@example.test");
  expect(sixth.status).toBe(429);
  expect(replyOf(sixth).error.email?.[0]).toMatch(/wait \d+ minutes/);
});

test("a new code is sent to the address of the browser's own row", async () => {
  const { email } = await makeReader();
  const browser = openBrowser();
  await ask(browser, email);
  const first = await codeFor(email);
  const again = await browser.send(signIn, "/sign-in", {
    form: { step: "again", email: "other@example.test" },
  });
  expect(again.status).toBe(302);
  const second = await codeFor(email);
  if (second !== first) expect((await type(browser, first)).status).toBe(400);
  expect((await type(browser, second)).headers.get("Location")).toBe("/walk");
});

test("somebody signed in is led on from the sign-in page", async () => {
  const { browser } = await signedInBrowser(["dispatcher"]);
  const answer = await browser.send(signIn, "/sign-in");
  expect(answer.headers.get("Location")).toBe("/board");
});

test("signing out ends the session in the table, so that a copied cookie ends too", async () => {
  const { browser } = await signedInBrowser(["manager"]);
  const copied = new Map(browser.cookies);
  expect((await browser.send(guarded, "/office/people")).status).toBe(200);
  const out = await browser.send(signOut, "/sign-out", { form: {} });
  expect([out.status, out.headers.get("Location")]).toEqual([302, "/sign-in"]);
  for (const [name, value] of copied) browser.cookies.set(name, value);
  expect((await browser.send(guarded, "/office/people")).status).toBe(302);
});

test("signed out: a page leads to sign-in and back, the API answers 401", async () => {
  const browser = openBrowser();
  const page = await browser.send(guarded, "/office/people?show=all");
  expect(page.headers.get("Location")).toBe("/sign-in?next=%2Foffice%2Fpeople%3Fshow%3Dall");
  const api = await browser.send(guarded, "/api/v1/people");
  expect(api.status).toBe(401);
  expect(api.data).toMatchObject({ code: "signed-out", status: 401 });
});

test("wrong role: 403 on a page and in the API", async () => {
  const { browser } = await signedInBrowser(["driver", "mechanic", "dispatcher"]);
  expect((await browser.send(guarded, "/office/people")).status).toBe(403);
  const api = await browser.send(guarded, "/api/v1/people");
  expect([api.status, api.data]).toMatchObject([403, { code: "not-allowed" }]);
});

test("a role taken away is gone at the next request", async () => {
  const { browser, person } = await signedInBrowser(["manager"]);
  expect((await browser.send(guarded, "/office/people")).status).toBe(200);
  await testDb()
    .update(memberships)
    .set({ roles: ["driver"] })
    .where(eq(memberships.personId, person.personId));
  expect((await browser.send(guarded, "/office/people")).status).toBe(403);
});

test("what another site's page sends is refused before anything happens", async () => {
  const { browser } = await signedInBrowser(["manager"]);
  let reached = 0;
  const act = () => {
    reached += 1;
    return data(null);
  };
  const route: TestRoute = { action: act };
  const origin = config().publicOrigin;
  const refused: HeadersInit[] = [
    {},
    { Origin: "https://evil.example" },
    { Origin: "null" },
    { Origin: `${origin}.evil.example` },
    { "Sec-Fetch-Site": "cross-site" },
    { "Sec-Fetch-Site": "same-site" },
    { Referer: origin },
  ];
  for (const headers of refused) {
    const answer = await browser.send(route, "/sign-out", { form: {}, headers });
    expect([answer.status, answer.data]).toMatchObject([403, { code: "cross-site" }]);
  }
  expect(reached).toBe(0);
  const ours: HeadersInit[] = [{ Origin: origin }, { "Sec-Fetch-Site": "same-origin" }];
  for (const headers of ours) {
    expect((await browser.send(route, "/sign-out", { form: {}, headers })).status).toBe(200);
  }
});

test("another site cannot sign anybody in either", async () => {
  const { email } = await makeReader();
  const browser = openBrowser();
  await ask(browser, email);
  const code = await codeFor(email);
  const headers = { Origin: "https://evil.example" };
  const answer = await browser.send(signIn, "/sign-in", { form: { step: "code", code }, headers });
  expect(answer.status).toBe(403);
});

test("cookies are closed to scripts and other sites, and bound to the host over TLS", async () => {
  for (const which of [SESSION_COOKIE, BROWSER_COOKIE]) {
    const line = await cookieFor(which, "https://keypeg.example").serialize(makeToken());
    expect(line).toMatch(new RegExp(`^__Host-${which.name}=`));
    for (const flag of ["Path=/", "HttpOnly", "Secure", "SameSite=Lax"])
      expect(line).toContain(flag);
    expect(line).not.toContain("Domain");
    const loopback = await cookieFor(which, "http://127.0.0.1:4180").serialize(makeToken());
    expect(loopback).toMatch(new RegExp(`^${which.name}=`));
  }
});

test("a signed-in page is not kept by shared caches", async () => {
  const { browser } = await signedInBrowser(["manager"]);
  const { headers } = await browser.send(guarded, "/office/people");
  expect(headers.get("Cache-Control")).toBe("private, no-cache");
});

test("an invitation's link shows carrier and roles; a strange one is not found", async () => {
  const params = { token: "A".repeat(43) };
  const strange = await openBrowser().send(invitation, "/invitation/x", { params });
  expect([strange.status, strange.data]).toEqual([404, { ended: "not-found" }]);
});

test("an invited person joins by POST alone and then signs in by code", async () => {
  const { person } = await makeReader(["manager"]);
  const email = `joiner-${makeToken().slice(0, 8).toLowerCase()}@example.test`;
  const input = { id: uuidv7(), email, name: "Lou Fenn", certifier: false, yardId: null };
  await invitePerson(testDb(), person, { ...input, roles: ["dispatcher", "mechanic"] });
  const { path } = await propsFor<{ path: string }>(email);
  const params = { token: path.replace("/invitation/", "") };
  const browser = openBrowser();
  const shown = await browser.send(invitation, path, { params });
  expect(shown.data).toMatchObject({ roles: ["dispatcher", "mechanic"], name: "Lou Fenn", email });
  const member = () => testDb().select().from(people).where(eq(people.email, email));
  expect(await member()).toEqual([]);
  const joined = await browser.send(invitation, path, { params, form: {} });
  expect([joined.status, joined.headers.get("Location")]).toEqual([302, "/sign-in"]);
  expect(browser.cookies.has("keypeg")).toBe(false);
  const done = await type(browser, await codeFor(email));
  expect(done.headers.get("Location")).toBe("/bench");
  const again = await openBrowser().send(invitation, path, { params });
  expect(again.data).toMatchObject({ accepted: true });
});

test("a log keeps no invitation's token", () => {
  const token = makeToken();
  expect(loggedPath(`/invitation/${token}`)).toBe("/invitation/…");
  expect(loggedPath(`/invitation/${token}.data`)).toBe("/invitation/….data");
  expect(loggedPath("/office/people")).toBe("/office/people");
});
