import { z } from "zod";
import type { Db } from "../../db/client";
import { rounds } from "../../db/schema/trucks";
import { readings } from "../../db/schema/walks";
import { type Clock, systemClock } from "../../services/clock";
import { ROUND_KINDS } from "../../trade/rounds";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { once, submissionOf } from "../receipts/once";
import { ok, type Result } from "../refusals";
import { yardOfTruck } from "../tags/yard-of-truck";
import { lastPumpHours } from "../trucks/pump-hours";
import { addDays, yardDay, yardInstant } from "../yard-day";

export const recordRoundSchema = z.object({
  id: z.uuid(),
  truckId: z.uuid(),
  kind: z.enum(ROUND_KINDS),
  doneOn: z.iso.date(),
  pumpHours: z.number().min(0).max(200_000).nullable(),
});
export type RecordRoundInput = z.infer<typeof recordRoundSchema>;

/** Hours of a day gone by are older than any reading since: they do not turn the truck's hours back. */
function endOfDay(day: string, zone: string, now: Date): Date {
  const end = yardInstant(addDays(day, 1), 0, zone);
  return end < now ? end : now;
}

/** A weekly or monthly round done at the bench. A day to come is refused. */
export async function recordRound(
  db: Db,
  actor: Actor,
  input: RecordRoundInput,
  clock: Clock = systemClock,
): Promise<Result<{ id: string; standing: StandingWord }>> {
  const { carrierId, personId } = actor;
  const sent = submissionOf("round", input);
  return once(db, actor, sent, clock, async () => {
    const key = { carrierId, truckId: input.truckId };
    const changed = await changeTruck(
      db,
      key,
      async (change) => {
        const { zone } = await yardOfTruck(change.tx, carrierId, input.truckId);
        if (input.doneOn > yardDay(change.now, zone).day) {
          change.deny("invalid", { fields: [{ pointer: "/doneOn", code: "date-future" }] });
        }
        const readAt = endOfDay(input.doneOn, zone, change.now);
        const pumpHours = input.pumpHours ?? (await lastPumpHours(change.tx, key, readAt));
        await change.tx.insert(rounds).values({
          ...key,
          id: input.id,
          kind: input.kind,
          doneOn: input.doneOn,
          doneAt: change.now,
          doneBy: personId,
          pumpHours,
        });
        if (input.pumpHours !== null) {
          await change.tx.insert(readings).values({
            ...key,
            id: input.id,
            checkKey: "round.pump-hours",
            quantity: "pump-hours",
            countsFrom: readAt,
            entered: input.pumpHours,
            unit: "h",
            si: input.pumpHours,
          });
        }
        const receipt = (standing: StandingWord) => ({ id: input.id, standing });
        change.receipt = { ...sent, personId, body: (after) => receipt(after.word) };
        change.note("round", input.id, { kind: input.kind });
      },
      { clock },
    );
    return changed.ok ? ok({ id: input.id, standing: changed.value.standing.word }) : changed;
  });
}
