import { and, eq, isNotNull, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { ownChecks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { ok, type Result, refuse } from "../refusals";
import { writeSetupAudit } from "../trucks/setup-audit";

/** Takes an own check off the sheets, or puts it back. Walks already made keep it. */
async function setRemoved(
  db: Db,
  actor: Actor,
  checkId: string,
  removed: boolean,
  clock: Clock,
): Promise<Result<null>> {
  const { carrierId } = actor;
  const now = clock.now();
  const found = await inTransaction(db, async (tx) => {
    const [changed] = await tx
      .update(ownChecks)
      .set({ removedAt: removed ? now : null })
      .where(
        and(
          eq(ownChecks.carrierId, carrierId),
          eq(ownChecks.id, checkId),
          removed ? isNull(ownChecks.removedAt) : isNotNull(ownChecks.removedAt),
        ),
      );
    if (changed.affectedRows !== 1) return false;
    const action = removed ? "own-check.remove" : "own-check.restore";
    await writeSetupAudit(tx, actor, now, action, checkId);
    await writeChanges(tx, carrierId, now, [{ kind: "own-check", subjectId: checkId }]);
    return true;
  });
  return found ? ok(null) : refuse("not-found");
}

export function removeOwnCheck(
  db: Db,
  actor: Actor,
  { checkId }: { checkId: string },
  clock: Clock = systemClock,
): Promise<Result<null>> {
  return setRemoved(db, actor, checkId, true, clock);
}

export function restoreOwnCheck(
  db: Db,
  actor: Actor,
  { checkId }: { checkId: string },
  clock: Clock = systemClock,
): Promise<Result<null>> {
  return setRemoved(db, actor, checkId, false, clock);
}
