import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { expect, test } from "vitest";
import { openSession } from "~/auth/sessions/open-session";
import { startSession } from "~/auth/sessions/start-session";
import { changes } from "~/db/schema/carriers";
import { audit, invitations, mailOutbox, memberships, people } from "~/db/schema/people";
import type { Actor } from "~/domain/actor";
import { addCarrier, addCarrierSchema } from "~/domain/carriers/add-carrier";
import { days } from "~/domain/durations";
import { acceptInvitation } from "~/domain/people/accept-invitation";
import { changeMembership } from "~/domain/people/change-membership";
import { deactivatePerson } from "~/domain/people/deactivate-person";
import { endSessions } from "~/domain/people/end-sessions";
import { invitePerson } from "~/domain/people/invite-person";
import { listPeople, readMember } from "~/domain/people/list-people";
import { changeOwnPhone, readOwnAccount, switchCarrier } from "~/domain/people/own-account";
import { listSessions, revokeOtherSessions, revokeSession } from "~/domain/people/own-sessions";
import { inviteSchema, membershipSchema } from "~/domain/people/person-input";
import { reactivatePerson } from "~/domain/people/reactivate-person";
import { readInvitation } from "~/domain/people/read-invitation";
import { revokeInvitation } from "~/domain/people/revoke-invitation";
import { readPolicy } from "~/domain/policy/read-policy";
import type { Result } from "~/domain/refusals";
import { testDb } from "./database";
import { makeCarrier, makePerson, TestClock } from "./factories";

async function makeFirm() {
  const clock = new TestClock();
  const carrier = await makeCarrier(testDb(), clock);
  const manager = await makePerson(testDb(), carrier, ["manager"]);
  return { clock, carrier, manager };
}

let serial = 0;
function invitee(more: Partial<Parameters<typeof invitePerson>[2]> = {}) {
  serial += 1;
  return {
    id: uuidv7(),
    email: `new-${serial}@example.test`,
    name: "Lou Fenn",
    roles: ["driver" as const],
    certifier: false,
    yardId: null,
    ...more,
  };
}

function codeOf(result: Result<unknown>): string | undefined {
  return result.ok ? undefined : result.refusal.code;
}

/** The token as the mail to be sent carries it. */
async function tokenInMail(invitationId: string): Promise<string> {
  const [mail] = await testDb()
    .select()
    .from(mailOutbox)
    .where(eq(mailOutbox.dedupeKey, `invitation:${invitationId}`));
  return (mail!.props as { path: string }).path.replace("/invitation/", "");
}

async function inviteAndAccept(firm: Awaited<ReturnType<typeof makeFirm>>, input = invitee()) {
  await invitePerson(testDb(), firm.manager, input, firm.clock);
  const token = await tokenInMail(input.id);
  return { input, token, accepted: await acceptInvitation(testDb(), token, firm.clock) };
}

async function personByEmail(email: string) {
  const [row] = await testDb().select().from(people).where(eq(people.email, email));
  return row ?? null;
}

const place = (personId: string, more: Partial<Parameters<typeof changeMembership>[2]> = {}) => ({
  personId,
  roles: ["driver" as const],
  certifier: false,
  yardId: null,
  onCall: null,
  ...more,
});

test("an invited person joins with the roles, the yard and the certifier's mark they were invited to", async () => {
  const firm = await makeFirm();
  const { yardId } = firm.carrier;
  const input = invitee({ roles: ["mechanic", "driver"], certifier: true, yardId });
  const { accepted } = await inviteAndAccept(firm, input);
  expect(accepted).toEqual({ ok: true, value: { email: input.email } });
  const { members, invitations: open } = await listPeople(testDb(), firm.manager, firm.clock.now());
  expect(members.find((member) => member.email === input.email)).toMatchObject({
    name: "Lou Fenn",
    roles: ["mechanic", "driver"],
    certifier: true,
    yardName: "Home Yard",
    active: true,
  });
  expect(open).toEqual([]);
});

test("accepting twice, at once or later, is one membership", async () => {
  const firm = await makeFirm();
  const input = invitee();
  await invitePerson(testDb(), firm.manager, input, firm.clock);
  const token = await tokenInMail(input.id);
  const results = await Promise.all(
    Array.from({ length: 8 }, () => acceptInvitation(testDb(), token, firm.clock)),
  );
  expect(results.every((result) => result.ok)).toBe(true);
  const person = await personByEmail(input.email);
  const rows = await testDb()
    .select()
    .from(memberships)
    .where(eq(memberships.personId, person!.id));
  expect(rows).toHaveLength(1);
});

