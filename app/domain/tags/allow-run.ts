import { z } from "zod";
import type { Db } from "../../db/client";
import { runLimits } from "../../db/schema/tags";
import { type Clock, systemClock } from "../../services/clock";
import { limitSchema } from "../../trade/limit-schema";
import type { Actor } from "../actor";
import { submissionOf } from "../receipts/once";
import type { Result } from "../refusals";
import { signatureSchema } from "../signature";
import { yardDay } from "../yard-day";
import { changeTag, type TagReceipt } from "./change-tag";
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

/** A certifier's leave for a yellow tag to run under its limit until a day; the tag stays open. */
export async function allowRun(
  db: Db,
  actor: Actor,
  input: AllowRunInput,
  clock: Clock = systemClock,
): Promise<Result<TagReceipt>> {
  const { carrierId, personId } = actor;
  const sent = submissionOf("run-limit", input);
  return changeTag(db, actor, { sent, tagId: input.tagId, clock }, async (change, tag) => {
    if (tag.colour !== "yellow") return change.deny("nothing-to-limit");
    const no = whySignerMayNot(actor, tag, { ...change.policy, driverFix: false }, false);
    if (no) return change.deny(no);
    const { zone } = await yardOfTruck(change.tx, carrierId, tag.truckId);
    if (input.untilDay < yardDay(change.now, zone).day) {
      return change.deny("invalid", { fields: [{ pointer: "/untilDay", code: "date-past" }] });
    }
    await change.tx.insert(runLimits).values({
      carrierId,
      id: input.id,
      tagId: tag.id,
      truckId: tag.truckId,
      limit: input.limit,
      untilDay: input.untilDay,
      signedBy: personId,
      signedAt: change.now,
      signature: input.signature,
      hash: sent.hash,
    });
    return {};
  });
}
