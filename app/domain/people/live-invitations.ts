import { and, eq, isNull, ne } from "drizzle-orm";
import { invitations } from "../../db/schema/people";
import type { PeopleChange } from "./change-people";

/** Ends what is still open to an address, but for one. */
export async function revokeInvitationsTo(
  change: PeopleChange,
  email: string,
  butFor: string | null,
): Promise<void> {
  await change.tx
    .update(invitations)
    .set({ revokedAt: change.now })
    .where(
      and(
        eq(invitations.carrierId, change.carrierId),
        eq(invitations.email, email),
        isNull(invitations.acceptedAt),
        isNull(invitations.revokedAt),
        ...(butFor === null ? [] : [ne(invitations.id, butFor)]),
      ),
    );
}