test("the same invitation form sent again is one invitation and one mail", async () => {
  const { manager, clock } = await makeFirm();
  const input = invitee();
  const sent = await Promise.all(
    [1, 2, 3].map(() => invitePerson(testDb(), manager, input, clock)),
  );
  expect(sent.every((result) => result.ok)).toBe(true);
  const mails = await testDb()
    .select()
    .from(mailOutbox)
    .where(eq(mailOutbox.recipient, input.email));
  expect(mails).toHaveLength(1);
  const other = await invitePerson(testDb(), manager, { ...input, email: "x@example.test" }, clock);
  expect(codeOf(other)).toBe("same-id-other-body");
});

test("a newer invitation ends the older one", async () => {
  const { manager, clock } = await makeFirm();
  const first = invitee();
  await invitePerson(testDb(), manager, first, clock);
  const second = { ...first, id: uuidv7(), roles: ["mechanic" as const] };
  await invitePerson(testDb(), manager, second, clock);
  const old = await acceptInvitation(testDb(), await tokenInMail(first.id), clock);
  expect(codeOf(old)).toBe("invitation-ended");
  expect((await acceptInvitation(testDb(), await tokenInMail(second.id), clock)).ok).toBe(true);
});

test("an invitation ends after seven days, and when it is taken back", async () => {
  const { manager, clock } = await makeFirm();
  const first = invitee();
  await invitePerson(testDb(), manager, first, clock);
  await revokeInvitation(testDb(), manager, { invitationId: first.id }, clock);
  const taken = await acceptInvitation(testDb(), await tokenInMail(first.id), clock);
  expect(codeOf(taken)).toBe("invitation-ended");
  const second = invitee();
  await invitePerson(testDb(), manager, second, clock);
  clock.turn(days(7));
  const late = await acceptInvitation(testDb(), await tokenInMail(second.id), clock);
  expect(codeOf(late)).toBe("invitation-ended");
  expect(await personByEmail(second.email)).toBeNull();
});

test("a made-up link finds no invitation", async () => {
  const found = await readInvitation(testDb(), "A".repeat(43), new Date());
  expect(codeOf(found)).toBe("not-found");
});

test("the token of an invitation is not stored", async () => {
  const { manager, clock } = await makeFirm();
  const input = invitee();
  await invitePerson(testDb(), manager, input, clock);
  const token = await tokenInMail(input.id);
  const [row] = await testDb().select().from(invitations).where(eq(invitations.id, input.id));
  expect(JSON.stringify(row)).not.toContain(token);
});

test("somebody who works or worked here is not invited again", async () => {
  const firm = await makeFirm();
  const { input } = await inviteAndAccept(firm);
  const again = { ...input, id: uuidv7() };
  const member = await invitePerson(testDb(), firm.manager, again, firm.clock);
  expect(member).toMatchObject({
    refusal: { fields: [{ pointer: "/email", code: "already-member" }] },
  });
  const person = await personByEmail(input.email);
  await deactivatePerson(testDb(), firm.manager, { personId: person!.id }, firm.clock);
  const gone = await invitePerson(testDb(), firm.manager, { ...again, id: uuidv7() }, firm.clock);
  expect(gone).toMatchObject({ refusal: { fields: [{ code: "member-deactivated" }] } });
});

test("a person of two carriers is one person, and each carrier sees its own part only", async () => {
  const [here, there] = [await makeFirm(), await makeFirm()];
  const { input } = await inviteAndAccept(here, invitee({ roles: ["driver"] }));
  await inviteAndAccept(there, {
    ...input,
    id: uuidv7(),
    roles: ["mechanic"],
    name: "Somebody Else",
  });
  const person = await personByEmail(input.email);
  expect(person?.name).toBe("Lou Fenn");
  const seenHere = await readMember(testDb(), here.manager, person!.id);
  const seenThere = await readMember(testDb(), there.manager, person!.id);
  expect(seenHere.ok && seenHere.value.roles).toEqual(["driver"]);
  expect(seenThere.ok && seenThere.value.roles).toEqual(["mechanic"]);
  await deactivatePerson(testDb(), here.manager, { personId: person!.id }, here.clock);
  const still = await readMember(testDb(), there.manager, person!.id);
  expect(still.ok && still.value.active).toBe(true);
});

