import { sql } from "drizzle-orm";
import { check, integer, pgTable, text, unique } from "drizzle-orm/pg-core";
import { isCode, isMonthText } from "./checks";
import { idColumn, monthColumn } from "./columns";

export const wards = pgTable(
  "wards",
  {
    id: idColumn(),
    code: text("code").notNull(),
    name: text("name").notNull(),
    division: text("division").notNull(),
    openFrom: monthColumn("open_from").notNull(),
    openTo: monthColumn("open_to"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    unique("wards_code_unique").on(table.code),
    check("wards_code", isCode(table.code)),
    check("wards_open_from", isMonthText(table.openFrom)),
    check("wards_open_to", isMonthText(table.openTo)),
    check("wards_open_order", sql`${table.openTo} is null or ${table.openTo} >= ${table.openFrom}`),
  ],
);
