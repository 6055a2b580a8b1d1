import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { DUPLICATE_KEY, errnoOf, FOREIGN_KEY } from "../../db/errors";
import { inTransaction } from "../../db/retry";
import { fittings, trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { UNIT_KINDS } from "../../trade/sheet/check";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { deriveGate } from "../gate/change-truck";
import { readPolicy } from "../policy/read-policy";
import { ok, type Result, refuse } from "../refusals";
import { readTruck } from "./read-setup";
import { writeSetupAudit } from "./setup-audit";
import { unitNumberSchema } from "./unit-number";
import { USUAL_TRUCKS, type UsualTruck, usualTruck } from "./usual-trucks";
import { type VinWarning, vinSchema, vinWarning } from "./vin";

export const addTruckSchema = z.object({
  /** Made with the form, so that a form sent twice is one truck. */
  id: z.uuid().optional(),
  unitNumber: unitNumberSchema,
  kind: z.enum(UNIT_KINDS, { error: "unit-kind" }),
  vin: vinSchema.default(null),
  yardId: z.uuid("yard-unknown"),
  /** A usual truck's fittings to start from; null starts with nothing fitted. */
  start: z.enum(USUAL_TRUCKS, { error: "start-unknown" }).nullable().default(null),
});
export type AddTruckInput = z.infer<typeof addTruckSchema>;

export interface TruckAdded {
  id: string;
  unitNumber: string;
  vinWarning: VinWarning | null;
}

/** Fittings get ids in the order they are listed, which is the order the sheet takes them in. */
async function fitOut(
  tx: Db,
  key: { carrierId: string; truckId: string },
  start: UsualTruck,
  at: Date,
) {
  await tx.insert(fittings).values(
    usualTruck(start).fittings.map(([kind, attributes = {}]) => ({
      ...key,
      id: uuidv7(),
      kind,
      attributes,
      fittedAt: at,
    })),
  );
}

/** Enters a truck or a towed unit. It stays on its peg until someone has walked it. */
export async function addTruck(
  db: Db,
  actor: Actor,
  input: AddTruckInput,
  clock: Clock = systemClock,
): Promise<Result<TruckAdded>> {
  const { carrierId } = actor;
  const { unitNumber, kind, vin, yardId, start } = input;
  const id = input.id ?? uuidv7();
  const now = clock.now();
  const added = () => ok({ id, unitNumber, vinWarning: vinWarning(vin) });
  try {
    await inTransaction(db, async (tx) => {
      // Written before anything is read: the tables' own keys say whether the number is free
      // and the yard is this carrier's.
      await tx
        .insert(trucks)
        .values({ carrierId, id, unitNumber, kind, vin, yardId, createdAt: now });
      if (start) await fitOut(tx, { carrierId, truckId: id }, start, now);
      const policy = await readPolicy(tx, carrierId);
      const { word } = await deriveGate(tx, { carrierId, truckId: id }, policy, now);
      await writeSetupAudit(tx, actor, now, "truck.add", id, input);
      await writeChanges(tx, carrierId, now, [
        { kind: "truck", truckId: id },
        { kind: "standing", truckId: id, data: { standing: word } },
      ]);
    });
  } catch (error) {
    const errno = errnoOf(error);
    if (errno === DUPLICATE_KEY) {
      const known = await readTruck(db, { carrierId, truckId: id });
      if (known?.unitNumber === unitNumber) return added();
      const values = { unitNumber };
      return refuse("invalid", {
        fields: [{ pointer: "/unitNumber", code: "unit-number-taken", values }],
      });
    }
    if (errno === FOREIGN_KEY) {
      return refuse("invalid", { fields: [{ pointer: "/yardId", code: "yard-unknown" }] });
    }
    throw error;
  }
  return added();
}
