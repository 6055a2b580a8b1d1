import { createHash } from "node:crypto";
import { sql } from "drizzle-orm";
import type { Db } from "../../../app/db/client";
import { uuidBytes } from "../../../app/db/columns";

/** What of a table's row changes by itself: mail goes out, sessions are used. */
const ONLY: Record<string, string> = {
  mail_outbox: "id, recipient, template",
  sessions: "id, person_id, carrier_id, revoked_at",
};

async function rowsOf(db: Db, query: ReturnType<typeof sql>): Promise<unknown[]> {
  const [rows] = (await db.execute(query)) as unknown as [unknown[]];
  return rows;
}

let known: string[] | null = null;

/** Every table that holds rows of carriers, as the database itself lists them. */
async function tablesOfCarriers(db: Db): Promise<string[]> {
  if (known) return known;
  const rows = (await rowsOf(
    db,
    sql`select table_name as name from information_schema.columns
      where table_schema = database() and column_name = 'carrier_id' order by table_name`,
  )) as { name: string }[];
  known = rows.map((row) => row.name);
  return known;
}

/** A print of all a carrier has, table by table: the number of rows and a hash over them. */
export async function carrierPrint(db: Db, carrierId: string): Promise<Record<string, string>> {
  const id = uuidBytes(carrierId);
  const prints: Record<string, string> = {};
  const print = (name: string, rows: unknown[]) => {
    const texts = rows.map((row) => JSON.stringify(row)).sort();
    const hash = createHash("sha256").update(texts.join("\n")).digest("hex").slice(0, 16);
    prints[name] = `${rows.length} rows, ${hash}`;
  };
  for (const table of await tablesOfCarriers(db)) {
    const columns = sql.raw(ONLY[table] ?? "*");
    const from = sql.raw(`\`${table}\``);
    print(table, await rowsOf(db, sql`select ${columns} from ${from} where carrier_id = ${id}`));
  }
  print("carriers", await rowsOf(db, sql`select * from carriers where id = ${id}`));
  print(
    "people",
    await rowsOf(
      db,
      sql`select people.* from people join memberships on person_id = people.id
        where carrier_id = ${id}`,
    ),
  );
  return prints;
}

/** No standing of this carrier runs out by itself while its print is compared. */
export async function stopStandings(db: Db, carrierId: string): Promise<void> {
  const id = uuidBytes(carrierId);
  await db.execute(sql`update trucks set standing_until = null where carrier_id = ${id}`);
}
