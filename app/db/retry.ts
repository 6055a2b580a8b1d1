import { setTimeout as wait } from "node:timers/promises";
import type { Db } from "./client";
import { mayRetry } from "./errors";

const TRIES = 8;

/** Runs a whole transaction, again after a transient failure, with jitter, at most eight times. */
export async function inTransaction<T>(db: Db, work: (tx: Db) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (attempt >= TRIES || !mayRetry(error)) throw error;
      await wait(Math.random() * Math.min(1000, 10 * 2 ** attempt));
    }
  }
}
