import { and, desc, eq, isNull } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { expect, test } from "vitest";
import { SESSION_COOKIE, setToken } from "~/auth/cookies";
import { startSession } from "~/auth/sessions/start-session";
import { invitations, memberships, people, sessions } from "~/db/schema/people";
import type { Actor, Role } from "~/domain/actor";
import { readMember } from "~/domain/people/list-people";
import { readPolicy } from "~/domain/policy/read-policy";
import { DEFAULT_POLICY } from "~/domain/policy/settings";
import * as account from "~/routes/account/account";
import * as invite from "~/routes/office/people/invite";
import * as list from "~/routes/office/people/list";
import * as person from "~/routes/office/people/person";
import * as policy from "~/routes/office/policy/policy";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock } from "./factories";
import { type Answer, TestBrowser, type TestRoute } from "./requests";

async function emailOf(personId: string): Promise<string> {
  const [row] = await testDb().select().from(people).where(eq(people.id, personId));
  return row!.email;
}

/** A browser in which this person is signed in. */
async function browserOf(actor: Actor): Promise<TestBrowser> {
  const email = await emailOf(actor.personId);
  const who = { email, device: "Firefox, Linux", previousToken: null };
  const started = await startSession(testDb(), who, new Date());
  const browser = new TestBrowser();
  const line = await setToken(SESSION_COOKIE, started!.token);
  const [, name = "", value = ""] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
  browser.cookies.set(name, value);
  return browser;
}

async function makeFirm() {
  const carrier = await makeCarrier(testDb(), new TestClock());
  const manager = await makePerson(testDb(), carrier, ["manager"]);
  return { carrier, manager, browser: await browserOf(manager) };
}

function replyOf(answer: Answer) {
  const { result } = answer.data as {
    result: { error?: Record<string, string[]>; initialValue?: Record<string, unknown> };
  };
  return { error: result.error ?? {}, kept: result.initialValue ?? {} };
}

const onPerson = (
  browser: TestBrowser,
  personId: string,
  form: Record<string, string | string[]>,
) => browser.send(person, `/office/people/${personId}`, { form, params: { personId } });

async function membershipOf(carrier: TestCarrier, personId: string) {
  const [row] = await testDb()
    .select()
    .from(memberships)
    .where(and(eq(memberships.carrierId, carrier.carrierId), eq(memberships.personId, personId)));
  return row ?? null;
}

test("a manager invites through the form; empty boxes and an empty yard are no error", async () => {
  const { browser, carrier } = await makeFirm();
  const loaded = (await browser.send(invite, "/office/people/invite")).data as { id: string };
  const form = {
    id: loaded.id,
    name: "Lou Fenn",
    email: "Lou@Example.Test",
    roles: "driver",
    yardId: "",
  };
  const sent = await browser.send(invite, "/office/people/invite", { form });
  expect(sent.headers.get("Location")).toBe("/office/people?done=invited");
  await browser.send(invite, "/office/people/invite", { form });
  const rows = await testDb()
    .select()
    .from(invitations)
    .where(eq(invitations.carrierId, carrier.carrierId));
  expect(rows).toMatchObject([{ email: "lou@example.test", roles: ["driver"], certifier: false }]);
  const shown = (await browser.send(list, "/office/people")).data;
  expect(shown).toMatchObject({ invitations: [{ name: "Lou Fenn" }] });
});

test("a bad invitation names each field and the fix, and keeps what was typed", async () => {
  const { browser } = await makeFirm();
  const form = { id: uuidv7(), name: " ", email: "lou at home", yardId: "" };
  const bad = await browser.send(invite, "/office/people/invite", { form });
  expect(bad.status).toBe(400);
  expect(replyOf(bad).error).toEqual({
    name: ["person-name"],
    email: ["email-form"],
    roles: ["roles-empty"],
  });
  expect(replyOf(bad).kept).toMatchObject({ email: "lou at home" });
  const own = {
    ...form,
    name: "Lou Fenn",
    email: "x@example.test",
    roles: ["dispatcher"],
    certifier: "on",
  };
  const dispatcher = await browser.send(invite, "/office/people/invite", { form: own });
  expect(replyOf(dispatcher).error).toEqual({ certifier: ["certifier-role"] });
});

test("an address that works here already is said at its field", async () => {
  const { browser, manager } = await makeFirm();
  const email = await emailOf(manager.personId);
  const form = { id: uuidv7(), name: "Lou Fenn", email, roles: "driver" };
  const answer = await browser.send(invite, "/office/people/invite", { form });
  expect([answer.status, replyOf(answer).error.email?.[0]]).toEqual([
    400,
    "This person works here already. Change their roles in the list instead.",
  ]);
});

