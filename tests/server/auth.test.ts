import { and, eq, isNull } from "drizzle-orm";
import { expect, test } from "vitest";
import { redeem, sendCode } from "~/auth/authenticator";
import { newestCode } from "~/auth/codes/pending-code";
import { whyEnded } from "~/auth/codes/redeem-code";
import { clientKey, takeSend } from "~/auth/codes/send-limits";
import { removeEnded } from "~/auth/housekeeping";
import { safeNext } from "~/auth/next-path";
import { deviceName } from "~/auth/sessions/device-name";
import { openSession } from "~/auth/sessions/open-session";
import { mailOutbox, people, rateLimits, sessions, signInCodes } from "~/db/schema/people";
import type { Actor } from "~/domain/actor";
import { days, minutes } from "~/domain/durations";
import { deactivatePerson } from "~/domain/people/deactivate-person";
import type { Result } from "~/domain/refusals";
import { makeToken } from "~/domain/tokens";
import { testDatabase, testDb } from "./database";
import { makeCarrier, makePerson, TestClock } from "./factories";

const SECRET = "a secret of thirty-two characters";

async function makeReader(roles: Actor["roles"][number][] = ["driver"]) {
  const clock = new TestClock();
  const carrier = await makeCarrier(testDb(), clock);
  const person = await makePerson(testDb(), carrier, roles);
  const [row] = await testDb().select().from(people).where(eq(people.id, person.personId));
  return { clock, carrier, person, email: row!.email };
}

/** One browser and its sign-in: what a person can do with it. */
class Browser {
  readonly token = makeToken();
  constructor(private readonly clock: TestClock) {}
  private get at() {
    return { db: testDb(), secret: SECRET, browser: this.token, now: this.clock.now() };
  }
  ask(email: string) {
    return sendCode(this.at, email);
  }
  type(code: string, previousToken: string | null = null) {
    return redeem(this.at, { code, device: "Chrome, Android", previousToken });
  }
  async newest() {
    const row = await newestCode(testDb(), { token: this.token, secret: SECRET });
    return row!;
  }
  /** The code as the mail to be sent carries it. */
  async codeInMail() {
    const row = await this.newest();
    const [mail] = await testDb()
      .select()
      .from(mailOutbox)
      .where(eq(mailOutbox.dedupeKey, `sign-in-code:${row.id}`));
    return (mail!.props as { code: string }).code;
  }
}

function faultOf(result: Result<unknown>): string | undefined {
  return result.ok ? undefined : result.refusal.fields?.[0]?.code;
}

const otherThan = (code: string, by = 1) =>
  String((Number(code) + by) % 1_000_000).padStart(6, "0");

test("a code from the mail signs in the person whose address asked for it", async () => {
  const { clock, person, email } = await makeReader(["mechanic", "driver"]);
  const browser = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  expect(code).toMatch(/^\d{6}$/);
  const started = await browser.type(code);
  if (!started.ok) throw new Error("refused");
  expect(started.value.roles).toEqual(["mechanic", "driver"]);
  const signedIn = await openSession(testDb(), started.value.token, clock.now());
  expect(signedIn?.actor.personId).toBe(person.personId);
});

test("neither code nor token nor browser is stored as it is", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  const row = await browser.newest();
  expect(JSON.stringify(row)).not.toContain(code);
  expect(JSON.stringify(row)).not.toContain(browser.token);
  const started = await browser.type(code);
  const stored = await testDb().select().from(sessions);
  expect(JSON.stringify(stored)).not.toContain(started.ok && started.value.token);
});

test("attack: fifty wrong codes at once are five tries, and then the right one is refused too", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  const tries = Array.from({ length: 50 }, (_, index) => browser.type(otherThan(code, index + 1)));
  const faults = (await Promise.all(tries)).map(faultOf);
  expect(faults.every((fault) => fault === "code-wrong" || fault === "code-out-of-tries")).toBe(
    true,
  );
  expect((await browser.newest()).tries).toBe(5);
  expect(faultOf(await browser.type(code))).toBe("code-out-of-tries");
});

test("attack: the right code among fifty at once makes one session at most", async () => {
  const { clock, email, person } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  const results = await Promise.all(Array.from({ length: 50 }, () => browser.type(code)));
  expect(results.filter((result) => result.ok)).toHaveLength(1);
  const made = await testDb().select().from(sessions).where(eq(sessions.personId, person.personId));
  expect(made).toHaveLength(1);
});

