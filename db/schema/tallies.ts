import { sql } from "drizzle-orm";
import { bigint, boolean, check, index, integer, pgTable, text, unique, uuid } from "drizzle-orm/pg-core";
import { isMonthText } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";
import { indicators, sharedDenominators } from "./indicators";
import { wards } from "./wards";

const count = (name: string) => bigint(name, { mode: "number" });

/** The one value of a shared denominator for a ward and month, with a version of its own. */
export const denominatorValues = pgTable(
  "denominator_values",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    sharedDenominatorId: uuid("shared_denominator_id")
      .notNull()
      .references(() => sharedDenominators.id),
    month: monthColumn("month").notNull(),
    value: count("value"),
    /** The source that it is still to come from, or null. */
    awaited: text("awaited"),
    version: integer("version").notNull().default(1),
    updatedAt: instant("updated_at").notNull(),
    updatedBy: text("updated_by").notNull(),
  },
  (table) => [
    unique("denominator_values_key").on(table.wardId, table.sharedDenominatorId, table.month),
    check("denominator_values_month", isMonthText(table.month)),
    check("denominator_values_value", sql`${table.value} between 0 and 1000000000`),
    check("denominator_values_awaited", sql`${table.awaited} is null or ${table.value} is null`),
  ],
);

/**
 * The current figures of one line: as typed (`numerator`, `denominator`, …) and as charted, which are those of the
 * last sending, correction or completion. `denominator` and `awaited` stay null where the denominator is shared.
 */
export const tallies = pgTable(
  "tallies",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    month: monthColumn("month").notNull(),
    numerator: count("numerator"),
    denominator: count("denominator"),
    /** Reason why nothing was collected, or null. */
    notCollected: text("not_collected"),
    awaited: text("awaited"),
    note: text("note"),
    version: integer("version").notNull().default(1),
    updatedAt: instant("updated_at").notNull(),
    updatedBy: text("updated_by").notNull(),
    charted: boolean("charted").notNull().default(false),
    chartedNumerator: count("charted_numerator"),
    chartedDenominator: count("charted_denominator"),
    chartedNotCollected: text("charted_not_collected"),
    chartedAwaited: text("charted_awaited"),
    /** True once a correction has changed a figure that had been sent. */
    corrected: boolean("corrected").notNull().default(false),
  },
  (table) => [
    unique("tallies_key").on(table.wardId, table.indicatorId, table.month),
    index("tallies_indicator_month").on(table.indicatorId, table.month),
    index("tallies_ward_month").on(table.wardId, table.month),
    check("tallies_month", isMonthText(table.month)),
    check("tallies_numerator", sql`${table.numerator} between 0 and 1000000000`),
    check("tallies_denominator", sql`${table.denominator} between 0 and 1000000000`),
    check(
      "tallies_not_collected",
      sql`${table.notCollected} is null or (${table.numerator} is null and ${table.denominator} is null)`,
    ),
    check("tallies_awaited", sql`${table.awaited} is null or ${table.denominator} is null`),
  ],
);
