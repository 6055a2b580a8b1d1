import { and, eq, gt, isNull, lt, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { signInCodes } from "../../db/schema/people";
import { type FaultValues, ok, type Result, refuse } from "../../domain/refusals";
import { sameHash } from "../../domain/tokens";
import { type Started, startSession } from "../sessions/start-session";
import { codeHash } from "./issue-code";
import { newestCode, type PendingCode } from "./pending-code";

const TRIES = 5;

export interface CodeToRedeem {
  code: string;
  browser: string;
  secret: string;
  device: string;
  previousToken: string | null;
}

function fault(code: string, values?: FaultValues) {
  return refuse("invalid", { fields: [{ pointer: "/code", code, ...(values && { values }) }] });
}

/** Why a code no longer counts, or null when it does. */
export function whyEnded(row: PendingCode, now: Date): string | null {
  if (row.endedAt !== null) return row.tries >= TRIES ? "code-out-of-tries" : "code-used";
  if (row.tries >= TRIES) return "code-out-of-tries";
  return row.expiresAt <= now ? "code-expired" : null;
}

/** Spends one of the five tries, by compare-and-set: fifty at once are still five. */
async function spendTry(db: Db, row: PendingCode, now: Date): Promise<boolean> {
  const [spent] = await db
    .update(signInCodes)
    .set({ tries: sql`${signInCodes.tries} + 1` })
    .where(
      and(
        eq(signInCodes.id, row.id),
        isNull(signInCodes.endedAt),
        lt(signInCodes.tries, TRIES),
        gt(signInCodes.expiresAt, now),
      ),
    );
  return spent.affectedRows === 1;
}

/** Ends the code and starts the session together, so that a code makes one session at most. */
async function endCode(db: Db, row: PendingCode, sent: CodeToRedeem, now: Date) {
  return inTransaction(db, async (tx) => {
    const [used] = await tx
      .update(signInCodes)
      .set({ endedAt: now })
      .where(and(eq(signInCodes.id, row.id), isNull(signInCodes.endedAt)));
    if (used.affectedRows !== 1) return null;
    return startSession(tx, { ...sent, email: row.email }, now);
  });
}

/**
 * Judges a typed code by the table alone. The address is the row's: nothing the browser sends
 * can name another. Refusals say whether the code was wrong, used, expired or out of tries.
 */
export async function redeemCode(db: Db, sent: CodeToRedeem, now: Date): Promise<Result<Started>> {
  const row = await newestCode(db, { token: sent.browser, secret: sent.secret });
  if (!row) return fault("code-none");
  if (!(await spendTry(db, row, now))) {
    const after = await newestCode(db, { token: sent.browser, secret: sent.secret });
    return fault((after && whyEnded(after, now)) ?? "code-used");
  }
  if (!sameHash(codeHash(sent.secret, row.id, sent.code), row.codeHash)) {
    const [left] = await db
      .select({ tries: signInCodes.tries })
      .from(signInCodes)
      .where(eq(signInCodes.id, row.id));
    const triesLeft = TRIES - (left?.tries ?? TRIES);
    return triesLeft > 0 ? fault("code-wrong", { triesLeft }) : fault("code-out-of-tries");
  }
  const started = await endCode(db, row, sent, now);
  // Somebody was faster, or nobody here has this address (any more).
  return started ? ok(started) : fault("code-used");
}
