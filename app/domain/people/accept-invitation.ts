import { and, eq, isNull, sql } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { invitations, memberships, people } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import { ok, type Result } from "../refusals";
import { changePeople, type PeopleChange } from "./change-people";
import { type Invitation, readInvitation } from "./read-invitation";
import { findMember } from "./that-member";

/** The person behind an address: one, however many carriers they work for. */
async function personFor(change: PeopleChange, invitation: Invitation): Promise<string> {
  const { email, name } = invitation;
  await change.tx
    .insert(people)
    .values({ id: uuidv7(), email, name, createdAt: change.now })
    .onDuplicateKeyUpdate({ set: { email: sql`email` } });
  const [person] = await change.tx
    .select({ id: people.id })
    .from(people)
    .where(eq(people.email, email));
  if (!person) throw new Error("person vanished");
  return person.id;
}

/**
 * Takes up an invitation. Answers the address it was sent to: accepting signs nobody in, a code
 * sent there does. Accepting again changes nothing.
 */
export async function acceptInvitation(
  db: Db,
  token: string,
  clock: Clock = systemClock,
): Promise<Result<{ email: string }>> {
  const found = await readInvitation(db, token, clock.now());
  if (!found.ok) return found;
  const { carrierId, id, email } = found.value;
  if (found.value.accepted) return ok({ email });
  return changePeople(db, { carrierId, personId: null }, clock, async (change) => {
    const open = and(
      eq(invitations.carrierId, carrierId),
      eq(invitations.id, id),
      isNull(invitations.acceptedAt),
      isNull(invitations.revokedAt),
    );
    const [taken] = await change.tx.update(invitations).set({ acceptedAt: change.now }).where(open);
    const [row] = await change.tx
      .select()
      .from(invitations)
      .where(and(eq(invitations.carrierId, carrierId), eq(invitations.id, id)));
    if (!row || row.acceptedAt === null) return change.deny("invitation-ended");
    if (taken.affectedRows === 0) return { email };
    const personId = await personFor(change, found.value);
    if (await findMember(change.tx, carrierId, personId)) return change.deny("invitation-ended");
    const { roles, certifier, yardId } = row;
    await change.tx
      .insert(memberships)
      .values({ carrierId, personId, roles, certifier, yardId, createdAt: change.now });
    change.note("person.join", personId, { invitationId: id, roles, certifier });
    return { email };
  });
}
