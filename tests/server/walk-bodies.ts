import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "~/db/client";
import { tags } from "~/db/schema/tags";
import { walks } from "~/db/schema/walks";
import type { Actor } from "~/domain/actor";
import type { Result } from "~/domain/refusals";
import { sheetForTruck, type TruckSheet } from "~/domain/sheets/sheet-for-truck";
import { setSetPoint, setSetPointSchema } from "~/domain/trucks/set-set-point";
import { recordWalk, type WalkReceipt } from "~/domain/walks/record-walk";
import { type WalkBody, walkSchema } from "~/domain/walks/walk-schema";
import type { Clock } from "~/services/clock";
import type { Answer, Answers } from "~/trade/sheet/answers";
import type { WalkKind } from "~/trade/sheet/check";
import { allChecks, dueChecks } from "~/trade/sheet/due-checks";
import { goodAnswers } from "../../fixtures/good-answers";
import { makePerson, makeTruck, type TestCarrier } from "./factories";

export const signature = { name: "A Signer", wording: "test" };
export const HOUR = 3_600_000;

export interface TruckToWalk extends TruckSheet {
  carrierId: string;
  truckId: string;
}

export function accepted<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`refused: ${JSON.stringify(result.refusal)}`);
  return result.value;
}

export const codeOf = (result: Result<unknown>) => (result.ok ? "ok" : result.refusal.code);

/** A truck whose set points are known, so that both halves of its run-up can be run. */
export async function makeTruckToWalk(
  db: Db,
  carrier: TestCarrier,
  clock: Clock,
): Promise<TruckToWalk> {
  const manager = await makePerson(db, carrier, ["manager"]);
  const { carrierId, truckId } = await makeTruck(db, carrier, clock);
  for (const point of [
    { reading: "vacuum-relief", unit: "inHg", setPoint: 20, low: 19, high: 21 },
    { reading: "pressure-relief", unit: "psi", setPoint: 10, low: 9, high: 11 },
  ]) {
    accepted(await setSetPoint(db, manager, { ...setSetPointSchema.parse(point), truckId }, clock));
  }
  return { carrierId, truckId, ...(await sheetNow(db, { carrierId, truckId }, clock)) };
}

export async function sheetNow(
  db: Db,
  key: { carrierId: string; truckId: string },
  clock: Clock,
): Promise<TruckSheet> {
  return accepted(await sheetForTruck(db, key, key.truckId, clock));
}

/** Everything due on a walk, with both halves of the run-up, answered good. */
export function allGood(truck: TruckToWalk, kind: WalkKind = "before", weeklyDue = false): Answers {
  return goodAnswers(
    dueChecks(truck.sheet, { walkKind: kind, weeklyDue, halves: ["vacuum", "pressure"] }),
  );
}

export type WalkWish = Partial<Omit<WalkBody, "answers">> & {
  /** Answers in place of good ones; undefined leaves a check out. */
  instead?: Record<string, Answer | undefined>;
  answers?: Answers;
};

/** The body of a walk as a phone sends it. */
export function walkBody(truck: TruckToWalk, wish: WalkWish = {}): WalkBody {
  const { instead = {}, ...more } = wish;
  const answers: Record<string, unknown> = { ...allGood(truck, wish.kind), ...instead };
  for (const [key, answer] of Object.entries(instead)) if (!answer) delete answers[key];
  return walkSchema.parse({
    id: uuidv7(),
    truckId: truck.truckId,
    kind: "before",
    sheetHash: truck.hash,
    signedAt: "2026-06-02T11:00:00.000Z",
    answers,
    signature,
    ...more,
  });
}

/** A problem at a check, with the tag that a phone hangs for it. */
export function tagged(
  truck: TruckToWalk,
  checkKey: string,
  problemKey: string,
  more: Partial<WalkBody["tags"][number]> = {},
): { instead: Record<string, Answer>; tags: WalkBody["tags"] } {
  const check = allChecks(truck.sheet).find((known) => known.key === checkKey);
  const problem = check?.problems.find((known) => known.key === problemKey);
  if (!problem) throw new Error(`no ${problemKey} at ${checkKey}`);
  const { colour } = problem;
  return {
    instead: { [checkKey]: { kind: "problem", problems: [{ key: problemKey }] } },
    tags: [{ id: uuidv7(), checkKey, problemKey, colour, note: null, ...more }],
  };
}

/** Sends a body as its own bytes. */
export async function sendWalk(
  db: Db,
  driver: Actor,
  body: WalkBody,
  clock: Clock,
  age: { ageMs?: number | null; clockJumped?: boolean } = {},
): Promise<Result<WalkReceipt>> {
  const { ageMs = 0, clockJumped = false } = age;
  const sent = { body, bytes: JSON.stringify(body), age: { ageMs, clockJumped } };
  return recordWalk(db, driver, sent, clock);
}

export async function storedWalk(db: Db, key: { carrierId: string }, id: string) {
  const [row] = await db
    .select()
    .from(walks)
    .where(and(eq(walks.carrierId, key.carrierId), eq(walks.id, id)));
  return row ?? null;
}

export async function tagsOf(db: Db, key: { carrierId: string; truckId: string }) {
  return db
    .select()
    .from(tags)
    .where(and(eq(tags.carrierId, key.carrierId), eq(tags.truckId, key.truckId)))
    .orderBy(tags.receivedAt, tags.id);
}

export const sha256 = (bytes: string | Uint8Array) =>
  createHash("sha256").update(bytes).digest("hex");
