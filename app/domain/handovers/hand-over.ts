import { and, eq } from "drizzle-orm";
import { z } from "zod";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { handovers, runs } from "../../db/schema/handovers";
import { memberships } from "../../db/schema/people";
import { trucks } from "../../db/schema/trucks";
import { receipts } from "../../db/schema/walks";
import { type Clock, systemClock } from "../../services/clock";
import { type NeedsMask, needsMask } from "../../trade/limits";
import { type GateReason, gateReasons } from "../../trade/standing/gate";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { changeTruck, deriveGate } from "../gate/change-truck";
import { readFacts } from "../gate/read-facts";
import { type Policy, readPolicy } from "../policy/read-policy";
import { once, submissionOf } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";
import { Refused } from "../refused";
import { tryGate } from "./gate-update";

/** A need unanswered is null: the form presets none, and the gate refuses null. */
export const handOverSchema = z.object({
  id: z.uuid(),
  truckId: z.uuid(),
  driverId: z.uuid(),
  runName: z.string().trim().min(1, "run-name-empty").max(120),
  needs: z.object({
    pressureOffLoad: z.boolean().nullable(),
    towing: z.boolean().nullable(),
    hazmat: z.boolean().nullable(),
    vacuumPa: z.number().min(0).max(101_325).nullable(),
    fillL: z.number().min(0).max(100_000).nullable(),
    hoseM: z.number().min(0).max(1000).nullable(),
  }),
});
export type HandOverInput = z.infer<typeof handOverSchema>;

export interface HandOverReceipt {
  id: string;
  truckId: string;
  driverId: string;
  decidedAt: string;
  gateSeq: number;
}

/** Where a carrier lets limits warn only, the needs still have to be answered. */
function asked(needs: NeedsMask, policy: Policy): NeedsMask {
  if (policy.settings.limitsBlock) return needs;
  const free = (value: number | null) => (value === null ? null : 0);
  return {
    mask: free(needs.mask),
    vacuumPa: free(needs.vacuumPa),
    fillL: needs.fillL,
    hoseMm: free(needs.hoseMm),
  };
}

/** Who the key may go to: an active driver of this carrier. */
async function isDriver(db: Db, carrierId: string, personId: string): Promise<boolean> {
  const [row] = await db
    .select({ roles: memberships.roles, deactivatedAt: memberships.deactivatedAt })
    .from(memberships)
    .where(and(eq(memberships.carrierId, carrierId), eq(memberships.personId, personId)));
  return row !== undefined && row.deactivatedAt === null && row.roles.includes("driver");
}

async function refusalReasons(
  db: Db,
  actor: Actor,
  input: HandOverInput,
  policy: Policy,
  needs: NeedsMask,
  now: Date,
): Promise<GateReason[]> {
  const key = { carrierId: actor.carrierId, truckId: input.truckId };
  const { facts } = await db.transaction((tx) => readFacts(tx, key, policy.settings, now));
  return gateReasons(facts, policy.settings, { driverId: input.driverId, needs }, now.getTime());
}

/** The derived verdict disagreed with the stored columns: hold the truck and say so (K9). */
class GateMismatch extends Error {}

