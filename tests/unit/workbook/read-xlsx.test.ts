import { describe, expect, it } from "vitest";
import {
  buildXlsx,
  exceljsBytes,
  headingRow,
  inlineCell,
  readHandmade,
  readXlsxBytes,
  refusalOf,
  titles,
} from "./fixtures";

const dateStyles =
  '<numFmts count="4"><numFmt numFmtId="164" formatCode="yyyy\\-mm"/><numFmt numFmtId="165" formatCode="[$-409]mmm&quot; day &quot;"/>' +
  '<numFmt numFmtId="166" formatCode="0.0&quot; days&quot;"/><numFmt numFmtId="167" formatCode="[h]:mm"/></numFmts>' +
  '<cellStyleXfs><xf numFmtId="14"/></cellStyleXfs>' +
  '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/><xf numFmtId="164"/><xf numFmtId="165"/><xf numFmtId="166"/><xf numFmtId="167"/></cellXfs>';

/** The numerator cell (column D) of a sheet whose row 2 is given. */
function numeratorOf(cell: string, more: Parameters<typeof readHandmade>[0] = {}) {
  const sheet = readHandmade({
    ...more,
    rows: `${headingRow}<row r="2"><c r="A2"><v>1</v></c>${cell}</row>`,
  });
  return sheet.rows[0]?.cells.numerator;
}

describe("a workbook by an ordinary program", () => {
  it("reads text, numbers, dates, formulas by their stored results, rich text, booleans and errors", async () => {
    const bytes = await exceljsBytes((workbook) => {
      const sheet = workbook.addWorksheet(" tallies ");
      sheet.addRow([
        "Note",
        "Ward ",
        "indicator",
        "MONTH",
        "Numerator",
        "Denominator",
        "not  collected",
        "Initials",
      ]);
      sheet.addRow([
        true,
        { richText: [{ text: "OS" }, { text: "I" }] },
        "FALLS",
        new Date(Date.UTC(2026, 10, 1)),
      ]);
      sheet.getCell("E2").value = { formula: "2*3", result: 6 };
      sheet.getCell("F2").value = { error: "#DIV/0!" };
      sheet.getCell("G2").value = { formula: 'UPPER("x")', result: "X" };
      sheet.getCell("H2").value = "DQ";
    });
    const sheet = readXlsxBytes(bytes);
    expect(sheet.sheetName).toBe(" tallies ");
    expect(sheet.columns.map(({ letter, readAs }) => [letter, readAs])).toEqual([
      ["A", "note"],
      ["B", "ward"],
      ["C", "indicator"],
      ["D", "month"],
      ["E", "numerator"],
      ["F", "denominator"],
      ["G", "notCollected"],
      ["H", null],
    ]);
    expect(sheet.rows).toEqual([
      {
        row: 2,
        cells: {
          ward: { type: "text", text: "OSI", ref: "B2" },
          indicator: { type: "text", text: "FALLS", ref: "C2" },
          month: { type: "date", year: 2026, month: 11, day: 1, ref: "D2" },
          numerator: { type: "number", value: 6, text: "6", ref: "E2" },
          denominator: { type: "error", text: "#DIV/0!", ref: "F2" },
          notCollected: { type: "text", text: "X", ref: "G2" },
          note: { type: "boolean", value: true, ref: "A2" },
        },
      },
    ]);
  });

  it("reads the value of merged cells in the top left one alone, and lives with validation of the whole sheet", async () => {
    const bytes = await exceljsBytes((workbook) => {
      const sheet = workbook.addWorksheet("Tallies");
      sheet.addRow(titles);
      sheet.addRow(["OSI", "FALLS", "2026-11", 1, 2]);
      sheet.getCell("A3").value = "TERN";
      sheet.mergeCells("A3:B4");
    });
    const sheet = readXlsxBytes(bytes);
    expect(sheet.rows.map(({ row, cells }) => [row, cells.ward.type, cells.indicator.type])).toEqual([
      [2, "text", "text"],
      [3, "text", "blank"],
    ]);
    const validated = readHandmade({
      rows: `${headingRow}<row r="2">${inlineCell("OSI")}</row>`,
      afterData:
        '<mergeCells><mergeCell ref="H1:XFD1048576"/></mergeCells>' +
        '<dataValidations><dataValidation type="whole" sqref="A1:XFD1048576"/></dataValidations>',
    });
    expect(validated.rows).toHaveLength(1);
  });

  it("counts months by the 1904 calendar where the workbook says so", async () => {
    const serial = '<c r="D2" s="2"><v>45961</v></c>';
    expect(numeratorOf(serial, { styles: dateStyles, workbookProperties: 'date1904="1"' })).toMatchObject({
      year: 2029,
      month: 11,
      day: 1,
    });
    expect(numeratorOf(serial, { styles: dateStyles })).toMatchObject({ year: 2025, month: 10, day: 31 });
  });
});