test("a manager changes roles, names a certifier, sets yard and on-call place", async () => {
  const { browser, carrier } = await makeFirm();
  const driver = await makePerson(testDb(), carrier, ["driver"]);
  const form = {
    intent: "change",
    roles: ["driver", "mechanic"],
    certifier: "on",
    yardId: carrier.yardId,
    onCall: "1",
  };
  const saved = await onPerson(browser, driver.personId, form);
  expect(saved.headers.get("Location")).toBe("/office/people?done=person");
  expect(await membershipOf(carrier, driver.personId)).toMatchObject({
    roles: ["driver", "mechanic"],
    certifier: true,
    yardId: carrier.yardId,
    onCallOrder: 1,
  });
  await onPerson(browser, driver.personId, {
    intent: "change",
    roles: "driver",
    yardId: "",
    onCall: "",
  });
  expect(await membershipOf(carrier, driver.personId)).toMatchObject({
    roles: ["driver"],
    certifier: false,
    yardId: null,
    onCallOrder: null,
  });
});

test("the id in the form cannot name another person than the address does", async () => {
  const { browser, carrier } = await makeFirm();
  const [one, other] = [
    await makePerson(testDb(), carrier, ["driver"]),
    await makePerson(testDb(), carrier, ["driver"]),
  ];
  const form = { intent: "deactivate", personId: other.personId };
  await onPerson(browser, one.personId, form);
  expect((await membershipOf(carrier, one.personId))?.deactivatedAt).not.toBeNull();
  expect((await membershipOf(carrier, other.personId))?.deactivatedAt).toBeNull();
});

test("deactivating signs the person out at their next request, reactivating lets them sign in", async () => {
  const { browser, carrier, manager } = await makeFirm();
  const driver = await makePerson(testDb(), carrier, ["driver"]);
  const theirs = await browserOf(driver);
  expect((await theirs.send(account, "/account")).status).toBe(200);
  await onPerson(browser, driver.personId, { intent: "deactivate" });
  expect((await theirs.send(account, "/account")).headers.get("Location")).toContain("/sign-in");
  await onPerson(browser, driver.personId, { intent: "reactivate" });
  const back = await readMember(testDb(), manager, driver.personId);
  expect(back.ok && back.value.active).toBe(true);
});

test("the last manager is told why they stay", async () => {
  const { browser, manager } = await makeFirm();
  const refused = await onPerson(browser, manager.personId, { intent: "deactivate" });
  expect(refused.status).toBe(409);
  expect(replyOf(refused).error[""]?.[0]).toContain("Somebody must stay manager");
});

test("K7: another carrier's person, yard and invitation are a 404 in path and body", async () => {
  const [here, there] = [await makeFirm(), await makeFirm()];
  const stranger = await makePerson(testDb(), there.carrier, ["driver"]);
  const own = await makePerson(testDb(), here.carrier, ["driver"]);
  const { personId } = stranger;
  const read = await here.browser.send(person, "/office/people/x", { params: { personId } });
  const notAnId = await here.browser.send(person, "/office/people/x", {
    params: { personId: "x" },
  });
  const deactivated = await onPerson(here.browser, personId, { intent: "deactivate" });
  const moved = await onPerson(here.browser, own.personId, {
    intent: "change",
    roles: "driver",
    yardId: there.carrier.yardId,
  });
  const form = { intent: "take-back", invitationId: uuidv7() };
  const taken = await here.browser.send(list, "/office/people", { form });
  const statuses = [read, notAnId, deactivated, moved, taken].map((answer) => answer.status);
  expect(statuses).toEqual([404, 404, 404, 404, 404]);
});

test("nobody but a manager opens the pages about people and policy", async () => {
  const { carrier } = await makeFirm();
  const others: Role[] = ["driver", "mechanic", "dispatcher"];
  const browser = await browserOf(await makePerson(testDb(), carrier, others));
  const pages: [TestRoute, string][] = [
    [list, "/office/people"],
    [invite, "/office/people/invite"],
    [person, "/office/people/x"],
    [policy, "/office/policy"],
  ];
  for (const [route, path] of pages) {
    const params = { personId: uuidv7() };
    expect((await browser.send(route, path, { params })).status).toBe(403);
    expect((await browser.send(route, path, { params, form: {} })).status).toBe(403);
  }
});

const POLICY_FORM = {
  walkHours: "24",
  reviewDays: "30",
  weeklyEveryDays: "7",
  weeklyGraceDays: "2",
  monthlyEveryMonths: "1",
  monthlyGraceDays: "5",
  monthlyEveryHours: "",
  monthlyGraceHours: "25",
  testWarnDays: "30",
  afterWalkRequired: "on",
  limitsBlock: "block",
};

