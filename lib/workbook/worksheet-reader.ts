import { DomainError } from "@/lib/errors/domain-error";
import { parseCellName } from "./cell-names";
import { decodeExcelText } from "./excel-text";
import type { CellContent } from "./raw-rows";
import { readingMessages } from "./reading-messages";
import { textContent, type SheetBuilder } from "./sheet-builder";
import { dateFromIso, dateFromSerial } from "./sheet-dates";
import { MAX_COLUMNS, MAX_SHEET_ROWS } from "./upload-limits";
import { RichText, type WorkbookParts } from "./workbook-parts";
import type { XmlHandler } from "./xml-reader";

const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d{1,3})?$/;

const damaged = () => new DomainError("invalid", readingMessages.damaged);

interface CellState {
  column: number;
  type: string;
  style: number;
  hasFormula: boolean;
  wanted: boolean;
}

/**
 * Handles the XML of one worksheet: rows and cells with or without their names, stored results of formulas.
 * Memory follows the filled cells of one row, never the distance between cells.
 */
export class WorksheetReader implements XmlHandler {
  private row = 0;
  private column = -1;
  private cells = new Map<number, CellContent>();
  private cell: CellState | null = null;
  private value: string[] | null = null;
  private inValue = false;
  private inInline = false;
  private inSheetData = false;
  private readonly inline = new RichText();

  constructor(
    private readonly parts: Pick<WorkbookParts, "is1904" | "strings" | "dateStyles">,
    private readonly builder: SheetBuilder,
  ) {}

  open = (name: string, attributes: Readonly<Record<string, string>>): void => {
    if (name === "sheetData") this.inSheetData = true;
    if (!this.inSheetData) return;
    if (name === "row") this.openRow(attributes.r);
    else if (name === "c") this.openCell(attributes);
    else if (this.cell) this.openInCell(name, this.cell);
  };

  text = (piece: string): void => {
    if (!this.cell?.wanted) return;
    if (this.inValue) this.value?.push(piece);
    else if (this.inInline) this.inline.add(piece);
  };

  close = (name: string): void => {
    if (name === "sheetData") this.inSheetData = false;
    else if (name === "row" && this.inSheetData) this.builder.addRow(this.row, this.cells);
    else if (name === "c") this.closeCell();
    else if (name === "v") this.inValue = false;
    else if (name === "is") this.inInline = false;
    else if (this.inInline) this.inline.close(name);
  };

  /** A row without a number follows the one before it; rows out of order are damage. */
  private openRow(name: string | undefined): void {
    const row = name === undefined ? this.row + 1 : Number(name);
    if (!Number.isInteger(row) || row <= this.row || row > MAX_SHEET_ROWS) throw damaged();
    this.row = row;
    this.column = -1;
    this.cells = new Map();
  }

  private openCell(attributes: Readonly<Record<string, string>>): void {
    if (this.row === 0) throw damaged();
    if (attributes.r === undefined) {
      this.column += 1;
    } else {
      const place = parseCellName(attributes.r);
      if (place?.row !== this.row) throw damaged();
      this.column = place.column;
    }
    if (this.column >= MAX_COLUMNS) throw damaged();
    this.cell = {
      column: this.column,
      type: attributes.t ?? "n",
      style: Number(attributes.s ?? 0),
      hasFormula: false,
      wanted: this.builder.wants(this.row, this.column),
    };
    this.value = null;
    this.inline.begin();
  }

  private openInCell(name: string, cell: CellState): void {
    if (name === "v") {
      this.inValue = true;
      this.value = [];
    } else if (name === "is") this.inInline = true;
    else if (name === "f") cell.hasFormula = true;
    else if (this.inInline) this.inline.open(name);
  }

  private closeCell(): void {
    const { cell } = this;
    this.cell = null;
    if (!cell?.wanted) return;
    const content = this.contentOf(cell);
    if (content.type === "blank") return;
    if (this.cells.has(cell.column)) throw damaged();
    this.cells.set(cell.column, content);
  }

  private contentOf(cell: CellState): CellContent {
    if (cell.type === "inlineStr") return textContent(this.inline.result());
    if (this.value === null) return cell.hasFormula ? { type: "no-result" } : { type: "blank" };
    const value = this.value.join("");
    switch (cell.type) {
      case "s":
        return this.sharedText(value);
      case "str":
        return textContent(decodeExcelText(value));
      case "b":
        return { type: "boolean", value: value.trim() === "1" || value.trim() === "true" };
      case "e":
        return { type: "error", text: value.trim().slice(0, 40) };
      case "d":
        return dateFromIso(value) ?? textContent(value);
      case "n":
        return this.numberContent(value.trim(), cell);
      default:
        throw damaged();
    }
  }

  private sharedText(value: string): CellContent {
    const text = /^\s*\d+\s*$/.test(value) ? this.parts.strings[Number(value)] : undefined;
    if (text === undefined) throw damaged();
    return textContent(text);
  }

  private numberContent(text: string, cell: CellState): CellContent {
    if (text === "") return cell.hasFormula ? { type: "no-result" } : { type: "blank" };
    const value = Number(text);
    if (!NUMBER.test(text) || !Number.isFinite(value)) throw damaged();
    const date = this.parts.dateStyles[cell.style] ? dateFromSerial(value, this.parts.is1904) : null;
    return date ?? { type: "number", value, text: text.slice(0, 40) };
  }
}
