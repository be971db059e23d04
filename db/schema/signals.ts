import { sql } from "drizzle-orm";
import { boolean, check, index, integer, pgTable, text, uuid } from "drizzle-orm/pg-core";
import {
  signalStatuses,
  sides,
  towardsValues,
  withdrawnReasons,
  type SignalStatus,
  type Towards,
  type WithdrawnReason,
} from "@/lib/indicators/vocabulary";
import { isMonthText, isOneOf } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";
import { indicators } from "./indicators";
import { wards } from "./wards";

/** One rule met by one series, from a first to a last month. Never deleted: withdrawn, with why. */
export const signals = pgTable(
  "signals",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    rule: text("rule").notNull(),
    side: text("side").$type<"upper" | "lower">().notNull(),
    towards: text("towards").$type<Towards>().notNull(),
    fromMonth: monthColumn("from_month").notNull(),
    toMonth: monthColumn("to_month").notNull(),
    /** First month of the chart's segment that the signal lies in: part of its identity. */
    segmentFrom: monthColumn("segment_from").notNull(),
    spansGap: boolean("spans_gap").notNull().default(false),
    /** True where it was born on the newest counted month; older ones are listed, not mailed. */
    onNewest: boolean("on_newest").notNull(),
    status: text("status").$type<SignalStatus>().notNull().default("new"),
    withdrawnWhy: text("withdrawn_why").$type<WithdrawnReason>(),
    bornAt: instant("born_at").notNull(),
    changedAt: instant("changed_at").notNull(),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    index("signals_series").on(table.wardId, table.indicatorId),
    index("signals_born").on(table.bornAt),
    check("signals_side", isOneOf(table.side, sides)),
    check("signals_towards", isOneOf(table.towards, towardsValues)),
    check("signals_status", isOneOf(table.status, signalStatuses)),
    check("signals_why", isOneOf(table.withdrawnWhy, withdrawnReasons)),
    check("signals_withdrawn", sql`(${table.status} = 'withdrawn') = (${table.withdrawnWhy} is not null)`),
    check("signals_from", isMonthText(table.fromMonth)),
    check("signals_to", isMonthText(table.toMonth)),
    check("signals_segment", isMonthText(table.segmentFrom)),
    check("signals_order", sql`${table.toMonth} >= ${table.fromMonth}`),
  ],
);

export const signalChanges = ["born", "grew", "shrank", "withdrawn", "came-back"] as const;
export type SignalChange = (typeof signalChanges)[number];

/** What happened to a signal, for its time line and for charts of a past day. Append-only by trigger. */
export const signalHistory = pgTable(
  "signal_history",
  {
    id: idColumn(),
    signalId: uuid("signal_id")
      .notNull()
      .references(() => signals.id),
    change: text("change").$type<SignalChange>().notNull(),
    fromMonth: monthColumn("from_month").notNull(),
    toMonth: monthColumn("to_month").notNull(),
    why: text("why"),
    at: instant("at").notNull(),
  },
  (table) => [
    index("signal_history_signal").on(table.signalId),
    check("signal_history_change", isOneOf(table.change, signalChanges)),
  ],
);
