import "server-only";
import type { ImportColumn, ImportLine, ImportMessage } from "@/lib/indicators/import-row";
import {
  contentText,
  cutText,
  readTallyRow,
  tallyColumns,
  type RawTallyRow,
  type RowMessage,
  type UploadSheet,
} from "@/lib/workbook";
import { inTurns } from "./yielding";

/** The rows of a sheet, understood cell by cell. */
export async function readLines(sheet: UploadSheet): Promise<ImportLine[]> {
  const lines: ImportLine[] = [];
  await inTurns(sheet.rows, (rows) => {
    for (const raw of rows) lines.push(readLine(raw));
  });
  return lines;
}

function readLine(raw: RawTallyRow): ImportLine {
  const reading = readTallyRow(raw);
  const isHalf = (message: RowMessage) =>
    message.column === "numerator" && raw.cells.numerator.type === "blank" && !reading.blank;
  const half = reading.messages.find(isHalf);
  return {
    row: raw.row,
    // Codes are short: whatever is cut here is unknown anyhow.
    ward: cutText(reading.ward),
    indicator: cutText(reading.indicator),
    monthText: cutText(reading.monthText),
    month: reading.month,
    numerator: reading.numerator,
    denominator: reading.denominator,
    notCollected: reading.notCollected,
    note: reading.note,
    cells: cellsOf(raw),
    messages: reading.messages.filter((message) => message !== half).map((message) => spoken(raw, message)),
    onlyDenominator: half ? spoken(raw, half) : null,
    blank: reading.blank,
  };
}

function cellsOf(raw: RawTallyRow): Partial<Record<ImportColumn, string>> {
  return Object.fromEntries(
    tallyColumns.flatMap(({ key }) => (raw.cells[key].ref ? [[key, raw.cells[key].ref]] : [])),
  );
}

function spoken(raw: RawTallyRow, { cell, column, message }: RowMessage): ImportMessage {
  const written = cutText(contentText(raw.cells[column]));
  const title = tallyColumns.find(({ key }) => key === column)?.title ?? column;
  return { cell: cell ?? title, columns: [column], message, ...(written === "" ? {} : { written }) };
}
