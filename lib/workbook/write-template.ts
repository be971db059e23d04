import { cautionsSheet, talliesSheet, type WrittenTally } from "./tally-sheets";
import { writeSheets } from "./write-sheets";

export interface Template {
  /** The lines to fill in, in order. */
  lines: readonly Pick<WrittenTally, "ward" | "indicator" | "month">[];
  cautions: readonly string[];
}

/** A workbook to fill in: ward, indicator and month stand there, the counts are blank. */
export function writeTemplate({ lines, cautions }: Template): Promise<Buffer> {
  const tallies = lines.map(({ ward, indicator, month }) => ({
    ward,
    indicator,
    month,
    numerator: null,
    denominator: null,
    notCollected: null,
    note: null,
  }));
  return writeSheets([talliesSheet(tallies), cautionsSheet(cautions)]);
}
