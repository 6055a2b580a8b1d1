import { and, ne, sql } from "drizzle-orm";
import { z } from "zod";
import type { Db } from "../../db/client";
import { DUPLICATE_KEY, errnoOf } from "../../db/errors";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { UNIT_KINDS } from "../../trade/sheet/check";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { ok, type Result, refuse } from "../refusals";
import { thatTruck } from "./read-setup";
import { writeSetupAudit } from "./setup-audit";
import { unitNumberSchema } from "./unit-number";
import { type VinWarning, vinSchema, vinWarning } from "./vin";

export const truckDetailsSchema = z.object({
  unitNumber: unitNumberSchema,
  kind: z.enum(UNIT_KINDS, { error: "unit-kind" }),
  vin: vinSchema.default(null),
});
export type TruckDetailsInput = z.infer<typeof truckDetailsSchema> & { truckId: string };

/** Unit number, kind and VIN. Another kind has another sheet, so walks made before no longer count. */
export async function changeTruckDetails(
  db: Db,
  actor: Actor,
  input: TruckDetailsInput,
  clock: Clock = systemClock,
): Promise<Result<{ unitNumber: string; vinWarning: VinWarning | null }>> {
  const { truckId, unitNumber, kind, vin } = input;
  const key = { carrierId: actor.carrierId, truckId };
  try {
    const changed = await changeTruck(
      db,
      key,
      async (change) => {
        await change.tx
          .update(trucks)
          .set({ setupVersion: sql`${trucks.setupVersion} + 1` })
          .where(and(thatTruck(key), ne(trucks.kind, kind)));
        await change.tx.update(trucks).set({ unitNumber, kind, vin }).where(thatTruck(key));
        const detail = { unitNumber, kind, vin };
        await writeSetupAudit(change.tx, actor, change.now, "truck.change", truckId, detail);
        change.note("truck", truckId);
      },
      { clock },
    );
    return changed.ok ? ok({ unitNumber, vinWarning: vinWarning(vin) }) : changed;
  } catch (error) {
    if (errnoOf(error) !== DUPLICATE_KEY) throw error;
    const values = { unitNumber };
    return refuse("invalid", {
      fields: [{ pointer: "/unitNumber", code: "unit-number-taken", values }],
    });
  }
}
