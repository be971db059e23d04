import { strToU8, zipSync } from "fflate";
import { describe, expect, it } from "vitest";
import { readBytes } from "@/lib/workbook/read-bytes";
import {
  buildXlsx,
  headingRow,
  inlineCell,
  readHandmade,
  readXlsxBytes,
  refusalOf,
  workbookParts,
} from "./fixtures";

const MEGABYTE = 1024 * 1024;
const wardRow = `<row r="2">${inlineCell("OSI")}</row>`;

/** Calls `bend` with the offset of every record of the zip that begins with the signature. */
function bendRecords(
  bytes: Uint8Array,
  signature: number,
  bend: (view: DataView, offset: number) => void,
): Uint8Array {
  const copy = bytes.slice();
  const view = new DataView(copy.buffer);
  for (let offset = 0; offset + 30 < copy.length; offset += 1) {
    if (view.getUint32(offset, true) === signature) bend(view, offset);
  }
  return copy;
}
const DIRECTORY_ENTRY = 0x02014b50;

async function codeOf(bytes: Uint8Array, fileName = "tallies.xlsx"): Promise<string> {
  return (await refusalOf(() => readBytes(bytes, fileName))).code;
}

describe("zip", () => {
  const bomb = buildXlsx({ parts: { "xl/media/image1.bin": new Uint8Array(65 * MEGABYTE) } });

  it("refuses more than 64 MB unpacked, even in a part that nobody reads", async () => {
    expect(await codeOf(bomb)).toBe("too-large");
  });

  it("counts what comes out, not what the file declares", async () => {
    const lying = bendRecords(bomb, DIRECTORY_ENTRY, (view, offset) =>
      view.setUint32(offset + 24, 100, true),
    );
    expect(await codeOf(lying)).toBe("too-large");
  });

  it("refuses a sheet of more than 64 MB whatever is in it", async () => {
    const zeros = new Uint8Array(65 * MEGABYTE);
    expect(await codeOf(buildXlsx({ parts: { "xl/worksheets/sheet1.xml": zeros } }))).toBe("too-large");
  });

  it("takes a wrong size or a wrong checksum for damage", async () => {
    const good = buildXlsx({ rows: headingRow + wardRow });
    expect(readXlsxBytes(good).rows).toHaveLength(1);
    for (const field of [16, 24]) {
      const bent = bendRecords(good, DIRECTORY_ENTRY, (view, offset) =>
        view.setUint32(offset + field, view.getUint32(offset + field, true) + 1, true),
      );
      expect(await codeOf(bent)).toBe("invalid");
    }
  });

  it("refuses encrypted parts, whichever flag says so", async () => {
    for (const flag of [0x0001, 0x0040]) {
      const encrypted = bendRecords(buildXlsx({}), DIRECTORY_ENTRY, (view, offset) =>
        view.setUint16(offset + 8, flag, true),
      );
      const error = await refusalOf(() => readXlsxBytes(encrypted));
      expect(error.code).toBe("unsupported-type");
      expect(error.message).toContain("password");
    }
  });

  it("refuses a file cut short anywhere", async () => {
    const good = buildXlsx({ rows: headingRow + wardRow });
    for (const length of [3, 30, Math.floor(good.length / 2), good.length - 1]) {
      expect(await codeOf(good.subarray(0, length))).toBe("invalid");
    }
  });

  it("survives a flip of any single byte: read or refused, nothing else", async () => {
    const good = buildXlsx({ rows: headingRow + wardRow });
    const outcomes = new Set<string>();
    for (let offset = 0; offset < good.length; offset += 1) {
      const bent = good.slice();
      bent[offset] = (bent[offset] ?? 0) ^ 0xff;
      try {
        readXlsxBytes(bent);
        outcomes.add("read");
      } catch (error) {
        outcomes.add(error instanceof Error ? error.name : String(error));
      }
    }
    expect([...outcomes].sort()).toEqual(["DomainError", "read"]);
  });

  it("refuses too many parts and a name that stands there twice", async () => {
    const many = Object.fromEntries(Array.from({ length: 2100 }, (_, index) => [`x/${index}`, ""]));
    expect(await codeOf(buildXlsx({ parts: many }))).toBe("too-large");
    const twice = { "XL/Workbook.xml": "<workbook/>" };
    expect(await codeOf(buildXlsx({ parts: twice }))).toBe("invalid");
  });

  it("refuses compression that it doesn't know", async () => {
    const bent = bendRecords(buildXlsx({}), DIRECTORY_ENTRY, (view, offset) =>
      view.setUint16(offset + 10, 12, true),
    );
    expect(await codeOf(bent)).toBe("invalid");
  });

  it("reads parts that are stored, and names with other slashes", () => {
    const parts = Object.entries(workbookParts({ rows: headingRow + wardRow }));
    const stored = Object.fromEntries(
      parts.map(([name, bytes]) => [`/${name}`.replaceAll("/", "\\"), bytes]),
    );
    expect(readXlsxBytes(zipSync(stored, { level: 0 })).rows).toHaveLength(1);
  });
});

