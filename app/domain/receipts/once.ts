import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { DUPLICATE_KEY, errnoOf, isTakenId } from "../../db/errors";
import { conflicts, receipts } from "../../db/schema/walks";
import type { Clock } from "../../services/clock";
import type { Actor } from "../actor";
import { ok, type Result, refuse } from "../refusals";

/** What makes a record the same record: its id, who sent it, and the hash of its bytes. */
export interface Submission {
  id: string;
  kind: string;
  /** SHA-256 of the body as sent, hex. */
  hash: string;
  body: unknown;
}

/** SHA-256 of text or bytes, hex. */
export function sha256Hex(input: string | Uint8Array): string {
  return createHash("sha256").update(input).digest("hex");
}

/** A form's input as a submission: its own JSON is what is hashed. */
export function submissionOf(kind: string, input: { id: string }): Submission {
  return { id: input.id, kind, hash: sha256Hex(JSON.stringify(input)), body: input };
}

async function keepConflict(db: Db, actor: Actor, sent: Submission, now: Date): Promise<void> {
  const { carrierId } = actor;
  const [kept] = await db
    .select({ id: conflicts.id })
    .from(conflicts)
    .where(
      and(
        eq(conflicts.carrierId, carrierId),
        eq(conflicts.recordId, sent.id),
        eq(conflicts.hash, sent.hash),
      ),
    );
  if (kept) return;
  await db.insert(conflicts).values({
    carrierId,
    id: uuidv7(),
    recordId: sent.id,
    kind: sent.kind,
    hash: sent.hash,
    body: sent.body,
    personId: actor.personId,
    receivedAt: now,
  });
}

async function stored<R>(
  db: Db,
  actor: Actor,
  sent: Submission,
  now: Date,
): Promise<Result<R> | null> {
  const [receipt] = await db
    .select()
    .from(receipts)
    .where(and(eq(receipts.carrierId, actor.carrierId), eq(receipts.id, sent.id)));
  if (!receipt) return null;
  const same =
    receipt.hash === sent.hash && receipt.kind === sent.kind && receipt.personId === actor.personId;
  if (same) return ok(receipt.body as R);
  await keepConflict(db, actor, sent, now);
  return refuse("same-id-other-body");
}

/**
 * A key was taken while `run` was under way. By the same record: its receipt is the answer. By
 * another that raced it to something both need: it is there now, so `run` again. By anything
 * else: the record uses an id that is already another's.
 */
async function afterDuplicate<R>(
  db: Db,
  actor: Actor,
  sent: Submission,
  clock: Clock,
  run: () => Promise<Result<R>>,
): Promise<Result<R>> {
  const first = await stored<R>(db, actor, sent, clock.now());
  if (first) return first;
  let taken: unknown;
  try {
    return await run();
  } catch (error) {
    if (errnoOf(error) !== DUPLICATE_KEY) throw error;
    taken = error;
  }
  const second = await stored<R>(db, actor, sent, clock.now());
  if (second) return second;
  if (!isTakenId(taken)) throw taken;
  await keepConflict(db, actor, sent, clock.now());
  return refuse("same-id-other-body");
}

/**
 * K4: the same record, sent any number of times, is stored once and answered with the same
 * receipt. The same id with another body is refused, and the second body kept.
 * `run` must write the receipt in its own transaction.
 */
export async function once<R>(
  db: Db,
  actor: Actor,
  sent: Submission,
  clock: Clock,
  run: () => Promise<Result<R>>,
): Promise<Result<R>> {
  const before = await stored<R>(db, actor, sent, clock.now());
  if (before) return before;
  try {
    const result = await run();
    if (result.ok) return result;
    // The same record may have gone through while this one waited for the truck.
    return (await stored<R>(db, actor, sent, clock.now())) ?? result;
  } catch (error) {
    if (errnoOf(error) !== DUPLICATE_KEY) throw error;
    return afterDuplicate(db, actor, sent, clock, run);
  }
}
