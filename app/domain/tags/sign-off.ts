import { and, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import type { Db } from "../../db/client";
import { signOffs, tags } from "../../db/schema/tags";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { submissionOf } from "../receipts/once";
import type { Result } from "../refusals";
import { signatureSchema } from "../signature";
import { changeTag, type TagReceipt } from "./change-tag";
import { queueKeyFreed } from "./key-freed-mail";
import { whySignerMayNot } from "./who-signs";

const ends = {
  id: z.uuid(),
  tagId: z.uuid(),
  remote: z.boolean().default(false),
  signature: signatureSchema,
};

/** The two ends 49 CFR 396.11(a)(3)(ii) knows: repaired, or repair not needed for safe operation. */
export const signOffSchema = z.discriminatedUnion("kind", [
  z.object({
    ...ends,
    kind: z.literal("repaired"),
    work: z.enum(["adjusted", "cleaned", "repaired", "replaced"]),
    parts: z.string().trim().max(400).nullable(),
    roadTested: z.boolean().nullable(),
  }),
  z.object({
    ...ends,
    kind: z.literal("not-needed"),
    reason: z.string().trim().min(3, "reason-empty").max(1000),
  }),
]);
export type SignOffInput = z.infer<typeof signOffSchema>;

export type SignOffReceipt = TagReceipt & { signedAt: string };

/** K3: ends a tag. Who may is K10's; the gate follows in the same transaction. */
export async function signOff(
  db: Db,
  actor: Actor,
  input: SignOffInput,
  clock: Clock = systemClock,
): Promise<Result<SignOffReceipt>> {
  const { carrierId, personId } = actor;
  const sent = submissionOf("sign-off", input);
  return changeTag(db, actor, { sent, tagId: input.tagId, clock }, async (change, tag) => {
    const no = whySignerMayNot(actor, tag, change.policy, input.remote);
    if (no) return change.deny(no);
    const { truckId } = tag;
    const repaired = input.kind === "repaired" ? input : null;
    await change.tx.insert(signOffs).values({
      carrierId,
      id: input.id,
      tagId: tag.id,
      truckId,
      kind: input.kind,
      work: repaired?.work ?? null,
      parts: repaired?.parts ?? null,
      roadTested: repaired?.roadTested ?? null,
      reason: input.kind === "not-needed" ? input.reason : null,
      remote: input.remote,
      ownFinding: tag.raisedBy === personId,
      signedBy: personId,
      signedAt: change.now,
      signature: input.signature,
      hash: sent.hash,
    });
    await change.tx
      .update(tags)
      .set({ signedOffAt: change.now })
      .where(and(eq(tags.carrierId, carrierId), eq(tags.id, tag.id), isNull(tags.signedOffAt)));
    change.after(async (after) => {
      if (tag.colour === "red" && after.gate.openReds === 0) {
        await queueKeyFreed(change, { carrierId, truckId, tagId: tag.id, signOffId: input.id });
      }
    });
    return { signedAt: change.now.toISOString() };
  });
}
