import { asc, eq, isNull } from "drizzle-orm";
import { beforeAll, expect, test } from "vitest";
import { config } from "~/config";
import { carriers } from "~/db/schema/carriers";
import { memberships } from "~/db/schema/people";
import { acknowledgements, photos, runLimits, signOffs, tags } from "~/db/schema/tags";
import { fittings, rounds, trucks } from "~/db/schema/trucks";
import { readings, walks } from "~/db/schema/walks";
import { readBoard } from "~/domain/board/read-board";
import { readFacts } from "~/domain/gate/read-facts";
import { readPolicy } from "~/domain/policy/read-policy";
import { addDays, yardDay } from "~/domain/yard-day";
import { openStorage } from "~/services/storage";
import { standing } from "~/trade/standing/standing";
import { Calendar } from "../../fixtures/demo/calendar";
import { loadDemo } from "../../fixtures/demo/load-demo";
import { historyOf } from "../../fixtures/demo/tallow-creek";
import { testDb } from "./database";
import { changeOver, judgedAgain, keysOf, papersOf, readingsOf } from "./demo-rows";

const ZONE = "America/Denver";
const now = new Date();
type Loaded = NonNullable<Awaited<ReturnType<typeof loadDemo>>>;
let loaded: Loaded;

beforeAll(async () => {
  const began = performance.now();
  loaded = (await loadDemo(testDb(), { store: openStorage(config().s3), now }))!;
  console.log(`the demo was loaded in ${((performance.now() - began) / 1000).toFixed(1)} s`);
}, 180_000);

const carrierId = () => loaded.trucks[0]!.key.carrierId;
const unit = (unitNumber: string) => {
  const truck = loaded.trucks.find((one) => one.spec.unitNumber === unitNumber);
  if (!truck) throw new Error(`no ${unitNumber}`);
  return truck;
};

test("there are two carriers, with their trucks and people", async () => {
  const db = testDb();
  const firms = await db.select().from(carriers);
  const counted = await Promise.all(
    firms.map(async ({ id, name }) => [
      name,
      await db.$count(trucks, eq(trucks.carrierId, id)),
      await db.$count(memberships, eq(memberships.carrierId, id)),
    ]),
  );
  expect(counted.sort()).toEqual([
    ["Harrow Bend Pumping", 3, 4],
    ["Tallow Creek Liquid Haulage", 16, 22],
  ]);
});

test("the trucks truly differ", async () => {
  const rows = await testDb().select().from(fittings).where(isNull(fittings.removedAt));
  const types = (kind: string) =>
    new Set(rows.filter((row) => row.kind === kind).map((row) => row.attributes.type));
  expect([...types("pump")].sort()).toEqual(["blower", "liquid-ring", "vane"]);
  expect([...types("drive")].sort()).toEqual(["direct", "hydraulic", "shaft"]);
  expect([...types("gearbox")].sort()).toEqual(["right-angle", "three-shaft"]);
  expect(rows.some((row) => row.attributes.specificationPlate)).toBe(true);
  expect(rows.some((row) => row.kind === "hydraulic-brakes")).toBe(true);
  expect(loaded.trucks.filter((one) => one.sheet.kind === "towed")).toHaveLength(2);
  expect(unit("T-112").fitted).not.toContain("deodorizer-can");
  expect(unit("T-133").tankL).toBeLessThan(3000);
  expect(new Set(loaded.trucks.map((one) => one.sheetHash)).size).toBeGreaterThanOrEqual(11);
});

test("every truck has its papers on file, one of them due within three weeks and none past", async () => {
  const db = testDb();
  const today = yardDay(now, ZONE).day;
  const left = (await Promise.all(loaded.trucks.map((truck) => papersOf(db, truck)))).flat();
  expect(left.length).toBeGreaterThanOrEqual(16 * 2 + 14 + 4);
  expect(left.filter((day) => day === "never" || day < today)).toEqual([]);
  expect(left.filter((day) => day <= addDays(today, 21))).toHaveLength(1);
});

