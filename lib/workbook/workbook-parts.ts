import { DomainError } from "@/lib/errors/domain-error";
import { cutText } from "./cut-text";
import { decodeExcelText } from "./excel-text";
import { readingMessages } from "./reading-messages";
import { isDateFormat } from "./sheet-dates";
import { plainName, TALLIES_SHEET } from "./tally-columns";
import { MAX_SHARED_STRINGS } from "./upload-limits";
import { readXml } from "./xml-reader";
import type { ZipArchive } from "./zip-archive";

const WORKBOOK = "xl/workbook.xml";
const MAX_SHEETS_NAMED = 10;

interface SheetEntry {
  name: string;
  hidden: boolean;
  relation: string;
}

export interface ChosenSheet {
  name: string;
  part: string;
}

export interface WorkbookParts {
  sheet: ChosenSheet;
  is1904: boolean;
  strings: string[];
  /** For each cell style (attribute `s`), whether it shows a calendar date. */
  dateStyles: boolean[];
}

/** Reads what a sheet's cells refer to: the sheet's own part, shared strings, and which styles are dates. */
export function readWorkbookParts(archive: ZipArchive): WorkbookParts {
  const { sheets, is1904 } = readWorkbook(archive);
  const relations = readRelations(archive);
  const worksheets = sheets.filter(({ relation }) => relations.get(relation)?.kind === "worksheet");
  const sheet = chooseSheet(worksheets);
  const related = (kind: string) => [...relations.values()].find((relation) => relation.kind === kind)?.part;
  return {
    sheet: { name: sheet.name, part: relations.get(sheet.relation)?.part ?? "" },
    is1904,
    strings: readSharedStrings(archive, related("sharedStrings")),
    dateStyles: readDateStyles(archive, related("styles")),
  };
}

/** The one called Tallies, hidden or not; else the only one that can be seen. */
export function chooseSheet<T extends Pick<SheetEntry, "name" | "hidden">>(sheets: T[]): T {
  const named = sheets.filter(({ name }) => plainName(name) === plainName(TALLIES_SHEET));
  if (named.length > 1) throw new DomainError("invalid", readingMessages.twoSheets);
  if (named[0]) return named[0];
  const visible = sheets.filter(({ hidden }) => !hidden);
  if (visible.length === 1 && visible[0]) return visible[0];
  const names = visible.slice(0, MAX_SHEETS_NAMED).map(({ name }) => `“${cutText(name)}”`);
  if (names.length === 0) throw new DomainError("invalid", readingMessages.noVisibleSheet);
  throw new DomainError("invalid", readingMessages.noSheet(names));
}

function readWorkbook(archive: ZipArchive): { sheets: SheetEntry[]; is1904: boolean } {
  const sheets: SheetEntry[] = [];
  let is1904 = false;
  readXml(archive, WORKBOOK, {
    open(name, attributes) {
      if (name === "workbookPr") is1904 = /^(1|true|on)$/.test(attributes.date1904 ?? "");
      if (name !== "sheet") return;
      sheets.push({
        name: attributes.name ?? "",
        hidden: /hidden/i.test(attributes.state ?? ""),
        relation: relationId(attributes),
      });
    },
  });
  return { sheets, is1904 };
}

/** `r:id`, whatever its prefix; `sheetId` and the like have none. */
function relationId(attributes: Readonly<Record<string, string>>): string {
  return Object.entries(attributes).find(([key]) => key.endsWith(":id"))?.[1] ?? "";
}

/** Parts that the workbook points to, by id. `kind` is the last piece of the relation's type. */
function readRelations(archive: ZipArchive): Map<string, { kind: string; part: string }> {
  const relations = new Map<string, { kind: string; part: string }>();
  readXml(archive, "xl/_rels/workbook.xml.rels", {
    open(name, { Id, Type, Target, TargetMode }) {
      if (name !== "Relationship" || !Id || !Type || !Target || TargetMode === "External") return;
      relations.set(Id, { kind: Type.slice(Type.lastIndexOf("/") + 1), part: partName(Target) });
    },
  });
  return relations;
}

/** A target is relative to xl/ unless it begins with a slash. */
function partName(target: string): string {
  return new URL(target, "part:/xl/").pathname.slice(1);
}

function readSharedStrings(archive: ZipArchive, part: string | undefined): string[] {
  const strings: string[] = [];
  if (part === undefined || !archive.has(part)) return strings;
  const text = new RichText();
  readXml(archive, part, {
    open(name) {
      if (name === "si") text.begin();
      text.open(name);
    },
    close(name) {
      text.close(name);
      if (name !== "si") return;
      if (strings.length >= MAX_SHARED_STRINGS)
        throw new DomainError("too-large", readingMessages.tooMuchText);
      strings.push(text.result());
    },
    text: (piece) => text.add(piece),
  });
  return strings;
}

function readDateStyles(archive: ZipArchive, part: string | undefined): boolean[] {
  const formats = new Map<number, string>();
  const formatIds: number[] = [];
  let inCellFormats = false;
  if (part === undefined || !archive.has(part)) return [];
  readXml(archive, part, {
    open(name, { numFmtId, formatCode }) {
      if (name === "cellXfs") inCellFormats = true;
      if (name === "numFmt" && formatCode !== undefined) formats.set(Number(numFmtId), formatCode);
      if (name === "xf" && inCellFormats) formatIds.push(Number(numFmtId ?? 0));
    },
    close(name) {
      if (name === "cellXfs") inCellFormats = false;
    },
  });
  return formatIds.map((id) => isDateFormat(id, formats));
}

/** Gathers the text of a shared or inline string: all runs together, without the reading aids of Asian scripts. */
export class RichText {
  private pieces: string[] = [];
  private inText = false;
  private inPhonetic = false;

  begin(): void {
    this.pieces = [];
    this.inPhonetic = false;
  }

  open(name: string): void {
    if (name === "rPh") this.inPhonetic = true;
    if (name === "t") this.inText = true;
  }

  close(name: string): void {
    if (name === "rPh") this.inPhonetic = false;
    if (name === "t") this.inText = false;
  }

  add(piece: string): void {
    if (this.inText && !this.inPhonetic) this.pieces.push(piece);
  }

  result(): string {
    return decodeExcelText(this.pieces.join(""));
  }
}
