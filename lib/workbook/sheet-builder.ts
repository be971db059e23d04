import { DomainError } from "@/lib/errors/domain-error";
import { columnLetter } from "./cell-names";
import type { CellContent, RawCell, RawTallyRow, UploadSheet } from "./raw-rows";
import { readHeadings, type Headings } from "./read-headings";
import { readingMessages } from "./reading-messages";
import { tallyColumns, type TallyColumn } from "./tally-columns";
import { MAX_CELL_CHARACTERS, MAX_LISTED_ROWS, MAX_ROWS, MAX_TEXT_CHARACTERS } from "./upload-limits";

const BLANK: CellContent = { type: "blank" };

/** Text as cell content: nothing but spaces is blank, and very long text is cut and marked. */
export function textContent(text: string): CellContent {
  if (text.trim() === "") return BLANK;
  if (text.length <= MAX_CELL_CHARACTERS) return { type: "text", text };
  return { type: "text", text: text.slice(0, MAX_CELL_CHARACTERS), cut: true };
}

/** What a heading or a message shows of a cell. */
export function contentText(content: CellContent): string {
  switch (content.type) {
    case "text":
    case "number":
    case "error":
      return content.text;
    case "date":
      return [
        content.year,
        String(content.month).padStart(2, "0"),
        String(content.day).padStart(2, "0"),
      ].join("-");
    case "boolean":
      return content.value ? "TRUE" : "FALSE";
    default:
      return "";
  }
}

/** Takes a sheet's rows one by one, whatever file they come from, and keeps what belongs to tallies. */
export class SheetBuilder {
  private headings: Headings | null = null;
  private readonly wanted = new Map<number, TallyColumn>();
  private readonly rows: RawTallyRow[] = [];
  private readonly skippedRows: number[] = [];
  private skippedRowCount = 0;
  private lastRow = 1;
  private characters = 0;

  /** True where the column's content is of use; in row 1 every heading is. */
  wants(row: number, column: number): boolean {
    return row === 1 || this.wanted.has(column);
  }

  /** Rows come in rising order; blank ones may be left out. `cells` maps column numbers from 0. */
  addRow(row: number, cells: ReadonlyMap<number, CellContent>): void {
    if (!this.headings) {
      this.startWith(row === 1 ? cells : new Map());
      if (row === 1) return;
    }
    const filled = [...this.wanted.keys()].some((column) => (cells.get(column) ?? BLANK).type !== "blank");
    if (!filled) return;
    this.noteSkipped(row);
    if (this.rows.length >= MAX_ROWS)
      throw new DomainError("too-large", readingMessages.tooManyRows(MAX_ROWS));
    this.rows.push({ row, cells: this.tallyCells(row, cells) });
    this.lastRow = row;
  }

  finish(kind: UploadSheet["kind"], sheetName: string): UploadSheet {
    const { columns } = this.headings ?? this.startWith(new Map());
    const { skippedRows, skippedRowCount, rows } = this;
    return { kind, sheetName, columns, skippedRows, skippedRowCount, rows };
  }

  private startWith(cells: ReadonlyMap<number, CellContent>): Headings {
    const texts = [...cells].map(([column, content]) => ({ column, text: contentText(content) }));
    const headings = readHeadings(texts.sort((left, right) => left.column - right.column));
    for (const [key, column] of headings.positions) this.wanted.set(column, key);
    this.headings = headings;
    return headings;
  }

  private noteSkipped(row: number): void {
    const blankRows = row - this.lastRow - 1;
    this.skippedRowCount += blankRows;
    const listed = Math.min(blankRows, MAX_LISTED_ROWS - this.skippedRows.length);
    for (let offset = 1; offset <= listed; offset += 1) this.skippedRows.push(this.lastRow + offset);
  }

  private tallyCells(row: number, cells: ReadonlyMap<number, CellContent>): Record<TallyColumn, RawCell> {
    const cell = (key: TallyColumn): RawCell => {
      const column = this.headings?.positions.get(key);
      if (column === undefined) return { ...BLANK, ref: null };
      const content = cells.get(column) ?? BLANK;
      if (content.type === "text") this.countCharacters(content.text.length);
      return { ...content, ref: `${columnLetter(column)}${row}` };
    };
    return Object.fromEntries(tallyColumns.map(({ key }) => [key, cell(key)])) as Record<
      TallyColumn,
      RawCell
    >;
  }

  private countCharacters(length: number): void {
    this.characters += length;
    if (this.characters > MAX_TEXT_CHARACTERS)
      throw new DomainError("too-large", readingMessages.tooMuchText);
  }
}
