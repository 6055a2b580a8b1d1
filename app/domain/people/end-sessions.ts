import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { sessions } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import type { Result } from "../refusals";
import { changePeople } from "./change-people";
import { findMember } from "./that-member";

/** Signs a person out everywhere they act for this carrier: a lost phone. */
export async function endSessions(
  db: Db,
  actor: Actor,
  input: { personId: string },
  clock: Clock = systemClock,
): Promise<Result<{ ended: number }>> {
  const { carrierId } = actor;
  const { personId } = input;
  return changePeople(db, actor, clock, async (change) => {
    if (!(await findMember(change.tx, carrierId, personId))) return change.deny("not-found");
    const [done] = await change.tx
      .update(sessions)
      .set({ revokedAt: change.now })
      .where(
        and(
          eq(sessions.personId, personId),
          eq(sessions.carrierId, carrierId),
          isNull(sessions.revokedAt),
        ),
      );
    change.note("person.end-sessions", personId, { ended: done.affectedRows });
    return { ended: done.affectedRows };
  });
}
