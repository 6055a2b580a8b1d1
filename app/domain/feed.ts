import { eq, sql } from "drizzle-orm";
import type { Db } from "../db/client";
import { changes, feedHeads } from "../db/schema/carriers";

export interface Change {
  kind: string;
  truckId?: string;
  subjectId?: string;
  data?: unknown;
}

/**
 * Writes rows of the change feed. Call as the last write before commit: the head row is
 * locked from here on, which is what makes the numbers gapless and in commit order.
 */
export async function writeChanges(
  tx: Db,
  carrierId: string,
  at: Date,
  rows: readonly Change[],
): Promise<void> {
  if (rows.length === 0) return;
  const [head] = await tx
    .update(feedHeads)
    .set({ seq: sql`last_insert_id(${feedHeads.seq} + ${rows.length})` })
    .where(eq(feedHeads.carrierId, carrierId));
  if (head.affectedRows !== 1) throw new Error("feed head missing");
  const last = head.insertId;
  await tx.insert(changes).values(
    rows.map((row, index) => ({
      carrierId,
      seq: last - rows.length + 1 + index,
      at,
      kind: row.kind,
      truckId: row.truckId ?? null,
      subjectId: row.subjectId ?? null,
      data: row.data ?? null,
    })),
  );
}
