import { and, eq } from "drizzle-orm";
import { beforeEach, expect, test } from "vitest";
import { clearances } from "~/db/schema/handovers";
import { rounds } from "~/db/schema/trucks";
import type { Actor } from "~/domain/actor";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import {
  accepted,
  allGood,
  HOUR,
  makeTruckToWalk,
  sendWalk,
  storedWalk,
  type TruckToWalk,
  tagged,
  tagsOf,
  walkBody,
} from "./walk-bodies";

let clock: TestClock;
let carrier: TestCarrier;
let driver: Actor;
let truck: TruckToWalk;

async function begin(iso?: string, zone?: string): Promise<void> {
  const db = testDb();
  clock = new TestClock(iso === undefined ? undefined : Date.parse(iso));
  carrier = await makeCarrier(db, clock, {}, zone);
  driver = await makePerson(db, carrier, ["driver"]);
  truck = await makeTruckToWalk(db, carrier, clock);
}

beforeEach(() => begin());

type Age = Parameters<typeof sendWalk>[4];
const send = (body: ReturnType<typeof walkBody>, age: Age = {}) =>
  sendWalk(testDb(), driver, body, clock, age);
const ago = (ms: number) => new Date(clock.now().getTime() - ms);

async function clearance() {
  const [own] = await testDb()
    .select()
    .from(clearances)
    .where(and(eq(clearances.truckId, truck.truckId), eq(clearances.driverId, driver.personId)));
  return own ?? null;
}

const held = () => tagged(truck, "rear.lamps", "brake-or-turn");

test("K6: a walk counts from when it came less its age, and clears from there on", async () => {
  for (const ageMs of [0, 1, HOUR, 24 * HOUR - 1]) {
    await begin();
    const body = walkBody(truck);
    const receipt = accepted(await send(body, { ageMs }));
    expect(receipt, String(ageMs)).toMatchObject({ clearsNot: null, standing: "cleared" });
    expect(await storedWalk(testDb(), truck, body.id)).toMatchObject({
      ageMs,
      receivedAt: clock.now(),
      countsFrom: ago(ageMs),
      clearsNot: null,
    });
    expect((await clearance())?.validUntil).toEqual(ago(ageMs - 24 * HOUR));
  }
});

test("K6: exactly twenty-four hours old is believed, and over at that instant", async () => {
  const body = walkBody(truck);
  const receipt = accepted(await send(body, { ageMs: 24 * HOUR }));
  expect(receipt).toMatchObject({ clearsNot: null, standing: "walk-due" });
  expect((await storedWalk(testDb(), truck, body.id))?.countsFrom).toEqual(ago(24 * HOUR));
});

test("K6: an age that is missing, negative, over a day or across a clock jump clears nothing; its tags hold", async () => {
  const cases: [Age, string, number][] = [
    [{ ageMs: null }, "age-unknown", 0],
    [{ ageMs: -1 }, "age-negative", 0],
    [{ ageMs: -400 * 24 * HOUR }, "age-negative", 0],
    [{ ageMs: 24 * HOUR + 1 }, "age-over-24h", 24 * HOUR + 1],
    [{ ageMs: 400 * 24 * HOUR }, "age-over-24h", 400 * 24 * HOUR],
    [{ ageMs: HOUR, clockJumped: true }, "clock-jumped", HOUR],
    [{ ageMs: 0, clockJumped: true }, "clock-jumped", 0],
  ];
  for (const [age, why, counted] of cases) {
    await begin();
    const db = testDb();
    const good = walkBody(truck);
    expect(accepted(await send(good, age)), why).toMatchObject({
      clearsNot: why,
      standing: "walk-due",
      missing: [],
    });
    expect(await storedWalk(db, truck, good.id)).toMatchObject({
      complete: true,
      clearsNot: why,
      countsFrom: ago(counted),
      ageMs: age?.ageMs ?? 0,
    });
    expect(await clearance()).toBeNull();
    const bad = walkBody(truck, held());
    expect(accepted(await send(bad, age)).standing, why).toBe("held");
    expect((await truckRow(db, truck)).openReds).toBe(1);
    expect((await tagsOf(db, truck))[0]).toMatchObject({ raisedAt: ago(counted) });
  }
});

test("K6: a walk older than the one in force replaces nothing when it comes late, yet its tags hold", async () => {
  const db = testDb();
  const newer = walkBody(truck);
  accepted(await send(newer, { ageMs: HOUR }));
  const before = await clearance();
  const late = walkBody(truck, { instead: { "run-up.pressure": undefined } });
  expect(accepted(await send(late, { ageMs: 5 * HOUR })).clearsNot).toBeNull();
  expect(await clearance()).toEqual(before);
  expect(before).toMatchObject({ walkId: newer.id, validUntil: ago(-23 * HOUR) });
  // The newest walk ran both halves: the older one's limit is not in force.
  expect((await truckRow(db, truck)).limitsMask).toBe(0);
  expect(accepted(await send(walkBody(truck, held()), { ageMs: 6 * HOUR })).standing).toBe("held");
  expect((await clearance())?.walkId).toBe(newer.id);
});

