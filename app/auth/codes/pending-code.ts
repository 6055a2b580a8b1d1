import { desc, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { signInCodes } from "../../db/schema/people";
import { browserHash } from "./issue-code";

export type PendingCode = typeof signInCodes.$inferSelect;

/** The newest code this browser asked for, whatever became of it. */
export async function newestCode(
  db: Db,
  browser: { token: string; secret: string },
): Promise<PendingCode | null> {
  const [row] = await db
    .select()
    .from(signInCodes)
    .where(eq(signInCodes.browserHash, browserHash(browser.secret, browser.token)))
    .orderBy(desc(signInCodes.createdAt), desc(signInCodes.id))
    .limit(1);
  return row ?? null;
}
