import { isIPv6 } from "node:net";
import type { Pool } from "mysql2";
import { RateLimiterMySQL, RateLimiterRes } from "rate-limiter-flexible";
import type { Database } from "../../db/client";
import { hours } from "../../domain/durations";
import { keyedHash } from "../../domain/tokens";

const HOUR_S = hours(1) / 1000;
const PER_ADDRESS = 5;
const PER_CLIENT = 20;

interface Limits {
  address: RateLimiterMySQL;
  client: RateLimiterMySQL;
}

const made = new WeakMap<Pool, Limits>();

function limiter({ pool, name }: Database, keyPrefix: string, points: number): RateLimiterMySQL {
  return new RateLimiterMySQL({
    storeClient: pool,
    storeType: "pool",
    dbName: name,
    tableName: "rate_limits",
    tableCreated: true,
    keyPrefix,
    points,
    duration: HOUR_S,
  });
}

function limitsOf(database: Database): Limits {
  const known = made.get(database.pool);
  if (known) return known;
  const limits = {
    address: limiter(database, "code-address", PER_ADDRESS),
    client: limiter(database, "code-client", PER_CLIENT),
  };
  made.set(database.pool, limits);
  return limits;
}

/** One household's IPv6 addresses share a /64: the first four groups stand for all. */
export function clientKey(wire: string): string {
  const address = wire.replace(/^::ffff:(?=\d+\.)/i, "");
  if (!isIPv6(address)) return address;
  const [head = "", tail = ""] = address.split("::");
  const groups = head.split(":").filter(Boolean);
  const after = tail.split(":").filter(Boolean);
  const zeros = address.includes("::") ? 8 - groups.length - after.length : 0;
  return [...groups, ...Array<string>(Math.max(0, zeros)).fill("0"), ...after]
    .slice(0, 4)
    .join(":");
}

/**
 * Takes one send from the address's five an hour and the client's twenty. Answers null, or how
 * many minutes to wait. The table holds keyed hashes only.
 */
export async function takeSend(
  database: Database,
  who: { email: string; clientAddress: string; secret: string },
): Promise<number | null> {
  const { address, client } = limitsOf(database);
  try {
    await client.consume(keyedHash(who.secret, "limit-client", clientKey(who.clientAddress)));
    await address.consume(keyedHash(who.secret, "limit-address", who.email));
    return null;
  } catch (full) {
    if (!(full instanceof RateLimiterRes)) throw full;
    return Math.max(1, Math.ceil(full.msBeforeNext / 60_000));
  }
}
