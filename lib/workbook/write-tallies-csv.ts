import { setImmediate as nextTurn } from "node:timers/promises";
import Papa from "papaparse";
import { guardText } from "./formula-guard";
import { tallyColumns } from "./tally-columns";
import type { WrittenTally } from "./tally-sheets";

const LINE_END = "\r\n";
const BYTE_ORDER_MARK = "\uFEFF";
/** Rows written before other work gets its turn. */
const ROWS_PER_TURN = 2_000;

/** The tallies as UTF-8 with byte order mark, commas and CRLF; reads back as the same tallies. */
export async function writeTalliesCsv(tallies: Iterable<WrittenTally>): Promise<Buffer> {
  const chunks = [Buffer.from(BYTE_ORDER_MARK + csvLines([tallyColumns.map(({ title }) => title)]))];
  let rows: (string | number | null)[][] = [];
  for (const tally of tallies) {
    rows.push(tallyColumns.map(({ key }) => csvValue(tally[key])));
    if (rows.length < ROWS_PER_TURN) continue;
    chunks.push(Buffer.from(csvLines(rows)));
    rows = [];
    await nextTurn();
  }
  if (rows.length > 0) chunks.push(Buffer.from(csvLines(rows)));
  return Buffer.concat(chunks);
}

function csvLines(rows: (string | number | null)[][]): string {
  return Papa.unparse(rows, { newline: LINE_END }) + LINE_END;
}

function csvValue(value: string | number | null): string | number | null {
  return typeof value === "string" ? guardText(value) : value;
}
