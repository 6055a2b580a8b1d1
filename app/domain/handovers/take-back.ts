import { and, eq, isNull } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { handovers, returns } from "../../db/schema/handovers";
import { trucks } from "../../db/schema/trucks";
import { readings } from "../../db/schema/walks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { once, submissionOf } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";

export const takeBackSchema = z.object({
  id: z.uuid(),
  handoverId: z.uuid(),
  aboard: z.enum(["empty", "loaded"]),
  pumpHours: z.number().min(0).max(200_000).nullable(),
  endsDay: z.boolean(),
  note: z.string().trim().max(1000).nullable(),
});
export type TakeBackInput = z.infer<typeof takeBackSchema>;

export interface TakeBackReceipt {
  id: string;
  truckId: string;
  returnedAt: string;
}

/** The key comes back to the peg. Refused when it is not out. */
export async function takeBack(
  db: Db,
  actor: Actor,
  input: TakeBackInput,
  clock: Clock = systemClock,
): Promise<Result<TakeBackReceipt>> {
  const { carrierId } = actor;
  const sent = submissionOf("return", input);
  return once(db, actor, sent, clock, async () => {
    const [handover] = await db
      .select({ truckId: handovers.truckId, driverId: handovers.driverId })
      .from(handovers)
      .where(and(eq(handovers.carrierId, carrierId), eq(handovers.id, input.handoverId)));
    if (!handover) return refuse("not-found");
    const key = { carrierId, truckId: handover.truckId };
    const result = await changeTruck(
      db,
      key,
      async (change) => {
        const [closed] = await change.tx
          .update(handovers)
          .set({ returnedAt: change.now })
          .where(
            and(
              eq(handovers.carrierId, carrierId),
              eq(handovers.id, input.handoverId),
              isNull(handovers.returnedAt),
            ),
          );
        if (closed.affectedRows !== 1) change.deny("already-ended");
        await change.tx
          .update(trucks)
          .set({ outHandover: null })
          .where(and(eq(trucks.carrierId, carrierId), eq(trucks.id, handover.truckId)));
        const { id: _id, ...fields } = input;
        await change.tx.insert(returns).values({
          ...fields,
          ...key,
          id: input.id,
          driverId: handover.driverId,
          takenBy: actor.personId,
          returnedAt: change.now,
          hash: sent.hash,
        });
        if (input.pumpHours !== null) {
          await change.tx.insert(readings).values({
            ...key,
            id: uuidv7(),
            checkKey: "return.pump-hours",
            quantity: "pump-hours",
            countsFrom: change.now,
            entered: input.pumpHours,
            unit: "h",
            si: input.pumpHours,
          });
        }
        const receipt = {
          id: input.id,
          truckId: handover.truckId,
          returnedAt: change.now.toISOString(),
        };
        change.receipt = { ...sent, personId: actor.personId, body: () => receipt };
        change.note("return", input.id);
        return receipt;
      },
      { clock },
    );
    return result.ok ? ok(result.value.value) : result;
  });
}
