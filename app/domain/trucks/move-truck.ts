import { z } from "zod";
import type { Db } from "../../db/client";
import { errnoOf, FOREIGN_KEY } from "../../db/errors";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { ok, type Result, refuse } from "../refusals";
import { readTruck, thatTruck } from "./read-setup";
import { writeSetupAudit } from "./setup-audit";

export const moveTruckSchema = z.object({ yardId: z.uuid("yard-unknown") });
export type MoveTruckInput = z.infer<typeof moveTruckSchema> & { truckId: string };

/** The truck sleeps in another yard from now on: other air, other clock, so it is walked again. */
export async function moveTruckToYard(
  db: Db,
  actor: Actor,
  { truckId, yardId }: MoveTruckInput,
  clock: Clock = systemClock,
): Promise<Result<{ moved: boolean }>> {
  const key = { carrierId: actor.carrierId, truckId };
  const before = await readTruck(db, key);
  if (before?.yardId === yardId) return ok({ moved: false });
  try {
    const changed = await changeTruck(
      db,
      key,
      async (change) => {
        await change.tx.update(trucks).set({ yardId }).where(thatTruck(key));
        const detail = { from: before?.yardId, to: yardId };
        await writeSetupAudit(change.tx, actor, change.now, "truck.move", truckId, detail);
        change.note("truck", truckId);
      },
      { clock, setup: true },
    );
    return changed.ok ? ok({ moved: true }) : changed;
  } catch (error) {
    if (errnoOf(error) !== FOREIGN_KEY) throw error;
    return refuse("invalid", { fields: [{ pointer: "/yardId", code: "yard-unknown" }] });
  }
}
