import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { datedTests } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { DATED_TESTS, type DatedTest, testDueOn } from "../../trade/dated-tests";
import type { Actor } from "../actor";
import { changeTruck, type GateChange } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import { type FieldFault, ok, type Result } from "../refusals";
import { yardOfTruck } from "../tags/yard-of-truck";
import { typedLine } from "../typed-line";
import { yardDay } from "../yard-day";
import { isDatedTest, NO_LONGER_DUE, type RecordedTest, readTests, testsFor } from "./dated-tests";
import { readFittings, readTruck } from "./read-setup";
import { writeSetupAudit } from "./setup-audit";

const day = z.preprocess(
  (typed) => (typeof typed === "string" ? typed.trim() || null : (typed ?? null)),
  z.iso.date("date-form").nullable(),
);

export const datedTestSchema = z.object({
  kind: z.enum(DATED_TESTS, { error: "test-kind-unknown" }),
  /** The yard's local day it was passed; null for a paper that only has a last day. */
  passedOn: day.default(null),
  /** Its last day; left out, the rule's own interval. */
  dueOn: day.default(null),
  note: typedLine("note-long", 0, 200).nullable().default(null),
});
export type DatedTestInput = z.infer<typeof datedTestSchema> & { truckId: string };

async function testsOfTruck(change: GateChange, key: TruckKey) {
  const truck = await readTruck(change.tx, key);
  if (!truck) throw new Error("truck vanished inside its own transaction");
  return testsFor(truck.kind, await readFittings(change.tx, key));
}

/** The last day the record gives, or what is wrong with it. */
async function judge(change: GateChange, key: TruckKey, input: DatedTestInput) {
  const fault = (pointer: string, code: string, values?: FieldFault["values"]) =>
    change.deny("invalid", { fields: [{ pointer, code, ...(values && { values }) }] });
  const { kind, passedOn } = input;
  const required = (await testsOfTruck(change, key)).find((one) => one.test === kind);
  if (!required) return fault("/kind", "test-not-for-this-tank");
  const { zone } = await yardOfTruck(change.tx, key.carrierId, key.truckId);
  const today = yardDay(change.now, zone).day;
  if (passedOn !== null && passedOn > today) return fault("/passedOn", "passed-in-future");
  if (passedOn === null && required.everyMonths !== null) return fault("/passedOn", "date-missing");
  const latest = passedOn === null ? null : testDueOn(required, passedOn);
  const dueOn = input.dueOn ?? latest;
  if (dueOn === null) return fault("/dueOn", "date-missing");
  if (passedOn !== null && dueOn < passedOn) return fault("/dueOn", "due-before-passed");
  if (latest !== null && dueOn > latest) return fault("/dueOn", "due-too-far", { latest });
  return dueOn;
}

/** Records an inspection, a tank test, a permit or an extinguisher: the newest of a kind counts. */
export async function recordDatedTest(
  db: Db,
  actor: Actor,
  input: DatedTestInput,
  clock: Clock = systemClock,
): Promise<Result<{ id: string; dueOn: string }>> {
  const { truckId, kind, passedOn, note } = input;
  const key = { carrierId: actor.carrierId, truckId };
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      const dueOn = await judge(change, key, input);
      const row = { kind, passedOn, dueOn, note: note || null };
      const newest = (await readTests(change.tx, key)).find((test) => test.kind === kind);
      if (newest && isSame(newest, row)) throw new RecordedBefore(newest.id, dueOn);
      const id = uuidv7();
      await change.tx.insert(datedTests).values({
        ...key,
        ...row,
        id,
        recordedBy: actor.personId,
        recordedAt: change.now,
      });
      await writeSetupAudit(change.tx, actor, change.now, "dated-test.record", id, row);
      change.note("dated-test", id);
      return { id, dueOn };
    },
    { clock },
  ).catch((error: unknown) => {
    if (error instanceof RecordedBefore) return ok({ value: { id: error.id, dueOn: error.dueOn } });
    throw error;
  });
  return changed.ok ? ok(changed.value.value) : changed;
}

/** Rolls back what a form sent before would do a second time: one test is one record. */
class RecordedBefore extends Error {
  constructor(
    readonly id: string,
    readonly dueOn: string,
  ) {
    super("recorded before");
  }
}

function isSame(one: RecordedTest, other: Omit<RecordedTest, "id">): boolean {
  return one.passedOn === other.passedOn && one.dueOn === other.dueOn && one.note === other.note;
}

/** May the office stop asking for it? Not while the law asks for it on this unit. */
function mayEnd(kind: DatedTest, required: readonly { test: DatedTest }[]): boolean {
  return kind === "permit" || !required.some((one) => one.test === kind);
}

/** A permit that was given up, or a test of a tank that lost its specification plate: no longer asked for. */
export async function endDatedTest(
  db: Db,
  actor: Actor,
  { truckId, kind }: { truckId: string; kind: string },
  clock: Clock = systemClock,
): Promise<Result<null>> {
  const key = { carrierId: actor.carrierId, truckId };
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      const recorded = (await readTests(change.tx, key)).find((test) => test.kind === kind);
      if (!recorded || !isDatedTest(kind)) return change.deny("not-found");
      if (!mayEnd(kind, await testsOfTruck(change, key))) {
        return change.deny("invalid", { fields: [{ pointer: "/kind", code: "test-cannot-end" }] });
      }
      const id = uuidv7();
      await change.tx.insert(datedTests).values({
        ...key,
        id,
        kind,
        passedOn: null,
        dueOn: NO_LONGER_DUE,
        recordedBy: actor.personId,
        recordedAt: change.now,
      });
      await writeSetupAudit(change.tx, actor, change.now, "dated-test.end", id, { kind });
      change.note("dated-test", id);
      return null;
    },
    { clock },
  );
  return changed.ok ? ok(null) : changed;
}
