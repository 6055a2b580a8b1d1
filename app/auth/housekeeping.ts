import { lt, or } from "drizzle-orm";
import type { Db } from "../db/client";
import { sessions, signInCodes } from "../db/schema/people";
import { days, hours } from "../domain/durations";
import { type Clock, systemClock } from "../services/clock";

/** Removes codes a day after they ended and sessions a month after: addresses are not kept for nothing. */
export async function removeEnded(db: Db, now: Date): Promise<void> {
  const dayAgo = new Date(now.getTime() - days(1));
  const monthAgo = new Date(now.getTime() - days(30));
  await db.delete(signInCodes).where(lt(signInCodes.expiresAt, dayAgo));
  await db
    .delete(sessions)
    .where(or(lt(sessions.expiresAt, monthAgo), lt(sessions.revokedAt, monthAgo)));
}

export interface Housekeeping {
  stop(): Promise<void>;
}

/** Every hour. Any number of nodes may do it at once. */
export function startHousekeeping(
  db: Db,
  onError: (error: unknown) => void,
  clock: Clock = systemClock,
): Housekeeping {
  let running: Promise<void> = Promise.resolve();
  const turn = () => {
    running = removeEnded(db, clock.now()).catch(onError);
  };
  turn();
  const timer = setInterval(turn, hours(1));
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
