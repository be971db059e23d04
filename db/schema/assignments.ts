import { sql } from "drizzle-orm";
import { check, index, integer, pgTable, unique, uuid } from "drizzle-orm/pg-core";
import { isMonthText } from "./checks";
import { idColumn, monthColumn } from "./columns";
import { indicators } from "./indicators";
import { wards } from "./wards";

/** Which ward reports which indicator, from month to month. */
export const assignments = pgTable(
  "assignments",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    fromMonth: monthColumn("from_month").notNull(),
    toMonth: monthColumn("to_month"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    unique("assignments_pair").on(table.wardId, table.indicatorId),
    index("assignments_indicator").on(table.indicatorId),
    check("assignments_from", isMonthText(table.fromMonth)),
    check("assignments_to", isMonthText(table.toMonth)),
    check("assignments_order", sql`${table.toMonth} is null or ${table.toMonth} >= ${table.fromMonth}`),
  ],
);
