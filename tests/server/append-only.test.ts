import { eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { beforeAll, expect, test } from "vitest";
import { changes } from "~/db/schema/carriers";
import { handovers } from "~/db/schema/handovers";
import { tags } from "~/db/schema/tags";
import { asAdmin, testDb } from "./database";
import { makeCarrier, makePerson, makeTruck, TestClock } from "./factories";

const clock = new TestClock();
let tagId: string;
let handoverId: string;

beforeAll(async () => {
  const db = testDb();
  const carrier = await makeCarrier(db, clock);
  const driver = await makePerson(db, carrier, ["driver"]);
  const { carrierId, truckId } = await makeTruck(db, carrier, clock, { bare: true });
  tagId = uuidv7();
  handoverId = uuidv7();
  await db.insert(tags).values({
    carrierId,
    id: tagId,
    truckId,
    colour: "red",
    title: "Sight glass: cracked",
    roadSafety: false,
    raisedBy: driver.personId,
    raisedAt: clock.now(),
    receivedAt: clock.now(),
  });
  await db.insert(handovers).values({
    carrierId,
    id: handoverId,
    truckId,
    driverId: driver.personId,
    handedBy: driver.personId,
    decidedAt: clock.now(),
    gateSeq: 1,
    hash: "0".repeat(64),
  });
  await db.insert(changes).values({ carrierId, seq: 1, at: clock.now(), kind: "test" });
});

const message = async (work: Promise<unknown>) =>
  work.then(
    () => "it went through",
    (error: Error) => `${error.message} ${(error.cause as Error | undefined)?.message ?? ""}`,
  );

test("K3: the app's user may not delete what was signed", async () => {
  const db = testDb();
  expect(await message(db.delete(tags).where(eq(tags.id, tagId)))).toContain(
    "DELETE command denied",
  );
  expect(await message(db.delete(handovers))).toContain("DELETE command denied");
});

test("K3: even the administrator is stopped by the trigger", async () => {
  expect(await message(asAdmin("delete from tags"))).toContain("append-only: tags");
  expect(await message(asAdmin("delete from changes"))).toContain("append-only: changes");
  expect(await message(asAdmin("update changes set kind = 'other'"))).toContain(
    "append-only: changes",
  );
});

test("K3: a tag's colour, title, truck and raiser never change", async () => {
  for (const set of [
    "colour = 'white'",
    "title = 'other'",
    "raised_by = id",
    "note = 'x'",
    "road_safety = 1",
  ]) {
    expect(await message(asAdmin(`update tags set ${set}`)), set).toContain("append-only: tags");
  }
});

test("K3: a tag is signed off once, and never un-signed", async () => {
  const db = testDb();
  await db.update(tags).set({ signedOffAt: clock.now() }).where(eq(tags.id, tagId));
  const again = db
    .update(tags)
    .set({ signedOffAt: new Date(0) })
    .where(eq(tags.id, tagId));
  expect(await message(again)).toContain("append-only: tags");
  const undo = db.update(tags).set({ signedOffAt: null }).where(eq(tags.id, tagId));
  expect(await message(undo)).toContain("append-only: tags");
});

test("K1: the table itself refuses a second open handover of a truck", async () => {
  const db = testDb();
  const [open] = await db.select().from(handovers).where(eq(handovers.id, handoverId));
  const { openTruck: _generated, ...row } = open!;
  expect(await message(db.insert(handovers).values({ ...row, id: uuidv7() }))).toContain(
    "handovers_one_open",
  );
  await db.update(handovers).set({ returnedAt: clock.now() }).where(eq(handovers.id, handoverId));
  await db.insert(handovers).values({ ...row, id: uuidv7() });
});

test("a limit hangs on yellow tags alone", async () => {
  const set =
    "insert into tags (carrier_id, id, truck_id, colour, `limit`, title, road_safety, raised_by, raised_at, received_at) select carrier_id, unhex(replace(uuid(),'-','')), truck_id, 'red', '{}', title, 0, raised_by, raised_at, received_at from tags limit 1";
  expect(await message(asAdmin(set))).toContain("tags_limit_is_yellow");
});
