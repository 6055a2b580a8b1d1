import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { invitations } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import type { Result } from "../refusals";
import { changePeople } from "./change-people";

/** Takes an invitation back. One that has been accepted stays accepted. */
export async function revokeInvitation(
  db: Db,
  actor: Actor,
  input: { invitationId: string },
  clock: Clock = systemClock,
): Promise<Result<{ id: string }>> {
  const id = input.invitationId;
  const that = and(eq(invitations.carrierId, actor.carrierId), eq(invitations.id, id));
  return changePeople(db, actor, clock, async (change) => {
    const [row] = await change.tx.select().from(invitations).where(that);
    if (!row) return change.deny("not-found");
    if (row.acceptedAt !== null) return change.deny("already-ended");
    if (row.revokedAt !== null) return { id };
    await change.tx
      .update(invitations)
      .set({ revokedAt: change.now })
      .where(and(that, isNull(invitations.revokedAt)));
    change.note("person.invite-revoke", id);
    return { id };
  });
}
