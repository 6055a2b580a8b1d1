import { and, eq, lt, lte, or } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { leases } from "../../db/schema/carriers";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { seconds } from "../durations";
import { changeTruck } from "./change-truck";

const LEASE = "standing-until";
const LEASE_FOR = seconds(20);
const AT_ONCE = 50;

/** Takes or keeps the lease, so that one node at a time rewrites expired standings. */
async function holdsLease(db: Db, holder: string, now: Date): Promise<boolean> {
  const until = new Date(now.getTime() + LEASE_FOR);
  const [taken] = await db
    .update(leases)
    .set({ holder, until })
    .where(and(eq(leases.name, LEASE), or(eq(leases.holder, holder), lt(leases.until, now))));
  if (taken.affectedRows === 1) return true;
  const [made] = await db.insert(leases).ignore().values({ name: LEASE, holder, until });
  return made.affectedRows === 1;
}

/** Rewrites trucks whose standing has stopped being true by itself. Returns how many. */
export async function refreshExpired(db: Db, clock: Clock = systemClock): Promise<number> {
  const expired = await db
    .select({ carrierId: trucks.carrierId, truckId: trucks.id })
    .from(trucks)
    .where(lte(trucks.standingUntil, clock.now()))
    .orderBy(trucks.standingUntil)
    .limit(AT_ONCE);
  for (const key of expired) await changeTruck(db, key, async () => undefined, { clock });
  return expired.length;
}

export interface Ticker {
  stop(): Promise<void>;
}

/** Every second, under a lease, brings expired standings up. A failed turn is reported and tried again. */
export function startTicker(
  db: Db,
  onError: (error: unknown) => void,
  clock: Clock = systemClock,
): Ticker {
  const holder = uuidv7();
  let running: Promise<void> = Promise.resolve();
  let stopped = false;
  const turn = async () => {
    try {
      if (await holdsLease(db, holder, clock.now())) await refreshExpired(db, clock);
    } catch (error) {
      onError(error);
    }
  };
  const timer = setInterval(() => {
    running = running.then(() => (stopped ? undefined : turn()));
  }, seconds(1));
  return {
    stop: async () => {
      stopped = true;
      clearInterval(timer);
      await running;
    },
  };
}
