import { v7 as uuidv7 } from "uuid";
import { expect, test } from "vitest";
import { readFacts } from "~/domain/gate/read-facts";
import { DEFAULT_POLICY } from "~/domain/policy/settings";
import { recordRound, recordRoundSchema } from "~/domain/rounds/record-round";
import { ROUND_KINDS } from "~/trade/rounds";
import { testDb } from "./database";
import { makeCarrier, makePerson, makeTruck, TestClock } from "./factories";

const DAY = 86_400_000;

test("K1: the last round of a truck is its own, whatever day another truck had one", async () => {
  const db = testDb();
  const clock = new TestClock();
  const carrier = await makeCarrier(db, clock);
  const other = await makeCarrier(db, clock);
  const early = await makeTruck(db, carrier, clock, { bare: true });
  const late = await makeTruck(db, carrier, clock, { bare: true });
  const elsewhere = await makeTruck(db, other, clock, { bare: true });
  const round = async (truck: typeof early, at: typeof carrier) => {
    const mechanic = await makePerson(db, at, ["mechanic"]);
    const doneOn = clock.now().toISOString().slice(0, 10);
    const common = { truckId: truck.truckId, doneOn, pumpHours: null };
    for (const kind of ["weekly", "monthly"] as const) {
      const done = await recordRound(db, mechanic, { ...common, id: uuidv7(), kind }, clock);
      expect(done.ok).toBe(true);
    }
  };
  clock.turn(10 * DAY);
  await round(early, carrier);
  clock.turn(3 * DAY);
  await round(late, carrier);
  clock.turn(2 * DAY);
  await round(elsewhere, other);

  const dueOf = async ({ carrierId, truckId }: typeof early) => {
    const { facts } = await readFacts(db, { carrierId, truckId }, DEFAULT_POLICY, clock.now());
    return facts.rounds.map((due) => due.dueOn);
  };
  expect(await dueOf(early)).toEqual(["2026-06-19", "2026-07-12"]);
  expect(await dueOf(late)).toEqual(["2026-06-22", "2026-07-15"]);
  expect(await dueOf(elsewhere)).toEqual(["2026-06-24", "2026-07-17"]);
});

test("every round there is can be recorded at the bench, the shop's weekly part too", () => {
  const round = { id: uuidv7(), truckId: uuidv7(), doneOn: "2026-06-12", pumpHours: null };
  for (const kind of ROUND_KINDS) {
    expect(recordRoundSchema.safeParse({ ...round, kind }).success, kind).toBe(true);
  }
  expect(recordRoundSchema.safeParse({ ...round, kind: "yearly" }).success).toBe(false);
});