describe("what is no workbook", () => {
  it.each([
    ["text", strToU8("Ward,Indicator"), "a.xlsx"],
    ["an older workbook", Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0), "a.xlsx"],
    [
      "an older workbook called CSV",
      Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0),
      "a.csv",
    ],
    ["another zip", zipSync({ "a.txt": strToU8("a") }), "a.xlsx"],
    ["a zip without content types", buildXlsx({ parts: { "[Content_Types].xml": null } }), "a.xlsx"],
    ["a zip without a workbook", buildXlsx({ parts: { "xl/workbook.xml": null } }), "a.xlsx"],
    ["an empty zip", zipSync({}), "a.xlsx"],
    ["a workbook with macros", buildXlsx({ parts: { "xl/vbaProject.bin": "x" } }), "a.xlsm"],
    ["a workbook called CSV", buildXlsx({}), "a.csv"],
    ["a text of an unknown kind", strToU8("{}"), "a.json"],
  ])("refuses %s", async (_, bytes, fileName) => {
    expect(await codeOf(bytes, fileName)).toBe("unsupported-type");
  });

  it("refuses an empty file", async () => {
    expect(await codeOf(new Uint8Array())).toBe("invalid");
  });
});

describe("xml", () => {
  const doctype = '<!DOCTYPE x [<!ENTITY a "ha"><!ENTITY b "&a;&a;&a;"><!ENTITY c "&b;&b;&b;">]>';

  it.each([
    ["xl/workbook.xml", `${doctype}<workbook>&c;</workbook>`],
    ["xl/_rels/workbook.xml.rels", `${doctype}<Relationships/>`],
    ["xl/worksheets/sheet1.xml", `${doctype}<worksheet>&c;</worksheet>`],
    ["xl/sharedStrings.xml", `${doctype}<sst/>`],
    ["xl/styles.xml", '<!DOCTYPE x SYSTEM "file:///etc/passwd"><styleSheet/>'],
  ])("refuses a document type in %s", async (part, xml) => {
    const error = await refusalOf(() =>
      readHandmade({ sharedStrings: "<si/>", styles: "<cellXfs/>", parts: { [part]: xml } }),
    );
    expect(error.code).toBe("invalid");
    expect(error.message).toContain("document type");
  });

  it.each([
    ["an entity that nobody declared", `<worksheet><sheetData>&a;</sheetData></worksheet>`],
    ["an end that is missing", `<worksheet><sheetData>${headingRow}`],
    [
      "a control character",
      `<worksheet><sheetData>${headingRow}${inlineCell("\u0001")}</sheetData></worksheet>`,
    ],
    ["bytes that are no UTF-8", Uint8Array.of(0x3c, 0x61, 0x3e, 0xff, 0x3c, 0x2f, 0x61, 0x3e)],
    ["nesting without end", "<a>".repeat(100_000)],
  ])("takes %s for damage", async (_, xml) => {
    expect(await codeOf(buildXlsx({ parts: { "xl/worksheets/sheet1.xml": xml } }))).toBe("invalid");
  });

  it("reads UTF-16 by its mark", () => {
    const utf16 = Buffer.from(
      `\uFEFF<worksheet><sheetData>${headingRow}${wardRow}</sheetData></worksheet>`,
      "utf16le",
    );
    const sheet = readHandmade({ parts: { "xl/worksheets/sheet1.xml": new Uint8Array(utf16) } });
    expect(sheet.rows).toHaveLength(1);
  });
});

