import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { DUPLICATE_KEY, errnoOf } from "../../db/errors";
import { fittings } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { FITTING_KINDS, type FittingAttributes, type FittingKind } from "../../trade/fittings";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import { type FieldFault, ok, type Result, refuse } from "../refusals";
import { readAttributes, samePlate, typedAttributesSchema } from "./fitting-attributes";
import { mayCarrySeveral } from "./fitting-fields";
import { readFittings } from "./read-setup";
import { setPointsOffPlate } from "./set-points-fit";
import { writeSetupAudit } from "./setup-audit";
import { readFitting } from "./that-fitting";

export const addFittingSchema = z.object({
  /** Made with the form, so that a form sent twice is one fitting. */
  id: z.uuid().optional(),
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

/** Has this very form been taken before? Filled in anew, it is another fitting. */
async function formerly(
  db: Db,
  key: TruckKey,
  id: string,
  kind: FittingKind,
  plate: FittingAttributes,
) {
  const row = await readFitting(db, key, id);
  if (!row) return "never";
  return row.kind === kind && samePlate(row.attributes, plate) ? "same" : "other";
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
      const { tx, now } = change;
      const before = input.id ? await formerly(tx, key, input.id, kind, attributes) : "never";
      if (input.id && before === "same") throw new SentBefore(input.id);
      const second = await secondOfItsKind(tx, key, kind);
      if (second.length > 0) change.deny("invalid", { fields: second });
      const id = input.id && before === "never" ? input.id : uuidv7();
      await tx.insert(fittings).values({ ...key, id, kind, attributes, fittedAt: now });
      const off = await setPointsOffPlate(tx, key);
      if (off.length > 0) change.deny("invalid", { fields: off });
      await writeSetupAudit(tx, actor, now, "fitting.add", id, { kind, attributes });
      change.note("setup", id);
      return { id };
    },
    { clock, setup: true },
  ).catch((error: unknown) => {
    if (error instanceof SentBefore) return ok({ value: { id: error.id } });
    if (errnoOf(error) === DUPLICATE_KEY && input.id) return null;
    throw error;
  });
  // The id is some other fitting's: this one gets its own.
  if (changed === null) return addFitting(db, actor, { ...input, id: undefined }, clock);
  return changed.ok ? ok({ id: changed.value.value.id }) : changed;
}

/** Rolls back what a form sent before would do a second time: no walk ends for it. */
class SentBefore extends Error {
  constructor(readonly id: string) {
    super("sent before");
  }
}
