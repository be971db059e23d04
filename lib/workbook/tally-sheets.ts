import type { Month } from "@/lib/indicators/month";
import { tallyColumns, TALLIES_SHEET, type TallyColumn } from "./tally-columns";
import type { SheetToWrite, SheetValue } from "./write-sheets";

/** One tally as it is handed out; ward and indicator by their codes. */
export interface WrittenTally {
  ward: string;
  indicator: string;
  month: Month;
  numerator: number | null;
  denominator: number | null;
  notCollected: string | null;
  note: string | null;
}

/** A table of plain values, such as the definitions of the indicators. */
export interface PlainTable {
  columns: readonly { title: string; width?: number }[];
  rows: readonly (readonly (string | number | null)[])[];
}

const DEFAULT_WIDTH = 24;
const widths: Record<TallyColumn, number> = {
  ward: 14,
  indicator: 18,
  month: 11,
  numerator: 12,
  denominator: 14,
  notCollected: 30,
  note: 44,
};

/** The sheet that is read back; the month is a real date, the first day of it. */
export function talliesSheet(tallies: Iterable<WrittenTally>): SheetToWrite {
  return {
    name: TALLIES_SHEET,
    columns: tallyColumns.map(({ key, title }) => ({
      title,
      width: widths[key],
      ...(key === "month" ? { format: "yyyy-mm" } : {}),
    })),
    rows: tallyRows(tallies),
  };
}

function* tallyRows(tallies: Iterable<WrittenTally>): Generator<SheetValue[]> {
  for (const tally of tallies) {
    yield tallyColumns.map(({ key }) => (key === "month" ? firstDayOf(tally.month) : tally[key]));
  }
}

export function plainSheet(name: string, { columns, rows }: PlainTable): SheetToWrite {
  return {
    name,
    columns: columns.map(({ title, width }) => ({ title, width: width ?? DEFAULT_WIDTH, wrap: true })),
    rows,
  };
}

export function cautionsSheet(cautions: readonly string[]): SheetToWrite {
  return plainSheet("Cautions", {
    columns: [{ title: "Cautions", width: 110 }],
    rows: cautions.map((caution) => [caution]),
  });
}

/** Midnight UTC, which is how dates are written to a workbook. */
function firstDayOf(month: Month): Date {
  return new Date(Date.UTC(Number(month.slice(0, 4)), Number(month.slice(5, 7)) - 1, 1));
}