test("K6: an after walk that comes late does not end a walk made since", async () => {
  accepted(await send(walkBody(truck), { ageMs: HOUR }));
  accepted(await send(walkBody(truck, { kind: "after" }), { ageMs: 2 * HOUR }));
  expect((await clearance())?.validUntil).toEqual(ago(-23 * HOUR));
});

test("K6: the phone's clock, ahead or behind by a year or forty, changes nothing but what is kept of it", async () => {
  const phones = [
    "2027-06-02T11:00:00.000Z",
    "2066-01-01T00:00:00.000+14:00",
    "1970-01-01T00:00:00.000Z",
    "2026-06-02T05:00:00-06:00",
  ];
  for (const signedAt of phones) {
    await begin();
    const body = walkBody(truck, { signedAt });
    expect(accepted(await send(body, { ageMs: HOUR })).standing, signedAt).toBe("cleared");
    expect(await storedWalk(testDb(), truck, body.id)).toMatchObject({
      signedAt: new Date(signedAt),
      countsFrom: ago(HOUR),
      yardDay: "2026-06-02",
    });
    expect((await clearance())?.validUntil).toEqual(ago(-23 * HOUR));
  }
});

test("K6: the same walk sent later again counts from its first arrival", async () => {
  const body = walkBody(truck);
  accepted(await send(body, { ageMs: HOUR }));
  const before = await clearance();
  clock.turn(3 * HOUR);
  accepted(await send(body, { ageMs: 0 }));
  expect(await clearance()).toEqual(before);
});

test("the day of a walk is the yard's own, on either side of its midnight", async () => {
  // Denver keeps UTC-6 in June: 06:00 UTC is midnight.
  await begin("2026-06-03T06:30:00Z");
  for (const [ageMs, day] of [
    [40 * 60_000, "2026-06-02"],
    [20 * 60_000, "2026-06-03"],
    [30 * 60_000, "2026-06-03"],
    [30 * 60_000 + 1, "2026-06-02"],
  ] as const) {
    const body = walkBody(truck);
    accepted(await send(body, { ageMs }));
    expect((await storedWalk(testDb(), truck, body.id))?.yardDay, String(ageMs)).toBe(day);
  }
});

test("yards far east and west of here keep their own day", async () => {
  for (const [zone, day] of [
    ["Pacific/Kiritimati", "2026-06-03"],
    ["Pacific/Pago_Pago", "2026-06-01"],
    ["Asia/Kathmandu", "2026-06-02"],
  ] as const) {
    await begin("2026-06-02T10:30:00Z", zone);
    const body = walkBody(truck);
    accepted(await send(body));
    expect((await storedWalk(testDb(), truck, body.id))?.yardDay, zone).toBe(day);
  }
});

test("in the night the clocks change a walk counts twenty-four hours, not a day on the dial", async () => {
  // Denver: 1 November 2026, 02:00 becomes 01:00; 8 March 2026, 02:00 becomes 03:00.
  for (const [iso, day] of [
    ["2026-11-01T05:30:00Z", "2026-10-31"],
    ["2026-11-01T07:30:00Z", "2026-11-01"],
    ["2026-11-01T08:30:00Z", "2026-11-01"],
    ["2026-11-02T06:59:59Z", "2026-11-01"],
    ["2026-11-02T07:00:00Z", "2026-11-02"],
    ["2026-03-08T06:59:59Z", "2026-03-07"],
    ["2026-03-08T09:30:00Z", "2026-03-08"],
    ["2026-03-09T05:59:59Z", "2026-03-08"],
    ["2026-03-09T06:00:00Z", "2026-03-09"],
  ] as const) {
    await begin(iso);
    const body = walkBody(truck);
    accepted(await send(body));
    expect((await storedWalk(testDb(), truck, body.id))?.yardDay, iso).toBe(day);
    expect((await clearance())?.validUntil, iso).toEqual(ago(-24 * HOUR));
  }
});

test("a walk from before the yard's midnight still clears after it", async () => {
  await begin("2026-06-03T05:50:00Z");
  const body = walkBody(truck);
  accepted(await send(body));
  expect((await storedWalk(testDb(), truck, body.id))?.yardDay).toBe("2026-06-02");
  clock.turn(8 * HOUR);
  expect((await clearance())?.validUntil.getTime()).toBeGreaterThan(clock.now().getTime());
  expect((await truckRow(testDb(), truck)).standing).toBe("cleared");
});

test("a weekly round done in a walk carries the day the walk counts from", async () => {
  await begin("2026-06-03T06:30:00Z");
  const body = walkBody(truck, { answers: allGood(truck, "before", true) });
  accepted(await send(body, { ageMs: HOUR }));
  const [row] = await testDb().select().from(rounds).where(eq(rounds.walkId, body.id));
  expect(row).toMatchObject({ kind: "weekly", doneOn: "2026-06-02", doneAt: ago(HOUR) });
});
