import { and, isNotNull, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { fittings } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { ok, type Result, refuse } from "../refusals";
import { secondOfItsKind } from "./add-fitting";
import { setPointsOffPlate } from "./set-points-fit";
import { writeSetupAudit } from "./setup-audit";
import { readFitting, thatFitting } from "./that-fitting";

export interface FittingOnTruck {
  truckId: string;
  fittingId: string;
}

/** A fitting comes off. Its row stays, for the readings that name it and for putting it back. */
export async function removeFitting(
  db: Db,
  actor: Actor,
  { truckId, fittingId }: FittingOnTruck,
  clock: Clock = systemClock,
): Promise<Result<null>> {
  const key = { carrierId: actor.carrierId, truckId };
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      const [removed] = await change.tx
        .update(fittings)
        .set({ removedAt: change.now })
        .where(and(thatFitting(key, fittingId), isNull(fittings.removedAt)));
      if (removed.affectedRows !== 1) change.deny("not-found");
      await writeSetupAudit(change.tx, actor, change.now, "fitting.remove", fittingId);
      change.note("setup", fittingId);
    },
    { clock, setup: true },
  );
  return changed.ok ? ok(null) : changed;
}

/** A removed fitting is put back as it was. */
export async function restoreFitting(
  db: Db,
  actor: Actor,
  { truckId, fittingId }: FittingOnTruck,
  clock: Clock = systemClock,
): Promise<Result<null>> {
  const key = { carrierId: actor.carrierId, truckId };
  const known = await readFitting(db, key, fittingId);
  if (!known) return refuse("not-found");
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      const second = await secondOfItsKind(change.tx, key, known.kind);
      if (second.length > 0) change.deny("invalid", { fields: second });
      const [restored] = await change.tx
        .update(fittings)
        .set({ removedAt: null })
        .where(and(thatFitting(key, fittingId), isNotNull(fittings.removedAt)));
      if (restored.affectedRows !== 1) change.deny("not-found");
      const off = await setPointsOffPlate(change.tx, key);
      if (off.length > 0) change.deny("invalid", { fields: off });
      await writeSetupAudit(change.tx, actor, change.now, "fitting.restore", fittingId);
      change.note("setup", fittingId);
    },
    { clock, setup: true },
  );
  return changed.ok ? ok(null) : changed;
}
