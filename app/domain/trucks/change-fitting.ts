import { z } from "zod";
import type { Db } from "../../db/client";
import { fittings } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { ok, type Result, refuse } from "../refusals";
import { readAttributes, samePlate, typedAttributesSchema } from "./fitting-attributes";
import { setPointsOffPlate } from "./set-points-fit";
import { writeSetupAudit } from "./setup-audit";
import { readFitting, thatFitting } from "./that-fitting";

export const changeFittingSchema = z.object({ attributes: typedAttributesSchema.default({}) });
export type ChangeFittingInput = z.infer<typeof changeFittingSchema> & {
  truckId: string;
  fittingId: string;
};

/** The plate of a fitting is put right, or another of its kind is in its place. Nothing changed: nothing done. */
export async function changeFitting(
  db: Db,
  actor: Actor,
  input: ChangeFittingInput,
  clock: Clock = systemClock,
): Promise<Result<{ changed: boolean }>> {
  const { truckId, fittingId } = input;
  const key = { carrierId: actor.carrierId, truckId };
  const before = await readFitting(db, key, fittingId);
  if (!before) return refuse("not-found");
  if (before.removedAt) {
    return refuse("invalid", { fields: [{ pointer: "", code: "fitting-gone" }] });
  }
  const read = readAttributes(before.kind, input.attributes, before.attributes);
  if (!read.ok) return refuse("invalid", { fields: read.faults });
  const { attributes } = read;
  if (samePlate(before.attributes, attributes)) return ok({ changed: false });
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      await change.tx.update(fittings).set({ attributes }).where(thatFitting(key, fittingId));
      const off = await setPointsOffPlate(change.tx, key);
      if (off.length > 0) change.deny("invalid", { fields: off });
      const detail = { kind: before.kind, before: before.attributes, after: attributes };
      await writeSetupAudit(change.tx, actor, change.now, "fitting.change", fittingId, detail);
      change.note("setup", fittingId);
    },
    { clock, setup: true },
  );
  return changed.ok ? ok({ changed: true }) : changed;
}