test("attack: a used code does not work again", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  expect((await browser.type(code)).ok).toBe(true);
  expect(faultOf(await browser.type(code))).toBe("code-used");
});

test("a wrong code says how many tries are left", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const wrong = otherThan(await browser.codeInMail());
  const left: unknown[] = [];
  for (let n = 0; n < 5; n += 1) {
    const result = await browser.type(wrong);
    left.push(
      result.ok ? null : (result.refusal.fields?.[0]?.values?.triesLeft ?? faultOf(result)),
    );
  }
  expect(left).toEqual([4, 3, 2, 1, "code-out-of-tries"]);
});

test("a code works for ten minutes", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  clock.turn(minutes(10));
  expect(faultOf(await browser.type(code))).toBe("code-expired");
});

test("a code works in no other browser", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  const other = new Browser(clock);
  await browser.ask(email);
  const code = await browser.codeInMail();
  expect(faultOf(await other.type(code))).toBe("code-none");
  expect((await browser.type(code)).ok).toBe(true);
});

test("the newest code of a browser is the only one that lives, whoever it is for", async () => {
  const { clock, email } = await makeReader();
  const second = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const first = await browser.codeInMail();
  clock.turn(1000);
  await browser.ask(second.email);
  const newer = await browser.newest();
  expect(newer.email).toBe(second.email);
  const live = await testDb()
    .select()
    .from(signInCodes)
    .where(and(eq(signInCodes.browserHash, newer.browserHash), isNull(signInCodes.endedAt)));
  expect(live.map((row) => row.id)).toEqual([newer.id]);
  expect(faultOf(await browser.type(first))).toBe("code-wrong");
});

test("ten codes asked for at once leave one alive", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await Promise.all(Array.from({ length: 10 }, () => browser.ask(email)));
  const { browserHash } = await browser.newest();
  const rows = await testDb()
    .select()
    .from(signInCodes)
    .where(eq(signInCodes.browserHash, browserHash));
  expect(rows).toHaveLength(10);
  expect(rows.filter((row) => whyEnded(row, clock.now()) === null)).toHaveLength(1);
});

test("an unknown address takes the same steps, and its code signs nobody in", async () => {
  const clock = new TestClock();
  const browser = new Browser(clock);
  await browser.ask("nobody@example.test");
  const code = await browser.codeInMail();
  expect(faultOf(await browser.type(code))).toBe("code-used");
  expect(
    await testDb().select().from(people).where(eq(people.email, "nobody@example.test")),
  ).toEqual([]);
});

test("signing in again ends the session the browser held before", async () => {
  const { clock, email } = await makeReader();
  const browser = new Browser(clock);
  await browser.ask(email);
  const first = await browser.type(await browser.codeInMail());
  if (!first.ok) throw new Error("refused");
  clock.turn(1000);
  await browser.ask(email);
  const second = await browser.type(await browser.codeInMail(), first.value.token);
  if (!second.ok) throw new Error("refused");
  expect(second.value.token).not.toBe(first.value.token);
  expect(await openSession(testDb(), first.value.token, clock.now())).toBeNull();
  expect(await openSession(testDb(), second.value.token, clock.now())).not.toBeNull();
});

async function signedIn() {
  const reader = await makeReader();
  const browser = new Browser(reader.clock);
  await browser.ask(reader.email);
  const started = await browser.type(await browser.codeInMail());
  if (!started.ok) throw new Error("refused");
  return { ...reader, token: started.value.token };
}

test("a deactivated person is signed out at the next request", async () => {
  const { carrier, person, clock, token } = await signedIn();
  const manager = await makePerson(testDb(), carrier, ["manager"]);
  expect(await openSession(testDb(), token, clock.now())).not.toBeNull();
  await deactivatePerson(testDb(), manager, { personId: person.personId }, clock);
  expect(await openSession(testDb(), token, clock.now())).toBeNull();
});

