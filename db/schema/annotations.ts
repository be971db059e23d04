import { check, index, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { isMonthText } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";
import { indicators } from "./indicators";
import { wards } from "./wards";

/** A remark on one month of a chart. */
export const annotations = pgTable(
  "annotations",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    month: monthColumn("month").notNull(),
    text: text("text").notNull(),
    createdBy: text("created_by").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [
    index("annotations_series").on(table.wardId, table.indicatorId),
    check("annotations_month", isMonthText(table.month)),
  ],
);
