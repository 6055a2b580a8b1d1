import { sql } from "drizzle-orm";
import { RouterContextProvider } from "react-router";
import { type Housekeeping, startHousekeeping } from "./auth/housekeeping";
import { config } from "./config";
import { type Client, clientContext, closeDatabase, database } from "./context";
import { startTicker, type Ticker } from "./domain/gate/ticker";
import { log } from "./services/log";
import { type MailDrain, startMailDrain } from "./services/mail/drain";
import { storage } from "./services/storage";

let ticker: Ticker | null = null;
let drain: MailDrain | null = null;
let housekeeping: Housekeeping | null = null;

/** Reads the configuration, opens the database and starts the background work. */
export async function start(): Promise<void> {
  config();
  const { db } = database();
  const report = (what: string) => (error: unknown) =>
    log().error({ what, error: error instanceof Error ? error.name : "unknown" }, "background");
  ticker = startTicker(db, report("ticker"));
  drain = startMailDrain(db, report("mail"));
  housekeeping = startHousekeeping(db, report("housekeeping"));
}

async function works(check: () => Promise<unknown>): Promise<boolean> {
  try {
    await check();
    return true;
  } catch {
    return false;
  }
}

/** Are the database and the object store there? */
export async function health(): Promise<{ ok: boolean; checks: Record<string, boolean> }> {
  const [databaseUp, storageUp] = await Promise.all([
    works(() => database().db.execute(sql`select 1`)),
    works(() => storage().check()),
  ]);
  return { ok: databaseUp && storageUp, checks: { database: databaseUp, storage: storageUp } };
}

/** Ends the background work, then the database. */
export async function stop(): Promise<void> {
  await ticker?.stop();
  await drain?.stop();
  await housekeeping?.stop();
  await closeDatabase();
}

/** The context a request starts with. */
export function loadContext(client: Client): RouterContextProvider {
  const context = new RouterContextProvider();
  context.set(clientContext, client);
  return context;
}
