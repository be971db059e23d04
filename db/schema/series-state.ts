import {
  boolean,
  doublePrecision,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uuid,
} from "drizzle-orm/pg-core";
import type { BaselineStatus } from "@/lib/indicators/vocabulary";
import { instant } from "./columns";
import { indicators } from "./indicators";
import { wards } from "./wards";

/** Arrays share one length, one slot a calendar month; null where nothing is plotted. */
export interface SeriesColumns {
  months: string[];
  numerators: (number | null)[];
  denominators: (number | null)[];
  values: (number | null)[];
  centre: (number | null)[];
  z: (number | null)[];
  lowerAction: (number | null)[];
  upperAction: (number | null)[];
  lowerWarning: (number | null)[];
  upperWarning: (number | null)[];
  /** -1, 0, 1. */
  beyondAction: number[];
  beyondWarning: number[];
  belowDetection: boolean[];
}

/** One row a series, written with every change that touches it; a command rebuilds it from scratch. */
export const seriesState = pgTable(
  "series_state",
  {
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    columns: jsonb("columns").$type<SeriesColumns>().notNull(),
    centre: doublePrecision("centre"),
    baselineStatus: text("baseline_status").$type<BaselineStatus>().notNull(),
    hasLimits: boolean("has_limits").notNull(),
    activeSignals: integer("active_signals").notNull(),
    newestMonth: text("newest_month"),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [primaryKey({ columns: [table.wardId, table.indicatorId] })],
);
