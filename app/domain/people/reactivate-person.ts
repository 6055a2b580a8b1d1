import type { Db } from "../../db/client";
import { memberships } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import type { Result } from "../refusals";
import { changePeople } from "./change-people";
import { findMember, thatMember } from "./that-member";

/** Gives a person their place back, with the roles they had. They sign in anew. */
export async function reactivatePerson(
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
    if (found.member.deactivatedAt === null) return { personId };
    await change.tx
      .update(memberships)
      .set({ deactivatedAt: null })
      .where(thatMember(carrierId, personId));
    change.note("person.reactivate", personId);
    return { personId };
  });
}
