import { and, eq, isNull, ne } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { signInCodes } from "../../db/schema/people";
import { minutes } from "../../domain/durations";
import { queueMail } from "../../domain/mail/queue-mail";
import { keyedHash } from "../../domain/tokens";

export const CODE_LASTS = minutes(10);

export interface CodeToIssue {
  /** Lower-cased address, as typed. */
  email: string;
  /** The token of the browser that asks. */
  browser: string;
  code: string;
  secret: string;
}

export function browserHash(secret: string, browser: string): string {
  return keyedHash(secret, "sign-in-browser", browser);
}

/** Salted with the row's id, so that equal codes do not look equal. */
export function codeHash(secret: string, rowId: string, code: string): string {
  return keyedHash(secret, "sign-in-code", `${rowId}:${code}`);
}

/**
 * Stores a code for an address and this browser, ends the browser's earlier ones, and queues the
 * mail. Known and unknown addresses take exactly the same statements: whether anybody reads the
 * address is looked up when the mail is sent.
 */
export async function issueCode(db: Db, asked: CodeToIssue, now: Date): Promise<void> {
  const { email, secret } = asked;
  const browser = browserHash(secret, asked.browser);
  const id = uuidv7();
  await inTransaction(db, async (tx) => {
    await tx.insert(signInCodes).values({
      id,
      email,
      browserHash: browser,
      codeHash: codeHash(secret, id, asked.code),
      createdAt: now,
      expiresAt: new Date(now.getTime() + CODE_LASTS),
    });
    await tx
      .update(signInCodes)
      .set({ endedAt: now })
      .where(
        and(
          eq(signInCodes.browserHash, browser),
          ne(signInCodes.id, id),
          isNull(signInCodes.endedAt),
        ),
      );
    await queueMail(
      tx,
      [
        {
          carrierId: null,
          dedupeKey: `sign-in-code:${id}`,
          recipient: email,
          template: "sign-in-code",
          props: { code: asked.code },
        },
      ],
      now,
    );
  });
}