describe("cells", () => {
  it.each([
    [
      "a built-in date format",
      '<c r="D2" s="1"><v>61</v></c>',
      { type: "date", year: 1900, month: 3, day: 1 },
    ],
    [
      "the day that never was",
      '<c r="D2" s="1"><v>60</v></c>',
      { type: "date", year: 1900, month: 2, day: 29 },
    ],
    ["the first day", '<c r="D2" s="1"><v>1.5</v></c>', { type: "date", year: 1900, month: 1, day: 1 }],
    ["no day", '<c r="D2" s="1"><v>0</v></c>', { type: "number", value: 0 }],
    ["a day after the last", '<c r="D2" s="1"><v>2958466</v></c>', { type: "number", value: 2958466 }],
    [
      "a custom date format",
      '<c r="D2" s="2"><v>46327</v></c>',
      { type: "date", year: 2026, month: 11, day: 1 },
    ],
    ["a month format with a literal", '<c r="D2" s="3"><v>46327</v></c>', { type: "date", month: 11 }],
    ["a number format with the word days", '<c r="D2" s="4"><v>5</v></c>', { type: "number", value: 5 }],
    ["a length of time", '<c r="D2" s="5"><v>5</v></c>', { type: "number", value: 5 }],
    [
      "an ISO date",
      '<c r="D2" t="d"><v>2026-11-01T00:00:00</v></c>',
      { type: "date", year: 2026, month: 11, day: 1 },
    ],
    [
      "an ISO date that is none",
      '<c r="D2" t="d"><v>2026-02-30</v></c>',
      { type: "text", text: "2026-02-30" },
    ],
    ["a text result", '<c r="D2" t="str"><f>A1</f><v>n/a</v></c>', { type: "text", text: "n/a" }],
    ["an empty text result", '<c r="D2" t="str"><f>A1</f><v></v></c>', { type: "blank" }],
    ["a true result", '<c r="D2" t="b"><f>A1</f><v>1</v></c>', { type: "boolean", value: true }],
    ["an error result", '<c r="D2" t="e"><f>A1</f><v>#N/A</v></c>', { type: "error", text: "#N/A" }],
    ["a result that isn't stored", '<c r="D2"><f>2*3</f></c>', { type: "no-result" }],
    ["an empty result", '<c r="D2"><f>2*3</f><v/></c>', { type: "no-result" }],
    ["exponents", '<c r="D2"><v>1.8E3</v></c>', { type: "number", value: 1800 }],
    ["a shared string", '<c r="D2" t="s"><v>1</v></c>', { type: "text", text: "one two" }],
    ["escaped characters", '<c r="D2" t="s"><v>2</v></c>', { type: "text", text: "a\r_x0041_" }],
    ["nothing but spaces", '<c r="D2" t="inlineStr"><is><t>  </t></is></c>', { type: "blank" }],
    ["CDATA", '<c r="D2" t="str"><v><![CDATA[<6>]]></v></c>', { type: "text", text: "<6>" }],
  ])("reads %s", (_, cell, expected) => {
    const sharedStrings =
      "<si><t>zero</t></si><si><r><t>one </t></r><r><t>two</t></r><rPh><t>ignored</t></rPh></si>" +
      "<si><t>a_x000D__x005F_x0041_</t></si>";
    expect(numeratorOf(cell, { styles: dateStyles, sharedStrings })).toMatchObject({
      ...expected,
      ref: "D2",
    });
  });

  it("places cells and rows without names after the ones before them", () => {
    const sheet = readHandmade({
      rows:
        headingRow.replace(' r="1"', "") +
        `<row>${inlineCell("OSI")}<c r="C2" t="str"><v>2026-11</v></c><c><v>3</v></c></row><row r="5"/>` +
        `<row>${inlineCell("TERN")}</row>`,
    });
    expect(sheet.rows.map(({ row }) => row)).toEqual([2, 6]);
    expect(sheet.rows[0]?.cells.numerator).toMatchObject({ value: 3, ref: "D2" });
    expect(sheet.rows[0]?.cells.denominator).toEqual({ type: "blank", ref: "E2" });
  });

  it("reads names with prefixes, as some writers use them", () => {
    const prefixed = (xml: string) => xml.replace(/<(\/?)(?=[a-z])/gi, "<$1x:").replace("<x:?", "<?");
    const sheet = readHandmade({
      parts: {
        "xl/worksheets/sheet1.xml": prefixed(
          `<worksheet xmlns:x="x"><sheetData>${headingRow}<row r="2"><c r="A2" t="str"><v>OSI</v></c></row></sheetData></worksheet>`,
        ),
      },
    });
    expect(sheet.rows[0]?.cells.ward).toMatchObject({ text: "OSI" });
  });

  it("lists blank rows between filled ones and leaves out those at the end", () => {
    const ward = (row: number) => `<row r="${row}"><c r="A${row}"><v>1</v></c></row>`;
    const unused = '<row r="3"><c r="H3"><v>1</v></c></row>';
    const sheet = readHandmade({
      rows: `${headingRow}${ward(2)}${unused}${ward(5)}<row r="9"><c r="H9"><v>1</v></c></row>`,
    });
    expect(sheet.rows.map(({ row }) => row)).toEqual([2, 5]);
    expect(sheet.skippedRows).toEqual([3, 4]);
    expect(sheet.skippedRowCount).toBe(2);
  });

  it("marks text that is too long for a cell instead of cutting it in silence", () => {
    const cell = numeratorOf(`<c r="D2" t="str"><v>${"x".repeat(2001)}</v></c>`);
    expect(cell).toEqual({ type: "text", text: "x".repeat(2000), cut: true, ref: "D2" });
  });

  it("knows no cell of an optional column that isn't there", () => {
    const headings = titles.slice(0, 5).map(inlineCell).join("");
    const sheet = readHandmade({ rows: `<row r="1">${headings}</row><row r="2">${inlineCell("OSI")}</row>` });
    expect(sheet.rows[0]?.cells.note).toEqual({ type: "blank", ref: null });
  });
});

