import type { MySqlDatabase } from "drizzle-orm/mysql-core";
import {
  drizzle,
  type MySql2PreparedQueryHKT,
  type MySql2QueryResultHKT,
} from "drizzle-orm/mysql2";
import mysql, { type Pool } from "mysql2";

/** The database as commands use it; a transaction fits the same slot. */
export type Db = MySqlDatabase<MySql2QueryResultHKT, MySql2PreparedQueryHKT>;

export interface Database {
  db: Db;
  /** The callback pool, for the rate limiter. */
  pool: Pool;
  /** The schema's name, which the rate limiter spells out. */
  name: string;
  close(): Promise<void>;
}

/** Opens a pool. Sessions run in UTC and wait five seconds for a lock. */
export function openDatabase(url: string, connectionLimit = 10): Database {
  const pool = mysql.createPool({
    uri: url,
    connectionLimit,
    timezone: "Z",
    charset: "utf8mb4",
    supportBigNumbers: true,
  });
  pool.on("connection", (connection) => {
    connection.query(
      "SET time_zone = '+00:00', innodb_lock_wait_timeout = 5, sql_mode = 'STRICT_ALL_TABLES,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION'",
    );
  });
  const db = drizzle({ client: pool.promise() });
  return {
    db,
    pool,
    name: decodeURIComponent(new URL(url).pathname.slice(1)),
    close: () => new Promise((resolve) => pool.end(() => resolve())),
  };
}
