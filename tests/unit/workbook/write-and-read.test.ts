import ExcelJS from "exceljs";
import fc from "fast-check";
import { unzipSync, strFromU8 } from "fflate";
import { describe, expect, it } from "vitest";
import { monthFromIndex } from "@/lib/indicators/month";
import { readBytes } from "@/lib/workbook/read-bytes";
import { readTallyRow } from "@/lib/workbook/read-tally-row";
import type { WrittenTally } from "@/lib/workbook/tally-sheets";
import { writeTalliesCsv } from "@/lib/workbook/write-tallies-csv";
import { writeTalliesWorkbook } from "@/lib/workbook/write-tallies-workbook";
import { writeTemplate } from "@/lib/workbook/write-template";

const tally: WrittenTally = {
  ward: "OSI",
  indicator: "FALLS",
  month: monthFromIndex(2026 * 12 + 10),
  numerator: 6,
  denominator: 804,
  notCollected: null,
  note: null,
};
const formulas = [
  "=1+1",
  "+1",
  "-1",
  "@SUM(A1)",
  "\tx",
  "\rx",
  '=HYPERLINK("x")',
  "'=1",
  "a\r\nb",
  "_x0041_",
  "__proto__",
];

function workbookOf(tallies: Iterable<WrittenTally>): Promise<Buffer> {
  return writeTalliesWorkbook({
    tallies,
    definitions: { columns: [{ title: "Code" }, { title: "Per", width: 8 }], rows: [["=CMD()", 1000]] },
    cautions: ["=A signal is a prompt to look.", "Second."],
  });
}

/** The tallies as the way in gives them, messages included. */
function readBack(bytes: Uint8Array, fileName: string) {
  return readBytes(bytes, fileName).rows.map((raw) => {
    const { ward, indicator, month, numerator, denominator, notCollected, note, messages } =
      readTallyRow(raw);
    expect(messages).toEqual([]);
    return { ward, indicator, month, numerator, denominator, notCollected, note };
  });
}

const code = fc.stringMatching(/^[A-Z0-9-]{1,16}$/);
const words = fc
  .oneof(
    fc.string({ unit: "grapheme", maxLength: 60 }),
    fc.string({
      unit: fc.constantFrom("=", "'", '"', ",", ";", "\t", "\n", "a", "_", "x", "0", "&", "<", " "),
      maxLength: 12,
    }),
    fc.constantFrom(...formulas),
  )
  .map((written) => written.replace(/[\x00-\x08\x0B\x0C\x0E-\x1F\x7F]/g, "").trim() || null);
const count = fc.oneof(fc.nat(20), fc.nat(1_000_000_000));
const month = fc.integer({ min: 1990 * 12, max: 2100 * 12 }).map(monthFromIndex);
const counted = fc.record({ numerator: count, denominator: count, notCollected: fc.constant(null) });
const notCollected = words.map((reason) => ({
  numerator: null,
  denominator: null,
  notCollected: reason ?? "closed",
}));
const tallies = fc.array(
  fc
    .tuple(fc.record({ ward: code, indicator: code, month, note: words }), fc.oneof(counted, notCollected))
    .map(([line, figures]): WrittenTally => ({ ...line, ...figures })),
  { maxLength: 20 },
);

describe("what is written reads back as the same", () => {
  it("as a workbook", async () => {
    await fc.assert(
      fc.asyncProperty(tallies, async (written) => {
        expect(readBack(await workbookOf(written), "a.xlsx")).toEqual(written);
      }),
      { numRuns: 25 },
    );
  });

  it("as CSV", async () => {
    await fc.assert(
      fc.asyncProperty(tallies, async (written) => {
        expect(readBack(await writeTalliesCsv(written), "a.csv")).toEqual(written);
      }),
      { numRuns: 200 },
    );
  });
});

