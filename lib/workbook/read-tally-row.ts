import type { Month } from "@/lib/indicators/month";
import type { RawCell, RawTallyRow } from "./raw-rows";
import { readCount, type CellReading } from "./read-count";
import { readMonth } from "./read-month";
import { rowMessages, type RemedyColumns } from "./row-messages";
import { contentText } from "./sheet-builder";
import { columnTitle, type TallyColumn } from "./tally-columns";
import { MAX_CELL_CHARACTERS } from "./upload-limits";

export interface RowMessage {
  /** The cell ("D4"), or null where the sheet has no such column. */
  cell: string | null;
  column: TallyColumn;
  message: string;
}

export interface TallyRowReading {
  row: number;
  /** As written, without outer spaces; whether such a ward or indicator exists is for others to say. */
  ward: string;
  indicator: string;
  /** The month's cell as written, for showing beside a message. */
  monthText: string;
  month: Month | null;
  numerator: number | null;
  denominator: number | null;
  notCollected: string | null;
  note: string | null;
  /** What has to be put right; a blank row has one message, which says that it is skipped. */
  messages: RowMessage[];
  /** Neither counts nor a reason: the row is skipped. */
  blank: boolean;
}

/** Control characters other than tab, line feed and carriage return. */
const UNPRINTABLE = /[\x00-\x08\x0B\x0C\x0E-\x1F\x7F]|\p{Surrogate}/u;

/**
 * Turns the raw cells of a row into what they say about a tally, with a message for each cell that can't be read.
 * One of two blank counts is an error, never a zero. Rules that need more than the row (a numerator above its
 * denominator, assignments, rights) are for others.
 */
export function readTallyRow(raw: RawTallyRow): TallyRowReading {
  const { cells } = raw;
  const columns = remedyColumns(raw);
  const readings = {
    ward: readText(cells.ward, "a ward code"),
    indicator: readText(cells.indicator, "an indicator code"),
    month: readMonth(cells.month),
    numerator: readCount(cells.numerator, columns),
    denominator: readCount(cells.denominator, columns),
    notCollected: readText(cells.notCollected, "a reason"),
    note: readText(cells.note, "a note"),
  };
  const blank = (["numerator", "denominator", "notCollected"] as const).every(
    (column) => cells[column].type === "blank",
  );
  return {
    row: raw.row,
    ward: readings.ward.value ?? contentText(cells.ward),
    indicator: readings.indicator.value ?? contentText(cells.indicator),
    monthText: contentText(cells.month).trim(),
    month: readings.month.value,
    numerator: readings.numerator.value,
    denominator: readings.denominator.value,
    notCollected: readings.notCollected.value,
    note: readings.note.value,
    messages: blank
      ? [messageAt(raw, "numerator", rowMessages.nothingEntered(columns))]
      : [...cellMessages(raw, readings), ...rowLevelMessages(raw, columns)],
    blank,
  };
}

/** "D4: …", or the column's heading where the sheet has no such cell. */
export function formatRowMessage({ cell, column, message }: RowMessage): string {
  return `${cell ?? columnTitle(column)}: ${message}`;
}

function messageAt(raw: RawTallyRow, column: TallyColumn, message: string): RowMessage {
  return { cell: raw.cells[column].ref, column, message };
}

function cellMessages(raw: RawTallyRow, readings: Record<TallyColumn, CellReading<unknown>>): RowMessage[] {
  const columns = Object.keys(readings) as TallyColumn[];
  const messages = columns.flatMap((column) => {
    const { message } = readings[column];
    return message === undefined ? [] : [messageAt(raw, column, message)];
  });
  const missing = (["ward", "indicator"] as const)
    .filter((column) => raw.cells[column].type === "blank")
    .map((column) => messageAt(raw, column, rowMessages.blank(column)));
  return [...missing, ...messages];
}

function rowLevelMessages(raw: RawTallyRow, columns: RemedyColumns): RowMessage[] {
  const isBlank = (column: TallyColumn) => raw.cells[column].type === "blank";
  const hasCount = !isBlank("numerator") || !isBlank("denominator");
  if (!isBlank("notCollected") && hasCount) {
    return [messageAt(raw, "notCollected", rowMessages.reasonAndCount(columns))];
  }
  if (isBlank("numerator") === isBlank("denominator")) return [];
  const column = isBlank("numerator") ? "numerator" : "denominator";
  return [messageAt(raw, column, rowMessages.halfBlank(columns[column], columns))];
}

/** Numbers in a column of text are taken as written: a code may be made of digits alone. */
function readText(cell: RawCell, what: string): CellReading<string | null> {
  switch (cell.type) {
    case "blank":
      return { value: null };
    case "text":
      if (cell.cut) return { value: null, message: rowMessages.tooLong(MAX_CELL_CHARACTERS) };
      if (UNPRINTABLE.test(cell.text)) return { value: null, message: rowMessages.unprintable };
      return { value: cell.text.trim() };
    case "date":
      return { value: null, message: rowMessages.dateAsText(what) };
    case "error":
      return { value: null, message: rowMessages.sheetError(cell.text) };
    case "no-result":
      return { value: null, message: rowMessages.noResult };
    default:
      return { value: contentText(cell) };
  }
}

function remedyColumns({ row, cells }: RawTallyRow): RemedyColumns {
  const letter = (column: TallyColumn) => cells[column].ref?.replace(String(row), "") ?? null;
  return {
    numerator: letter("numerator") ?? columnTitle("numerator"),
    denominator: letter("denominator") ?? columnTitle("denominator"),
    reason: letter("notCollected"),
  };
}
