import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { acknowledgements, signOffs, tags } from "../../db/schema/tags";
import { type Clock, systemClock } from "../../services/clock";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { changeTruck, type GateChange } from "../gate/change-truck";
import { once, type Submission, submissionOf } from "../receipts/once";
import { ok, type Result } from "../refusals";
import { signatureSchema } from "../signature";
import { queueRedTags } from "../tags/red-tag-mail";

export const acknowledgeSchema = z.object({
  id: z.uuid(),
  truckId: z.uuid(),
  /** Ids of the tags, changes, run-with-limits and sign-offs that were shown. */
  items: z.array(z.uuid()).max(500),
  satisfied: z.boolean(),
  /** Not satisfied: with which sign-off, and why. */
  disputesSignOffId: z.uuid().nullable(),
  note: z.string().trim().max(1000).nullable(),
  signature: signatureSchema,
});
export type AcknowledgeInput = z.infer<typeof acknowledgeSchema>;

export interface AcknowledgeReceipt {
  id: string;
  truckId: string;
  standing: StandingWord;
}

/** "Not satisfied" hangs a red tag that a second certifier must end. */
async function hangDispute(
  change: GateChange,
  actor: Actor,
  input: Omit<AcknowledgeInput, "signature">,
): Promise<void> {
  const { carrierId, personId } = actor;
  if (input.disputesSignOffId !== null) {
    const [signed] = await change.tx
      .select({ id: signOffs.id })
      .from(signOffs)
      .where(
        and(
          eq(signOffs.carrierId, carrierId),
          eq(signOffs.id, input.disputesSignOffId),
          eq(signOffs.truckId, input.truckId),
        ),
      );
    if (!signed) change.deny("not-found");
  }
  const id = uuidv7();
  await change.tx.insert(tags).values({
    carrierId,
    id,
    truckId: input.truckId,
    kind: "not-satisfied",
    disputesSignOffId: input.disputesSignOffId,
    colour: "red",
    title: "not-satisfied",
    note: input.note,
    roadSafety: true,
    raisedBy: personId,
    raisedAt: change.now,
    receivedAt: change.now,
  });
  change.moveTags();
  change.note("tag", id, { colour: "red" });
  const tag = { id, colour: "red" as const, title: "not-satisfied" };
  await queueRedTags(change, { carrierId, truckId: input.truckId }, [tag]);
}

/** Stores an acknowledgement inside a change that is under way (a walk carries one too). */
export async function writeAcknowledgement(
  change: GateChange,
  actor: Actor,
  input: AcknowledgeInput,
  sent: Pick<Submission, "hash">,
  walkId: string | null,
): Promise<void> {
  await change.tx.insert(acknowledgements).values({
    carrierId: actor.carrierId,
    id: input.id,
    truckId: input.truckId,
    driverId: actor.personId,
    walkId,
    items: input.items,
    satisfied: input.satisfied,
    note: input.note,
    signedAt: change.now,
    receivedAt: change.now,
    signature: input.signature,
    hash: sent.hash,
  });
  change.note("acknowledgement", input.id, { satisfied: input.satisfied });
  if (!input.satisfied) await hangDispute(change, actor, input);
}

/** 49 CFR 396.13: the next driver signs that sign-offs and open tags were seen, or is not satisfied. */
export async function acknowledge(
  db: Db,
  actor: Actor,
  input: AcknowledgeInput,
  clock: Clock = systemClock,
): Promise<Result<AcknowledgeReceipt>> {
  const { carrierId, personId } = actor;
  const sent = submissionOf("acknowledgement", input);
  return once(db, actor, sent, clock, async () => {
    const changed = await changeTruck(
      db,
      { carrierId, truckId: input.truckId },
      async (change) => {
        await writeAcknowledgement(change, actor, input, sent, null);
        const receipt = (standing: StandingWord) => ({
          id: input.id,
          truckId: input.truckId,
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