test("the last manager is neither demoted nor deactivated", async () => {
  const { manager, clock, carrier } = await makeFirm();
  const { personId } = manager;
  await makePerson(testDb(), carrier, ["driver"]);
  expect(codeOf(await changeMembership(testDb(), manager, place(personId), clock))).toBe(
    "last-manager",
  );
  expect(codeOf(await deactivatePerson(testDb(), manager, { personId }, clock))).toBe(
    "last-manager",
  );
  const kept = await readMember(testDb(), manager, personId);
  expect(kept.ok && kept.value).toMatchObject({ roles: ["manager"], active: true });
});

test("two managers who remove each other at the same moment leave one", async () => {
  for (let round = 0; round < 6; round += 1) {
    const { manager: a, carrier, clock } = await makeFirm();
    const b = await makePerson(testDb(), carrier, ["manager"]);
    const results = await Promise.all([
      deactivatePerson(testDb(), a, { personId: b.personId }, clock),
      changeMembership(testDb(), b, place(a.personId), clock),
    ]);
    expect(results.map(codeOf).filter(Boolean)).toEqual(["last-manager"]);
  }
});

test("a deactivated manager does not count as one", async () => {
  const { manager, carrier, clock } = await makeFirm();
  const second = await makePerson(testDb(), carrier, ["manager"]);
  await deactivatePerson(testDb(), manager, { personId: second.personId }, clock);
  const { personId } = manager;
  expect(codeOf(await deactivatePerson(testDb(), manager, { personId }, clock))).toBe(
    "last-manager",
  );
  await reactivatePerson(testDb(), manager, { personId: second.personId }, clock);
  expect((await deactivatePerson(testDb(), manager, { personId }, clock)).ok).toBe(true);
});

test("a deactivated person is not changed until reactivated", async () => {
  const { manager, carrier, clock } = await makeFirm();
  const { personId } = await makePerson(testDb(), carrier, ["driver"]);
  await deactivatePerson(testDb(), manager, { personId }, clock);
  const change = () => changeMembership(testDb(), manager, place(personId), clock);
  expect(codeOf(await change())).toBe("already-ended");
  await reactivatePerson(testDb(), manager, { personId }, clock);
  expect((await change()).ok).toBe(true);
});

test("deactivating takes back what was still open to the same address", async () => {
  const firm = await makeFirm();
  const { input } = await inviteAndAccept(firm);
  const person = await personByEmail(input.email);
  const id = uuidv7();
  await testDb()
    .insert(invitations)
    .values({
      carrierId: firm.carrier.carrierId,
      id,
      email: input.email,
      name: input.name,
      roles: ["manager"],
      tokenHash: "ab".repeat(32),
      invitedBy: firm.manager.personId,
      createdAt: firm.clock.now(),
      expiresAt: new Date(firm.clock.now().getTime() + days(7)),
    });
  await deactivatePerson(testDb(), firm.manager, { personId: person!.id }, firm.clock);
  const [row] = await testDb().select().from(invitations).where(eq(invitations.id, id));
  expect(row?.revokedAt).not.toBeNull();
});

async function onCallLine(actor: Actor, clock: TestClock): Promise<string[]> {
  const { members } = await listPeople(testDb(), actor, clock.now());
  return members
    .filter((member) => member.onCall !== null)
    .sort((a, b) => a.onCall! - b.onCall!)
    .map((member) => `${member.onCall} ${member.name}`);
}

test("the on-call line has no gaps and no two in one place", async () => {
  const { manager, carrier, clock } = await makeFirm();
  const names = ["Ada", "Bo", "Cy"];
  const crew: Actor[] = [];
  for (const name of names) crew.push(await makePerson(testDb(), carrier, ["mechanic"], { name }));
  const put = (index: number, onCall: number | null) =>
    changeMembership(
      testDb(),
      manager,
      place(crew[index]!.personId, { roles: ["driver"], onCall }),
      clock,
    );
  await put(0, 1);
  await put(1, 1);
  await put(2, 9);
  expect(await onCallLine(manager, clock)).toEqual(["1 Bo", "2 Ada", "3 Cy"]);
  await put(2, 1);
  expect(await onCallLine(manager, clock)).toEqual(["1 Cy", "2 Bo", "3 Ada"]);
  await put(1, null);
  expect(await onCallLine(manager, clock)).toEqual(["1 Cy", "2 Ada"]);
  await deactivatePerson(testDb(), manager, { personId: crew[2]!.personId }, clock);
  expect(await onCallLine(manager, clock)).toEqual(["1 Ada"]);
});