test("there are ninety days of walks, none on a Sunday but today, before and after", async () => {
  const rows = await testDb().select().from(walks).where(eq(walks.carrierId, carrierId()));
  const calendar = new Calendar(now, ZONE);
  const days = new Set(rows.map((row) => row.yardDay));
  expect([...days].sort()[0]! <= calendar.day(88)).toBe(true);
  expect(days.size).toBeGreaterThanOrEqual(76);
  const past = Array.from({ length: 89 }, (_, index) => index + 2);
  const sundays = past.filter((daysAgo) => !calendar.works(daysAgo));
  expect(sundays.filter((daysAgo) => days.has(calendar.day(daysAgo)))).toEqual([]);
  expect(rows.filter((row) => row.clearsNot !== null)).toEqual([]);
  expect(rows.filter((row) => row.kind === "after").length).toBeGreaterThan(700);
  const done = await testDb().select().from(rounds).where(eq(rounds.carrierId, carrierId()));
  expect(done.filter((round) => round.walkId !== null).length).toBeGreaterThan(16 * 9);
  expect(done.filter((round) => round.kind === "monthly").length).toBeGreaterThanOrEqual(16 * 4);
});

test("K8: every walk, old or young, says what its answers say", async () => {
  const { judged, wrong } = await judgedAgain(testDb(), loaded.trucks);
  expect(judged).toBeGreaterThan(1500);
  expect(wrong).toEqual([]);
});

test("meters never fall", async () => {
  for (const { key, spec } of loaded.trucks) {
    const meters = await testDb()
      .select()
      .from(readings)
      .where(eq(readings.truckId, key.truckId))
      .orderBy(asc(readings.countsFrom));
    for (const quantity of ["pump-hours", "odometer"]) {
      const read = meters.filter((one) => one.quantity === quantity).map((one) => one.si);
      const falls = read.filter((value, index) => index > 0 && value < read[index - 1]!);
      expect(falls, `${spec.unitNumber} ${quantity}`).toEqual([]);
      if (spec.start !== "towed-5000") expect(read.length).toBeGreaterThan(40);
    }
  }
});

test("what drifts is in the numbers, and steady trucks are steady", async () => {
  const change = (unitNumber: string, checkKey: string) =>
    changeOver(testDb(), unit(unitNumber).key.truckId, checkKey);
  const relief = await change("T-121", "run-up.vacuum");
  expect(relief.by).toBeGreaterThan(Math.max(1, relief.scatter));
  const oil = await change("T-112", "pump-side.oil-level");
  expect(oil.by).toBeGreaterThan(Math.max(8, oil.scatter));
  const vacuum = await change("T-214", "run-up.vacuum");
  expect(vacuum.by).toBeLessThan(-Math.max(1.5, vacuum.scatter));
  expect(Math.abs((await change("T-104", "run-up.vacuum")).by)).toBeLessThan(0.5);
  const trap = await readingsOf(testDb(), unit("T-203").key.truckId, "pump-side.trap-drain");
  expect(trap.filter((one) => one.unit === "qt").length).toBeGreaterThan(3);
  const relieved = await readingsOf(testDb(), unit("T-118").key.truckId, "run-up.pressure");
  expect(relieved.filter((one) => one.verdict === "below")).toHaveLength(1);
});

test("K1: no key is out twice, or left while a red tag hung", async () => {
  let open = 0;
  for (const { key, spec } of loaded.trucks) {
    const keys = await keysOf(testDb(), key.truckId, now);
    expect(keys.twice, `${spec.unitNumber} is out twice`).toEqual([]);
    expect(keys.underRed, `${spec.unitNumber} left under a red tag`).toEqual([]);
    open += keys.open;
  }
  expect(open).toBe(1);
});

test("tags end both ways, run under leave, and once a driver was not satisfied", async () => {
  const db = testDb();
  const ended = await db.select().from(signOffs);
  expect(new Set(ended.map((one) => one.kind))).toEqual(new Set(["repaired", "not-needed"]));
  expect(await db.$count(runLimits)).toBeGreaterThanOrEqual(3);
  const seen = await db.select().from(acknowledgements);
  expect(seen.filter((one) => !one.satisfied)).toHaveLength(1);
  const [dispute] = await db.select().from(tags).where(eq(tags.kind, "not-satisfied"));
  const before = ended.find((one) => one.id === dispute?.disputesSignOffId);
  const after = ended.find((one) => one.tagId === dispute?.id);
  expect(after?.signedBy).not.toBe(before?.signedBy);
});