describe("sheets", () => {
  it("gives a far-away cell no room", () => {
    const far = '<row r="1048576"><c r="XFD1048576"><v>1</v></c></row>';
    expect(readHandmade({ rows: headingRow + wardRow + far }).rows).toHaveLength(1);
    const ward = '<row r="1048576"><c r="A1048576"><v>1</v></c></row>';
    const sheet = readHandmade({ rows: headingRow + wardRow + ward });
    expect(sheet.rows.map(({ row }) => row)).toEqual([2, 1_048_576]);
    expect(sheet.skippedRowCount).toBe(1_048_573);
    expect(sheet.skippedRows).toHaveLength(200);
  });

  it.each([
    ["a row beyond the last", '<row r="1048577"><c><v>1</v></c></row>'],
    ["a row that is no number", '<row r="x"/>'],
    ["rows out of order", '<row r="3"/><row r="2"/>'],
    ["a cell of another row", '<row r="2"><c r="A3"><v>1</v></c></row>'],
    ["a column beyond the last", '<row r="2"><c r="XFE2"><v>1</v></c></row>'],
    ["a cell that is there twice", '<row r="2"><c r="A2"><v>1</v></c><c r="A2"><v>2</v></c></row>'],
    ["a shared string that isn't there", '<row r="2"><c r="A2" t="s"><v>9</v></c></row>'],
    ["a shared string called __proto__", '<row r="2"><c r="A2" t="s"><v>__proto__</v></c></row>'],
    ["a number that is none", '<row r="2"><c r="A2"><v>0x10</v></c></row>'],
    ["a number without end", '<row r="2"><c r="A2"><v>1e999</v></c></row>'],
    ["a type that nobody knows", '<row r="2"><c r="A2" t="zz"><v>1</v></c></row>'],
  ])("takes %s for damage", async (_, row) => {
    expect(await codeOf(buildXlsx({ rows: headingRow + row }))).toBe("invalid");
  });

  it("takes 50 000 rows and not one more", async () => {
    const rows = (count: number) => headingRow + '<row><c t="n"><v>1</v></c></row>'.repeat(count);
    expect(readHandmade({ rows: rows(50_000) }).rows).toHaveLength(50_000);
    expect((await refusalOf(() => readHandmade({ rows: rows(50_001) }))).code).toBe("too-large");
  });

  it("doesn't count blank rows as rows", () => {
    const blank = '<row><c s="0"/></row>'.repeat(60_000);
    expect(readHandmade({ rows: headingRow + blank + `<row>${inlineCell("OSI")}</row>` }).rows).toHaveLength(
      1,
    );
  });

  it("refuses one long text repeated in every row", async () => {
    const rows = `<row><c t="s"><v>0</v></c></row>`.repeat(20_000);
    const sharedStrings = `<si><t>${"x".repeat(1_900)}</t></si>`;
    expect((await refusalOf(() => readHandmade({ rows: headingRow + rows, sharedStrings }))).code).toBe(
      "too-large",
    );
  });

  it("refuses shared strings by the million", async () => {
    expect((await refusalOf(() => readHandmade({ sharedStrings: "<si/>".repeat(500_001) }))).code).toBe(
      "too-large",
    );
  });

  it("leaves a sheet that stands outside the file alone", async () => {
    const outside =
      '<Relationships><Relationship Id="rId1" Type="x/worksheet" Target="../../../etc/passwd" TargetMode="External"/></Relationships>';
    expect(
      (await refusalOf(() => readHandmade({ parts: { "xl/_rels/workbook.xml.rels": outside } }))).code,
    ).toBe("invalid");
    const climbing = outside.replace(' TargetMode="External"', "");
    expect(
      (await refusalOf(() => readHandmade({ parts: { "xl/_rels/workbook.xml.rels": climbing } }))).code,
    ).toBe("invalid");
  });
});
