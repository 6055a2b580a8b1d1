import { z } from "zod";
import type { Db } from "../../db/client";
import { runLimits } from "../../db/schema/tags";
import { type Clock, systemClock } from "../../services/clock";
import { limitSchema } from "../../trade/limit-schema";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { once, submissionOf } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";
import { signatureSchema } from "../signature";
import { yardDay } from "../yard-day";
import { readOpenTag, truckOfTag } from "./open-tag";
import { whySignerMayNot } from "./who-signs";
import { yardOfTruck } from "./yard-of-truck";

export const allowRunSchema = z.object({
  id: z.uuid(),
  tagId: z.uuid(),
  limit: limitSchema.nullable(),
  /** Last day the truck may run under the limit, yard time. */
  untilDay: z.iso.date(),
  signature: signatureSchema,
});
export type AllowRunInput = z.infer<typeof allowRunSchema>;

export interface AllowRunReceipt {
  id: string;
  tagId: string;
  truckId: string;
  standing: StandingWord;
}

/** A certifier's leave for a yellow tag to run under its limit until a day; the tag stays open. */
export async function allowRun(
  db: Db,
  actor: Actor,
  input: AllowRunInput,
  clock: Clock = systemClock,
): Promise<Result<AllowRunReceipt>> {
  const { carrierId, personId } = actor;
  const sent = submissionOf("run-limit", input);
  return once(db, actor, sent, clock, async () => {
    const truckId = await truckOfTag(db, carrierId, input.tagId);
    if (!truckId) return refuse("not-found");
    const changed = await changeTruck(
      db,
      { carrierId, truckId },
      async (change) => {
        const tag = await readOpenTag(change.tx, carrierId, input.tagId);
        if (!tag) return change.deny("already-ended");
        if (tag.colour !== "yellow") return change.deny("nothing-to-limit");
        const no = whySignerMayNot(actor, tag, { ...change.policy, driverFix: false }, false);
        if (no) return change.deny(no);
        const { zone } = await yardOfTruck(change.tx, carrierId, truckId);
        if (input.untilDay < yardDay(change.now, zone).day) {
          return change.deny("invalid", { fields: [{ pointer: "/untilDay", code: "date-past" }] });
        }
        await change.tx.insert(runLimits).values({
          carrierId,
          id: input.id,
          tagId: tag.id,
          truckId,
          limit: input.limit,
          untilDay: input.untilDay,
          signedBy: personId,
          signedAt: change.now,
          signature: input.signature,
          hash: sent.hash,
        });
        change.moveTags();
        change.note("run-limit", input.id, { tagId: tag.id });
        const receipt = (standing: StandingWord) => ({
          id: input.id,
          tagId: tag.id,
          truckId,
          standing,
        });
        change.receipt = { ...sent, personId, body: (after) => receipt(after.word) };
        return receipt;
      },
      { clock },
    );
    if (!changed.ok) return changed;
    return ok(changed.value.value(changed.value.standing.word));
  });
}
