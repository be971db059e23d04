import { index, integer, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { idColumn, instant } from "./columns";
import { people } from "./people";

/** A session is a row; the cookie holds its id alone. */
export const sessions = pgTable(
  "sessions",
  {
    id: idColumn(),
    personId: uuid("person_id")
      .notNull()
      .references(() => people.id),
    createdAt: instant("created_at").notNull(),
    lastSeenAt: instant("last_seen_at").notNull(),
    /** Absolute end; the idle limit is counted from `lastSeenAt`. */
    expiresAt: instant("expires_at").notNull(),
    endedAt: instant("ended_at"),
    endedWhy: text("ended_why"),
  },
  (table) => [index("sessions_person").on(table.personId)],
);

/** Failed sign-ins per key (an address or a network address), in the database so that two processes agree. */
export const signInThrottle = pgTable("sign_in_throttle", {
  key: text("key").primaryKey(),
  failures: integer("failures").notNull(),
  windowStartedAt: instant("window_started_at").notNull(),
  blockedUntil: instant("blocked_until"),
});
