import { bigint, boolean, check, index, integer, pgTable, text, uuid } from "drizzle-orm/pg-core";
import {
  revisionEvents,
  revisionSources,
  type RevisionEvent,
  type RevisionSource,
} from "@/lib/indicators/vocabulary";
import { isMonthText, isOneOf } from "./checks";
import { idColumn, instant, monthColumn } from "./columns";

/**
 * Every value that a tally ever had: append-only by trigger. `month` is the valid time, `at` the time from which
 * it was known. The denominator is the effective one, shared or own, so that a past day can be drawn from this
 * table alone. `charted` says what the revision does to charts: true shows its figures, false takes the month
 * off, null leaves the chart as it was.
 */
export const tallyRevisions = pgTable(
  "tally_revisions",
  {
    id: idColumn(),
    wardId: uuid("ward_id").notNull(),
    indicatorId: uuid("indicator_id").notNull(),
    month: monthColumn("month").notNull(),
    event: text("event").$type<RevisionEvent>().notNull(),
    charted: boolean("charted"),
    numerator: bigint("numerator", { mode: "number" }),
    denominator: bigint("denominator", { mode: "number" }),
    notCollected: text("not_collected"),
    awaited: text("awaited"),
    note: text("note"),
    tallyVersion: integer("tally_version").notNull(),
    source: text("source").$type<RevisionSource>().notNull(),
    reason: text("reason"),
    importRunId: uuid("import_run_id"),
    actorId: text("actor_id"),
    actorName: text("actor_name").notNull(),
    at: instant("at").notNull(),
  },
  (table) => [
    index("tally_revisions_series").on(table.wardId, table.indicatorId, table.month, table.at),
    index("tally_revisions_import").on(table.importRunId),
    check("tally_revisions_month", isMonthText(table.month)),
    check("tally_revisions_event", isOneOf(table.event, revisionEvents)),
    check("tally_revisions_source", isOneOf(table.source, revisionSources)),
  ],
);
