import { parseMonth, type Month } from "@/lib/indicators/month";
import type { RawCell } from "./raw-rows";
import type { CellReading } from "./read-count";
import { rowMessages } from "./row-messages";
import { dateFromIso, isCalendarDate } from "./sheet-dates";

const MONTH_NAMES = [
  "january",
  "february",
  "march",
  "april",
  "may",
  "june",
  "july",
  "august",
  "september",
  "october",
  "november",
  "december",
];

/** A cell as a month: a date in it, or text that can be read as one month only. */
export function readMonth(cell: RawCell): CellReading<Month | null> {
  switch (cell.type) {
    case "blank":
      return { value: null, message: rowMessages.blank("month") };
    case "date":
      return fromOnly([monthOf(cell.year, cell.month)], `${cell.year}-${cell.month}-${cell.day}`);
    case "number":
      return { value: null, message: rowMessages.notMonth(cell.text) };
    case "text":
      return fromOnly(monthsMeant(cell.text.trim()), cell.text);
    case "boolean":
      return { value: null, message: rowMessages.notMonth(cell.value ? "TRUE" : "FALSE") };
    case "error":
      return { value: null, message: rowMessages.sheetError(cell.text) };
    case "no-result":
      return { value: null, message: rowMessages.noResult };
  }
}

function fromOnly(meant: (Month | null)[], text: string): CellReading<Month | null> {
  const months = [...new Set(meant.filter((month) => month !== null))];
  if (months.length > 1) return { value: null, message: rowMessages.monthTwoReadings(text) };
  const [month] = months;
  return month === undefined ? { value: null, message: rowMessages.notMonth(text) } : { value: month };
}

/** Every month that the text could mean; years always have four digits. */
function monthsMeant(text: string): (Month | null)[] {
  const yearFirst = /^(\d{4})[-/.](\d{1,2})$/.exec(text);
  if (yearFirst) return [monthOf(Number(yearFirst[1]), Number(yearFirst[2]))];
  const monthFirst = /^(\d{1,2})[-/.](\d{4})$/.exec(text);
  if (monthFirst) return [monthOf(Number(monthFirst[2]), Number(monthFirst[1]))];
  const iso = dateFromIso(text);
  if (iso) return [monthOf(iso.year, iso.month)];
  const date = /^(\d{1,2})([-/.])(\d{1,2})\2(\d{4})$/.exec(text);
  if (date) return monthsOfDate(Number(date[4]), Number(date[1]), Number(date[3]));
  const named = /^([a-z]{3,9})\.?[ -](\d{4})$/i.exec(text);
  return named ? [monthOf(Number(named[2]), monthNumber(named[1] ?? ""))] : [];
}

/** A day with numbers only may have its day or its month first; both readings count where they are dates. */
function monthsOfDate(year: number, first: number, second: number): (Month | null)[] {
  const readings = [
    { day: first, month: second },
    { day: second, month: first },
  ];
  return readings
    .filter(({ day, month }) => isCalendarDate(year, month, day))
    .map(({ month }) => monthOf(year, month));
}

/** 1 to 12 for a full English name or one cut to three letters (four for Sept), 0 for anything else. */
function monthNumber(name: string): number {
  const plain = name.toLowerCase();
  const cut = plain === "sept" ? "sep" : plain;
  return MONTH_NAMES.findIndex((month) => month === cut || month.slice(0, 3) === cut) + 1;
}

function monthOf(year: number, month: number): Month | null {
  return parseMonth(`${String(year).padStart(4, "0")}-${String(month).padStart(2, "0")}`);
}