async function commitHandover(
  db: Db,
  actor: Actor,
  input: HandOverInput,
  policy: Policy,
  needs: NeedsMask,
  hash: string,
  clock: Clock,
): Promise<HandOverReceipt | null> {
  const { carrierId } = actor;
  const key = { carrierId, truckId: input.truckId };
  return inTransaction(db, async (tx) => {
    const asOf = clock.now();
    const ask = { ...key, driverId: input.driverId, handoverId: input.id, needs };
    const passed = await tryGate(tx, { ...ask, policyVersion: policy.version }, asOf);
    if (!passed) return null;
    const [row] = await tx
      .select({ gateSeq: trucks.gateSeq })
      .from(trucks)
      .where(and(eq(trucks.carrierId, carrierId), eq(trucks.id, input.truckId)));
    const decidedAt = clock.now();
    const handover = { carrierId, id: input.id, truckId: input.truckId, driverId: input.driverId };
    const gateSeq = row!.gateSeq;
    await tx
      .insert(handovers)
      .values({ ...handover, handedBy: actor.personId, decidedAt, gateSeq, hash });
    await tx.insert(runs).values({
      carrierId,
      id: input.id,
      handoverId: input.id,
      name: input.runName,
      pressureOffLoad: input.needs.pressureOffLoad!,
      towing: input.needs.towing!,
      hazmat: input.needs.hazmat!,
      vacuumPa: Math.round(input.needs.vacuumPa!),
      fillL: Math.round(input.needs.fillL!),
      hoseMm: Math.round(input.needs.hoseM! * 1000),
      createdAt: decidedAt,
    });
    const { facts } = await readFacts(tx, key, policy.settings, decidedAt);
    const askAgain = { driverId: input.driverId, needs, ignoreHandover: input.id };
    const late = gateReasons(facts, policy.settings, askAgain, decidedAt.getTime());
    if (late.length > 0) {
      const early = gateReasons(facts, policy.settings, askAgain, asOf.getTime());
      // Time ran out between the UPDATE and here: a plain refusal. Else the columns were wrong.
      if (early.length === 0) throw new Refused(refuse("not-clear", { reasons: late }).refusal);
      throw new GateMismatch(early.map((reason) => reason.code).join(", "));
    }
    await deriveGate(tx, key, policy, decidedAt);
    const receipt = {
      id: input.id,
      truckId: input.truckId,
      driverId: input.driverId,
      decidedAt: decidedAt.toISOString(),
      gateSeq,
    };
    await tx.insert(receipts).values({
      carrierId,
      id: input.id,
      kind: "handover",
      hash,
      body: receipt,
      personId: actor.personId,
      receivedAt: decidedAt,
    });
    await writeChanges(tx, carrierId, decidedAt, [
      {
        kind: "handover",
        truckId: input.truckId,
        subjectId: input.id,
        data: { driverId: input.driverId, run: input.runName },
      },
    ]);
    return receipt;
  });
}

async function holdForMismatch(
  db: Db,
  key: { carrierId: string; truckId: string },
  why: string,
  clock: Clock,
) {
  await changeTruck(
    db,
    key,
    async (change) => {
      await change.tx
        .update(trucks)
        .set({ gateFault: `columns disagreed: ${why}`.slice(0, 190) })
        .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
      change.note("gate-fault");
    },
    { clock },
  );
}

/**
 * K1: hands the key of a truck to a named driver for a run, or refuses with every reason.
 * The verdict is the gate's UPDATE; it is derived again before commit with a fresh clock.
 */
export async function handOver(
  db: Db,
  actor: Actor,
  input: HandOverInput,
  clock: Clock = systemClock,
): Promise<Result<HandOverReceipt>> {
  const sent = submissionOf("handover", input);
  return once(db, actor, sent, clock, async () => {
    const { carrierId } = actor;
    const key = { carrierId, truckId: input.truckId };
    const [truck] = await db
      .select({ id: trucks.id })
      .from(trucks)
      .where(and(eq(trucks.carrierId, carrierId), eq(trucks.id, input.truckId)));
    if (!truck || !(await isDriver(db, carrierId, input.driverId))) return refuse("not-found");
    for (let attempt = 0; attempt < 5; attempt += 1) {
      const policy = await readPolicy(db, carrierId);
      const needs = asked(needsMask(input.needs), policy);
      try {
        const receipt = await commitHandover(db, actor, input, policy, needs, sent.hash, clock);
        if (receipt) return ok(receipt);
      } catch (error) {
        if (error instanceof Refused) return { ok: false, refusal: error.refusal };
        if (!(error instanceof GateMismatch)) throw error;
        await holdForMismatch(db, key, error.message, clock);
      }
      const reasons = await refusalReasons(db, actor, input, policy, needs, clock.now());
      if (reasons.length > 0) return refuse("not-clear", { reasons });
      // No row changed and no reason found: stored columns are behind the truth (a date passed,
      // a policy changed meanwhile). Bring them up and run again.
      await changeTruck(db, key, async () => undefined, { clock });
    }
    return refuse("stale");
  });
}
