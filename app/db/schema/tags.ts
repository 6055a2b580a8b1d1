import { sql } from "drizzle-orm";
import {
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
  smallint,
  unique,
  varchar,
} from "drizzle-orm/mysql-core";
import type { Limit } from "../../trade/limits";
import { instant, jsonOf, sha256, uuid } from "../columns";
import { memberships } from "./people";
import { trucks } from "./trucks";
import { type Signature, walks } from "./walks";

/** A defect on a truck. Append-only; ends by sign-off only (K3). */
export const tags = mysqlTable(
  "tags",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    walkId: uuid("walk_id"),
    /** `not-satisfied` is a driver's refusal of a sign-off: red, for a second certifier. */
    kind: mysqlEnum("kind", ["defect", "not-satisfied"]).notNull().default("defect"),
    disputesSignOffId: uuid("disputes_sign_off_id"),
    checkKey: varchar("check_key", { length: 80 }),
    problemKey: varchar("problem_key", { length: 60 }),
    fittingId: uuid("fitting_id"),
    part: varchar("part", { length: 40 }),
    colour: mysqlEnum("colour", ["white", "yellow", "red"]).notNull(),
    limit: jsonOf<Limit>("limit"),
    title: varchar("title", { length: 160 }).notNull(),
    note: varchar("note", { length: 1000 }),
    roadSafety: boolean("road_safety").notNull(),
    driverFix: boolean("driver_fix").notNull().default(false),
    remote: boolean("remote").notNull().default(false),
    raisedBy: uuid("raised_by").notNull(),
    raisedAt: instant("raised_at").notNull(),
    receivedAt: instant("received_at").notNull(),
    signedOffAt: instant("signed_off_at"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("tags_of_truck").on(t.carrierId, t.truckId, t.signedOffAt),
    index("tags_open").on(t.carrierId, t.signedOffAt, t.colour, t.raisedAt),
    foreignKey({
      name: "tags_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
    foreignKey({
      name: "tags_walk",
      columns: [t.carrierId, t.walkId],
      foreignColumns: [walks.carrierId, walks.id],
    }),
    foreignKey({
      name: "tags_raised_by",
      columns: [t.carrierId, t.raisedBy],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
    check("tags_limit_is_yellow", sql`\`limit\` is null or colour = 'yellow'`),
    check("tags_not_satisfied", sql`kind = 'defect' or colour = 'red'`),
  ],
);

/** What a later walk said of an open tag. Only `worse` changes colour or limit. */
export const tagChanges = mysqlTable(
  "tag_changes",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    tagId: uuid("tag_id").notNull(),
    truckId: uuid("truck_id").notNull(),
    walkId: uuid("walk_id"),
    seen: mysqlEnum("seen", ["same", "worse", "gone"]).notNull(),
    colour: mysqlEnum("colour", ["white", "yellow", "red"]).notNull(),
    limit: jsonOf<Limit>("limit"),
    note: varchar("note", { length: 1000 }),
    changedBy: uuid("changed_by").notNull(),
    changedAt: instant("changed_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("tag_changes_of_tag").on(t.carrierId, t.tagId, t.changedAt),
    foreignKey({
      name: "tag_changes_tag",
      columns: [t.carrierId, t.tagId],
      foreignColumns: [tags.carrierId, tags.id],
    }),
  ],
);

/** A tag's photo: promised by the record's manifest, its bytes come later (K2). */
export const photos = mysqlTable(
  "photos",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    tagId: uuid("tag_id"),
    walkId: uuid("walk_id"),
    ownerId: uuid("owner_id").notNull(),
    sha256: sha256("sha256").notNull(),
    bytes: int("bytes").notNull(),
    promisedAt: instant("promised_at").notNull(),
    storedAt: instant("stored_at"),
    objectKey: varchar("object_key", { length: 190 }),
    thumbKey: varchar("thumb_key", { length: 190 }),
    width: smallint("width"),
    height: smallint("height"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("photos_of_tag").on(t.carrierId, t.tagId),
    index("photos_of_walk").on(t.carrierId, t.walkId),
    foreignKey({
      name: "photos_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
    foreignKey({
      name: "photos_tag",
      columns: [t.carrierId, t.tagId],
      foreignColumns: [tags.carrierId, tags.id],
    }),
    check("photos_stored_whole", sql`(stored_at is null) = (object_key is null)`),
  ],
);

/** A certifier's end of a tag, 49 CFR 396.11(a)(3). One per tag. */
export const signOffs = mysqlTable(
  "sign_offs",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    tagId: uuid("tag_id").notNull(),
    truckId: uuid("truck_id").notNull(),
    kind: mysqlEnum("kind", ["repaired", "not-needed"]).notNull(),
    work: mysqlEnum("work", ["adjusted", "cleaned", "repaired", "replaced"]),
    parts: varchar("parts", { length: 400 }),
    reason: varchar("reason", { length: 1000 }),
    valueEntered: double("value_entered"),
    valueUnit: varchar("value_unit", { length: 12 }),
    valueSi: double("value_si"),
    roadTested: boolean("road_tested"),
    /** Signed from photos, away from the truck. */
    remote: boolean("remote").notNull().default(false),
    /** The certifier raised the tag too. */
    ownFinding: boolean("own_finding").notNull().default(false),
    signedBy: uuid("signed_by").notNull(),
    signedAt: instant("signed_at").notNull(),
    signature: jsonOf<Signature>("signature").notNull(),
    hash: sha256("hash").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    unique("sign_offs_one_per_tag").on(t.carrierId, t.tagId),
    index("sign_offs_of_truck").on(t.carrierId, t.truckId, t.signedAt),
    foreignKey({
      name: "sign_offs_tag",
      columns: [t.carrierId, t.tagId],
      foreignColumns: [tags.carrierId, tags.id],
    }),
    foreignKey({
      name: "sign_offs_signed_by",
      columns: [t.carrierId, t.signedBy],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
    check(
      "sign_offs_says_what",
      sql`(kind = 'repaired' and work is not null) or (kind = 'not-needed' and reason is not null)`,
    ),
  ],
);

/** A certifier's signed leave for a yellow tag to run under its limit until a date. The tag stays open. */
export const runLimits = mysqlTable(
  "run_limits",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    tagId: uuid("tag_id").notNull(),
    truckId: uuid("truck_id").notNull(),
    limit: jsonOf<Limit>("limit"),
    untilDay: date("until_day", { mode: "string" }).notNull(),
    signedBy: uuid("signed_by").notNull(),
    signedAt: instant("signed_at").notNull(),
    signature: jsonOf<Signature>("signature").notNull(),
    hash: sha256("hash").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("run_limits_of_tag").on(t.carrierId, t.tagId, t.signedAt),
    foreignKey({
      name: "run_limits_tag",
      columns: [t.carrierId, t.tagId],
      foreignColumns: [tags.carrierId, tags.id],
    }),
  ],
);

/** A driver's signature that sign-offs and open tags were seen, 49 CFR 396.13; or "not satisfied". */
export const acknowledgements = mysqlTable(
  "acknowledgements",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    truckId: uuid("truck_id").notNull(),
    driverId: uuid("driver_id").notNull(),
    walkId: uuid("walk_id"),
    /** Ids of what was seen: tags, their changes, run-with-limits, sign-offs. */
    items: jsonOf<string[]>("items").notNull(),
    satisfied: boolean("satisfied").notNull(),
    note: varchar("note", { length: 1000 }),
    signedAt: instant("signed_at").notNull(),
    receivedAt: instant("received_at").notNull(),
    signature: jsonOf<Signature>("signature").notNull(),
    hash: sha256("hash").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    index("acknowledgements_of_truck").on(t.carrierId, t.truckId, t.driverId, t.receivedAt),
    foreignKey({
      name: "acknowledgements_truck",
      columns: [t.carrierId, t.truckId],
      foreignColumns: [trucks.carrierId, trucks.id],
    }),
    foreignKey({
      name: "acknowledgements_driver",
      columns: [t.carrierId, t.driverId],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
  ],
);
