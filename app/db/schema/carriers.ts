import {
  boolean,
  char,
  double,
  foreignKey,
  int,
  mysqlTable,
  primaryKey,
  smallint,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, jsonOf, uuid } from "../columns";

/** A firm. Nobody ever sees another carrier's rows. */
export const carriers = mysqlTable("carriers", {
  id: uuid("id").primaryKey(),
  name: varchar("name", { length: 120 }).notNull(),
  policyVersion: int("policy_version").notNull().default(1),
  /** Goes up with every change of who may do what, so that two at once cannot remove the last manager. */
  peopleSeq: int("people_seq").notNull().default(0),
  createdAt: instant("created_at").notNull(),
});

/** The firm's settings, one row a version, never changed. */
export const policies = mysqlTable(
  "policies",
  {
    carrierId: uuid("carrier_id").notNull(),
    version: int("version").notNull(),
    settings: jsonOf<unknown>("settings").notNull(),
    createdBy: uuid("created_by"),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.version] }),
    foreignKey({ name: "policies_carrier", columns: [t.carrierId], foreignColumns: [carriers.id] }),
  ],
);

/** Where trucks sleep. */
export const yards = mysqlTable(
  "yards",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    name: varchar("name", { length: 80 }).notNull(),
    /** IANA zone name. */
    zone: varchar("zone", { length: 64 }).notNull(),
    elevationM: double("elevation_m").notNull(),
    phone: varchar("phone", { length: 32 }),
    /** Minutes after midnight, yard time, when the shop opens. */
    shopOpensMinute: smallint("shop_opens_minute").notNull().default(360),
    /** Drains can freeze here: winter wording on. */
    winter: boolean("winter").notNull().default(false),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    foreignKey({ name: "yards_carrier", columns: [t.carrierId], foreignColumns: [carriers.id] }),
  ],
);

/** Numbers of the change feed: gapless per carrier, taken as the last write before commit. Nothing refers to it. */
export const feedHeads = mysqlTable("feed_heads", {
  carrierId: uuid("carrier_id").primaryKey(),
  seq: int("seq").notNull().default(0),
});

/** Append-only feed that live screens and integrations read. */
export const changes = mysqlTable(
  "changes",
  {
    carrierId: uuid("carrier_id").notNull(),
    seq: int("seq").notNull(),
    at: instant("at").notNull(),
    kind: varchar("kind", { length: 40 }).notNull(),
    truckId: uuid("truck_id"),
    subjectId: uuid("subject_id"),
    data: jsonOf<unknown>("data"),
  },
  (t) => [primaryKey({ columns: [t.carrierId, t.seq] })],
);

/** Who may run a piece of background work now. */
export const leases = mysqlTable("leases", {
  name: varchar("name", { length: 40 }).primaryKey(),
  holder: char("holder", { length: 36 }).notNull(),
  until: instant("until").notNull(),
});