test("K9: the stored gate of every truck is the derived one", async () => {
  const db = testDb();
  const ms = (at: Date | null) => at?.getTime() ?? null;
  for (const row of await db.select().from(trucks)) {
    const key = { carrierId: row.carrierId, truckId: row.id };
    const { settings } = await readPolicy(db, row.carrierId);
    const { facts } = await db.transaction((tx) => readFacts(tx, key, settings, now));
    const derived = standing(facts, settings, now.getTime());
    expect(row.gateFault).toBeNull();
    expect(row.standing, row.unitNumber).toBe(derived.word);
    expect({
      openReds: row.openReds,
      yellowBlockAt: ms(row.yellowBlockAt),
      testsBlockAt: ms(row.testsBlockAt),
      roundsBlockAt: ms(row.roundsBlockAt),
      roundsBlockHours: row.roundsBlockHours,
      limits: {
        mask: row.limitsMask,
        vacuumPa: row.limitVacuumPa,
        fillL: row.limitFillL,
        hoseMm: row.limitHoseMm,
      },
    }).toEqual(derived.gate);
  }
});

test("this morning's pegboard has every word on it, and mostly cleared trucks", async () => {
  const board = await readBoard(testDb(), loaded.staff[0]!);
  const pegs = board.yards.flatMap((yard) => yard.trucks);
  const of = (word: string) => pegs.filter((peg) => peg.standing === word);
  const names = (word: string) => of(word).map((peg) => peg.unitNumber);
  expect(names("held")).toEqual(["T-207", "T-109", "T-125"]);
  expect(names("walk-due")).toEqual(["T-219", "T-120"]);
  expect(names("limited")).toEqual(["T-211", "T-131"]);
  expect(names("out")).toEqual(["T-121"]);
  expect(names("cleared")).toHaveLength(8);
  const warned = new Set(pegs.flatMap((peg) => peg.detail.warnings));
  expect([...warned].sort()).toEqual(["extinguisher", "permit"]);
  const shown = await testDb().select().from(photos);
  expect(shown.length).toBeGreaterThanOrEqual(12);
  expect(shown.filter((photo) => photo.storedAt === null)).toEqual([]);
  for (const tag of of("held").flatMap((peg) => peg.tags)) {
    expect(tag.colour).toBe("red");
    expect(
      shown.some((photo) => photo.tagId === tag.id),
      tag.title,
    ).toBe(true);
  }
});

test("K7: the second carrier has a week of its own, and nothing of the first", async () => {
  const db = testDb();
  const [other] = await db.select().from(carriers).where(eq(carriers.name, "Harrow Bend Pumping"));
  const theirs = await db.select().from(walks).where(eq(walks.carrierId, other!.id));
  expect(theirs.length).toBeGreaterThan(8);
  const ours = new Set(loaded.trucks.map((one) => one.key.truckId));
  expect(theirs.filter((walk) => ours.has(walk.truckId))).toEqual([]);
  const actor = { ...loaded.staff[0]!, carrierId: other!.id };
  const pegs = (await readBoard(db, actor)).yards.flatMap((yard) => yard.trucks);
  expect(pegs.map((peg) => peg.unitNumber)).toEqual(["HB-1", "HB-2", "HB-3"]);
});

/** Mountain time: a plain noon, small hours, a Sunday, and the days round both clock changes. */
const HOURS = [
  "2026-06-03T18:00:00Z",
  "2026-06-07T15:00:00Z",
  "2026-03-08T09:30:00Z",
  "2026-11-01T08:30:00Z",
  "2027-01-01T07:05:00Z",
];

test.each(HOURS)("loaded at %s, the story is whole, in order, and over by then", (hour) => {
  const calendar = new Calendar(new Date(hour), ZONE);
  const late = calendar.now.getTime();
  for (const truck of loaded.trucks) {
    const { events } = historyOf(truck, loaded.staff, calendar, () => Buffer.from("photo"));
    const times = events.map((event) => event.at);
    expect(times).toEqual([...times].sort((a, b) => a - b));
    expect(times.at(-1)!).toBeLessThan(late);
    const walked = events.filter((event) => event.do === "walk").at(-1)!;
    const today = walked.body.kind === "before" && walked.at > late - 24 * 3_600_000;
    expect(today, truck.spec.unitNumber).toBe(!["T-120", "T-219"].includes(truck.spec.unitNumber));
  }
});