test("a session slides by ninety days and ends after a hundred and eighty", async () => {
  const { clock, token } = await signedIn();
  const open = () => openSession(testDb(), token, clock.now());
  clock.turn(days(89));
  expect(await open()).not.toBeNull();
  clock.turn(days(89));
  expect(await open()).not.toBeNull();
  clock.turn(days(3));
  expect(await open()).toBeNull();
});

test("a session unused for ninety days has ended", async () => {
  const { clock, token } = await signedIn();
  clock.turn(days(90));
  expect(await openSession(testDb(), token, clock.now())).toBeNull();
});

test("last use is noted once a minute at most", async () => {
  const { clock, token, person } = await signedIn();
  const lastSeen = async () => {
    await openSession(testDb(), token, clock.now());
    const [row] = await testDb()
      .select()
      .from(sessions)
      .where(eq(sessions.personId, person.personId));
    return row!.lastSeenAt.getTime();
  };
  const first = await lastSeen();
  clock.turn(30_000);
  expect(await lastSeen()).toBe(first);
  clock.turn(31_000);
  expect(await lastSeen()).toBe(first + 61_000);
});

test("a made-up token opens nothing", async () => {
  expect(await openSession(testDb(), makeToken(), new Date())).toBeNull();
});

const wait = (email: string, clientAddress: string) =>
  takeSend(testDatabase(), { email, clientAddress, secret: SECRET });

test("an address gets five codes an hour, also when twenty are asked for at once", async () => {
  const asked = Array.from({ length: 20 }, () => wait("five@example.test", "192.0.2.10"));
  const answers = await Promise.all(asked);
  expect(answers.filter((minutesToWait) => minutesToWait === null)).toHaveLength(5);
  expect(answers.filter((minutesToWait) => minutesToWait === 60)).toHaveLength(15);
});

test("a client gets twenty codes an hour over all addresses", async () => {
  const asked = Array.from({ length: 25 }, (_, n) => wait(`n${n}@example.test`, "192.0.2.11"));
  const answers = await Promise.all(asked);
  expect(answers.filter((minutesToWait) => minutesToWait === null)).toHaveLength(20);
  expect(await wait("other@example.test", "192.0.2.12")).toBeNull();
});

test("the limits keep no address in clear", async () => {
  await wait("private@example.test", "192.0.2.13");
  const keys = (await testDb().select().from(rateLimits)).map((row) => row.key).join("\n");
  expect(keys).not.toContain("example.test");
  expect(keys).not.toContain("192.0.2");
});

test("IPv6 clients of one household count as one", () => {
  expect(clientKey("2001:db8:1:2:aaaa::1")).toBe(clientKey("2001:db8:1:2:bbbb:cccc::9"));
  expect(clientKey("2001:db8:1:2::1")).not.toBe(clientKey("2001:db8:1:3::1"));
  expect(clientKey("::ffff:192.0.2.1")).toBe("192.0.2.1");
  expect(clientKey("::1")).toBe("0:0:0:0");
});

test("after sign-in the way leads to a page of this site only", () => {
  expect(safeNext("/board?yard=1")).toBe("/board?yard=1");
  for (const bad of [
    null,
    "",
    "board",
    "//evil.example/x",
    "/\\evil.example",
    "https://evil.example/",
  ]) {
    expect(safeNext(bad)).toBeNull();
  }
});

test("a device is named so that its owner knows it", () => {
  const chrome =
    "Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 Chrome/140.0 Mobile Safari/537.36";
  const safari = "Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) Version/19.0 Safari/604.1";
  expect(deviceName(chrome)).toBe("Chrome, Android");
  expect(deviceName(safari)).toBe("Safari, iPhone");
  expect(deviceName(null)).toBe("");
});

test("codes go a day after they ended, sessions a month after, and nothing before", async () => {
  const { clock, token, email, person } = await signedIn();
  const browser = new Browser(clock);
  await browser.ask(email);
  await removeEnded(testDb(), clock.now());
  expect(await browser.newest()).toBeDefined();
  clock.turn(days(1) + minutes(11));
  await removeEnded(testDb(), clock.now());
  expect(await browser.newest()).toBeNull();
  expect(await openSession(testDb(), token, clock.now())).not.toBeNull();
  clock.turn(days(200));
  await removeEnded(testDb(), clock.now());
  const kept = await testDb().select().from(sessions).where(eq(sessions.personId, person.personId));
  expect(kept).toEqual([]);
});
