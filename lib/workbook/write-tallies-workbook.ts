import { cautionsSheet, plainSheet, talliesSheet, type PlainTable, type WrittenTally } from "./tally-sheets";
import { writeSheets } from "./write-sheets";

export interface TalliesWorkbook {
  tallies: Iterable<WrittenTally>;
  definitions: PlainTable;
  cautions: readonly string[];
}

/** A workbook whose sheet Tallies reads back as the same tallies. */
export function writeTalliesWorkbook({ tallies, definitions, cautions }: TalliesWorkbook): Promise<Buffer> {
  return writeSheets([
    talliesSheet(tallies),
    plainSheet("Definitions", definitions),
    cautionsSheet(cautions),
  ]);
}
