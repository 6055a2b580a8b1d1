// Creates the database, runs the migrations once under a lock, and gives the app's user its rights.
import { drizzle } from "drizzle-orm/mysql2";
import { migrate } from "drizzle-orm/mysql2/migrator";
import mysql from "mysql2/promise";
import { grants } from "../drizzle/grants.mjs";

const env = (name) => {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set`);
  return value;
};
const database = env("KEYPEG_DATABASE");
const connection = await mysql.createConnection({ uri: env("KEYPEG_ADMIN_URL"), timezone: "Z" });
const name = (id) => connection.escapeId(id);
try {
  await connection.query(`create database if not exists ${name(database)} character set utf8mb4`);
  await connection.query(`use ${name(database)}`);
  const [[lock]] = await connection.query("select get_lock(?, 120) as held", [
    `migrate-${database}`,
  ]);
  if (lock.held !== 1) throw new Error("another migration is running");
  await migrate(drizzle({ client: connection }), {
    migrationsFolder: new URL("../drizzle", import.meta.url).pathname,
  });
  const host = process.env.KEYPEG_APP_HOST ?? "127.0.0.1";
  const user = `${connection.escape(env("KEYPEG_APP_USER"))}@${connection.escape(host)}`;
  const password = connection.escape(env("KEYPEG_APP_PASSWORD"));
  await connection.query(`create user if not exists ${user} identified by ${password}`);
  for (const statement of grants(database, user)) await connection.query(statement);
} finally {
  await connection.end();
}
