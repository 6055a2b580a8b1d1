import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { memberships, sessions } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import type { Result } from "../refusals";
import { changePeople } from "./change-people";
import { revokeInvitationsTo } from "./live-invitations";
import { placeOnCall } from "./on-call";
import { findMember, thatMember } from "./that-member";

/** Ends a person's place here, with their sessions and open invitations, from the next request on. */
export async function deactivatePerson(
  db: Db,
  actor: Actor,
  input: { personId: string },
  clock: Clock = systemClock,
): Promise<Result<{ personId: string }>> {
  const { carrierId } = actor;
  const { personId } = input;
  return changePeople(db, actor, clock, async (change) => {
    const found = await findMember(change.tx, carrierId, personId);
    if (!found) return change.deny("not-found");
    if (found.member.deactivatedAt !== null) return { personId };
    await placeOnCall(change.tx, carrierId, personId, null);
    await change.tx
      .update(memberships)
      .set({ deactivatedAt: change.now })
      .where(thatMember(carrierId, personId));
    await change.requireManager();
    await change.tx
      .update(sessions)
      .set({ revokedAt: change.now })
      .where(
        and(
          eq(sessions.personId, personId),
          eq(sessions.carrierId, carrierId),
          isNull(sessions.revokedAt),
        ),
      );
    await revokeInvitationsTo(change, found.email, null);
    change.note("person.deactivate", personId);
    return { personId };
  });
}
