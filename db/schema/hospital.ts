import { sql } from "drizzle-orm";
import { check, integer, jsonb, pgTable, text } from "drizzle-orm/pg-core";

/** One row: what is set for the whole hospital. */
export const hospital = pgTable(
  "hospital",
  {
    id: integer("id").primaryKey(),
    name: text("name").notNull(),
    /** IANA name; due days and "this month" follow it. */
    timeZone: text("time_zone").notNull(),
    /** Day of the next month on which a return is due, before moving to a working day. */
    dueDay: integer("due_day").notNull(),
    /** `YYYY-MM-DD` dates on which nobody is expected to send a return. */
    holidays: jsonb("holidays").$type<string[]>().notNull(),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    check("hospital_single_row", sql`${table.id} = 1`),
    check("hospital_due_day", sql`${table.dueDay} between 1 and 28`),
  ],
);
