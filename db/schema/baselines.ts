import { sql } from "drizzle-orm";
import { check, index, integer, jsonb, pgTable, text, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { baselineStates, type BaselineState } from "@/lib/indicators/vocabulary";
import type { Month } from "@/lib/indicators/month";
import { isMonthText, isOneOf } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";
import { indicators } from "./indicators";
import { wards } from "./wards";

export interface LeftOutMonth {
  month: Month;
  reason: string;
}

/**
 * The months that centre line and limits are worked out from. `appliesFrom` null is the first baseline of a
 * series; each later one begins a new segment of the chart. Superseded rows are kept for charts of a past day.
 */
export const baselines = pgTable(
  "baselines",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    fromMonth: monthColumn("from_month").notNull(),
    toMonth: monthColumn("to_month").notNull(),
    appliesFrom: monthColumn("applies_from"),
    leftOut: jsonb("left_out").$type<LeftOutMonth[]>().notNull(),
    /** Settled when the baseline is decided, not month by month. */
    limits: text("limits").$type<"three-sigma" | "exact" | "overdispersed">().notNull(),
    reason: text("reason").notNull(),
    state: text("state").$type<BaselineState>().notNull(),
    proposedById: text("proposed_by_id"),
    proposedBy: text("proposed_by").notNull(),
    proposedAt: instant("proposed_at").notNull(),
    decidedById: text("decided_by_id"),
    decidedBy: text("decided_by"),
    decidedAt: instant("decided_at"),
    decisionReason: text("decision_reason"),
    supersededAt: instant("superseded_at"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    index("baselines_series").on(table.wardId, table.indicatorId),
    uniqueIndex("baselines_one_decided")
      .on(table.wardId, table.indicatorId, sql`coalesce(${table.appliesFrom}, '')`)
      .where(sql`${table.state} = 'decided'`),
    check("baselines_state", isOneOf(table.state, baselineStates)),
    check("baselines_from", isMonthText(table.fromMonth)),
    check("baselines_to", isMonthText(table.toMonth)),
    check("baselines_applies_from", isMonthText(table.appliesFrom)),
    check("baselines_order", sql`${table.toMonth} >= ${table.fromMonth}`),
    check("baselines_decided", sql`${table.state} in ('proposed') or ${table.decidedAt} is not null`),
  ],
);
