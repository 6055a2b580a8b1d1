import { and, desc, eq, gt, isNull, ne } from "drizzle-orm";
import type { Db } from "../../db/client";
import { sessions } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { ok, type Result, refuse } from "../refusals";

export interface OwnSession {
  id: string;
  device: string;
  createdAt: Date;
  lastSeenAt: Date;
}

function ownLive(actor: Actor) {
  return and(eq(sessions.personId, actor.personId), isNull(sessions.revokedAt));
}

/** Where this person is signed in, the latest used first. */
export async function listSessions(db: Db, actor: Actor, now: Date): Promise<OwnSession[]> {
  return db
    .select({
      id: sessions.id,
      device: sessions.device,
      createdAt: sessions.createdAt,
      lastSeenAt: sessions.lastSeenAt,
    })
    .from(sessions)
    .where(and(ownLive(actor), gt(sessions.expiresAt, now)))
    .orderBy(desc(sessions.lastSeenAt));
}

/** Ends one of one's own sessions. Somebody else's is not found. */
export async function revokeSession(
  db: Db,
  actor: Actor,
  input: { sessionId: string },
  clock: Clock = systemClock,
): Promise<Result<{ id: string }>> {
  const id = input.sessionId;
  const mine = and(eq(sessions.personId, actor.personId), eq(sessions.id, id));
  const [row] = await db.select({ id: sessions.id }).from(sessions).where(mine);
  if (!row) return refuse("not-found");
  await db
    .update(sessions)
    .set({ revokedAt: clock.now() })
    .where(and(mine, ownLive(actor)));
  return ok({ id });
}

/** Ends every own session but the one in hand. */
export async function revokeOtherSessions(
  db: Db,
  actor: Actor,
  input: { keep: string },
  clock: Clock = systemClock,
): Promise<Result<{ ended: number }>> {
  const [done] = await db
    .update(sessions)
    .set({ revokedAt: clock.now() })
    .where(and(ownLive(actor), ne(sessions.id, input.keep)));
  return ok({ ended: done.affectedRows });
}