test("K7: another carrier's people, yards and invitations are not found, and nothing is written", async () => {
  const [here, there] = [await makeFirm(), await makeFirm()];
  const stranger = await makePerson(testDb(), there.carrier, ["driver"]);
  const input = invitee();
  await invitePerson(testDb(), there.manager, input, there.clock);
  const { personId } = stranger;
  const yardId = there.carrier.yardId;
  const own = await makePerson(testDb(), here.carrier, ["driver"]);
  const tried = [
    await changeMembership(testDb(), here.manager, place(personId), here.clock),
    await changeMembership(testDb(), here.manager, place(own.personId, { yardId }), here.clock),
    await deactivatePerson(testDb(), here.manager, { personId }, here.clock),
    await reactivatePerson(testDb(), here.manager, { personId }, here.clock),
    await endSessions(testDb(), here.manager, { personId }, here.clock),
    await revokeInvitation(testDb(), here.manager, { invitationId: input.id }, here.clock),
    await invitePerson(testDb(), here.manager, invitee({ yardId }), here.clock),
    await readMember(testDb(), here.manager, personId),
  ];
  expect(tried.map(codeOf)).toEqual(tried.map(() => "not-found"));
  const written = await testDb()
    .select()
    .from(audit)
    .where(eq(audit.carrierId, here.carrier.carrierId));
  expect(written).toEqual([]);
});

test("every change of people is in the audit and in the feed, and names no address", async () => {
  const firm = await makeFirm();
  const { input } = await inviteAndAccept(firm);
  const { id: personId } = (await personByEmail(input.email))!;
  await changeMembership(
    testDb(),
    firm.manager,
    place(personId, { roles: ["driver"] }),
    firm.clock,
  );
  await deactivatePerson(testDb(), firm.manager, { personId }, firm.clock);
  const { carrierId } = firm.carrier;
  const audited = await testDb().select().from(audit).where(eq(audit.carrierId, carrierId));
  const actions = ["person.invite", "person.join", "person.change", "person.deactivate"];
  expect(audited.map((row) => row.action).sort()).toEqual([...actions].sort());
  const feed = await testDb()
    .select()
    .from(changes)
    .where(eq(changes.carrierId, carrierId))
    .orderBy(changes.seq);
  expect(feed.map((row) => row.kind)).toEqual(actions);
  expect(feed.map((row) => row.seq)).toEqual([1, 2, 3, 4]);
  expect(JSON.stringify([audited, feed])).not.toContain(input.email);
});

async function signIn(email: string, clock: TestClock) {
  const who = { email, device: "Chrome, Android", previousToken: null };
  const started = await startSession(testDb(), who, clock.now());
  return started!.token;
}

test("a person lists their own sessions and ends one, or all others", async () => {
  const firm = await makeFirm();
  const { input } = await inviteAndAccept(firm);
  const [phone, tablet, desk] = [
    await signIn(input.email, firm.clock),
    await signIn(input.email, firm.clock),
    await signIn(input.email, firm.clock),
  ];
  const open = (token: string) => openSession(testDb(), token, firm.clock.now());
  const { actor, sessionId: keep } = (await open(phone))!;
  const listed = await listSessions(testDb(), actor, firm.clock.now());
  expect(listed).toHaveLength(3);
  await revokeSession(testDb(), actor, { sessionId: (await open(tablet))!.sessionId }, firm.clock);
  expect(await open(tablet)).toBeNull();
  const ended = await revokeOtherSessions(testDb(), actor, { keep }, firm.clock);
  expect(ended).toEqual({ ok: true, value: { ended: 1 } });
  expect(await open(desk)).toBeNull();
  expect(await open(phone)).not.toBeNull();
});

test("nobody ends somebody else's session by its id", async () => {
  const firm = await makeFirm();
  const { input } = await inviteAndAccept(firm);
  const token = await signIn(input.email, firm.clock);
  const { sessionId } = (await openSession(testDb(), token, firm.clock.now()))!;
  const tried = await revokeSession(testDb(), firm.manager, { sessionId }, firm.clock);
  expect(codeOf(tried)).toBe("not-found");
  expect(await openSession(testDb(), token, firm.clock.now())).not.toBeNull();
});

