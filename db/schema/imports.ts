import {
  bigint,
  boolean,
  check,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uuid,
} from "drizzle-orm/pg-core";
import {
  importStates,
  rowOutcomes,
  type ImportBefore,
  type ImportMessage,
  type ImportState,
  type RowOutcome,
} from "@/lib/indicators/import-row";
import { isOneOf } from "./checks";
import { idColumn, instant } from "./columns";

export const importRuns = pgTable(
  "import_runs",
  {
    id: idColumn(),
    fileName: text("file_name").notNull(),
    sheetName: text("sheet_name").notNull(),
    /** SHA-256 of the uploaded bytes, in hex. */
    checksum: text("checksum").notNull(),
    state: text("state").$type<ImportState>().notNull(),
    counts: jsonb("counts").$type<Record<RowOutcome, number>>().notNull(),
    columns: jsonb("columns").$type<{ letter: string; header: string; readAs: string | null }[]>().notNull(),
    uploadedById: text("uploaded_by_id"),
    uploadedBy: text("uploaded_by").notNull(),
    uploadedAt: instant("uploaded_at").notNull(),
    committedAt: instant("committed_at"),
    committedBy: text("committed_by"),
    reason: text("reason"),
    accepted: boolean("accepted").notNull().default(false),
    takenBackAt: instant("taken_back_at"),
    version: integer("version").notNull().default(1),
  },
  (table) => [
    index("import_runs_uploader").on(table.uploadedById),
    check("import_runs_state", isOneOf(table.state, importStates)),
  ],
);

/** What each row of the file will do, worked out before anything is changed. */
export const importRows = pgTable(
  "import_rows",
  {
    importRunId: uuid("import_run_id")
      .notNull()
      .references(() => importRuns.id),
    row: integer("row").notNull(),
    wardId: uuid("ward_id"),
    indicatorId: uuid("indicator_id"),
    /** As written in the file, for showing. */
    ward: text("ward").notNull(),
    indicator: text("indicator").notNull(),
    month: text("month").notNull(),
    numerator: bigint("numerator", { mode: "number" }),
    denominator: bigint("denominator", { mode: "number" }),
    notCollected: text("not_collected"),
    note: text("note"),
    outcome: text("outcome").$type<RowOutcome>().notNull(),
    messages: jsonb("messages").$type<ImportMessage[]>().notNull(),
    /** Versions seen by the check (0: none yet); a commit that finds others answers 409. */
    tallyVersion: integer("tally_version").notNull().default(0),
    denominatorVersion: integer("denominator_version").notNull().default(0),
    /** What the commit wrote over, for taking it back. */
    before: jsonb("before").$type<ImportBefore | null>(),
    /** Version that a commit gives the tally; a later one stands in the way of taking it back. */
    committedVersion: integer("committed_version"),
  },
  (table) => [
    primaryKey({ columns: [table.importRunId, table.row] }),
    check("import_rows_outcome", isOneOf(table.outcome, rowOutcomes)),
  ],
);
