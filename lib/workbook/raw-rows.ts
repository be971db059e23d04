import type { TallyColumn } from "./tally-columns";

/** What a cell holds, before anybody decides what it means. */
export type CellContent =
  | { type: "blank" }
  /** `cut` is set where the text was longer than a cell may be and its end is missing. */
  | { type: "text"; text: string; cut?: true }
  | { type: "number"; value: number; text: string }
  | { type: "date"; year: number; month: number; day: number }
  | { type: "boolean"; value: boolean }
  /** An error value of the spreadsheet program, such as #DIV/0!. */
  | { type: "error"; text: string }
  /** A formula whose result is not stored in the file. */
  | { type: "no-result" };

/** `ref` is the cell's name ("D7"), or null where the sheet has no such column. */
export type RawCell = CellContent & { ref: string | null };

export interface RawTallyRow {
  /** Row number in the sheet, or record number in a CSV; the heading is row 1. */
  row: number;
  cells: Record<TallyColumn, RawCell>;
}

export interface UploadColumn {
  letter: string;
  header: string;
  /** The column of a tally that it is read as; null where it is not used. */
  readAs: TallyColumn | null;
}

export interface UploadSummary {
  kind: "xlsx" | "csv";
  /** Empty for a CSV. */
  sheetName: string;
  columns: UploadColumn[];
  /** Rows above the last filled one that hold nothing in the columns read; the first 200 of them. */
  skippedRows: number[];
  skippedRowCount: number;
}

export interface UploadSheet extends UploadSummary {
  rows: RawTallyRow[];
}
