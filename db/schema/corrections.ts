import { bigint, check, index, integer, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { correctionStates, type CorrectionState } from "@/lib/indicators/vocabulary";
import { isMonthText, isOneOf } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";
import { indicators } from "./indicators";
import { wards } from "./wards";

/** A change asked for after sending; a nurse's waits for a quality lead. */
export const corrections = pgTable(
  "corrections",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    indicatorId: uuid("indicator_id")
      .notNull()
      .references(() => indicators.id),
    month: monthColumn("month").notNull(),
    numerator: bigint("numerator", { mode: "number" }),
    denominator: bigint("denominator", { mode: "number" }),
    reason: text("reason").notNull(),
    state: text("state").$type<CorrectionState>().notNull(),
    /** Version of the tally that the correction was asked against. */
    tallyVersion: integer("tally_version").notNull(),
    askedById: text("asked_by_id"),
    askedBy: text("asked_by").notNull(),
    askedAt: instant("asked_at").notNull(),
    decidedBy: text("decided_by"),
    decidedAt: instant("decided_at"),
    decisionReason: text("decision_reason"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    index("corrections_series").on(table.wardId, table.month, table.indicatorId),
    check("corrections_month", isMonthText(table.month)),
    check("corrections_state", isOneOf(table.state, correctionStates)),
  ],
);
