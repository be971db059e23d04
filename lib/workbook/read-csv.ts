import Papa from "papaparse";
import { DomainError } from "@/lib/errors/domain-error";
import { decodeText } from "./decode-text";
import { unguardText } from "./formula-guard";
import type { CellContent, UploadSheet } from "./raw-rows";
import { columnOfHeading } from "./read-headings";
import { readingMessages } from "./reading-messages";
import { SheetBuilder, textContent } from "./sheet-builder";
import { MAX_COLUMNS } from "./upload-limits";

const DELIMITERS = [",", ";", "\t"];

/** Reads a CSV of tallies. Every field stays text: what looks like a number is judged by the row reader. */
export function readCsv(bytes: Uint8Array): UploadSheet {
  const text = decodeText(bytes);
  const builder = new SheetBuilder();
  let row = 0;
  const failures: unknown[] = [];
  Papa.parse<string[]>(text, {
    delimiter: bestDelimiter(text),
    step({ data, errors }, parser) {
      row += 1;
      try {
        if (errors.some(({ type }) => type === "Quotes")) {
          throw new DomainError("invalid", readingMessages.brokenQuotes(row));
        }
        builder.addRow(row, fieldContents(data));
      } catch (error) {
        failures.push(error);
        parser.abort();
      }
    },
  });
  if (failures.length > 0) throw failures[0];
  return builder.finish("csv", "");
}

/** The one that finds most headings; a comma where they find equally many. */
function bestDelimiter(text: string): string {
  const found = DELIMITERS.map((delimiter) => {
    const first = Papa.parse<string[]>(text, { delimiter, preview: 1 }).data[0] ?? [];
    return new Set(first.map(columnOfHeading).filter((key) => key !== null)).size;
  });
  return DELIMITERS[found.indexOf(Math.max(...found))] ?? ",";
}

function fieldContents(fields: string[]): Map<number, CellContent> {
  const contents = new Map<number, CellContent>();
  fields.slice(0, MAX_COLUMNS).forEach((field, column) => {
    const content = textContent(unguardText(field));
    if (content.type !== "blank") contents.set(column, content);
  });
  return contents;
}
