import { once } from "node:events";
import { PassThrough } from "node:stream";
import { setImmediate as nextTurn } from "node:timers/promises";
import ExcelJS from "exceljs";
import { encodeExcelText } from "./excel-text";

/** Rows written before other work gets its turn. */
const ROWS_PER_TURN = 500;

/** Text, a number, a day (as midnight UTC) or nothing: never a formula or any other object. */
export type SheetValue = string | number | Date | null;

export interface SheetColumn {
  title: string;
  width: number;
  /** Number format of the cells, e.g. `yyyy-mm`. */
  format?: string;
  wrap?: boolean;
}

export interface SheetToWrite {
  name: string;
  columns: readonly SheetColumn[];
  rows: Iterable<readonly SheetValue[]>;
}

/** Writes a workbook row by row: the whole of it never stands in memory as objects. */
export async function writeSheets(sheets: readonly SheetToWrite[]): Promise<Buffer> {
  const stream = new PassThrough();
  const chunks: Buffer[] = [];
  stream.on("data", (chunk: Buffer) => chunks.push(chunk));
  const ended = once(stream, "end");
  const workbook = new ExcelJS.stream.xlsx.WorkbookWriter({
    stream,
    useStyles: true,
    useSharedStrings: true,
  });
  for (const sheet of sheets) await writeSheet(workbook, sheet);
  await workbook.commit();
  await ended;
  return Buffer.concat(chunks);
}

async function writeSheet(workbook: ExcelJS.stream.xlsx.WorkbookWriter, sheet: SheetToWrite): Promise<void> {
  const worksheet = workbook.addWorksheet(sheet.name, { views: [{ state: "frozen", ySplit: 1 }] });
  worksheet.columns = sheet.columns.map(({ width, format, wrap }) => ({
    width,
    style: {
      ...(format ? { numFmt: format } : {}),
      ...(wrap ? { alignment: { wrapText: true, vertical: "top" as const } } : {}),
    },
  }));
  const heading = worksheet.addRow(sheet.columns.map(({ title }) => title));
  heading.font = { bold: true };
  heading.commit();
  let written = 0;
  for (const values of sheet.rows) {
    worksheet.addRow(values.map(cellValue)).commit();
    written += 1;
    if (written % ROWS_PER_TURN === 0) await nextTurn();
  }
  worksheet.commit();
}

/** Text stays text in a workbook, whatever it begins with. */
function cellValue(value: SheetValue): SheetValue {
  return typeof value === "string" ? (value === "" ? null : encodeExcelText(value)) : value;
}
