import { asc, eq, inArray } from "drizzle-orm";
import { expect, test } from "vitest";
import { config } from "~/config";
import { mailOutbox, people } from "~/db/schema/people";
import { hours, minutes } from "~/domain/durations";
import { type MailToQueue, queueMail } from "~/domain/mail/queue-mail";
import { drainOne, startMailDrain } from "~/services/mail/drain";
import { renderMail } from "~/services/mail/render-mail";
import { type Mail, sendMail } from "~/services/mail-transport";
import { testDb } from "./database";
import { makeCarrier, makePerson, TestClock } from "./factories";

const ORIGIN = "https://keypeg.example";

/** A mail server of the test's own: keeps what it is given, or refuses it. */
class MailServer {
  readonly taken: Mail[] = [];
  refusals = 0;
  send = async (mail: Mail) => {
    if (this.refusals > 0) {
      this.refusals -= 1;
      const error = new Error(`550 no such user ${mail.to}`);
      throw Object.assign(error, { code: "EENVELOPE", responseCode: 550 });
    }
    this.taken.push(mail);
  };
}

let serial = 0;
function redTag(more: Partial<MailToQueue> = {}): MailToQueue {
  serial += 1;
  return {
    carrierId: null,
    dedupeKey: `red-tag:${serial}`,
    recipient: `reader-${serial}@example.test`,
    template: "red-tag",
    props: { unitNumber: "T-118", title: "Float ball missing, primary trap" },
    ...more,
  };
}

async function setUp() {
  // Each test drains what it queued and nothing else.
  await testDb().update(mailOutbox).set({ failedAt: new Date(), lastError: "an earlier test's" });
  const clock = new TestClock();
  const server = new MailServer();
  const tools = { send: server.send, origin: ORIGIN, clock };
  const queue = (...mails: MailToQueue[]) => queueMail(testDb(), mails, clock.now());
  const drain = async () => {
    let turns = 0;
    while (await drainOne(testDb(), tools)) turns += 1;
    return turns;
  };
  return { clock, server, tools, queue, drain };
}

async function rowOf(mail: MailToQueue) {
  const [row] = await testDb()
    .select()
    .from(mailOutbox)
    .where(eq(mailOutbox.dedupeKey, mail.dedupeKey));
  return row!;
}

async function makeReader(clock: TestClock) {
  const carrier = await makeCarrier(testDb(), clock);
  const person = await makePerson(testDb(), carrier, ["driver"]);
  const [row] = await testDb().select().from(people).where(eq(people.id, person.personId));
  return row!.email;
}

test("a queued mail goes once, as HTML and as plain text", async () => {
  const { server, queue, drain } = await setUp();
  const mail = redTag();
  await queue(mail);
  await queue(mail);
  expect(await drain()).toBe(1);
  expect(await drain()).toBe(0);
  const [sent] = server.taken;
  expect(sent).toMatchObject({
    to: mail.recipient,
    subject: "T-118 is held: Float ball missing, primary trap",
  });
  expect(sent?.html).toContain("Float ball missing");
  expect(sent?.text).toContain("Red tag: Float ball missing, primary trap.");
  expect(sent?.text).not.toContain("<");
  expect(sent?.messageId).toMatch(/^<[\da-f-]{36}@keypeg\.example>$/);
  expect((await rowOf(mail)).sentAt).not.toBeNull();
});

test("eight drains at once send each mail once", async () => {
  const { server, tools, queue } = await setUp();
  const mails = Array.from({ length: 30 }, () => redTag());
  await queue(...mails);
  const work = async () => {
    while (await drainOne(testDb(), tools));
  };
  await Promise.all(Array.from({ length: 8 }, work));
  expect(server.taken.map((mail) => mail.to).sort()).toEqual(
    mails.map((mail) => mail.recipient).sort(),
  );
});

test("a mail the server does not take waits longer each time and is given up after eight tries", async () => {
  const { server, clock, queue, drain } = await setUp();
  server.refusals = 100;
  const mail = redTag();
  await queue(mail);
  const waits: number[] = [];
  for (let tries = 1; tries <= 8; tries += 1) {
    expect(await drain()).toBe(1);
    const row = await rowOf(mail);
    expect(row.tries).toBe(tries);
    waits.push(row.sendAfter.getTime() - clock.now().getTime());
    clock.turn(hours(1));
  }
  expect(waits[0]).toBeLessThan(15_000);
  expect(waits[5]).toBeGreaterThan(waits[1]!);
  expect(await drain()).toBe(0);
  expect(await rowOf(mail)).toMatchObject({ sentAt: null, lastError: "EENVELOPE 550" });
  expect((await rowOf(mail)).failedAt).not.toBeNull();
});

test("what a mail server repeats of an address is not kept", async () => {
  const { server, queue, drain } = await setUp();
  server.refusals = 1;
  const mail = redTag();
  await queue(mail);
  await drain();
  expect((await rowOf(mail)).lastError).not.toContain("example.test");
});

test("a mail whose sender died is taken up again after two minutes", async () => {
  const { server, tools, clock, queue, drain } = await setUp();
  const mail = redTag();
  await queue(mail);
  const never = { ...tools, send: () => new Promise<void>(() => undefined) };
  void drainOne(testDb(), never);
  await expect.poll(async () => (await rowOf(mail)).tries).toBe(1);
  expect(await drain()).toBe(0);
  clock.turn(minutes(2));
  expect(await drain()).toBe(1);
  expect(server.taken).toHaveLength(1);
});

