import { eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeAll, expect, test } from "vitest";
import { trucks } from "~/db/schema/trucks";
import type { Actor } from "~/domain/actor";
import type { Result } from "~/domain/refusals";
import { addYard } from "~/domain/yards/add-yard";
import { changeYard } from "~/domain/yards/change-yard";
import { listYards, readYard } from "~/domain/yards/read-yards";
import { shownElevation, yardSchema } from "~/domain/yards/yard-input";
import { refusalText } from "~/text/en/refusals";
import { testDb } from "./database";
import {
  makeCarrier,
  makePerson,
  makeTruck,
  type TestCarrier,
  TestClock,
  truckRow,
} from "./factories";

const clock = new TestClock();
let ours: TestCarrier;
let manager: Actor;
let stranger: Actor;
let serial = 0;

beforeAll(async () => {
  ours = await makeCarrier(testDb(), clock);
  manager = await makePerson(testDb(), ours, ["manager"]);
  stranger = await makePerson(testDb(), await makeCarrier(testDb(), clock), ["manager"]);
});

function typed(more: Record<string, unknown> = {}) {
  serial += 1;
  return yardSchema.parse({
    name: `Yard ${serial}`,
    zone: "America/Denver",
    elevation: "6,496",
    elevationUnit: "ft",
    shopOpens: "05:30",
    ...more,
  });
}

function faults(result: Result<unknown>): Record<string, string> {
  if (result.ok) throw new Error("went through");
  const fields = result.refusal.fields ?? [];
  return Object.fromEntries(
    fields.map(({ pointer, code, values }) => [pointer, refusalText.field(code, values)]),
  );
}

async function newYard(more: Record<string, unknown> = {}): Promise<string> {
  const added = await addYard(testDb(), manager, typed(more), clock);
  if (!added.ok) throw new Error(JSON.stringify(added.refusal));
  return added.value.id;
}

test("a yard's elevation is typed in feet or meters and kept in meters", async () => {
  const high = await readYard(testDb(), ours.carrierId, await newYard());
  expect(high?.elevationM).toBeCloseTo(1980, 0);
  expect(high?.shopOpensMinute).toBe(330);
  const low = await newYard({ elevation: "240", elevationUnit: "m" });
  expect((await readYard(testDb(), ours.carrierId, low))?.elevationM).toBe(240);
});

test("an elevation outside the roads of the earth, or in gallons, is refused at its field", async () => {
  const add = async (more: Record<string, unknown>) =>
    faults(await addYard(testDb(), manager, typed(more), clock));
  expect((await add({ elevation: "17000" }))["/elevation"]).toBe(
    "Type an elevation from -1410 to 16404 ft.",
  );
  expect((await add({ elevation: "-431", elevationUnit: "m" }))["/elevation"]).toBe(
    "Type an elevation from -430 to 5000 m.",
  );
  expect((await add({ elevationUnit: "gal" }))["/elevationUnit"]).toContain(
    "does not measure this",
  );
  expect((await add({ elevationUnit: "cubit" }))["/elevationUnit"]).toContain("Choose a unit");
});

test("a zone nobody knows, a bad clock, telephone or name is refused with words for the field", () => {
  const words = (more: Record<string, unknown>) => {
    const base = { name: "N", zone: "UTC", elevation: 1, elevationUnit: "m", shopOpens: "06:00" };
    const result = yardSchema.safeParse({ ...base, ...more });
    return result.error?.issues.map((issue) => refusalText.field(issue.message));
  };
  expect(words({ zone: "America/Atlantis" })).toEqual([
    "Choose a time zone from the list, such as America/Denver.",
  ]);
  expect(words({ shopOpens: "6 am" })?.[0]).toContain("06:00");
  expect(words({ phone: "call Bob" })?.[0]).toContain("telephone");
  expect(words({ name: "  " })?.[0]).toContain("Name the yard");
  expect(words({ elevation: "high" })?.[0]).toContain("Type a number");
  expect(words({})).toBeUndefined();
});

test("two yards of one firm do not share a name; two firms may", async () => {
  const yardId = await newYard({ name: "North Yard" });
  const sentTwice = await addYard(testDb(), manager, typed({ name: "North Yard" }), clock);
  expect(sentTwice).toEqual({ ok: true, value: { id: yardId } });
  const otherClock = typed({ name: "North Yard", shopOpens: "07:15" });
  const again = await addYard(testDb(), manager, otherClock, clock);
  expect(faults(again)["/name"]).toContain("another name");
  const other = await newYard({ name: "South Yard" });
  const renamed = { ...typed({ name: "North Yard" }), yardId: other };
  expect(faults(await changeYard(testDb(), manager, renamed, clock))["/name"]).toBeDefined();
  const kept = { ...typed({ name: "North Yard" }), yardId };
  expect((await changeYard(testDb(), manager, kept, clock)).ok).toBe(true);
  const theirs = await addYard(testDb(), stranger, typed({ name: "North Yard" }), clock);
  expect(theirs.ok).toBe(true);
});

test("other air in the yard ends its trucks' walks; another name, clock or the same elevation does not", async () => {
  const yardId = await newYard({ elevation: "240", elevationUnit: "m" });
  const truck = await makeTruck(testDb(), { ...ours, yardId }, clock);
  const elsewhere = await makeTruck(testDb(), ours, clock);
  const before = await truckRow(testDb(), truck);
  const change = async (more: Record<string, unknown>) =>
    changeYard(testDb(), manager, { ...typed(more), yardId }, clock);
  // As the form shows it: whole feet.
  const same = { elevation: shownElevation(240), elevationUnit: "ft", zone: "America/Chicago" };
  expect((await change(same)).ok).toBe(true);
  const renamed = await truckRow(testDb(), truck);
  expect(renamed.setupVersion).toBe(before.setupVersion);
  expect(renamed.gateSeq).toBe(before.gateSeq + 1);
  expect(renamed.standing).toBe("walk-due");
  expect((await readYard(testDb(), ours.carrierId, yardId))?.elevationM).toBe(240);
  expect((await change({ elevation: 900, elevationUnit: "ft" })).ok).toBe(true);
  expect((await truckRow(testDb(), truck)).setupVersion).toBe(before.setupVersion + 1);
  expect((await truckRow(testDb(), elsewhere)).setupVersion).toBe(1);
});

test("a yard counts its trucks, and another firm's yard is not there", async () => {
  const yardId = await newYard();
  await makeTruck(testDb(), { ...ours, yardId }, clock);
  await makeTruck(testDb(), { ...ours, yardId }, clock);
  const listed = (await listYards(testDb(), manager)).find((yard) => yard.id === yardId);
  expect(listed?.trucks).toBe(2);
  expect((await listYards(testDb(), stranger)).some((yard) => yard.id === yardId)).toBe(false);
  const input = { ...typed(), yardId };
  expect((await changeYard(testDb(), stranger, input, clock)).ok).toBe(false);
  const unknown = await changeYard(testDb(), manager, { ...typed(), yardId: uuidv7() }, clock);
  expect(unknown.ok ? null : unknown.refusal.code).toBe("not-found");
  const there = await testDb().select().from(trucks).where(eq(trucks.yardId, yardId));
  expect(there.every((truck) => truck.gateSeq === 0)).toBe(true);
});
