import { DomainError, type FieldError } from "@/lib/errors/domain-error";
import { columnLetter } from "./cell-names";
import { cutText } from "./cut-text";
import type { UploadColumn } from "./raw-rows";
import { readingMessages } from "./reading-messages";
import { plainName, tallyColumns, type TallyColumn } from "./tally-columns";

/** Columns that aren't used are listed so that nobody wonders, but not by the thousand. */
const MAX_UNUSED_LISTED = 50;

export interface Headings {
  columns: UploadColumn[];
  /** Column number (from 0) of each column that the sheet has. */
  positions: Map<TallyColumn, number>;
}

const keysByName = new Map<string, TallyColumn>(
  tallyColumns.map(({ key, title }) => [plainName(title), key]),
);

/** The tally's column that a heading names, or null. */
export function columnOfHeading(heading: string): TallyColumn | null {
  return keysByName.get(plainName(heading)) ?? null;
}

/**
 * Finds the columns by their headings, in any order.
 * @throws DomainError invalid where a needed column is missing or one is there twice
 */
export function readHeadings(cells: Iterable<{ column: number; text: string }>): Headings {
  const columns: UploadColumn[] = [];
  const found = new Map<TallyColumn, number[]>();
  let unused = 0;
  for (const { column, text } of cells) {
    if (text.trim() === "") continue;
    const readAs = columnOfHeading(text);
    if (readAs) found.set(readAs, [...(found.get(readAs) ?? []), column].slice(0, 5));
    if (readAs || ++unused <= MAX_UNUSED_LISTED) {
      columns.push({ letter: columnLetter(column), header: cutText(text), readAs });
    }
  }
  if (found.size === 0) {
    throw new DomainError("invalid", readingMessages.noHeadings, {
      errors: [{ path: "1", message: readingMessages.noHeadings }],
    });
  }
  const errors = headingErrors(found);
  if (errors.length > 0) throw new DomainError("invalid", readingMessages.headings, { errors });
  return {
    columns,
    positions: new Map([...found].map(([key, positions]) => [key, positions[0] ?? 0])),
  };
}

function headingErrors(found: ReadonlyMap<TallyColumn, number[]>): FieldError[] {
  return tallyColumns.flatMap(({ key, title, required }) => {
    const positions = found.get(key) ?? [];
    if (positions.length > 1) {
      const letters = positions.map(columnLetter);
      return [{ path: `${letters[1]}1`, message: readingMessages.twiceColumn(title, letters) }];
    }
    if (positions.length === 0 && required) {
      return [{ path: "1", message: readingMessages.missingColumn(title) }];
    }
    return [];
  });
}
