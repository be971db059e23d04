import type { CellContent } from "./raw-rows";

/** Formats that have a number instead of a code in the file and show a calendar date (not a time alone). */
const BUILT_IN_DATE_FORMATS = new Set([
  14, 15, 16, 17, 22, 27, 28, 29, 30, 31, 36, 50, 51, 52, 53, 54, 55, 56, 57, 58,
]);
/** 31 December 9999. */
const LAST_SERIAL = 2_958_465;
/** Days from 1 January 1900 to 1 January 1904 as counted by the programs, which believe in 29 February 1900. */
const DAYS_TO_1904 = 1462;

/** True where a number in this format is shown as a calendar date. `formats` holds the workbook's own codes. */
export function isDateFormat(formatId: number, formats: ReadonlyMap<number, string>): boolean {
  const code = formats.get(formatId);
  return code === undefined ? BUILT_IN_DATE_FORMATS.has(formatId) : isDateCode(code);
}

/** Judges the first section of a format code by its letters; literals, colours and locales don't count. */
function isDateCode(code: string): boolean {
  const bare = code
    .slice(0, 500)
    .toLowerCase()
    .replace(/"[^"]*"|\\.|_.|\*./g, "");
  if (/\[(h+|m+|s+)\]/.test(bare)) return false;
  const section = bare.replace(/\[[^\]]*\]/g, "").split(";")[0] ?? "";
  if (/general/.test(section)) return false;
  if (/[yd]/.test(section)) return true;
  return section.includes("m") && !/[hs]/.test(section);
}

/**
 * The calendar date of a serial day number, worked out in UTC; null where there is none. Serial 60 is 29 February
 * 1900, a day that never was but that the programs show.
 */
export function dateFromSerial(
  serial: number,
  is1904: boolean,
): Extract<CellContent, { type: "date" }> | null {
  const days = Math.floor(serial) + (is1904 ? DAYS_TO_1904 : 0);
  if (!(days >= 1 && days <= LAST_SERIAL)) return null;
  if (days === 60) return { type: "date", year: 1900, month: 2, day: 29 };
  const date = new Date(Date.UTC(1900, 0, days < 60 ? days : days - 1));
  return { type: "date", year: date.getUTCFullYear(), month: date.getUTCMonth() + 1, day: date.getUTCDate() };
}

/** The calendar date of an ISO 8601 text such as `2026-11-01` or `2026-11-01T00:00:00`; null for anything else. */
export function dateFromIso(text: string): Extract<CellContent, { type: "date" }> | null {
  const match = /^(\d{4})-(\d{2})-(\d{2})(?:[T ]\d{2}:\d{2}(?::\d{2}(?:\.\d+)?)?Z?)?$/.exec(text.trim());
  if (!match) return null;
  const [year, month, day] = [Number(match[1]), Number(match[2]), Number(match[3])];
  return isCalendarDate(year, month, day) ? { type: "date", year, month, day } : null;
}

export function isCalendarDate(year: number, month: number, day: number): boolean {
  const date = new Date(Date.UTC(year, month - 1, day));
  return date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
}
