import { sql } from "drizzle-orm";
import { boolean, check, index, integer, pgTable, text, unique, uuid } from "drizzle-orm/pg-core";
import { returnStatuses, type ReturnStatus } from "@/lib/indicators/vocabulary";
import { isDateText, isMonthText, isOneOf } from "./checks";
import { calendarDate, idColumn, instant, monthColumn } from "./columns";
import { wards } from "./wards";

/** All tallies of one ward for one month. */
export const wardReturns = pgTable(
  "ward_returns",
  {
    id: idColumn(),
    wardId: uuid("ward_id")
      .notNull()
      .references(() => wards.id),
    month: monthColumn("month").notNull(),
    status: text("status").$type<ReturnStatus>().notNull().default("open"),
    /** Stored when the return opens, so that a later change of the holiday list moves nothing. */
    dueOn: calendarDate("due_on").notNull(),
    /** Lateness is judged by the first sending, whatever is recalled afterwards. */
    firstSubmittedAt: instant("first_submitted_at"),
    submittedAt: instant("submitted_at"),
    submittedBy: text("submitted_by"),
    acceptedAt: instant("accepted_at"),
    acceptedBy: text("accepted_by"),
    /** True while a reopened return waits to be sent again: its last sent figures stay on the charts. */
    reopened: boolean("reopened").notNull().default(false),
    reopenedReason: text("reopened_reason"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    unique("ward_returns_pair").on(table.wardId, table.month),
    index("ward_returns_month").on(table.month),
    check("ward_returns_month", isMonthText(table.month)),
    check("ward_returns_due_on", isDateText(table.dueOn)),
    check("ward_returns_status", isOneOf(table.status, returnStatuses)),
    check("ward_returns_sent", sql`${table.status} = 'open' or ${table.submittedAt} is not null`),
    check("ward_returns_accepted", sql`(${table.status} = 'accepted') = (${table.acceptedAt} is not null)`),
  ],
);
