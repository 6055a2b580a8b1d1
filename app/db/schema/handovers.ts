import { sql } from "drizzle-orm";
import {
  boolean,
  check,
  double,
  foreignKey,
  index,
  int,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  unique,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, sha256, uuid } from "../columns";
import { memberships } from "./people";
import { trucks } from "./trucks";

/** Who may take the key now: written only by the gate's keeper, from walks, acknowledgements and returns. */
export const clearances = mysqlTable(
  "clearances",
  {
    carrierId: uuid("carrier_id").notNull(),
    truckId: uuid("truck_id").notNull(),
    driverId: uuid("driver_id").notNull(),
    walkId: uuid("walk_id").notNull(),
    /** The truck's `tags_seq` that the driver has seen; -1 while something is unseen. */
    tagsSeq: int("tags_seq").notNull(),
    validUntil: instant("valid_until").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.truckId, t.driverId] }),
    foreignKey({
      name: "clearances_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
  ],
);

/** The key leaves the peg. `returned_at` is written once. */
export const handovers = mysqlTable(
  "handovers",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    driverId: uuid("driver_id").notNull(),
    handedBy: uuid("handed_by").notNull(),
    /** The instant at which K1 held. */
    decidedAt: instant("decided_at").notNull(),
    gateSeq: int("gate_seq").notNull(),
    hash: sha256("hash").notNull(),
    returnedAt: instant("returned_at"),
    /** The truck while the handover is open, else null: two open ones collide. */
    openTruck: uuid("open_truck").generatedAlwaysAs(
      sql`(if(\`returned_at\` is null, \`truck_id\`, null))`,
      { mode: "stored" },
    ),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    unique("handovers_one_open").on(t.carrierId, t.openTruck),
    index("handovers_of_truck").on(t.carrierId, t.truckId, t.decidedAt),
    foreignKey({
      name: "handovers_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
    foreignKey({
      name: "handovers_driver",
      columns: [t.carrierId, t.driverId],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
    foreignKey({
      name: "handovers_handed_by",
      columns: [t.carrierId, t.handedBy],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
  ],
);

/** A job and its needs, on the handover that carries it. */
export const runs = mysqlTable(
  "runs",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    handoverId: uuid("handover_id").notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    pressureOffLoad: boolean("pressure_off_load").notNull(),
    towing: boolean("towing").notNull(),
    hazmat: boolean("hazmat").notNull(),
    vacuumPa: int("vacuum_pa").notNull(),
    fillL: int("fill_l").notNull(),
    hoseMm: int("hose_mm").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("runs_of_handover").on(t.carrierId, t.handoverId),
    foreignKey({
      name: "runs_handover",
      columns: [t.carrierId, t.handoverId],
      foreignColumns: [handovers.carrierId, handovers.id],
    }),
    check("runs_needs", sql`vacuum_pa >= 0 and fill_l >= 0 and hose_mm >= 0`),
  ],
);

/** The key comes back. */
export const returns = mysqlTable(
  "returns",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    handoverId: uuid("handover_id").notNull(),
    truckId: uuid("truck_id").notNull(),
    driverId: uuid("driver_id").notNull(),
    takenBy: uuid("taken_by").notNull(),
    returnedAt: instant("returned_at").notNull(),
    pumpHours: double("pump_hours"),
    /** What is still in the tank. */
    aboard: mysqlEnum("aboard", ["empty", "loaded"]).notNull(),
    /** The driver's day with this truck is over: the walk behind it no longer counts. */
    endsDay: boolean("ends_day").notNull(),
    note: varchar("note", { length: 1000 }),
    hash: sha256("hash").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    unique("returns_one_per_handover").on(t.carrierId, t.handoverId),
    index("returns_of_truck").on(t.carrierId, t.truckId, t.returnedAt),
    foreignKey({
      name: "returns_handover",
      columns: [t.carrierId, t.handoverId],
      foreignColumns: [handovers.carrierId, handovers.id],
    }),
  ],
);