test("a manager signs a lost phone out", async () => {
  const firm = await makeFirm();
  const { input } = await inviteAndAccept(firm);
  const token = await signIn(input.email, firm.clock);
  const { id: personId } = (await personByEmail(input.email))!;
  await endSessions(testDb(), firm.manager, { personId }, firm.clock);
  expect(await openSession(testDb(), token, firm.clock.now())).toBeNull();
});

test("a session switches to another of the person's carriers, never to a stranger's or an ended one", async () => {
  const [here, there, strange] = [await makeFirm(), await makeFirm(), await makeFirm()];
  const { input } = await inviteAndAccept(here);
  await inviteAndAccept(there, { ...input, id: uuidv7(), roles: ["mechanic"] });
  const token = await signIn(input.email, here.clock);
  const open = async () => (await openSession(testDb(), token, here.clock.now()))!;
  const { actor, sessionId } = await open();
  const account = await readOwnAccount(testDb(), actor);
  expect(account.carriers.map((carrier) => carrier.id).sort()).toEqual(
    [here.carrier.carrierId, there.carrier.carrierId].sort(),
  );
  const to = (carrierId: string) => switchCarrier(testDb(), actor, { sessionId, carrierId });
  expect(codeOf(await to(strange.carrier.carrierId))).toBe("not-found");
  const other = account.carriers.find((carrier) => carrier.id !== actor.carrierId)!.id;
  expect((await to(other)).ok).toBe(true);
  expect((await open()).actor.carrierId).toBe(other);
  const back = actor.carrierId === here.carrier.carrierId ? here : there;
  await deactivatePerson(testDb(), back.manager, { personId: actor.personId }, back.clock);
  expect(codeOf(await to(back.carrier.carrierId))).toBe("not-found");
});

test("a person keeps their own number", async () => {
  const { manager } = await makeFirm();
  await changeOwnPhone(testDb(), manager, { phone: "303 555 0142" });
  expect((await readOwnAccount(testDb(), manager)).phone).toBe("303 555 0142");
});

function faultsOf(parsed: { error?: { issues: { path: PropertyKey[]; message: string }[] } }) {
  return parsed.error?.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
}

test("a bad invitation names each field and the fix", () => {
  const bad = {
    id: uuidv7(),
    email: "lou at home",
    name: " ",
    roles: [],
    certifier: true,
    yardId: "x",
  };
  expect(faultsOf(inviteSchema.safeParse(bad))).toEqual([
    "email: email-form",
    "name: person-name",
    "roles: roles-empty",
    "yardId: yard-unknown",
  ]);
  const dispatcher = invitee({ roles: ["dispatcher" as never], certifier: true });
  expect(faultsOf(inviteSchema.safeParse(dispatcher))).toEqual(["certifier: certifier-role"]);
  expect(inviteSchema.parse(invitee({ email: "  LOU@Example.Test " })).email).toBe(
    "lou@example.test",
  );
});

test("a bad place in the on-call line and an unknown role are refused", () => {
  const bad = place(uuidv7(), { onCall: 0, roles: ["owner" as never] });
  expect(faultsOf(membershipSchema.safeParse(bad))).toEqual([
    "roles.0: roles-empty",
    "onCall: on-call-place",
  ]);
});

test("a new carrier has a policy, a yard and a manager who can sign in", async () => {
  const clock = new TestClock();
  const input = addCarrierSchema.parse({
    name: "Bent Willow Pumping",
    managerName: "Ona Reyes",
    managerEmail: "Ona@Example.Test",
    yard: "Creek Yard",
    zone: "America/Boise",
    elevationM: "820",
  });
  const added = await addCarrier(testDb(), input, clock);
  if (!added.ok) throw new Error("refused");
  const token = await signIn("ona@example.test", clock);
  const signedIn = await openSession(testDb(), token, clock.now());
  expect(signedIn).toMatchObject({
    carrierName: "Bent Willow Pumping",
    actor: { roles: ["manager"] },
  });
  expect((await readPolicy(testDb(), added.value.carrierId)).version).toBe(1);
  const feed = await testDb()
    .select()
    .from(changes)
    .where(and(eq(changes.carrierId, added.value.carrierId), eq(changes.seq, 1)));
  expect(feed).toHaveLength(1);
});
