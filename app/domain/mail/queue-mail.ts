import { sql } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { mailOutbox } from "../../db/schema/people";

export interface MailToQueue {
  carrierId: string | null;
  /** One mail per key, ever. */
  dedupeKey: string;
  recipient: string;
  template: (typeof mailOutbox.$inferInsert)["template"];
  props: unknown;
}

/** Puts mail into the outbox, in the transaction of what it tells about. The same key twice is one mail. */
export async function queueMail(tx: Db, mails: readonly MailToQueue[], now: Date): Promise<void> {
  if (mails.length === 0) return;
  await tx
    .insert(mailOutbox)
    .values(mails.map((mail) => ({ ...mail, id: uuidv7(), createdAt: now, sendAfter: now })))
    .onDuplicateKeyUpdate({ set: { dedupeKey: sql`dedupe_key` } });
}
