import { strToU8 } from "fflate";
import { describe, expect, it } from "vitest";
import { readBytes } from "@/lib/workbook/read-bytes";
import { refusalOf } from "./fixtures";

const read = (content: string | Uint8Array, fileName = "tallies.csv") =>
  readBytes(typeof content === "string" ? strToU8(content) : content, fileName);
const heading = "Ward,Indicator,Month,Numerator,Denominator,Not collected,Note";

function utf16(content: string, littleEndian: boolean): Uint8Array {
  const bytes = Buffer.from(`\uFEFF${content}`, "utf16le");
  return new Uint8Array(littleEndian ? bytes : bytes.swap16());
}

describe("text", () => {
  const content = `${heading}\r\nÖST,FALLS,2026-11,1,2,,näher\r\n`;

  it.each([
    ["UTF-8", strToU8(content)],
    ["UTF-8 with mark", strToU8(`\uFEFF${content}`)],
    ["UTF-16, little end first", utf16(content, true)],
    ["UTF-16, big end first", utf16(content, false)],
  ])("reads %s", (_, bytes) => {
    const sheet = read(bytes);
    expect(sheet).toMatchObject({ kind: "csv", sheetName: "", skippedRowCount: 0 });
    expect(sheet.rows[0]?.cells.ward).toEqual({ type: "text", text: "ÖST", ref: "A2" });
    expect(sheet.rows[0]?.cells.note).toEqual({ type: "text", text: "näher", ref: "G2" });
  });

  it.each([
    ["a NUL", strToU8(`${heading}\nOSI,FALLS\0`)],
    ["a NUL in UTF-16", utf16(`${heading}\nOSI,FALLS\0`, true)],
    ["bytes of another encoding", Uint8Array.of(...strToU8(`${heading}\n`), 0xd6, 0x53, 0x54)],
    ["UTF-16 without mark", utf16(content, true).subarray(2)],
    ["half a character of UTF-16", utf16(content, true).subarray(0, -1)],
  ])("refuses %s", async (_, bytes) => {
    expect((await refusalOf(() => read(bytes))).code).toBe("unsupported-type");
  });
});

describe("fields", () => {
  it.each([
    [",", "tallies.csv"],
    [";", "tallies.csv"],
    ["\t", "tallies.tsv"],
  ])("finds the delimiter %j by the headings", (delimiter, fileName) => {
    const row = ["OSI", "FALLS", "2026-11", "6", "804", "", "a, b; c"]
      .map((field) => `"${field}"`)
      .join(delimiter);
    const sheet = read(`${heading.replaceAll(",", delimiter)}\n${row}`, fileName);
    expect(sheet.columns.map(({ letter }) => letter).join("")).toBe("ABCDEFG");
    expect(sheet.rows[0]?.cells.note).toMatchObject({ text: "a, b; c" });
  });

  it("leaves what looks like a number as text", () => {
    const cells = read(`${heading}\n007,1e3,202611,0x10, 6 ,-,TRUE`).rows[0]?.cells;
    const texts = Object.values(cells ?? {}).map((cell) => (cell.type === "text" ? cell.text : cell.type));
    expect(texts).toEqual(["007", "1e3", "202611", "0x10", " 6 ", "-", "TRUE"]);
  });

  it("keeps line breaks and quotation marks within fields, and counts records as rows", () => {
    const sheet = read(
      `${heading}\nOSI,FALLS,2026-11,1,2,,"one\ntwo ""three"""\n\n , ,,\nTERN,FALLS,2026-11,1,2`,
    );
    expect(sheet.rows.map(({ row }) => row)).toEqual([2, 5]);
    expect(sheet.rows[0]?.cells.note).toMatchObject({ text: 'one\ntwo "three"' });
    expect(sheet.skippedRows).toEqual([3, 4]);
    expect(sheet.rows[1]?.cells.note).toEqual({ type: "blank", ref: "G5" });
  });

  it("takes off the apostrophe that keeps text from becoming a formula", () => {
    const cells = read(`${heading}\n'-A,FALLS,2026-11,1,2,''=x,'tis`).rows[0]?.cells;
    expect(cells?.ward).toMatchObject({ text: "-A" });
    expect(cells?.notCollected).toMatchObject({ text: "'=x" });
    expect(cells?.note).toMatchObject({ text: "'tis" });
  });

  it("ignores fields beyond the headings", () => {
    expect(read(`${heading}\nOSI,,,,,,,surplus`).rows).toHaveLength(1);
  });
});

describe("refusals", () => {
  it("names the row with a quotation mark that isn't closed", async () => {
    const error = await refusalOf(() => read(`${heading}\nOSI,FALLS,2026-11,1,2,,\nOSI,FALLS,"2026-11,1,2`));
    expect(error.code).toBe("invalid");
    expect(error.message).toContain("Row 3");
  });

  it("says which columns are missing or twice there", async () => {
    expect((await refusalOf(() => read("Ward,Month"))).errors).toHaveLength(3);
    expect((await refusalOf(() => read(`${heading},note`))).errors).toEqual([
      { path: "H1", message: "Columns G and H are both headed “Note”. Keep one of them." },
    ]);
    expect((await refusalOf(() => read("\n\n"))).code).toBe("invalid");
  });

  it("takes 50 000 rows and not one more", async () => {
    const rows = (count: number) => `${heading}\n${"OSI,FALLS,2026-11,1,2\n".repeat(count)}`;
    expect(read(rows(50_000)).rows).toHaveLength(50_000);
    expect((await refusalOf(() => read(rows(50_001)))).code).toBe("too-large");
  });
});
