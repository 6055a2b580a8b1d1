import { and, eq, gt, isNull, lt } from "drizzle-orm";
import type { SignedIn } from "../../context";
import type { Db } from "../../db/client";
import { carriers } from "../../db/schema/carriers";
import { memberships, people, sessions } from "../../db/schema/people";
import type { Role } from "../../domain/actor";
import { days, minutes } from "../../domain/durations";
import { tokenHash } from "../../domain/tokens";

const SLIDES_BY = days(90);
const AT_MOST = days(180);

/** A session ends 90 days after it was last used, and 180 days after sign-in whatever happens. */
export function sessionEnd(createdAt: Date, now: Date): Date {
  return new Date(Math.min(now.getTime() + SLIDES_BY, createdAt.getTime() + AT_MOST));
}

/** Notes that a session is in use, once a minute at most. */
async function touch(
  db: Db,
  session: { id: string; createdAt: Date; lastSeenAt: Date },
  now: Date,
): Promise<void> {
  const minuteAgo = new Date(now.getTime() - minutes(1));
  if (session.lastSeenAt > minuteAgo) return;
  await db
    .update(sessions)
    .set({ lastSeenAt: now, expiresAt: sessionEnd(session.createdAt, now) })
    .where(and(eq(sessions.id, session.id), lt(sessions.lastSeenAt, minuteAgo)));
}

/** The person behind a session's token, with their roles as they are now; null when either has ended. */
export async function openSession(db: Db, token: string, now: Date): Promise<SignedIn | null> {
  const [row] = await db
    .select({
      id: sessions.id,
      createdAt: sessions.createdAt,
      lastSeenAt: sessions.lastSeenAt,
      carrierId: memberships.carrierId,
      carrierName: carriers.name,
      personId: people.id,
      name: people.name,
      roles: memberships.roles,
      certifier: memberships.certifier,
      yardId: memberships.yardId,
    })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .innerJoin(
      memberships,
      and(
        eq(memberships.personId, sessions.personId),
        eq(memberships.carrierId, sessions.carrierId),
        isNull(memberships.deactivatedAt),
      ),
    )
    .innerJoin(carriers, eq(carriers.id, memberships.carrierId))
    .where(
      and(
        eq(sessions.tokenHash, tokenHash(token)),
        isNull(sessions.revokedAt),
        gt(sessions.expiresAt, now),
      ),
    );
  if (!row) return null;
  await touch(db, row, now);
  const { carrierId, personId, name, certifier, yardId } = row;
  const actor = { carrierId, personId, name, roles: row.roles as Role[], certifier, yardId };
  return { sessionId: row.id, actor, carrierName: row.carrierName };
}
