import {
  bigint,
  boolean,
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
import { instant, jsonOf, sha256, uuid } from "../columns";
import { carriers, yards } from "./carriers";

/** A person, once, however many carriers they work for. */
export const people = mysqlTable("people", {
  id: uuid("id").primaryKey(),
  /** Lower-cased address. */
  email: varchar("email", { length: 254 }).notNull().unique("people_email"),
  name: varchar("name", { length: 80 }).notNull(),
  phone: varchar("phone", { length: 32 }),
  createdAt: instant("created_at").notNull(),
});

/** A person's place in one carrier. Ended by `deactivated_at`, effective on the next request. */
export const memberships = mysqlTable(
  "memberships",
  {
    carrierId: uuid("carrier_id").notNull(),
    personId: uuid("person_id").notNull(),
    /** Any of driver, mechanic, dispatcher, manager. */
    roles: jsonOf<string[]>("roles").notNull(),
    /** May sign tags off. */
    certifier: boolean("certifier").notNull().default(false),
    /** Called at five in the morning: 1 first, 2 next; null never. */
    onCallOrder: smallint("on_call_order"),
    yardId: uuid("yard_id"),
    createdAt: instant("created_at").notNull(),
    deactivatedAt: instant("deactivated_at"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.personId] }),
    foreignKey({
      name: "memberships_carrier",
      columns: [t.carrierId],
      foreignColumns: [carriers.id],
    }),
    foreignKey({ name: "memberships_person", columns: [t.personId], foreignColumns: [people.id] }),
    foreignKey({
      name: "memberships_yard",
      columns: [t.carrierId, t.yardId],
      foreignColumns: [yards.carrierId, yards.id],
    }),
    index("memberships_of_person").on(t.personId),
  ],
);

export const invitations = mysqlTable(
  "invitations",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    email: varchar("email", { length: 254 }).notNull(),
    name: varchar("name", { length: 80 }).notNull(),
    roles: jsonOf<string[]>("roles").notNull(),
    certifier: boolean("certifier").notNull().default(false),
    yardId: uuid("yard_id"),
    tokenHash: sha256("token_hash").notNull(),
    invitedBy: uuid("invited_by").notNull(),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    acceptedAt: instant("accepted_at"),
    revokedAt: instant("revoked_at"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    unique("invitations_token").on(t.tokenHash),
    foreignKey({
      name: "invitations_carrier",
      columns: [t.carrierId],
      foreignColumns: [carriers.id],
    }),
    foreignKey({
      name: "invitations_by",
      columns: [t.carrierId, t.invitedBy],
      foreignColumns: [memberships.carrierId, memberships.personId],
    }),
  ],
);

/** A signed-in browser. The cookie holds a random token; the table holds its hash. */
export const sessions = mysqlTable(
  "sessions",
  {
    id: uuid("id").primaryKey(),
    tokenHash: sha256("token_hash").notNull().unique("sessions_token"),
    personId: uuid("person_id").notNull(),
    /** The carrier this session acts for; a person of several carriers may switch. */
    carrierId: uuid("carrier_id"),
    /** What the browser called itself, shortened, so its owner can tell their devices apart. */
    device: varchar("device", { length: 120 }).notNull(),
    createdAt: instant("created_at").notNull(),
    lastSeenAt: instant("last_seen_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    revokedAt: instant("revoked_at"),
  },
  (t) => [
    foreignKey({ name: "sessions_person", columns: [t.personId], foreignColumns: [people.id] }),
    index("sessions_of_person").on(t.personId),
    index("sessions_expiry").on(t.expiresAt),
  ],
);

/** A six-digit code sent to an address. Every decision about it is taken here, never in a cookie. */
export const signInCodes = mysqlTable(
  "sign_in_codes",
  {
    id: uuid("id").primaryKey(),
    email: varchar("email", { length: 254 }).notNull(),
    /** HMAC of the browser's own random cookie: a code works in the browser that asked for it. */
    browserHash: sha256("browser_hash").notNull(),
    codeHash: sha256("code_hash").notNull(),
    tries: smallint("tries").notNull().default(0),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    /** Used, replaced by a newer one, or out of tries. */
    endedAt: instant("ended_at"),
  },
  (t) => [
    index("sign_in_codes_of_browser").on(t.browserHash, t.createdAt),
    index("sign_in_codes_expiry").on(t.expiresAt),
  ],
);

/** Kept by rate-limiter-flexible; keys are HMACs. */
export const rateLimits = mysqlTable("rate_limits", {
  key: varchar("key", { length: 255 }).primaryKey(),
  points: int("points").notNull().default(0),
  expire: bigint("expire", { mode: "number", unsigned: true }),
});

/** Who did what to settings and people. Never changed. */
export const audit = mysqlTable(
  "audit",
  {
    carrierId: uuid("carrier_id").notNull(),
    id: uuid("id").notNull(),
    at: instant("at").notNull(),
    actorId: uuid("actor_id"),
    action: varchar("action", { length: 60 }).notNull(),
    subjectId: uuid("subject_id"),
    detail: jsonOf<unknown>("detail"),
  },
  (t) => [
    primaryKey({ columns: [t.carrierId, t.id] }),
    foreignKey({ name: "audit_carrier", columns: [t.carrierId], foreignColumns: [carriers.id] }),
  ],
);

/** Mail waiting to go, drained with SKIP LOCKED. */
export const mailOutbox = mysqlTable(
  "mail_outbox",
  {
    id: uuid("id").primaryKey(),
    carrierId: uuid("carrier_id"),
    /** One mail per key, ever: what makes "once each" true across restarts. */
    dedupeKey: varchar("dedupe_key", { length: 190 }).notNull().unique("mail_outbox_once"),
    recipient: varchar("recipient", { length: 254 }).notNull(),
    template: mysqlEnum("template", [
      "sign-in-code",
      "invitation",
      "red-tag",
      "key-freed",
    ]).notNull(),
    props: jsonOf<unknown>("props").notNull(),
    createdAt: instant("created_at").notNull(),
    sendAfter: instant("send_after").notNull(),
    tries: smallint("tries").notNull().default(0),
    sentAt: instant("sent_at"),
    failedAt: instant("failed_at"),
    lastError: varchar("last_error", { length: 190 }),
  },
  (t) => [
    index("mail_outbox_waiting").on(t.sentAt, t.failedAt, t.sendAfter),
    foreignKey({
      name: "mail_outbox_carrier",
      columns: [t.carrierId],
      foreignColumns: [carriers.id],
    }),
  ],
);
