import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { DUPLICATE_KEY, errnoOf } from "../../db/errors";
import { carriers } from "../../db/schema/carriers";
import { invitations, memberships, people } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { days } from "../durations";
import { queueMail } from "../mail/queue-mail";
import { ok, type Result, refuse } from "../refusals";
import { makeToken, tokenHash } from "../tokens";
import { changePeople, type PeopleChange } from "./change-people";
import { revokeInvitationsTo } from "./live-invitations";
import type { InviteInput } from "./person-input";

const INVITATION_LASTS = days(7);

async function refuseMembers(change: PeopleChange, email: string): Promise<void> {
  const [member] = await change.tx
    .select({ deactivatedAt: memberships.deactivatedAt })
    .from(people)
    .innerJoin(memberships, eq(memberships.personId, people.id))
    .where(and(eq(people.email, email), eq(memberships.carrierId, change.carrierId)));
  if (!member) return;
  const code = member.deactivatedAt === null ? "already-member" : "member-deactivated";
  change.deny("invalid", { fields: [{ pointer: "/email", code }] });
}

async function queueInvitation(
  change: PeopleChange,
  actor: Actor,
  input: InviteInput,
  token: string,
): Promise<void> {
  const [carrier] = await change.tx
    .select({ name: carriers.name })
    .from(carriers)
    .where(eq(carriers.id, change.carrierId));
  const props = {
    carrierName: carrier?.name ?? "",
    invitedBy: actor.name,
    roles: input.roles,
    path: `/invitation/${token}`,
  };
  await queueMail(
    change.tx,
    [
      {
        carrierId: change.carrierId,
        dedupeKey: `invitation:${input.id}`,
        recipient: input.email,
        template: "invitation",
        props,
      },
    ],
    change.now,
  );
}

async function sameInvitation(db: Db, actor: Actor, input: InviteInput): Promise<boolean> {
  const [row] = await db
    .select({ email: invitations.email })
    .from(invitations)
    .where(and(eq(invitations.carrierId, actor.carrierId), eq(invitations.id, input.id)));
  return row?.email === input.email;
}

/**
 * Invites a person by e-mail. A newer invitation to the same address ends the older one; the
 * same form sent twice is one invitation and one mail.
 */
export async function invitePerson(
  db: Db,
  actor: Actor,
  input: InviteInput,
  clock: Clock = systemClock,
): Promise<Result<{ id: string }>> {
  const { carrierId, personId } = actor;
  const { id, email, name, roles, certifier, yardId } = input;
  const token = makeToken();
  try {
    return await changePeople(db, actor, clock, async (change) => {
      await refuseMembers(change, email);
      await change.requireYard(yardId);
      await change.tx.insert(invitations).values({
        ...{ carrierId, id, email, name, roles, certifier, yardId },
        tokenHash: tokenHash(token),
        invitedBy: personId,
        createdAt: change.now,
        expiresAt: new Date(change.now.getTime() + INVITATION_LASTS),
      });
      await revokeInvitationsTo(change, email, id);
      await queueInvitation(change, actor, input, token);
      change.note("person.invite", id, { roles, certifier });
      return { id };
    });
  } catch (error) {
    if (errnoOf(error) !== DUPLICATE_KEY) throw error;
    return (await sameInvitation(db, actor, input)) ? ok({ id }) : refuse("same-id-other-body");
  }
}
