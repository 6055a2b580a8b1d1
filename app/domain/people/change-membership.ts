import type { Db } from "../../db/client";
import { memberships } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import type { Result } from "../refusals";
import { changePeople } from "./change-people";
import { placeOnCall } from "./on-call";
import type { MembershipInput } from "./person-input";
import { findMember, thatMember } from "./that-member";

/** Changes what a person may do here: roles, certifier, yard, place in the on-call line. */
export async function changeMembership(
  db: Db,
  actor: Actor,
  input: MembershipInput,
  clock: Clock = systemClock,
): Promise<Result<{ personId: string }>> {
  const { carrierId } = actor;
  const { personId, roles, certifier, yardId, onCall } = input;
  return changePeople(db, actor, clock, async (change) => {
    const found = await findMember(change.tx, carrierId, personId);
    if (!found) return change.deny("not-found");
    if (found.member.deactivatedAt !== null) return change.deny("already-ended");
    await change.requireYard(yardId);
    await change.tx
      .update(memberships)
      .set({ roles, certifier, yardId })
      .where(thatMember(carrierId, personId));
    await placeOnCall(change.tx, carrierId, personId, onCall);
    await change.requireManager();
    const { member } = found;
    const was = {
      roles: member.roles,
      certifier: member.certifier,
      yardId: member.yardId,
      onCall: member.onCallOrder,
    };
    change.note("person.change", personId, { was, is: { roles, certifier, yardId, onCall } });
    return { personId };
  });
}