test("a code is blanked from the outbox once it is sent", async () => {
  const { server, clock, queue, drain } = await setUp();
  const recipient = await makeReader(clock);
  const mail = redTag({ recipient, template: "sign-in-code", props: { code: "402718" } });
  await queue(mail);
  expect((await rowOf(mail)).props).toEqual({ code: "402718" });
  await drain();
  expect(server.taken[0]?.text).toContain("402718");
  expect((await rowOf(mail)).props).toEqual({});
});

test("a code goes to nobody who does not work here, and neither code nor address stays", async () => {
  const { server, queue, drain } = await setUp();
  const mail = redTag({
    recipient: "nobody@example.test",
    template: "sign-in-code",
    props: { code: "402718" },
  });
  await queue(mail);
  expect(await drain()).toBe(1);
  expect(server.taken).toEqual([]);
  expect(await rowOf(mail)).toMatchObject({
    recipient: "",
    props: {},
    lastError: "unknown-address",
  });
});

test("a code older than ten minutes is not sent any more", async () => {
  const { server, clock, queue, drain } = await setUp();
  const recipient = await makeReader(clock);
  const mail = redTag({ recipient, template: "sign-in-code", props: { code: "402718" } });
  await queue(mail);
  clock.turn(minutes(10));
  await drain();
  expect(server.taken).toEqual([]);
  expect(await rowOf(mail)).toMatchObject({ props: {}, lastError: "expired" });
});

test("an invitation's link is blanked when the mail is given up", async () => {
  const { server, clock, queue, drain } = await setUp();
  server.refusals = 100;
  const mail = redTag({
    template: "invitation",
    props: { carrierName: "A", invitedBy: "B", roles: ["driver"], path: "/invitation/x" },
  });
  await queue(mail);
  for (let tries = 0; tries < 8; tries += 1) {
    await drain();
    clock.turn(hours(1));
  }
  expect((await rowOf(mail)).props).toEqual({});
});

test("props that do not fit their template are a failure, not a mail", async () => {
  const { server, queue, drain } = await setUp();
  const mail = redTag({ props: { unit: 7 } });
  await queue(mail);
  await drain();
  expect(server.taken).toEqual([]);
  expect((await rowOf(mail)).lastError).toBe("ZodError");
});

test("every mail says the same in HTML and plain text, and links to this site", async () => {
  const all = [
    ["sign-in-code", { code: "402718" }, ["402718", "ten minutes"]],
    [
      "invitation",
      {
        carrierName: "Bent Willow",
        invitedBy: "Ona Reyes",
        roles: ["driver", "mechanic"],
        path: "/invitation/abc",
      },
      ["Ona Reyes", "driver and mechanic", `${ORIGIN}/invitation/abc`],
    ],
    [
      "red-tag",
      { unitNumber: "T-118", title: "Door clamp loose" },
      ["T-118 is held", "Door clamp loose", `${ORIGIN}/`],
    ],
    [
      "red-tag",
      { unitNumber: "T-118", title: "not-satisfied" },
      ["the next driver is not satisfied"],
    ],
    [
      "key-freed",
      { unitNumber: "T-118", title: "Door clamp loose" },
      ["no red tag holds the key", `${ORIGIN}/`],
    ],
  ] as const;
  for (const [template, props, said] of all) {
    const { html, text } = await renderMail(template, props, ORIGIN);
    for (const words of said) {
      expect(html).toContain(words);
      expect(text).toContain(words);
    }
  }
});

test("what a mail says of a truck cannot break out of its HTML", async () => {
  const props = { unitNumber: "T-118", title: "<img src=x onerror=alert(1)>" };
  expect((await renderMail("red-tag", props, ORIGIN)).html).not.toContain("<img");
});

test("the drain sends over SMTP, one mail after the other, and stops when told", async () => {
  await setUp();
  const mails = [redTag(), redTag(), redTag()];
  const now = new Date();
  await queueMail(testDb(), mails, now);
  const faults: unknown[] = [];
  const clock = { now: () => new Date() };
  const drain = startMailDrain(testDb(), (error) => faults.push(error), {
    send: sendMail,
    origin: config().publicOrigin,
    clock,
  });
  const keys = mails.map((mail) => mail.dedupeKey);
  const rows = () =>
    testDb()
      .select()
      .from(mailOutbox)
      .where(inArray(mailOutbox.dedupeKey, keys))
      .orderBy(asc(mailOutbox.id));
  await expect
    .poll(async () => (await rows()).every((row) => row.sentAt !== null), { timeout: 10_000 })
    .toBe(true);
  await drain.stop();
  expect(faults).toEqual([]);
  const page = process.env.KEYPEG_TEST_MAIL_PAGE;
  const received = (await (await fetch(`${page}email`)).json()) as { to: { address: string }[] }[];
  const readers = received.flatMap((mail) => mail.to.map((to) => to.address));
  expect(readers).toEqual(expect.arrayContaining(mails.map((mail) => mail.recipient)));
  const late = redTag();
  await queueMail(testDb(), [late], new Date());
  expect((await rowOf(late)).tries).toBe(0);
});