test("the policy's form, sent as it is shown, changes no setting", async () => {
  const { browser, carrier } = await makeFirm();
  const saved = await browser.send(policy, "/office/policy", { form: POLICY_FORM });
  expect(saved.headers.get("Location")).toBe("/office/policy?done=policy");
  const stored = await readPolicy(testDb(), carrier.carrierId);
  expect(stored).toEqual({ version: 2, settings: DEFAULT_POLICY });
});

test("a manager turns the driver-fix list on, the after walk off, and lets limits warn", async () => {
  const { browser, carrier } = await makeFirm();
  const { afterWalkRequired: _, ...form } = POLICY_FORM;
  const changed = {
    ...form,
    driverFix: "on",
    limitsBlock: "warn",
    walkHours: "14",
    monthlyEveryHours: "100",
  };
  await browser.send(policy, "/office/policy", { form: changed });
  expect((await readPolicy(testDb(), carrier.carrierId)).settings).toMatchObject({
    driverFix: true,
    afterWalkRequired: false,
    limitsBlock: false,
    walkHours: 14,
    monthlyEveryHours: 100,
  });
});

test("a setting out of its limits or left empty says what to type", async () => {
  const { browser, carrier } = await makeFirm();
  const form = {
    ...POLICY_FORM,
    walkHours: "25",
    reviewDays: "",
    weeklyGraceDays: "two",
    monthlyEveryHours: "5",
  };
  const bad = await browser.send(policy, "/office/policy", { form });
  expect(bad.status).toBe(400);
  expect(replyOf(bad).error).toEqual({
    walkHours: ["Type a whole number from 1 to 24."],
    reviewDays: ["Type a whole number from 1 to 90."],
    weeklyGraceDays: ["Type a whole number from 0 to 7."],
    monthlyEveryHours: ["Type a whole number from 10 to 1000, or leave it empty."],
  });
  expect(replyOf(bad).kept).toMatchObject({ walkHours: "25", weeklyGraceDays: "two" });
  expect((await readPolicy(testDb(), carrier.carrierId)).version).toBe(1);
});

test("a person saves their number, and a bad one is named and kept", async () => {
  const { browser } = await makeFirm();
  const save = (phone: string) =>
    browser.send(account, "/account", { form: { intent: "phone", phone } });
  const bad = await save("ring the yard");
  expect([bad.status, replyOf(bad)]).toMatchObject([
    400,
    { error: { phone: ["phone-form"] }, kept: { phone: "ring the yard" } },
  ]);
  expect((await save("303 555 0142")).headers.get("Location")).toBe("/account?done=phone");
  expect((await browser.send(account, "/account")).data).toMatchObject({ phone: "303 555 0142" });
  await save("");
  expect((await browser.send(account, "/account")).data).toMatchObject({ phone: null });
});

test("a person ends a session of their own, not another's, and then all others", async () => {
  const { browser, manager, carrier } = await makeFirm();
  const second = await browserOf(manager);
  const third = await browserOf(manager);
  const stranger = await makePerson(testDb(), carrier, ["driver"]);
  await browserOf(stranger);
  const idsOf = async (personId: string) => {
    const live = and(eq(sessions.personId, personId), isNull(sessions.revokedAt));
    const rows = await testDb().select().from(sessions).where(live).orderBy(desc(sessions.id));
    return rows.map((row) => row.id);
  };
  const [theirs = ""] = await idsOf(stranger.personId);
  const end = (sessionId: string) =>
    browser.send(account, "/account", { form: { intent: "end", sessionId } });
  expect((await end(theirs)).status).toBe(404);
  const [newest = ""] = await idsOf(manager.personId);
  await end(newest);
  expect((await third.send(account, "/account")).status).toBe(302);
  await browser.send(account, "/account", { form: { intent: "end-others" } });
  expect((await second.send(account, "/account")).status).toBe(302);
  expect((await browser.send(account, "/account")).status).toBe(200);
});

test("a person of two carriers switches in the account, never to a third", async () => {
  const [here, there, strange] = [await makeFirm(), await makeFirm(), await makeFirm()];
  const { personId } = here.manager;
  const { carrierId } = there.carrier;
  const createdAt = new Date();
  await testDb()
    .insert(memberships)
    .values({ carrierId, personId, roles: ["driver"], createdAt });
  const to = (id: string) =>
    here.browser.send(account, "/account", { form: { intent: "switch", carrierId: id } });
  expect((await to(strange.carrier.carrierId)).status).toBe(404);
  expect((await to(carrierId)).headers.get("Location")).toBe("/");
  const now = (await here.browser.send(account, "/account")).data;
  expect(now).toMatchObject({ carrierId, roles: ["driver"] });
});
