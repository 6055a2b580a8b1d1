import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { fittings } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { FITTING_KINDS, type FittingKind } from "../../trade/fittings";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import { type FieldFault, ok, type Result, refuse } from "../refusals";
import { readAttributes, typedAttributesSchema } from "./fitting-attributes";
import { mayCarrySeveral } from "./fitting-fields";
import { readFittings } from "./read-setup";
import { setPointsOffPlate } from "./set-points-fit";
import { writeSetupAudit } from "./setup-audit";

export const addFittingSchema = z.object({
  kind: z.enum(FITTING_KINDS, { error: "fitting-kind-unknown" }),
  attributes: typedAttributesSchema.default({}),
});
export type AddFittingInput = z.infer<typeof addFittingSchema> & { truckId: string };

/** Most kinds a truck has once; a second is refused. */
export async function secondOfItsKind(
  tx: Db,
  key: TruckKey,
  kind: FittingKind,
): Promise<FieldFault[]> {
  if (mayCarrySeveral(kind)) return [];
  const same = (await readFittings(tx, key)).some((fitting) => fitting.kind === kind);
  return same ? [{ pointer: "/kind", code: "fitting-only-one" }] : [];
}

/** Something is fitted to a truck: the sheet follows, and walks made before no longer count. */
export async function addFitting(
  db: Db,
  actor: Actor,
  input: AddFittingInput,
  clock: Clock = systemClock,
): Promise<Result<{ id: string }>> {
  const { truckId, kind } = input;
  const key = { carrierId: actor.carrierId, truckId };
  const read = readAttributes(kind, input.attributes);
  if (!read.ok) return refuse("invalid", { fields: read.faults });
  const { attributes } = read;
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      const second = await secondOfItsKind(change.tx, key, kind);
      if (second.length > 0) change.deny("invalid", { fields: second });
      const id = uuidv7();
      await change.tx
        .insert(fittings)
        .values({ ...key, id, kind, attributes, fittedAt: change.now });
      const off = await setPointsOffPlate(change.tx, key);
      if (off.length > 0) change.deny("invalid", { fields: off });
      await writeSetupAudit(change.tx, actor, change.now, "fitting.add", id, { kind, attributes });
      change.note("setup", id);
      return { id };
    },
    { clock, setup: true },
  );
  return changed.ok ? ok(changed.value.value) : changed;
}
