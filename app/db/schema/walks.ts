import { sql } from "drizzle-orm";
import {
  bigint,
  boolean,
  check,
  date,
  double,
  foreignKey,
  index,
  int,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  varchar,
} from "drizzle-orm/mysql-core";
import type { Limit } from "../../trade/limits";
import { instant, jsonOf, sha256, uuid } from "../columns";
import { memberships } from "./people";
import { sheetVersions, trucks } from "./trucks";

/** A signature: the name as typed, and the key of the certification wording signed under. */
export interface Signature {
  name: string;
  wording: string;
}

/** One signed pass over the sheet. Append-only. */
export const walks = mysqlTable(
  "walks",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    driverId: uuid("driver_id").notNull(),
    kind: mysqlEnum("kind", ["before", "after", "takeover"]).notNull(),
    /** The walk taken over. */
    baseWalkId: uuid("base_walk_id"),
    /** The walk this one corrects. */
    correctsWalkId: uuid("corrects_walk_id"),
    sheetId: uuid("sheet_id").notNull(),
    setupVersion: int("setup_version").notNull(),
    hash: sha256("hash").notNull(),
    /** The phone's own clock at signature: kept, never ordered by. */
    signedAt: instant("signed_at").notNull(),
    ageMs: bigint("age_ms", { mode: "number" }).notNull(),
    receivedAt: instant("received_at").notNull(),
    countsFrom: instant("counts_from").notNull(),
    yardDay: date("yard_day", { mode: "string" }).notNull(),
    /** An answer to every due check. */
    complete: boolean("complete").notNull(),
    /** Null when the walk clears; else why it does not. */
    clearsNot: varchar("clears_not", { length: 40 }),
    /** Limits from halves of the run-up not done. */
    limits: jsonOf<Limit[]>("limits").notNull(),
    missing: jsonOf<string[]>("missing").notNull(),
    signature: jsonOf<Signature>("signature").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("walks_of_truck").on(t.carrierId, t.truckId, t.countsFrom),
    index("walks_of_driver").on(t.carrierId, t.driverId, t.countsFrom),
    foreignKey({
      name: "walks_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
    foreignKey({
      name: "walks_driver",
      columns: [t.carrierId, t.driverId],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
    foreignKey({
      name: "walks_sheet",
      columns: [t.carrierId, t.sheetId],
      foreignColumns: [sheetVersions.carrierId, sheetVersions.id],
    }),
    foreignKey({
      name: "walks_base",
      columns: [t.carrierId, t.baseWalkId],
      foreignColumns: [t.carrierId, t.id],
    }),
    foreignKey({
      name: "walks_corrects",
      columns: [t.carrierId, t.correctsWalkId],
      foreignColumns: [t.carrierId, t.id],
    }),
    check("walks_clears_whole", sql`clears_not is not null or complete`),
    check("walks_takeover_base", sql`(kind = 'takeover') = (base_walk_id is not null)`),
  ],
);

export const answers = mysqlTable(
  "answers",
  {
    carrierId: uuid("carrier_id").notNull(),
    walkId: uuid("walk_id").notNull(),
    checkKey: varchar("check_key", { length: 80 }).notNull(),
    body: jsonOf<unknown>("body").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.walkId, t.checkKey] }),
    foreignKey({
      name: "answers_walk",
      columns: [t.carrierId, t.walkId],
      foreignColumns: [walks.carrierId, walks.id],
    }),
  ],
);

/** A number read on a truck: as entered, and in SI. */
export const readings = mysqlTable(
  "readings",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    walkId: uuid("walk_id"),
    checkKey: varchar("check_key", { length: 80 }).notNull(),
    fittingId: uuid("fitting_id"),
    quantity: varchar("quantity", { length: 20 }).notNull(),
    countsFrom: instant("counts_from").notNull(),
    entered: double("entered").notNull(),
    unit: varchar("unit", { length: 12 }).notNull(),
    si: double("si").notNull(),
    /** The server's verdict (K8). */
    verdict: varchar("verdict", { length: 24 }),
    elevationM: double("elevation_m"),
    stationPa: double("station_pa"),
    pumpHours: double("pump_hours"),
    liquidL: double("liquid_l"),
    /** A repair, replacement or adjustment came before it: drift starts anew. */
    newSegment: boolean("new_segment").notNull().default(false),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("readings_of_truck").on(t.carrierId, t.truckId, t.checkKey, t.countsFrom),
    index("readings_by_quantity").on(t.carrierId, t.truckId, t.quantity, t.countsFrom),
    foreignKey({
      name: "readings_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
    foreignKey({
      name: "readings_walk",
      columns: [t.carrierId, t.walkId],
      foreignColumns: [walks.carrierId, walks.id],
    }),
  ],
);

/** The answer a phone keeps: committed in the same transaction as the effect (K4). */
export const receipts = mysqlTable(
  "receipts",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    kind: varchar("kind", { length: 24 }).notNull(),
    hash: sha256("hash").notNull(),
    body: jsonOf<unknown>("body").notNull(),
    personId: uuid("person_id").notNull(),
    receivedAt: instant("received_at").notNull(),
  },
  (t) => [primaryKey({ columns: [t.carrierId, t.id] })],
);

/** The second body that came under an id already used: kept for a person to look at (K4). */
export const conflicts = mysqlTable(
  "conflicts",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    recordId: uuid("record_id").notNull(),
    kind: varchar("kind", { length: 24 }).notNull(),
    hash: sha256("hash").notNull(),
    body: jsonOf<unknown>("body").notNull(),
    personId: uuid("person_id").notNull(),
    receivedAt: instant("received_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("conflicts_of_record").on(t.carrierId, t.recordId, t.hash),
  ],
);
