import { eq, sql } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { carriers, feedHeads, policies, yards } from "../../db/schema/carriers";
import { audit, memberships, people } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import { writeChanges } from "../feed";
import { emailSchema, personNameSchema } from "../people/person-input";
import { DEFAULT_POLICY } from "../policy/settings";
import { ok, type Result } from "../refusals";
import { isZone } from "../yard-day";

export const addCarrierSchema = z.object({
  name: z.string().trim().min(2, "carrier-name").max(120, "carrier-name"),
  managerName: personNameSchema,
  managerEmail: emailSchema,
  yard: z.string().trim().min(2, "yard-name").max(80, "yard-name"),
  zone: z.string().refine(isZone, "zone-unknown"),
  /** Metres above the sea. */
  elevationM: z.coerce
    .number({ error: "not-a-number" })
    .min(-430, "elevation")
    .max(5100, "elevation"),
});
export type AddCarrierInput = z.infer<typeof addCarrierSchema>;

/** A new carrier with its first yard and its first manager, who signs in by code. */
export async function addCarrier(
  db: Db,
  input: AddCarrierInput,
  clock: Clock = systemClock,
): Promise<Result<{ carrierId: string; personId: string; yardId: string }>> {
  const now = clock.now();
  const [carrierId, yardId] = [uuidv7(), uuidv7()];
  const personId = await inTransaction(db, async (tx) => {
    await tx.insert(carriers).values({ id: carrierId, name: input.name, createdAt: now });
    await tx.insert(feedHeads).values({ carrierId });
    await tx
      .insert(policies)
      .values({ carrierId, version: 1, settings: DEFAULT_POLICY, createdAt: now });
    await tx.insert(yards).values({
      carrierId,
      id: yardId,
      name: input.yard,
      zone: input.zone,
      elevationM: input.elevationM,
      createdAt: now,
    });
    await tx
      .insert(people)
      .values({ id: uuidv7(), email: input.managerEmail, name: input.managerName, createdAt: now })
      .onDuplicateKeyUpdate({ set: { email: sql`email` } });
    const [person] = await tx
      .select({ id: people.id })
      .from(people)
      .where(eq(people.email, input.managerEmail));
    if (!person) throw new Error("person vanished");
    await tx
      .insert(memberships)
      .values({ carrierId, personId: person.id, roles: ["manager"], createdAt: now });
    await tx
      .insert(audit)
      .values({ carrierId, id: uuidv7(), at: now, action: "carrier.add", subjectId: carrierId });
    await writeChanges(tx, carrierId, now, [{ kind: "carrier.add", subjectId: carrierId }]);
    return person.id;
  });
  return ok({ carrierId, personId, yardId });
}
