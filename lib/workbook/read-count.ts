import type { RawCell } from "./raw-rows";
import { rowMessages, type RemedyColumns } from "./row-messages";

/** The largest count that a record takes. */
const MAX_COUNT = 1_000_000_000;
const WHOLE = /^\d{1,10}$/;
/** "1,804", "1 804", "1'804", "1.804": a separator of thousands to some, of decimals to others. */
const GROUPED = /^\d{1,3}(?:([.,'’\s])\d{3})(?:\1\d{3})*$/;

export type CellReading<Value> = { value: Value; message?: undefined } | { value: null; message: string };

/** A cell as a count: a whole number, or null where it is blank. Text is taken only if it is plainly whole. */
export function readCount(cell: RawCell, columns: RemedyColumns): CellReading<number | null> {
  switch (cell.type) {
    case "blank":
      return { value: null };
    case "number":
      return readNumber(cell.value, cell.text);
    case "text":
      return readText(cell.text.trim(), columns);
    case "date":
      return { value: null, message: rowMessages.dateAsCount };
    case "boolean":
      return { value: null, message: rowMessages.notWhole(cell.value ? "TRUE" : "FALSE", columns) };
    case "error":
      return { value: null, message: rowMessages.sheetError(cell.text) };
    case "no-result":
      return { value: null, message: rowMessages.noResult };
  }
}

function readNumber(stored: number, text: string): CellReading<number | null> {
  // Spreadsheet programs show 15 digits: a worked-out 6.0000000000000009 is a 6 to whoever looks at it.
  const value = Number(stored.toPrecision(15));
  if (value < 0) return { value: null, message: rowMessages.negative(text) };
  if (!Number.isInteger(value)) return { value: null, message: rowMessages.fraction(text) };
  if (value > MAX_COUNT) return { value: null, message: rowMessages.tooManyToCount(text) };
  return { value: value + 0 };
}

function readText(text: string, columns: RemedyColumns): CellReading<number | null> {
  if (WHOLE.test(text) && Number(text) <= MAX_COUNT) return { value: Number(text) };
  if (/^\d+$/.test(text)) return { value: null, message: rowMessages.tooManyToCount(text) };
  if (/^[-−]\d+$/.test(text)) return { value: null, message: rowMessages.negative(text) };
  if (GROUPED.test(text))
    return { value: null, message: rowMessages.twoReadings(text, text.replace(/\D/g, "")) };
  if (/^\d+[.,]\d+$/.test(text)) return { value: null, message: rowMessages.fraction(text) };
  return { value: null, message: rowMessages.notWhole(text, columns) };
}
