import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { carriers } from "../../db/schema/carriers";
import { invitations, memberships, people } from "../../db/schema/people";
import type { Role } from "../actor";
import { ok, type Result, refuse } from "../refusals";
import { tokenHash } from "../tokens";

export interface Invitation {
  carrierId: string;
  id: string;
  carrierName: string;
  invitedBy: string;
  email: string;
  name: string;
  roles: Role[];
  accepted: boolean;
}

/** The invitation a link opens. Whoever holds the link may read it; nobody else's token finds it. */
export async function readInvitation(
  db: Db,
  token: string,
  now: Date,
): Promise<Result<Invitation>> {
  const [row] = await db
    .select({ invitation: invitations, carrierName: carriers.name, invitedBy: people.name })
    .from(invitations)
    .innerJoin(carriers, eq(carriers.id, invitations.carrierId))
    .innerJoin(
      memberships,
      and(
        eq(memberships.carrierId, invitations.carrierId),
        eq(memberships.personId, invitations.invitedBy),
      ),
    )
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(eq(invitations.tokenHash, tokenHash(token)));
  if (!row) return refuse("not-found");
  const { invitation, carrierName, invitedBy } = row;
  const { carrierId, id, email, name } = invitation;
  const accepted = invitation.acceptedAt !== null;
  const ended = invitation.revokedAt !== null || invitation.expiresAt <= now;
  if (ended && !accepted) return refuse("invitation-ended");
  const roles = invitation.roles as Role[];
  return ok({ carrierId, id, carrierName, invitedBy, email, name, roles, accepted });
}
