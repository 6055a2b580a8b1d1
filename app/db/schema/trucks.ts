import { sql } from "drizzle-orm";
import {
  type AnyMySqlColumn,
  boolean,
  char,
  check,
  date,
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
import type { FittingAttributes, FittingKind } from "../../trade/fittings";
import { ROUND_KINDS } from "../../trade/rounds";
import type { StandingDetail, StandingWord } from "../../trade/standing/standing";
import { instant, jsonOf, sha256, uuid } from "../columns";
import { carriers, yards } from "./carriers";

/**
 * A truck, or a towed unit. The columns from `gate_seq` on are the gate's: one function
 * (domain/gate/change-truck) writes them, recomputed from the base rows, and the handover's
 * UPDATE reads them.
 */
export const trucks = mysqlTable(
  "trucks",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    unitNumber: varchar("unit_number", { length: 20 }).notNull(),
    kind: mysqlEnum("kind", ["powered", "towed"]).notNull(),
    vin: char("vin", { length: 17 }),
    yardId: uuid("yard_id").notNull(),
    inService: boolean("in_service").notNull().default(true),
    createdAt: instant("created_at").notNull(),
    /** Goes up with every fitting, set point and yard change; a walk made before it no longer counts. */
    setupVersion: int("setup_version").notNull().default(1),

    gateSeq: int("gate_seq").notNull().default(0),
    tagsSeq: int("tags_seq").notNull().default(0),
    policyVersion: int("policy_version").notNull().default(1),
    gateFault: varchar("gate_fault", { length: 190 }),
    /** No foreign key: the gate's UPDATE writes it before the handover row exists. */
    outHandover: uuid("out_handover"),
    openReds: int("open_reds").notNull().default(0),
    yellowBlockAt: instant("yellow_block_at"),
    testsBlockAt: instant("tests_block_at"),
    roundsBlockAt: instant("rounds_block_at"),
    roundsBlockHours: double("rounds_block_hours"),
    pumpHours: double("pump_hours").notNull().default(0),
    limitsMask: int("limits_mask").notNull().default(0),
    limitVacuumPa: int("limit_vacuum_pa"),
    limitFillL: int("limit_fill_l"),
    limitHoseMm: int("limit_hose_mm"),
    standing: mysqlEnum("standing", ["held", "walk-due", "limited", "cleared", "out"])
      .$type<StandingWord>()
      .notNull()
      .default("held"),
    standingUntil: instant("standing_until"),
    standingDetail: jsonOf<StandingDetail>("standing_detail"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    unique("trucks_unit_number").on(t.carrierId, t.unitNumber),
    foreignKey({ name: "trucks_carrier", columns: [t.carrierId], foreignColumns: [carriers.id] }),
    foreignKey({
      name: "trucks_yard",
      columns: [t.carrierId, t.yardId],
      foreignColumns: [yards.carrierId, yards.id],
    }),
    index("trucks_by_yard").on(t.carrierId, t.yardId, t.unitNumber),
    index("trucks_standing_until").on(t.standingUntil),
    check("trucks_limits_mask", sql`limits_mask between 0 and 15`),
    check(
      "trucks_gate_counts",
      sql`gate_seq >= 0 and tags_seq >= 0 and open_reds >= 0 and pump_hours >= 0`,
    ),
    check("trucks_unit_number_form", sql`unit_number regexp '^[A-Z0-9][A-Z0-9-]{0,19}$'`),
  ],
);

const truckRef = (name: string, t: { carrierId: AnyMySqlColumn; truckId: AnyMySqlColumn }) =>
  foreignKey({
    name,
    columns: [t.carrierId, t.truckId],
    foreignColumns: [trucks.carrierId, trucks.id],
  });

export const fittings = mysqlTable(
  "fittings",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    kind: varchar("kind", { length: 40 }).$type<FittingKind>().notNull(),
    attributes: jsonOf<FittingAttributes>("attributes").notNull(),
    fittedAt: instant("fitted_at").notNull(),
    removedAt: instant("removed_at"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    truckRef("fittings_truck", t),
    index("fittings_of_truck").on(t.carrierId, t.truckId),
  ],
);

/** Set point, band and stop value of one reading on one truck: as entered, and in SI. */
export const setPoints = mysqlTable(
  "set_points",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    /** Which reading: "vacuum-relief", "pressure-relief", "pump-speed" … */
    reading: varchar("reading", { length: 40 }).notNull(),
    unit: varchar("unit", { length: 12 }).notNull(),
    entered: jsonOf<SetPointEntered>("entered").notNull(),
    setPointSi: double("set_point_si").notNull(),
    lowSi: double("low_si"),
    highSi: double("high_si"),
    stopSi: double("stop_si"),
    setBy: uuid("set_by").notNull(),
    setAt: instant("set_at").notNull(),
    replacedAt: instant("replaced_at"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    truckRef("set_points_truck", t),
    index("set_points_of_truck").on(t.carrierId, t.truckId, t.reading),
  ],
);

/** Numbers as the manager typed them, in `unit`. */
export interface SetPointEntered {
  setPoint: number;
  low: number | null;
  high: number | null;
  stop: number | null;
}

/** The carrier's own checks, on every truck or on one. */
export const ownChecks = mysqlTable(
  "own_checks",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id"),
    station: varchar("station", { length: 20 }).notNull(),
    cadence: mysqlEnum("cadence", ["daily", "weekly", "monthly"]).notNull(),
    label: varchar("label", { length: 80 }).notNull(),
    good: varchar("good", { length: 160 }).notNull(),
    colour: mysqlEnum("colour", ["white", "yellow", "red"]).notNull(),
    createdBy: uuid("created_by").notNull(),
    createdAt: instant("created_at").notNull(),
    removedAt: instant("removed_at"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    truckRef("own_checks_truck", t),
    foreignKey({
      name: "own_checks_carrier",
      columns: [t.carrierId],
      foreignColumns: [carriers.id],
    }),
  ],
);

/** Tests with a date set by law or by a permit. The newest row of a kind counts. */
export const datedTests = mysqlTable(
  "dated_tests",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    kind: varchar("kind", { length: 40 }).notNull(),
    passedOn: date("passed_on", { mode: "string" }),
    dueOn: date("due_on", { mode: "string" }).notNull(),
    note: varchar("note", { length: 200 }),
    recordedBy: uuid("recorded_by").notNull(),
    recordedAt: instant("recorded_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    truckRef("dated_tests_truck", t),
    index("dated_tests_of_truck").on(t.carrierId, t.truckId, t.kind, t.recordedAt),
    check("dated_tests_order", sql`passed_on is null or due_on >= passed_on`),
  ],
);

/** Rounds done. The weekly one is walked by drivers; what of it needs the shop has a round of its own. */
export const rounds = mysqlTable(
  "rounds",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    kind: mysqlEnum("kind", ROUND_KINDS).notNull(),
    /** The yard's local day. */
    doneOn: date("done_on", { mode: "string" }).notNull(),
    doneAt: instant("done_at").notNull(),
    doneBy: uuid("done_by").notNull(),
    walkId: uuid("walk_id"),
    pumpHours: double("pump_hours"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    truckRef("rounds_truck", t),
    index("rounds_of_truck").on(t.carrierId, t.truckId, t.kind, t.doneOn),
  ],
);

/** A check sheet as it was, by hash; a walk keeps the version it used. */
export const sheetVersions = mysqlTable(
  "sheet_versions",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    hash: sha256("hash").notNull(),
    setupVersion: int("setup_version").notNull(),
    body: jsonOf<unknown>("body").notNull(),
    /** False for a sheet that came with a walk and was not made here: stored, clears nothing. */
    madeHere: boolean("made_here").notNull().default(true),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    unique("sheet_versions_once").on(t.carrierId, t.truckId, t.hash, t.setupVersion),
    truckRef("sheet_versions_truck", t),
  ],
);
