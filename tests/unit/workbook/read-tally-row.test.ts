import { describe, expect, it } from "vitest";
import type { CellContent } from "@/lib/workbook/raw-rows";
import { formatRowMessage, readTallyRow } from "@/lib/workbook/read-tally-row";
import { number, rawRow, text } from "./fixtures";

const whole = {
  ward: text(" OSI "),
  indicator: text("FALLS"),
  month: text("2026-11"),
  numerator: number(6),
  denominator: number(804),
};
const read = (contents: Parameters<typeof rawRow>[0]) => readTallyRow(rawRow(contents));
const messagesOf = (contents: Parameters<typeof rawRow>[0]) => read(contents).messages.map(formatRowMessage);

describe("a row", () => {
  it("reads what it says", () => {
    expect(read({ ...whole, note: text("a note ") })).toEqual({
      row: 4,
      ward: "OSI",
      indicator: "FALLS",
      monthText: "2026-11",
      month: "2026-11",
      numerator: 6,
      denominator: 804,
      notCollected: null,
      note: "a note",
      messages: [],
      blank: false,
    });
  });

  it("takes zero for a count", () => {
    expect(read({ ...whole, numerator: number(0), denominator: number(0) })).toMatchObject({
      numerator: 0,
      denominator: 0,
      messages: [],
      blank: false,
    });
  });

  it("is not collected with a reason and no counts", () => {
    const reading = read({
      ...whole,
      numerator: { type: "blank" },
      denominator: { type: "blank" },
      notCollected: text("closed"),
    });
    expect(reading).toMatchObject({
      numerator: null,
      denominator: null,
      notCollected: "closed",
      messages: [],
      blank: false,
    });
  });

  it("is skipped, and says so, with neither counts nor a reason, whatever else is wrong", () => {
    const reading = read({ ward: text("OSI"), month: text("13/2026"), note: text("x") });
    expect(reading.blank).toBe(true);
    expect(reading.messages.map(formatRowMessage)).toEqual([
      "D4: Skipped: D and E are blank and no reason is given.",
    ]);
  });

  it.each(["numerator", "denominator"] as const)("never takes a blank %s for zero", (column) => {
    const cell = column === "numerator" ? "D4" : "E4";
    const reading = read({ ...whole, [column]: { type: "blank" } });
    expect(reading[column]).toBeNull();
    expect(reading.messages.map(formatRowMessage)).toEqual([
      `${cell}: ${cell[0]} is blank, and blank is not zero. Fill it in; or, if it wasn't collected, leave D and E blank and give a reason in F.`,
    ]);
  });

  it("can't have a reason beside a count", () => {
    expect(messagesOf({ ...whole, denominator: { type: "blank" }, notCollected: text("closed") })).toEqual([
      "F4: A reason for not collecting stands beside a count. Clear the reason, or leave D and E blank.",
    ]);
  });

  it("needs a ward, an indicator and a month", () => {
    expect(messagesOf({ numerator: number(1), denominator: number(2) })).toEqual([
      "A4: The ward is blank.",
      "B4: The indicator is blank.",
      "C4: The month is blank.",
    ]);
  });

  it("says what to do where the sheet has no column for reasons", () => {
    const raw = rawRow({ ...whole, numerator: text("n/a") });
    raw.cells.notCollected = { type: "blank", ref: null };
    expect(readTallyRow(raw).messages.map(formatRowMessage)).toEqual([
      "D4: “n/a” isn't a whole number. If it wasn't collected, leave D and E blank and give a reason in a column headed “Not collected”.",
    ]);
  });
});

describe("counts", () => {
  it.each<[string, CellContent, number]>([
    ["a number", number(804), 804],
    ["a number that 15 digits show as whole", number(6.000000000000001), 6],
    ["minus nothing", number(-0), 0],
    ["text of digits", text(" 007 "), 7],
    ["the largest", number(1_000_000_000), 1_000_000_000],
  ])("takes %s", (_, content, value) => {
    const reading = read({ ...whole, denominator: content });
    expect(reading.messages).toEqual([]);
    expect(Object.is(reading.denominator, value)).toBe(true);
  });

  const remedy = "If it wasn't collected, leave D and E blank and give a reason in F.";
  it.each<[CellContent, string]>([
    [text("n/a"), `“n/a” isn't a whole number. ${remedy}`],
    [text("0x10"), `“0x10” isn't a whole number. ${remedy}`],
    [text("1e3"), `“1e3” isn't a whole number. ${remedy}`],
    [text("six\u0000\n teen"), `“six teen” isn't a whole number. ${remedy}`],
    [text("y".repeat(300)), `“${"y".repeat(40)}…” isn't a whole number. ${remedy}`],
    [{ type: "boolean", value: true }, `“TRUE” isn't a whole number. ${remedy}`],
    [
      text("1,804"),
      "“1,804” can be read in more than one way. Write it without dots, commas or spaces: 1804.",
    ],
    [
      text("1.804"),
      "“1.804” can be read in more than one way. Write it without dots, commas or spaces: 1804.",
    ],
    [text("6.5"), "“6.5” isn't a whole number."],
    [number(6.5), "“6.5” isn't a whole number."],
    [number(-3), "“-3” is below zero. A count is 0 or more."],
    [text("-3"), "“-3” is below zero. A count is 0 or more."],
    [number(1e12), "“1000000000000” is too large for a count."],
    [text("99999999999"), "“99999999999” is too large for a count."],
    [
      { type: "date", year: 1900, month: 1, day: 6 },
      "This is a date, not a whole number. Format the cell as a number and type it again.",
    ],
    [
      { type: "error", text: "#REF!" },
      "“#REF!” is an error in the sheet. Put the formula right, or type the value.",
    ],
    [
      { type: "no-result" },
      "The formula's result is not stored in the file. Save the sheet in your spreadsheet program first.",
    ],
  ])("doesn't take %j", (content, message) => {
    const reading = read({ ...whole, numerator: content });
    expect(reading.numerator).toBeNull();
    expect(reading.messages).toEqual([{ cell: "D4", column: "numerator", message }]);
  });
});

