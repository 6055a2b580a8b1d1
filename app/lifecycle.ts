import { sql } from "drizzle-orm";
import { RouterContextProvider } from "react-router";
import { type Housekeeping, startHousekeeping } from "./auth/housekeeping";
import { type Config, config } from "./config";
import { type Client, clientContext, closeDatabase, database } from "./context";
import { startTicker, type Ticker } from "./domain/gate/ticker";
import { log } from "./services/log";
import { type MailDrain, startMailDrain } from "./services/mail/drain";
import { storage } from "./services/storage";

let ticker: Ticker | null = null;
let drain: MailDrain | null = null;
let housekeeping: Housekeeping | null = null;

/** Reads the configuration, opens the database and starts the background work; says where to listen. */
export async function start(): Promise<Config["listen"]> {
  const { listen } = config();
  const { db } = database();
  const report = (what: string) => (error: unknown) =>
    log().error({ what, error: error instanceof Error ? error.name : "unknown" }, "background");
  ticker = startTicker(db, report("ticker"));
  drain = startMailDrain(db, report("mail"));
  housekeeping = startHousekeeping(db, report("housekeeping"));
  return listen;
}

/** Shorter than whoever asks waits: what hangs is as good as away. */
const HEALTH_WITHIN_MS = 3_000;

async function works(check: () => Promise<unknown>): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), HEALTH_WITHIN_MS);
  });
  const done = check().then(
    () => true,
    () => false,
  );
  const up = await Promise.race([done, late]);
  clearTimeout(timer);
  return up;
}

/** Are the database and the object store there? */
export async function health(): Promise<{ ok: boolean; checks: Record<string, boolean> }> {
  const [databaseUp, storageUp] = await Promise.all([
    works(async () => database().db.execute(sql`select 1`)),
    works(async () => storage().check()),
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
