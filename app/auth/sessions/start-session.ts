import { and, desc, eq, isNull } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { memberships, people, sessions } from "../../db/schema/people";
import type { Role } from "../../domain/actor";
import { makeToken, tokenHash } from "../../domain/tokens";
import { sessionEnd } from "./open-session";

export interface Started {
  /** Goes into the cookie; kept nowhere else. */
  token: string;
  roles: readonly Role[];
}

/** Carriers where the person works now, the one they last acted for first. */
async function placesOf(tx: Db, email: string) {
  return tx
    .select({
      personId: people.id,
      carrierId: memberships.carrierId,
      roles: memberships.roles,
      lastSeenAt: sessions.lastSeenAt,
    })
    .from(people)
    .innerJoin(memberships, eq(memberships.personId, people.id))
    .leftJoin(
      sessions,
      and(eq(sessions.personId, people.id), eq(sessions.carrierId, memberships.carrierId)),
    )
    .where(and(eq(people.email, email), isNull(memberships.deactivatedAt)))
    .orderBy(desc(sessions.lastSeenAt), memberships.createdAt)
    .limit(1);
}

/**
 * Starts a session with a token of its own for whoever reads this address, and ends the one the
 * browser held before. Null when nobody here has that address.
 */
export async function startSession(
  tx: Db,
  who: { email: string; device: string; previousToken: string | null },
  now: Date,
): Promise<Started | null> {
  const [place] = await placesOf(tx, who.email);
  if (!place) return null;
  if (who.previousToken) {
    await tx
      .update(sessions)
      .set({ revokedAt: now })
      .where(and(eq(sessions.tokenHash, tokenHash(who.previousToken)), isNull(sessions.revokedAt)));
  }
  const token = makeToken();
  await tx.insert(sessions).values({
    id: uuidv7(),
    tokenHash: tokenHash(token),
    personId: place.personId,
    carrierId: place.carrierId,
    device: who.device,
    createdAt: now,
    lastSeenAt: now,
    expiresAt: sessionEnd(now, now),
  });
  return { token, roles: place.roles as Role[] };
}
