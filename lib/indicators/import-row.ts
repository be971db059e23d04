import type { Month } from "./month";
import type { ReturnStatus } from "./vocabulary";

/** Checked and nothing brought in; brought in; brought in and taken back. */
export const importStates = ["checked", "committed", "taken-back"] as const;
export type ImportState = (typeof importStates)[number];

/** What a row of a sheet will do: adds, replaces, same as now, needs fixing, or nothing because it is blank. */
export const rowOutcomes = ["new", "changed", "same", "rejected", "skipped"] as const;
export type RowOutcome = (typeof rowOutcomes)[number];

export type ImportColumn =
  "ward" | "indicator" | "month" | "numerator" | "denominator" | "notCollected" | "note";

/** Something to say about one cell or two. `written` is what stood there where it could not be read. */
export interface ImportMessage {
  /** Names of the cells ("D4, E4"), or the column's heading where the sheet has no such column. */
  cell: string;
  /** Columns to mark: none where the words are only for information. */
  columns: ImportColumn[];
  message: string;
  written?: string;
}

/** One row as read from a sheet: cells understood, nothing yet compared with what is stored. */
export interface ImportLine {
  row: number;
  /** As written; codes are compared without case. */
  ward: string;
  indicator: string;
  monthText: string;
  month: Month | null;
  numerator: number | null;
  denominator: number | null;
  notCollected: string | null;
  note: string | null;
  cells: Partial<Record<ImportColumn, string>>;
  messages: ImportMessage[];
  /** A denominator alone: fine only where somebody else counts the numerator. */
  onlyDenominator: ImportMessage | null;
  blank: boolean;
}

/** The figures of a line as stored, for showing what they were and for taking an import back. */
export interface ImportBefore {
  tally: {
    numerator: number | null;
    denominator: number | null;
    notCollected: string | null;
    awaited: string | null;
    note: string | null;
    corrected: boolean;
  } | null;
  shared: { value: number | null; awaited: string | null } | null;
  return: ReturnBefore | null;
}

export interface ReturnBefore {
  status: ReturnStatus;
  reopened: boolean;
  reopenedReason: string | null;
  firstSubmittedAt: string | null;
  submittedAt: string | null;
  submittedBy: string | null;
  acceptedAt: string | null;
  acceptedBy: string | null;
}

export interface ImportVerdict {
  line: ImportLine;
  outcome: RowOutcome;
  wardId: string | null;
  indicatorId: string | null;
  /** Set where the line counts out of a shared denominator. */
  sharedDenominatorId: string | null;
  /** The figures that a commit would store. */
  numerator: number | null;
  denominator: number | null;
  /** Versions that the verdict rests on; 0 where nothing is stored. */
  tallyVersion: number;
  denominatorVersion: number;
  before: ImportBefore | null;
  messages: ImportMessage[];
}
