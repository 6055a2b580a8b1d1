import { and, eq, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { mayRetry } from "../../db/errors";
import { inTransaction } from "../../db/retry";
import { clearances } from "../../db/schema/handovers";
import { trucks } from "../../db/schema/trucks";
import { receipts } from "../../db/schema/walks";
import type { Clock } from "../../services/clock";
import { type Standing, standing } from "../../trade/standing/standing";
import { type Change, writeChanges } from "../feed";
import { readPolicy } from "../policy/read-policy";
import type { PolicySettings } from "../policy/settings";
import { ok, type RefusalCode, type Result, refuse } from "../refusals";
import { Refused } from "../refused";
import { readFacts, type TruckKey } from "./read-facts";

/** A receipt to be stored with the effect; its body may name the standing that follows. */
export interface ReceiptToWrite {
  id: string;
  kind: string;
  hash: string;
  personId: string;
  body: (after: Standing) => unknown;
}

/** What an effect may say about itself while it runs. */
export class GateChange {
  tagsMoved = false;
  readonly notes: Change[] = [];
  receipt: ReceiptToWrite | null = null;
  readonly afterwards: ((standing: Standing) => Promise<void>)[] = [];

  constructor(
    readonly tx: Db,
    readonly now: Date,
    private readonly truckId: string,
    readonly policy: PolicySettings,
  ) {}

  /** A tag, a colour, a sign-off, a run-with-limit or a "not satisfied" came: clearances must be earned again. */
  moveTags(): void {
    this.tagsMoved = true;
  }

  /** Work that needs the standing that follows: mail, mostly. Runs before the feed is written. */
  after(work: (standing: Standing) => Promise<void>): void {
    this.afterwards.push(work);
  }

  /** A row for the change feed. */
  note(kind: string, subjectId?: string, data?: unknown): void {
    this.notes.push({ kind, truckId: this.truckId, subjectId, data });
  }

  deny(code: RefusalCode, more: Parameters<typeof refuse>[1] = {}): never {
    throw new Refused(refuse(code, more).refusal);
  }
}

export interface ChangeOptions {
  clock: Clock;
  /** Fittings, set points or yard changed: walks made before no longer count. */
  setup?: boolean;
  /** A person looked at a gate fault and asks for the columns anew. */
  clearFault?: boolean;
}

export interface Changed<T> {
  value: T;
  standing: Standing;
}

function at(ms: number | null): Date | null {
  return ms === null ? null : new Date(ms);
}

async function writeClearances(tx: Db, key: TruckKey, after: Standing, tagsSeq: number) {
  const rows = after.clearances.map((clearance) => ({
    ...key,
    driverId: clearance.driverId,
    walkId: clearance.walkId,
    tagsSeq: clearance.unseen.length === 0 ? tagsSeq : -1,
    validUntil: new Date(clearance.validUntil),
  }));
  const ofTruck = and(eq(clearances.carrierId, key.carrierId), eq(clearances.truckId, key.truckId));
  const kept = rows.map((row) => row.driverId);
  // Rows are named one by one: a DELETE over the truck's range would lock the gap that the next
  // truck's first row goes into, and two trucks walked at once would deadlock.
  const before = await tx.select({ driverId: clearances.driverId }).from(clearances).where(ofTruck);
  for (const { driverId } of before) {
    if (kept.includes(driverId)) continue;
    await tx.delete(clearances).where(and(ofTruck, eq(clearances.driverId, driverId)));
  }
  if (rows.length === 0) return;
  await tx
    .insert(clearances)
    .values(rows)
    .onDuplicateKeyUpdate({
      set: {
        walkId: sql`values(walk_id)`,
        tagsSeq: sql`values(tags_seq)`,
        validUntil: sql`values(valid_until)`,
      },
    });
}

/** The gate's columns as they follow from the base rows. */
function columnsOf(after: Standing, pumpHours: number, policyVersion: number) {
  const { gate } = after;
  return {
    policyVersion,
    openReds: gate.openReds,
    yellowBlockAt: at(gate.yellowBlockAt),
    testsBlockAt: at(gate.testsBlockAt),
    roundsBlockAt: at(gate.roundsBlockAt),
    roundsBlockHours: gate.roundsBlockHours,
    pumpHours,
    limitsMask: gate.limits.mask,
    limitVacuumPa: gate.limits.vacuumPa,
    limitFillL: gate.limits.fillL,
    limitHoseMm: gate.limits.hoseMm,
    standing: after.word,
    standingUntil: at(after.until),
    standingDetail: { reasons: after.reasons, warnings: after.warnings, limits: after.limits },
  };
}

/**
 * Works the standing out from the base rows and writes the gate's columns. When it cannot be
 * worked out the truck is marked and held (K9): what was recorded stays recorded.
 */
export async function deriveGate(
  tx: Db,
  key: TruckKey,
  policy: { version: number; settings: PolicySettings },
  now: Date,
): Promise<Standing> {
  const ofTruck = and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId));
  let fault = "";
  try {
    const { facts, tagsSeq } = await readFacts(tx, key, policy.settings, now);
    const after = standing(facts, policy.settings, now.getTime());
    await tx
      .update(trucks)
      .set(columnsOf(after, facts.pumpHours, policy.version))
      .where(ofTruck);
    await writeClearances(tx, key, after, tagsSeq);
    return after;
  } catch (error) {
    if (mayRetry(error)) throw error;
    fault = `not worked out: ${error instanceof Error ? error.name : "unknown"}`;
  }
  const held: Standing = {
    word: "held",
    reasons: [{ code: "gate-fault", detail: fault }],
    warnings: [],
    limits: [],
    until: null,
    gate: {
      openReds: 0,
      yellowBlockAt: 0,
      testsBlockAt: null,
      roundsBlockAt: null,
      roundsBlockHours: null,
      limits: { mask: 0, vacuumPa: null, fillL: null, hoseMm: null },
    },
    clearances: [],
  };
  await tx
    .update(trucks)
    .set({
      gateFault: fault,
      standing: "held",
      standingUntil: null,
      standingDetail: { reasons: held.reasons, warnings: [], limits: [] },
    })
    .where(ofTruck);
  return held;
}

