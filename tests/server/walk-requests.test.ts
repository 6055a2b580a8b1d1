import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeEach, expect, test } from "vitest";
import { sessions } from "~/db/schema/people";
import { answers, conflicts, readings, walks } from "~/db/schema/walks";
import type { Actor } from "~/domain/actor";
import * as walksRoute from "~/routes/api/walks";
import { problemOf, sendBytes, signedIn } from "./api-requests";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import type { TestBrowser } from "./requests";
import {
  HOUR,
  makeTruckToWalk,
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

interface Receipt {
  id: string;
  hash: string;
  receivedAt: string;
  standing: string;
  clearsNot: string | null;
  missing: string[];
}

const post = (
  body: string,
  headers: Record<string, string> = { "Keypeg-Age": "0" },
  by = browser,
) =>
  sendBytes(by, walksRoute, "/api/v1/walks", {
    body,
    headers: { "Content-Type": "application/json", ...headers },
  });
const receiptOf = (answer: { data: unknown }) => answer.data as Receipt;

test("a walk comes by the API and is answered with its receipt: id, hash of the bytes as sent, standing", async () => {
  const body = walkBody(truck);
  // As a phone may write it: spaces, order and escapes are part of what is hashed.
  const bytes = JSON.stringify(body, null, 1).replace("A Signer", "\\u0041 Signer");
  const before = Date.now();
  const answer = await post(bytes, { "Keypeg-Age": String(HOUR) });
  expect(answer.status).toBe(200);
  expect(answer.headers.get("Keypeg-Receipt")).toBe(body.id);
  expect(answer.headers.get("Cache-Control")).toBe("no-store");
  expect(receiptOf(answer)).toMatchObject({
    id: body.id,
    hash: sha256(bytes),
    standing: "cleared",
    clearsNot: null,
    missing: [],
  });
  const row = await storedWalk(testDb(), truck, body.id);
  expect(row).toMatchObject({ driverId: driver.personId, ageMs: HOUR });
  expect(row!.receivedAt.getTime()).toBeGreaterThanOrEqual(before - 1);
  expect(row!.receivedAt.getTime() - row!.countsFrom.getTime()).toBe(HOUR);
});

test("K4: the same bytes from another session of the same driver bring the same receipt", async () => {
  const bytes = JSON.stringify(walkBody(truck));
  const first = await post(bytes);
  const again = await post(bytes, { "Keypeg-Age": "90000" }, await signedIn(driver));
  expect([again.status, again.data]).toEqual([200, first.data]);
  expect(again.headers.get("Keypeg-Receipt")).toBe(first.headers.get("Keypeg-Receipt"));
  expect(await testDb().select().from(walks).where(eq(walks.truckId, truck.truckId))).toHaveLength(
    1,
  );
  const mine = await testDb().select().from(sessions).where(eq(sessions.personId, driver.personId));
  expect(mine).toHaveLength(2);
});

test("K4: ten sendings at once from two sessions are one walk", async () => {
  const bytes = JSON.stringify(walkBody(truck, tagged(truck, "rear.lamps", "brake-or-turn")));
  const second = await signedIn(driver);
  const answers = await Promise.all(
    Array.from({ length: 10 }, (_, n) => post(bytes, undefined, n % 2 ? second : browser)),
  );
  expect(new Set(answers.map((answer) => JSON.stringify(answer.data)))).toHaveLength(1);
  expect(answers.map((answer) => answer.status)).toEqual(answers.map(() => 200));
  expect(await tagsOf(testDb(), truck)).toHaveLength(1);
});

test("K4: the same id with one space more is another body: 422, and both are kept", async () => {
  const body = walkBody(truck);
  await post(JSON.stringify(body));
  const answer = await post(`${JSON.stringify(body)} `);
  expect([answer.status, problemOf(answer).code]).toEqual([422, "same-id-other-body"]);
  expect(problemOf(answer).title).toMatch(/kept/i);
  expect(answer.headers.get("Keypeg-Receipt")).toBeNull();
  const kept = await testDb().select().from(conflicts).where(eq(conflicts.recordId, body.id));
  expect(kept.map((one) => one.hash)).toEqual([sha256(`${JSON.stringify(body)} `)]);
});

test("K8: verdicts, tags' titles and a standing sent by the phone are not looked at", async () => {
  const body = walkBody(truck, {
    instead: { "run-up.vacuum": { kind: "reading", value: 17, unit: "inHg", heardItOpen: true } },
  });
  const [beside] = tagged(truck, "rear.sight-glass", "cannot-read").tags;
  const sent = {
    ...body,
    standing: "cleared",
    complete: true,
    clearsNot: null,
    readings: [{ checkKey: "run-up.vacuum", verdict: "in-band", si: 67_000 }],
    answers: {
      ...body.answers,
      "run-up.vacuum": { ...body.answers["run-up.vacuum"], verdict: "in-band", si: 67_000 },
    },
    tags: [{ ...beside, title: "Nothing", roadSafety: false, limit: null, driverFix: true }],
    receivedAt: "2020-01-01T00:00:00Z",
    driverId: uuidv7(),
  };
  const answer = await post(JSON.stringify(sent));
  expect(receiptOf(answer).standing).toBe("limited");
  const hung = await tagsOf(testDb(), truck);
  expect(hung.map((tag) => tag.problemKey).sort()).toEqual(["cannot-read", "opens-low"]);
  expect(hung.find((tag) => tag.problemKey === "cannot-read")).toMatchObject({
    driverFix: false,
    raisedBy: driver.personId,
    limit: { kind: "fill-no-more" },
  });
  const [reading] = await testDb()
    .select()
    .from(readings)
    .where(and(eq(readings.walkId, body.id), eq(readings.checkKey, "run-up.vacuum")));
  expect(reading?.verdict).toBe("below");
  expect(reading?.si).toBeCloseTo(17 * 3386.388640341, 6);
});

test("K6: a walk without its age, or with one that is no number of milliseconds, is stored and clears nothing", async () => {
  const headers: Record<string, string>[] = [
    {},
    { "Keypeg-Age": "" },
    { "Keypeg-Age": "soon" },
    { "Keypeg-Age": "1e3" },
    { "Keypeg-Age": "12.5" },
    { "Keypeg-Age": "NaN" },
    { "Keypeg-Age": "0x10" },
    { "Keypeg-Age": "9999999999999" },
  ];
  for (const header of headers) {
    const answer = await post(JSON.stringify(walkBody(truck)), header);
    expect(answer.status, JSON.stringify(header)).toBe(200);
    expect(receiptOf(answer).clearsNot, JSON.stringify(header)).toBe("age-unknown");
  }
  expect((await truckRow(testDb(), truck)).standing).toBe("walk-due");
});

test("K6: the header of a clock jump and ages past belief are heard", async () => {
  for (const [header, why] of [
    [{ "Keypeg-Age": "1000", "Keypeg-Clock-Jumped": "1" }, "clock-jumped"],
    [{ "Keypeg-Age": "-1" }, "age-negative"],
    [{ "Keypeg-Age": String(24 * HOUR + 1) }, "age-over-24h"],
    [{ "Keypeg-Age": "-999999999999" }, "age-negative"],
    [{ "Keypeg-Age": "999999999999" }, "age-over-24h"],
  ] as [Record<string, string>, string][]) {
    const answer = await post(JSON.stringify(walkBody(truck)), header);
    expect([answer.status, receiptOf(answer).clearsNot]).toEqual([200, why]);
  }
});

test("K6: a walk signed a year ahead by the phone's clock is taken, and counts from now", async () => {
  const signedAt = new Date(Date.now() + 365 * 24 * HOUR).toISOString();
  const body = walkBody(truck, { signedAt });
  const answer = await post(JSON.stringify(body));
  expect([answer.status, receiptOf(answer).standing]).toEqual([200, "cleared"]);
  const row = await storedWalk(testDb(), truck, body.id);
  expect(row?.countsFrom.getTime()).toBeLessThanOrEqual(Date.now());
});

test("K7: signed out, of another role, from another site: nothing is stored", async () => {
  const bytes = JSON.stringify(walkBody(truck));
  for (const roles of [["mechanic"], ["dispatcher"], ["manager"]] as const) {
    const person = await makePerson(testDb(), carrier, [...roles]);
    const answer = await post(bytes, undefined, await signedIn(person));
    expect([answer.status, problemOf(answer).code], roles[0]).toEqual([403, "not-allowed"]);
  }
  const crossSite = await browser.send(walksRoute, "/api/v1/walks", {
    form: {},
    headers: { Origin: "https://else.example" },
  });
  expect(crossSite.status).toBe(403);
  browser.cookies.clear();
  const answer = await post(bytes);
  expect([answer.status, problemOf(answer).code]).toEqual([401, "signed-out"]);
  expect(await testDb().select().from(walks).where(eq(walks.truckId, truck.truckId))).toEqual([]);
});

test("K7: a truck of another carrier is the same 404 as a truck of nobody", async () => {
  const elsewhere = await makeCarrier(testDb(), clock);
  const theirs = await makeTruckToWalk(testDb(), elsewhere, clock);
  const seq = (await truckRow(testDb(), theirs)).gateSeq;
  const foreign = await post(JSON.stringify(walkBody(theirs)));
  const unknown = await post(JSON.stringify(walkBody(truck, { truckId: uuidv7() })));
  expect(foreign.status).toBe(404);
  expect(foreign.data).toEqual(unknown.data);
  expect((await truckRow(testDb(), theirs)).gateSeq).toBe(seq);
});

test("a refused walk is sent again as it is once the cause is gone", async () => {
  const base = walkBody(truck);
  const bytes = JSON.stringify(walkBody(truck, { kind: "takeover", baseWalkId: base.id }));
  const early = await post(bytes);
  expect(early.status).toBe(400);
  expect(problemOf(early).errors).toEqual([
    { pointer: "#/baseWalkId", code: "unknown-walk", detail: "That walk is not on this truck." },
  ]);
  await post(JSON.stringify(base));
  expect((await post(bytes)).status).toBe(200);
});

test("emoji, four-byte letters and line breaks are kept as they were typed", async () => {
  const note = "Räder 🛞🔧 𠜎𠜱\nzweite Zeile \u0000 ende — “so”";
  const found = tagged(truck, "rear.lamps", "marker-or-plate", { note });
  const body = walkBody(truck, {
    ...found,
    instead: {
      ...found.instead,
      "driver-side.fuel": { kind: "could-not-check", reason: "🧊".repeat(500) },
    },
    signature: { name: "Zoë 𝒜 O’Hara", wording: "walk" },
  });
  expect((await post(JSON.stringify(body))).status).toBe(200);
  const hung = await tagsOf(testDb(), truck);
  expect(hung.map((tag) => tag.note).sort()).toEqual([note, "🧊".repeat(500)].sort());
  const row = await storedWalk(testDb(), truck, body.id);
  expect(row?.signature).toEqual({ name: "Zoë 𝒜 O’Hara", wording: "walk" });
  const [stored] = await testDb()
    .select()
    .from(answers)
    .where(and(eq(answers.walkId, body.id), eq(answers.checkKey, "driver-side.fuel")));
  expect(stored?.body).toEqual(body.answers["driver-side.fuel"]);
});
