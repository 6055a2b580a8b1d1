import { eq, sql } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { carriers, policies } from "../../db/schema/carriers";
import { audit } from "../../db/schema/people";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { deriveGate } from "../gate/change-truck";
import { ok, type Result } from "../refusals";
import { readPolicy } from "./read-policy";
import type { PolicySettings } from "./settings";

/**
 * Stores a new version of the policy and works every truck's gate out again, in one
 * transaction. Every truck row is written before anything is read, so that no truck is
 * derived from rows older than its own last change.
 */
export async function changePolicy(
  db: Db,
  actor: Actor,
  settings: PolicySettings,
  clock: Clock = systemClock,
): Promise<Result<{ version: number }>> {
  const { carrierId } = actor;
  const version = await inTransaction(db, async (tx) => {
    await tx
      .update(carriers)
      .set({ policyVersion: sql`${carriers.policyVersion} + 1` })
      .where(eq(carriers.id, carrierId));
    await tx
      .update(trucks)
      .set({ gateSeq: sql`${trucks.gateSeq} + 1` })
      .where(eq(trucks.carrierId, carrierId));
    const [carrier] = await tx
      .select({ version: carriers.policyVersion })
      .from(carriers)
      .where(eq(carriers.id, carrierId));
    if (!carrier) throw new Error("carrier vanished");
    const now = clock.now();
    const row = { carrierId, version: carrier.version, settings, createdAt: now };
    await tx.insert(policies).values({ ...row, createdBy: actor.personId });
    const policy = await readPolicy(tx, carrierId);
    const fleet = await tx
      .select({ id: trucks.id })
      .from(trucks)
      .where(eq(trucks.carrierId, carrierId));
    for (const truck of fleet) await deriveGate(tx, { carrierId, truckId: truck.id }, policy, now);
    await tx.insert(audit).values({
      carrierId,
      id: uuidv7(),
      at: now,
      actorId: actor.personId,
      action: "policy.change",
      detail: { version: carrier.version, settings },
    });
    await writeChanges(tx, carrierId, now, [
      { kind: "policy", data: { version: carrier.version } },
    ]);
    return carrier.version;
  });
  return ok({ version });
}