describe("which sheet", () => {
  const filled = `${headingRow}<row r="2">${inlineCell("OSI")}</row>`;

  it("takes the one called Tallies, even hidden, before any other", () => {
    const sheet = readHandmade({
      sheets: [
        { name: "Notes", data: "" },
        { name: "TALLIES ", state: "hidden", data: filled },
      ],
    });
    expect(sheet.sheetName).toBe("TALLIES ");
    expect(sheet.rows).toHaveLength(1);
  });

  it("takes the only one that can be seen", () => {
    const sheet = readHandmade({
      sheets: [
        { name: "Lists", state: "veryHidden", data: "" },
        { name: "Return", data: filled },
      ],
    });
    expect(sheet.sheetName).toBe("Return");
  });

  it("names the sheets where it can't choose", async () => {
    const sheets = ["May", "June"].map((name) => ({ name, data: filled }));
    const error = await refusalOf(() => readHandmade({ sheets }));
    expect(error.code).toBe("invalid");
    expect(error.message).toContain("“May”, “June”");
  });

  it("refuses a hidden sheet of another name, and two of that name", async () => {
    const hidden = await refusalOf(() =>
      readHandmade({ sheets: [{ name: "May", state: "hidden", data: filled }] }),
    );
    expect(hidden.message).toContain("none that can be seen");
    const twice = ["Tallies", "tallies "].map((name) => ({ name, data: filled }));
    expect((await refusalOf(() => readHandmade({ sheets: twice }))).code).toBe("invalid");
  });
});

describe("headings", () => {
  const sheetWith = (headings: string[]) => `<row r="1">${headings.map(inlineCell).join("")}</row>`;

  it("says which columns are missing", async () => {
    const error = await refusalOf(() => readHandmade({ rows: sheetWith(["Ward", "Month", "Numerator"]) }));
    expect(error.code).toBe("invalid");
    expect(error.errors.map(({ message }) => message)).toEqual([
      "There is no column headed “Indicator” in row 1.",
      "There is no column headed “Denominator” in row 1.",
    ]);
  });

  it("says which columns stand there twice", async () => {
    const error = await refusalOf(() =>
      readHandmade({ rows: sheetWith([...titles, " WARD", "Extra", "Extra"]) }),
    );
    expect(error.errors).toEqual([
      { path: "H1", message: "Columns A and H are both headed “Ward”. Keep one of them." },
    ]);
  });

  it("refuses a sheet with nothing in row 1", async () => {
    const error = await refusalOf(() => readHandmade({ rows: headingRow.replace('r="1"', 'r="2"') }));
    expect(error.message).toContain("Row 1 holds no column headings");
    expect((await refusalOf(() => readHandmade({ rows: "" }))).code).toBe("invalid");
  });

  it("takes __proto__ and the like for a column that isn't used", () => {
    const sheet = readXlsxBytes(buildXlsx({ rows: sheetWith(["__proto__", "constructor", ...titles]) }));
    expect(sheet.columns.slice(0, 2)).toEqual([
      { letter: "A", header: "__proto__", readAs: null },
      { letter: "B", header: "constructor", readAs: null },
    ]);
  });

  it("lists no more than fifty columns that aren't used", () => {
    const many = Array.from({ length: 300 }, (_, index) => `Extra ${index}`);
    expect(readHandmade({ rows: sheetWith([...many, ...titles]) }).columns).toHaveLength(57);
  });
});
