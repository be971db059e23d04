import ExcelJS from "exceljs";
import { strToU8, zipSync } from "fflate";
import { isDomainError, type DomainError } from "@/lib/errors/domain-error";
import { readBytes } from "@/lib/workbook/read-bytes";
import type { CellContent, RawTallyRow } from "@/lib/workbook/raw-rows";
import { tallyColumns, type TallyColumn } from "@/lib/workbook/tally-columns";

const MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
const OFFICE = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const PACKAGE = "http://schemas.openxmlformats.org/package/2006";
const DECLARATION = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';

export const titles = tallyColumns.map(({ title }) => title);
export const headingRow = `<row r="1">${titles.map(inlineCell).join("")}</row>`;

export function inlineCell(text: string): string {
  return `<c t="inlineStr"><is><t>${text}</t></is></c>`;
}

export interface Sheet {
  name: string;
  state?: string;
  data: string;
}

export interface HandmadeWorkbook {
  sheets?: Sheet[];
  /** XML of the rows of the one sheet, called Tallies. */
  rows?: string;
  afterData?: string;
  workbookProperties?: string;
  sharedStrings?: string;
  styles?: string;
  /** Parts that replace or join the usual ones; null takes one away. */
  parts?: Record<string, string | Uint8Array | null>;
}

/** The parts of a small workbook, written by hand so that a test can bend any of them. */
export function workbookParts(workbook: HandmadeWorkbook): Record<string, Uint8Array> {
  const sheets = workbook.sheets ?? [{ name: "Tallies", data: workbook.rows ?? headingRow }];
  const relation = (id: string, kind: string, target: string) =>
    `<Relationship Id="${id}" Type="${OFFICE}/${kind}" Target="${target}"/>`;
  const sheetList = sheets.map(
    ({ name, state }, index) =>
      `<sheet name="${name}" sheetId="${index + 1}"${state ? ` state="${state}"` : ""} r:id="rId${index + 1}"/>`,
  );
  const relations = [
    ...sheets.map((_, index) => relation(`rId${index + 1}`, "worksheet", `worksheets/sheet${index + 1}.xml`)),
    ...(workbook.sharedStrings ? [relation("rIdS", "sharedStrings", "sharedStrings.xml")] : []),
    ...(workbook.styles ? [relation("rIdT", "styles", "/xl/styles.xml")] : []),
  ];
  const texts: Record<string, string | Uint8Array | null> = {
    "[Content_Types].xml": `${DECLARATION}<Types xmlns="${PACKAGE}/content-types"/>`,
    "xl/workbook.xml": `${DECLARATION}<workbook xmlns="${MAIN}" xmlns:r="${OFFICE}"><workbookPr ${
      workbook.workbookProperties ?? ""
    }/><sheets>${sheetList.join("")}</sheets></workbook>`,
    "xl/_rels/workbook.xml.rels": `${DECLARATION}<Relationships xmlns="${PACKAGE}/relationships">${relations.join(
      "",
    )}</Relationships>`,
    ...(workbook.sharedStrings
      ? { "xl/sharedStrings.xml": `<sst xmlns="${MAIN}">${workbook.sharedStrings}</sst>` }
      : {}),
    ...(workbook.styles
      ? { "xl/styles.xml": `<styleSheet xmlns="${MAIN}">${workbook.styles}</styleSheet>` }
      : {}),
    ...Object.fromEntries(
      sheets.map(({ data }, index) => [
        `xl/worksheets/sheet${index + 1}.xml`,
        `<worksheet xmlns="${MAIN}"><sheetData>${data}</sheetData>${workbook.afterData ?? ""}</worksheet>`,
      ]),
    ),
    ...workbook.parts,
  };
  return Object.fromEntries(
    Object.entries(texts)
      .filter((entry): entry is [string, string | Uint8Array] => entry[1] !== null)
      .map(([name, content]) => [name, typeof content === "string" ? strToU8(content) : content]),
  );
}

export function buildXlsx(workbook: HandmadeWorkbook): Uint8Array {
  return zipSync(workbookParts(workbook), { level: 6 });
}

export const readXlsxBytes = (bytes: Uint8Array) => readBytes(bytes, "tallies.xlsx");
export const readHandmade = (workbook: HandmadeWorkbook) => readXlsxBytes(buildXlsx(workbook));

/** A workbook as an ordinary program writes it. */
export async function exceljsBytes(fill: (workbook: ExcelJS.Workbook) => void): Promise<Uint8Array> {
  const workbook = new ExcelJS.Workbook();
  fill(workbook);
  return new Uint8Array(await workbook.xlsx.writeBuffer());
}

/** The DomainError that `act` ends in; fails where it ends otherwise. */
export async function refusalOf(act: () => unknown): Promise<DomainError> {
  try {
    await act();
  } catch (error) {
    if (isDomainError(error)) return error;
    throw error;
  }
  throw new Error("Nothing was refused.");
}

/** A row of raw cells in columns A to G. */
export function rawRow(contents: Partial<Record<TallyColumn, CellContent>>, row = 4): RawTallyRow {
  const cells = tallyColumns.map(({ key }, index) => {
    const content: CellContent = contents[key] ?? { type: "blank" };
    return [key, { ...content, ref: `${"ABCDEFG"[index]}${row}` }];
  });
  return { row, cells: Object.fromEntries(cells) as RawTallyRow["cells"] };
}

export const text = (value: string): CellContent => ({ type: "text", text: value });
export const number = (value: number): CellContent => ({ type: "number", value, text: String(value) });