describe("the workbook", () => {
  it("has real dates, numbers, a frozen bold heading and no formula", async () => {
    const bytes = await workbookOf([tally, ...formulas.map((note) => ({ ...tally, ward: "-A", note }))]);
    const workbook = new ExcelJS.Workbook();
    await workbook.xlsx.load(new Uint8Array(bytes).buffer);
    expect(workbook.worksheets.map(({ name }) => name)).toEqual(["Tallies", "Definitions", "Cautions"]);
    const sheet = workbook.getWorksheet("Tallies");
    expect(sheet?.getRow(1).values).toEqual([
      undefined,
      "Ward",
      "Indicator",
      "Month",
      "Numerator",
      "Denominator",
      "Not collected",
      "Note",
    ]);
    expect(sheet?.getRow(1).font.bold).toBe(true);
    expect(sheet?.views[0]).toMatchObject({ state: "frozen", ySplit: 1 });
    expect(sheet?.getCell("C2").value).toEqual(new Date("2026-11-01T00:00:00Z"));
    expect(sheet?.getCell("C2").numFmt).toBe("yyyy-mm");
    expect(sheet?.getCell("D2").value).toBe(6);
    expect(sheet?.getCell("F2").value).toBeNull();
    expect(sheet?.getCell("G3").value).toBe("=1+1");
    const parts = Object.entries(unzipSync(new Uint8Array(bytes))).filter(([name]) =>
      name.includes("worksheets/sheet"),
    );
    expect(parts).toHaveLength(3);
    for (const [, xml] of parts) expect(strFromU8(xml)).not.toMatch(/<f[\s>/]/);
  });

  it("holds the definitions and cautions that it was given", async () => {
    const workbook = new ExcelJS.Workbook();
    await workbook.xlsx.load(new Uint8Array(await workbookOf([])).buffer);
    expect(workbook.getWorksheet("Definitions")?.getRow(2).values).toEqual([undefined, "=CMD()", 1000]);
    expect(workbook.getWorksheet("Cautions")?.getCell("A2").value).toBe("=A signal is a prompt to look.");
    expect(workbook.getWorksheet("Cautions")?.rowCount).toBe(3);
  });

  it("writes more rows than fit one turn", async () => {
    const many = Array.from({ length: 1_201 }, (_, index) => ({ ...tally, numerator: index }));
    expect(readBack(await workbookOf(many), "a.xlsx")).toEqual(many);
  });
});

describe("the CSV", () => {
  it("has a mark, commas, CRLF and guarded text", async () => {
    const bytes = await writeTalliesCsv([
      { ...tally, note: "=1+1" },
      { ...tally, ward: "-A", numerator: null, denominator: null, notCollected: "a, b" },
    ]);
    expect(bytes.toString("utf8")).toBe(
      "\uFEFFWard,Indicator,Month,Numerator,Denominator,Not collected,Note\r\n" +
        "OSI,FALLS,2026-11,6,804,,'=1+1\r\n" +
        '\'-A,FALLS,2026-11,,,"a, b",\r\n',
    );
  });

  it("writes more rows than fit one turn", async () => {
    const many = Array.from({ length: 4_001 }, (_, index) => ({ ...tally, numerator: index }));
    expect(readBack(await writeTalliesCsv(many), "a.csv")).toEqual(many);
  });
});

describe("the template", () => {
  it("has the lines to fill in, all of which are skipped until they are", async () => {
    const bytes = await writeTemplate({
      lines: [tally, { ...tally, indicator: "HANDS" }],
      cautions: ["Look."],
    });
    const sheet = readBytes(bytes, "template.xlsx");
    expect(sheet.columns.every(({ readAs }) => readAs !== null)).toBe(true);
    const readings = sheet.rows.map(readTallyRow);
    expect(readings.map(({ ward, indicator, month, blank }) => [ward, indicator, month, blank])).toEqual([
      ["OSI", "FALLS", "2026-11", true],
      ["OSI", "HANDS", "2026-11", true],
    ]);
  });
});
