import { sql } from "drizzle-orm";
import { check, index, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from "drizzle-orm/pg-core";
import { roles, type Grant, type Role } from "@/lib/policy";
import { isOneOf } from "./checks";
import { calendarDate, idColumn, instant } from "./columns";
import { wards } from "./wards";

export const personStates = ["invited", "active", "off"] as const;
export type PersonState = (typeof personStates)[number];

export const people = pgTable(
  "people",
  {
    id: idColumn(),
    /** Lower case. */
    email: text("email").notNull(),
    name: text("name").notNull(),
    role: text("role").$type<Role>().notNull(),
    grants: jsonb("grants").$type<Grant[]>().notNull(),
    state: text("state").$type<PersonState>().notNull(),
    /** argon2id in its encoded form; null until the invitation is taken. */
    passwordHash: text("password_hash"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    unique("people_email_unique").on(table.email),
    check("people_email", sql`${table.email} = lower(${table.email}) and ${table.email} like '%_@_%'`),
    check("people_role", isOneOf(table.role, roles)),
    check("people_state", isOneOf(table.state, personStates)),
    check("people_active", sql`${table.state} <> 'active' or ${table.passwordHash} is not null`),
    check(
      "people_board_grants",
      sql`${table.role} <> 'board_member' or jsonb_array_length(${table.grants}) = 0`,
    ),
  ],
);

export const personWards = pgTable(
  "person_wards",
  {
    personId: uuid("person_id")
      .notNull()
      .references(() => people.id),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
  },
  (table) => [primaryKey({ columns: [table.personId, table.wardId] })],
);

/** Opens a ward to a colleague between two dates and ends by itself. */
export const cover = pgTable(
  "cover",
  {
    id: idColumn(),
    personId: uuid("person_id")
      .notNull()
      .references(() => people.id),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    fromDate: calendarDate("from_date").notNull(),
    untilDate: calendarDate("until_date").notNull(),
  },
  (table) => [
    index("cover_person").on(table.personId),
    check("cover_order", sql`${table.untilDate} >= ${table.fromDate}`),
  ],
);

/** A link to choose a password with, used once; only a hash of its token is stored. */
export const invitations = pgTable(
  "invitations",
  {
    id: idColumn(),
    personId: uuid("person_id")
      .notNull()
      .references(() => people.id),
    tokenHash: text("token_hash").notNull(),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    usedAt: instant("used_at"),
  },
  (table) => [unique("invitations_token").on(table.tokenHash)],
);
