import { MAX_COLUMNS, MAX_SHEET_ROWS } from "./upload-limits";

/** Letters of a column, from its number beginning with 0: 0 is A, 26 is AA. */
export function columnLetter(index: number): string {
  let letters = "";
  for (let rest = index + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  }
  return letters;
}

/** Column (from 0) and row (from 1) of a name like "D7", or null where no sheet has such a cell. */
export function parseCellName(name: string): { column: number; row: number } | null {
  const match = /^\$?([A-Za-z]{1,3})\$?([1-9]\d{0,6})$/.exec(name);
  if (!match?.[1] || !match[2]) return null;
  const column =
    [...match[1].toUpperCase()].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;
  const row = Number(match[2]);
  return column < MAX_COLUMNS && row <= MAX_SHEET_ROWS ? { column, row } : null;
}
