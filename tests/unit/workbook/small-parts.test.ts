import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { columnLetter, parseCellName } from "@/lib/workbook/cell-names";
import { crc32 } from "@/lib/workbook/crc32";
import { cutText } from "@/lib/workbook/cut-text";
import { decodeExcelText, encodeExcelText } from "@/lib/workbook/excel-text";
import { guardText, unguardText } from "@/lib/workbook/formula-guard";
import { isDateFormat } from "@/lib/workbook/sheet-dates";

describe("formula guard", () => {
  it.each(["=1", "+1", "-1", "@x", "\tx", "\rx", "\n=x", "'=1", "''-1", "＝1"])("guards %j", (written) => {
    expect(guardText(written)).toBe(`'${written}`);
  });

  it.each(["a=1", "'tis", "", "'", " =1", "1-2"])("leaves %j alone", (written) => {
    expect(guardText(written)).toBe(written);
    expect(unguardText(written)).toBe(written);
  });

  it("is taken off exactly", () => {
    const tricky = fc.string({ unit: fc.constantFrom("'", "=", "-", "a", "\t") });
    fc.assert(
      fc.property(tricky, (written) => {
        expect(unguardText(guardText(written))).toBe(written);
      }),
    );
  });

  it("never lets text begin like a formula", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme" }), (written) => {
        expect(guardText(written)).not.toMatch(/^[=+\-@\t\r\n]/);
      }),
    );
  });
});

describe("text of workbooks", () => {
  it("comes back as it went, control characters included", () => {
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string({ unit: "binary" }),
          fc.string({ unit: fc.constantFrom("_", "x", "0", "4", "1", "\r") }),
        ),
        (written) => {
          expect(decodeExcelText(encodeExcelText(written))).toBe(written);
        },
      ),
    );
  });
});

describe("cell names", () => {
  it("go both ways", () => {
    fc.assert(
      fc.property(fc.nat(16_383), fc.integer({ min: 1, max: 1_048_576 }), (column, row) => {
        expect(parseCellName(`${columnLetter(column)}${row}`)).toEqual({ column, row });
      }),
    );
    expect(columnLetter(16_383)).toBe("XFD");
  });

  it.each(["", "A", "7", "A0", "XFE1", "A1048577", "AAAA1", "A-1", "R1C1"])("knows no cell %j", (name) => {
    expect(parseCellName(name)).toBeNull();
  });
});

describe("date formats", () => {
  it.each(["yyyy-mm", "mmm", "d/m/yyyy h:mm", "[$-409]mmmm\\ yy;@", "dd"])("takes %s for a date", (code) => {
    expect(isDateFormat(164, new Map([[164, code]]))).toBe(true);
  });

  it.each([
    "General",
    "0.00",
    "h:mm:ss",
    "mm:ss.0",
    "[mm]:ss",
    '0" days"',
    "#,##0;[Red]-#,##0",
    "0\\d",
    "@",
    "0_m",
  ])("doesn't take %s for one", (code) => {
    expect(isDateFormat(164, new Map([[164, code]]))).toBe(false);
  });

  it("knows the numbered ones, unless the workbook says otherwise", () => {
    expect([14, 17, 22].every((id) => isDateFormat(id, new Map()))).toBe(true);
    expect([0, 9, 18, 21, 45, 49].some((id) => isDateFormat(id, new Map()))).toBe(false);
    expect(isDateFormat(14, new Map([[14, "0"]]))).toBe(false);
  });
});

describe("cut text", () => {
  it("stays on one line and within its length", () => {
    expect(cutText("a\n b\u202E  c")).toBe("a b c");
    expect(cutText("x".repeat(40))).toBe("x".repeat(40));
    expect(cutText("x".repeat(41))).toBe(`${"x".repeat(40)}…`);
    expect(cutText("😀".repeat(50), 3)).toBe("😀😀😀…");
  });
});

describe("checksum", () => {
  it("is the published check value, in one piece or several", () => {
    const bytes = new TextEncoder().encode("123456789");
    expect(crc32(bytes)).toBe(0xcbf43926);
    expect(crc32(bytes.subarray(4), crc32(bytes.subarray(0, 4)))).toBe(0xcbf43926);
  });
});
