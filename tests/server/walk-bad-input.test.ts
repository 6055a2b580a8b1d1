import { eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { photos, tagChanges } from "~/db/schema/tags";
import { answers, conflicts, receipts, walks } from "~/db/schema/walks";
import type { Actor } from "~/domain/actor";
import { handleError, loadContext } from "~/entry.server";
import * as walksRoute from "~/routes/api/walks";
import { problemOf, sendBytes, signedIn } from "./api-requests";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import type { TestBrowser } from "./requests";
import {
  accepted,
  makeTruckToWalk,
  sendWalk,
  sha256,
  storedWalk,
  type TruckToWalk,
  tagged,
  tagsOf,
  walkBody,
} from "./walk-bodies";

let clock: TestClock;
let carrier: TestCarrier;
let driver: Actor;
let browser: TestBrowser;
let truck: TruckToWalk;

beforeEach(async () => {
  const db = testDb();
  clock = new TestClock(Date.now());
  carrier = await makeCarrier(db, clock);
  driver = await makePerson(db, carrier, ["driver"]);
  truck = await makeTruckToWalk(db, carrier, clock);
  browser = await signedIn(driver);
});

afterEach(() => vi.restoreAllMocks());

const post = (body: unknown, headers: Record<string, string> = {}) =>
  sendBytes(browser, walksRoute, "/api/v1/walks", {
    body: typeof body === "string" ? body : JSON.stringify(body),
    headers: { "Content-Type": "application/json", "Keypeg-Age": "0", ...headers },
  });

/** A good walk as plain data, to be spoiled. */
const good = (): Record<string, unknown> & { id: string; answers: Record<string, unknown> } =>
  structuredClone(walkBody(truck));
const answered = (checkKey: string, answer: unknown) => {
  const body = good();
  return { ...body, answers: { ...body.answers, [checkKey]: answer } };
};
const photo = (more: object = {}) => ({
  id: uuidv7(),
  tagId: null,
  sha256: sha256("a picture"),
  bytes: 9,
  ...more,
});

async function nothingStored(): Promise<void> {
  const db = testDb();
  expect(await db.select().from(walks).where(eq(walks.truckId, truck.truckId))).toEqual([]);
  expect(await tagsOf(db, truck)).toEqual([]);
  const mine = await db.select().from(receipts).where(eq(receipts.personId, driver.personId));
  expect(mine).toEqual([]);
}

/** No code of the schema library, no SQL and no path of ours reaches whoever asks. */
function expectPlainWords(text: string): void {
  expect(text).not.toMatch(
    /zod|Invalid input|received|expected|regex|insert into|Duplicate entry/i,
  );
  expect(text).not.toMatch(/node_modules|\.ts:|at async|undefined/);
}

async function expectFault(body: unknown, pointer: string, code: string): Promise<void> {
  const answer = await post(body);
  const what = `${pointer} ${code}: ${JSON.stringify(answer.data)}`;
  expect([answer.status, problemOf(answer).code], what).toEqual([400, "invalid"]);
  expect(answer.headers.get("Content-Type")).toBe("application/problem+json");
  const errors = problemOf(answer).errors ?? [];
  expect(
    errors.map((one) => [one.pointer, one.code]),
    what,
  ).toContainEqual([pointer, code]);
  for (const { detail } of errors) {
    expect(detail, what).toMatch(/^[A-Z].* .*[.…]$/);
    expectPlainWords(detail);
  }
}

test("what is no JSON, or no object, is refused as that", async () => {
  for (const body of ["", '{"id":', "a=b&c=d", "<walk/>", '{"a":NaN}', '{"a":Infinity}', "'x'"]) {
    const answer = await post(body);
    expect([answer.status, problemOf(answer).code], body).toEqual([400, "not-json"]);
  }
  for (const body of ["null", "[]", "7", '"walk"', "true"])
    await expectFault(body, "#", "wrong-type");
  await nothingStored();
});

test("a form in place of JSON is refused, whatever it calls itself", async () => {
  const form = new URLSearchParams({ id: uuidv7() }).toString();
  for (const type of ["application/x-www-form-urlencoded", "application/json", "text/plain", ""]) {
    const answer = await post(form, { "Content-Type": type });
    expect([answer.status, problemOf(answer).code], type).toEqual([400, "not-json"]);
  }
});

test("everything missing is named at once", async () => {
  const answer = await post({});
  const errors = problemOf(answer).errors ?? [];
  expect(errors.map((one) => [one.pointer, one.code])).toEqual([
    ["#/id", "missing"],
    ["#/truckId", "missing"],
    ["#/kind", "not-one-of"],
    ["#/sheetHash", "missing"],
    ["#/signedAt", "missing"],
    ["#/answers", "missing"],
    ["#/signature", "missing"],
  ]);
  await nothingStored();
});

test("ids that are none are named, each at its place", async () => {
  const [tag] = tagged(truck, "rear.lamps", "tail").tags;
  const seen = { id: uuidv7(), tagId: "x", seen: "same", colour: null, note: null };
  const ack = { id: uuidv7(), items: ["x"], satisfied: true, disputesSignOffId: null, note: null };
  const cases: [Record<string, unknown>, string][] = [
    [{ id: "7" }, "#/id"],
    [{ truckId: "T-118" }, "#/truckId"],
    [{ truckId: "'; drop table walks; --" }, "#/truckId"],
    [{ kind: "takeover", baseWalkId: "yesterday's" }, "#/baseWalkId"],
    [{ correctsWalkId: "" }, "#/correctsWalkId"],
    [{ tags: [{ ...tag, id: `${uuidv7()}0` }] }, "#/tags/0/id"],
    [{ seenTags: [seen] }, "#/seenTags/0/tagId"],
    [{ photos: [photo(), photo({ id: "one" })] }, "#/photos/1/id"],
    [{ acknowledgement: ack }, "#/acknowledgement/items/0"],
  ];
  for (const [more, pointer] of cases)
    await expectFault({ ...good(), ...more }, pointer, "not-an-id");
  await nothingStored();
});

test("fields of a walk that cannot be are named with what to send", async () => {
  const [tag] = tagged(truck, "rear.lamps", "tail").tags;
  const long = "x".repeat(1001);
  const cases: [Record<string, unknown>, string, string][] = [
    [{ kind: "round" }, "#/kind", "not-one-of"],
    [{ sheetHash: "XYZ" }, "#/sheetHash", "not-a-sha256"],
    [{ sheetHash: truck.hash.toUpperCase() }, "#/sheetHash", "not-a-sha256"],
    [{ signedAt: "yesterday" }, "#/signedAt", "not-a-time"],
    [{ signedAt: "2026-06-02T11:00:00" }, "#/signedAt", "not-a-time"],
    [{ signedAt: "2026-02-30T11:00:00Z" }, "#/signedAt", "not-a-time"],
    [{ signedAt: 1_780_000_000 }, "#/signedAt", "wrong-type"],
    [{ signedAt: "9999-12-31T23:59:59-14:00" }, "#/signedAt", "time-out-of-range"],
    [{ signedAt: "0000-01-01T00:00:00+14:00" }, "#/signedAt", "time-out-of-range"],
    [{ answers: [] }, "#/answers", "wrong-type"],
    [{ tags: [{ ...tag, colour: "green" }] }, "#/tags/0/colour", "not-one-of"],
    [{ tags: [{ ...tag, note: long }] }, "#/tags/0/note", "text-too-long"],
    [{ tags: [{ ...tag, checkKey: "x".repeat(81) }] }, "#/tags/0/checkKey", "text-too-long"],
    [{ tags: {} }, "#/tags", "wrong-type"],
    [{ signature: { name: " ", wording: "walk" } }, "#/signature/name", "signature-empty"],
    [{ signature: { name: "A Signer" } }, "#/signature/wording", "missing"],
    [{ signature: null }, "#/signature", "wrong-type"],
    [{ kind: "takeover" }, "#/baseWalkId", "takeover-needs-base"],
    [{ baseWalkId: uuidv7() }, "#/baseWalkId", "takeover-needs-base"],
    [{ photos: [photo({ bytes: 0 })] }, "#/photos/0/bytes", "number-too-small"],
    [{ photos: [photo({ bytes: 13e6 })] }, "#/photos/0/bytes", "number-too-large"],
    [{ photos: [photo({ sha256: "" })] }, "#/photos/0/sha256", "not-a-sha256"],
    [{ photos: [photo({ tagId: uuidv7() })] }, "#/photos/0/tagId", "unknown-tag"],
    [{ photos: Array.from({ length: 7 }, () => photo()) }, "#/photos/6", "too-many-photos"],
    [{ photos: Array.from({ length: 301 }, () => photo()) }, "#/photos", "list-too-long"],
  ];
  for (const [more, pointer, code] of cases)
    await expectFault({ ...good(), ...more }, pointer, code);
  await nothingStored();
});

test("answers that no sheet can ask for are named at their check", async () => {
  const hours = "cab.pump-hours";
  const leak = "cab.applied-leak-down";
  const cases: [string, unknown, string, string][] = [
    [hours, { kind: "reading", value: "12", unit: "h" }, "/value", "wrong-type"],
    [hours, { kind: "reading", value: null, unit: "h" }, "/value", "wrong-type"],
    [hours, { kind: "reading", unit: "h" }, "/value", "missing"],
    [hours, { kind: "reading", value: 12 }, "/unit", "missing"],
    [hours, { kind: "reading", value: 12, unit: "x".repeat(13) }, "/unit", "text-too-long"],
    [leak, { kind: "timed", value: 1, unit: "psi", seconds: -1 }, "/seconds", "number-too-small"],
    [leak, { kind: "timed", value: 1, unit: "psi", seconds: 1e9 }, "/seconds", "number-too-large"],
    ["rear.caps", { kind: "count", counted: -1 }, "/counted", "number-too-small"],
    ["rear.caps", { kind: "count", counted: 1.5 }, "/counted", "wrong-type"],
    ["cab.horn", { kind: "shrug" }, "/kind", "kind-unknown"],
    ["cab.horn", {}, "/kind", "kind-unknown"],
    ["cab.horn", null, "", "wrong-type"],
    ["cab.horn", "ok", "", "wrong-type"],
    ["cab.horn", { kind: "look", ok: false }, "/ok", "not-one-of"],
    ["cab.horn", { kind: "problem", problems: [] }, "/problems", "list-too-short"],
    ["cab.horn", { kind: "could-not-check", reason: "  " }, "/reason", "text-too-short"],
    [
      "pump-side.trap-drain",
      { kind: "drain", cracked: true, saw: "ran", amount: "cup", what: "nothing", shutAgain: true },
      "/what",
      "say-what-came-out",
    ],
    [
      "pump-side.trap-drain",
      { kind: "drain", cracked: true, saw: "dry", amount: "cup", what: "nothing", shutAgain: true },
      "/amount",
      "nothing-ran",
    ],
  ];
  for (const [checkKey, answer, field, code] of cases) {
    await expectFault(answered(checkKey, answer), `#/answers/${checkKey}${field}`, code);
  }
  const huge = JSON.stringify(good()).replace(/"value":[\d.]+/, '"value":1e999');
  await expectFault(huge, "#/answers/approach.load-aboard/value", "wrong-type");
  await nothingStored();
});

test("a check's key has one spelling: no second answer to one check gets by", async () => {
  for (const key of [
    "CAB.HORN",
    "cab.horn ",
    "cab.hörn",
    "cab/horn~",
    "",
    "x".repeat(81),
    "a..b",
  ]) {
    const escaped = key.replaceAll("~", "~0").replaceAll("/", "~1");
    const code = key.length > 80 ? "text-too-long" : "not-a-check-key";
    await expectFault(answered(key, { kind: "look", ok: true }), `#/answers/${escaped}`, code);
  }
  await nothingStored();
});

test("ten thousand answers are refused, three hundred are not", async () => {
  const many = (count: number) =>
    Object.fromEntries(
      Array.from({ length: count }, (_, n) => [`own.${n}`, { kind: "look", ok: true }]),
    );
  await expectFault({ ...good(), answers: many(10_000) }, "#/answers", "too-many-answers");
  await nothingStored();
  const body = { ...good(), answers: many(300) };
  expect((await post(body)).status).toBe(200);
  const stored = await testDb().select().from(answers).where(eq(answers.walkId, body.id));
  expect(stored).toHaveLength(300);
});

test("an answer to a check that is not on the sheet is kept and decides nothing", async () => {
  for (const key of ["cab.no-such-check", "constructor", "own.hasownproperty"]) {
    const answer = await post(answered(key, { kind: "look", ok: true }));
    expect([answer.status, answer.data], key).toMatchObject([
      200,
      { clearsNot: null, missing: [] },
    ]);
  }
  const polluted = JSON.stringify(good()).replace(
    '"answers":{',
    '"answers":{"__proto__":{"kind":"look","ok":true},',
  );
  expect((await post(polluted)).status).toBeLessThan(500);
  expect(({} as Record<string, unknown>).kind).toBeUndefined();
});

test("a tag for a check or a problem the sheet does not know hangs all the same (K2)", async () => {
  const [tag] = tagged(truck, "rear.lamps", "tail").tags;
  const odd = [
    { ...tag, id: uuidv7(), problemKey: "no-such-problem" },
    { ...tag, id: uuidv7(), checkKey: "no-such-check" },
  ];
  const answer = await post({ ...good(), tags: odd });
  expect([answer.status, answer.data]).toMatchObject([200, { standing: "held" }]);
  expect((await truckRow(testDb(), truck)).openReds).toBe(2);
});

test("an id twice in one walk is named, and nothing is stored", async () => {
  const [tag] = tagged(truck, "rear.lamps", "tail").tags;
  const upper = { ...tag, id: tag!.id.toUpperCase() };
  const seen = { id: uuidv7(), tagId: uuidv7(), seen: "same", colour: null, note: null };
  const one = photo();
  await expectFault({ ...good(), tags: [tag, tag] }, "#/tags/1/id", "id-twice");
  await expectFault({ ...good(), tags: [tag, upper] }, "#/tags/1/id", "id-twice");
  await expectFault({ ...good(), seenTags: [seen, seen] }, "#/seenTags/1/id", "id-twice");
  await expectFault({ ...good(), photos: [one, photo(), one] }, "#/photos/2/id", "id-twice");
  await nothingStored();
});

test("an id that another record already has is refused, and the walk is kept for a person to look at", async () => {
  const db = testDb();
  const found = tagged(truck, "rear.lamps", "tail");
  const ack = { id: uuidv7(), items: [], satisfied: true, disputesSignOffId: null, note: null };
  const seen = (tagId: string, id = uuidv7()) => ({
    id,
    tagId,
    seen: "same" as const,
    colour: null,
    note: null,
  });
  const known = photo({ tagId: found.tags[0]!.id }) as ReturnType<typeof photo>;
  const first = walkBody(truck, { ...found, photos: [known], acknowledgement: ack });
  accepted(await sendWalk(db, driver, first, clock));
  const said = seen(found.tags[0]!.id);
  accepted(await sendWalk(db, driver, walkBody(truck, { seenTags: [said] }), clock));
  const seq = (await truckRow(db, truck)).gateSeq;
  const again = [
    { ...good(), tags: found.tags },
    { ...good(), photos: [{ ...known, tagId: null }] },
    { ...good(), acknowledgement: ack },
    { ...good(), seenTags: [said] },
  ];
  for (const body of again) {
    const answer = await post(body);
    const what = JSON.stringify(answer.data);
    expect([answer.status, problemOf(answer).code], what).toEqual([422, "same-id-other-body"]);
    expectPlainWords(what);
    expect(await storedWalk(db, truck, body.id)).toBeNull();
    const kept = await db.select().from(conflicts).where(eq(conflicts.recordId, body.id));
    expect(kept).toHaveLength(1);
  }
  expect((await truckRow(db, truck)).gateSeq).toBe(seq);
  expect(await tagsOf(db, truck)).toHaveLength(1);
  expect(await db.select().from(tagChanges).where(eq(tagChanges.id, said.id))).toHaveLength(1);
  expect(await db.select().from(photos).where(eq(photos.id, known.id))).toHaveLength(1);
});

test("a body nested a hundred thousand deep does no harm, first or second under its id", async () => {
  const nested = (depth: number) => "[".repeat(depth) + "]".repeat(depth);
  const withSheet = (body: object, depth: number) =>
    JSON.stringify({ ...body, sheet: 1 }).replace('"sheet":1', `"sheet":${nested(depth)}`);
  const body = good();
  expect((await post(withSheet(body, 100_000))).status).toBe(200);
  for (const depth of [10, 50, 99_999]) {
    const answer = await post(withSheet(body, depth));
    expect([answer.status, problemOf(answer).code], String(depth)).toEqual([
      422,
      "same-id-other-body",
    ]);
  }
  const kept = await testDb().select().from(conflicts).where(eq(conflicts.recordId, body.id));
  expect(kept).toHaveLength(3);
  const deepAnswer = JSON.stringify(good()).replace(
    '"answers":{',
    `"answers":{"x":${'{"a":'.repeat(50_000)}1${"}".repeat(50_000)},`,
  );
  await expectFault(deepAnswer, "#/answers/x/kind", "kind-unknown");
});

test("what a driver typed is never in the answer to bad input", async () => {
  const note = "Call Marta at 555-0143 about her divorce";
  const [tag] = tagged(truck, "rear.lamps", "tail", { note }).tags;
  const bad = [
    { ...good(), tags: [{ ...tag, colour: "green" }] },
    { ...good(), tags: [{ ...tag, note: note.repeat(40) }] },
    { ...good(), kind: note },
    { ...good(), signedAt: note },
    { ...good(), signature: { name: note.repeat(3), wording: "walk" } },
    answered("cab.horn", { kind: note }),
  ];
  for (const body of bad) {
    const answer = await post(body);
    expect(answer.status).toBe(400);
    expect(JSON.stringify(answer.data)).not.toMatch(/Marta|555-0143/);
  }
});

test("an error of the database reaches the log without what was typed or who typed it", async () => {
  const lines: string[] = [];
  vi.spyOn(console, "error").mockImplementation((...said: unknown[]) => {
    lines.push(said.map(String).join(" "));
  });
  const note = "Call Marta at 555-0143";
  const found = tagged(truck, "rear.lamps", "tail", { note });
  const body = walkBody(truck, { ...found, signature: { name: "Marta Ruiz", wording: "walk" } });
  // A driver whom the carrier no longer knows: the walk's foreign key fails, deep in the command.
  const gone = { ...driver, personId: uuidv7() };
  const failure = await sendWalk(testDb(), gone, body, clock).catch((error: unknown) => error);
  expect(String((failure as Error).message)).toMatch(/Marta/);
  const request = new Request("http://keypeg.example/api/v1/walks?name=Marta", { method: "POST" });
  const context = loadContext({ address: "192.0.2.7", requestId: "request-of-a-test" });
  handleError(failure, { request, context });
  expect(lines).toHaveLength(1);
  expect(lines[0]).toMatch(/"path":"\/api\/v1\/walks"/);
  expect(lines[0]).toMatch(/errno 1452/);
  expect(lines[0]).toContain("request-of-a-test");
  expect(lines[0]).not.toMatch(/Marta|555|Ruiz|insert|params|name=/i);
  expect(lines[0]).not.toContain(driver.name);
});