/**
 * The one way to change anything a standing depends on: bumps the truck row first, runs the
 * effect, works the gate's columns out from the base rows, writes the receipt and, last, the
 * feed. A refusal inside the effect rolls everything back. No SELECT comes before the first UPDATE.
 */
export async function changeTruck<T>(
  db: Db,
  key: TruckKey,
  effect: (change: GateChange) => Promise<T>,
  options: ChangeOptions,
): Promise<Result<Changed<T>>> {
  try {
    const value = await inTransaction(db, async (tx) => {
      const [bumped] = await tx
        .update(trucks)
        .set({
          gateSeq: sql`${trucks.gateSeq} + 1`,
          ...(options.setup && { setupVersion: sql`${trucks.setupVersion} + 1` }),
          ...(options.clearFault && { gateFault: null }),
        })
        .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
      if (bumped.affectedRows !== 1) throw new Refused({ code: "not-found" });
      // Read after the bump: a policy change writes every truck row too, so the newest is seen.
      const policy = await readPolicy(tx, key.carrierId);
      const now = options.clock.now();
      const change = new GateChange(tx, now, key.truckId, policy.settings);
      const result = await effect(change);
      if (change.tagsMoved) {
        await tx
          .update(trucks)
          .set({ tagsSeq: sql`${trucks.tagsSeq} + 1` })
          .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
      }
      const after = await deriveGate(tx, key, policy, now);
      for (const work of change.afterwards) await work(after);
      if (change.receipt) {
        const { id, kind, hash, personId, body } = change.receipt;
        await tx.insert(receipts).values({
          carrierId: key.carrierId,
          id,
          kind,
          hash,
          personId,
          body: body(after),
          receivedAt: now,
        });
      }
      await writeChanges(tx, key.carrierId, now, [
        ...change.notes,
        { kind: "standing", truckId: key.truckId, data: { standing: after.word } },
      ]);
      return { value: result, standing: after };
    });
    return ok(value);
  } catch (error) {
    if (error instanceof Refused) return { ok: false, refusal: error.refusal };
    throw error;
  }
}