describe("months", () => {
  it.each<[CellContent, string]>([
    [{ type: "date", year: 2026, month: 11, day: 30 }, "2026-11"],
    [text(" 2026-11 "), "2026-11"],
    [text("2026-3"), "2026-03"],
    [text("2026/03"), "2026-03"],
    [text("2026-11-01"), "2026-11"],
    [text("2026-11-01 00:00:00"), "2026-11"],
    [text("11/2026"), "2026-11"],
    [text("13/11/2026"), "2026-11"],
    [text("11/13/2026"), "2026-11"],
    [text("03.03.2026"), "2026-03"],
    [text("Nov 2026"), "2026-11"],
    [text("november-2026"), "2026-11"],
    [text("Sept. 2026"), "2026-09"],
  ])("takes %j", (content, month) => {
    expect(read({ ...whole, month: content })).toMatchObject({ month, messages: [] });
  });

  it.each<CellContent>([text("03/04/2026"), text("1.2.2026")])(
    "doesn't choose between the months of %j",
    (content) => {
      expect(messagesOf({ ...whole, month: content })).toEqual([
        `C4: “${content.type === "text" ? content.text : ""}” can be read as two months. Write it like 2026-11.`,
      ]);
    },
  );

  it.each([
    "13/2026",
    "2026-13",
    "2026-00",
    "31/11/2026",
    "2026-02-30",
    "Nov-26",
    "26-11",
    "Novem 2026",
    "202611",
    "2026",
    "1/2/26",
    "1850-01",
    "may",
  ])("doesn't take %s", (written) => {
    const reading = read({ ...whole, month: text(written) });
    expect(reading).toMatchObject({ month: null, monthText: written });
    expect(reading.messages).toEqual([
      { cell: "C4", column: "month", message: `“${written}” isn't a month. Write it like 2026-11.` },
    ]);
  });

  it.each<CellContent>([
    number(46327),
    { type: "date", year: 2500, month: 1, day: 1 },
    { type: "boolean", value: false },
    { type: "error", text: "#N/A" },
    { type: "no-result" },
  ])("doesn't take %j", (content) => {
    const reading = read({ ...whole, month: content });
    expect(reading.month).toBeNull();
    expect(reading.messages.map(({ cell }) => cell)).toEqual(["C4"]);
  });
});

describe("text", () => {
  it("takes codes made of digits", () => {
    expect(read({ ...whole, ward: number(7) })).toMatchObject({ ward: "7", messages: [] });
  });

  it.each<[CellContent, string]>([
    [
      { type: "text", text: "x".repeat(2000), cut: true },
      "The text is longer than 2,000 characters. Shorten it.",
    ],
    [text("a\u0007b"), "The text holds a character that can't be shown. Type it again."],
    [text("a\uD800b"), "The text holds a character that can't be shown. Type it again."],
    [
      { type: "date", year: 2026, month: 5, day: 1 },
      "This is a date, not a note. Format the cell as text and type it again.",
    ],
    [
      { type: "error", text: "#NAME?" },
      "“#NAME?” is an error in the sheet. Put the formula right, or type the value.",
    ],
  ])("doesn't take %j", (content, message) => {
    const reading = read({ ...whole, note: content });
    expect(reading.note).toBeNull();
    expect(reading.messages).toEqual([{ cell: "G4", column: "note", message }]);
  });

  it("shows a ward that a spreadsheet program turned into a date", () => {
    const reading = read({ ...whole, ward: { type: "date", year: 2026, month: 5, day: 1 } });
    expect(reading.ward).toBe("2026-05-01");
    expect(reading.messages[0]?.message).toContain("not a ward code");
  });
});
