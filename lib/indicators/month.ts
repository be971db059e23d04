/** A calendar month as `YYYY-MM`. Branded, so that no other text passes for one. */
export type Month = string & { readonly __brand: "Month" };

/** A calendar quarter as `YYYY-Qn`. */
export type Quarter = string & { readonly __brand: "Quarter" };

const MONTH_PATTERN = /^(19|20|21)\d{2}-(0[1-9]|1[0-2])$/;

export function isMonth(text: string): text is Month {
  return MONTH_PATTERN.test(text);
}

/** The month, or null where the text is not plainly `YYYY-MM` between 1900 and 2199. */
export function parseMonth(text: string): Month | null {
  return isMonth(text) ? text : null;
}

/** For text that is known to be a month (from the database or a constant); throws RangeError otherwise. */
export function asMonth(text: string): Month {
  if (!isMonth(text)) throw new RangeError(`Not a month: ${text.slice(0, 20)}`);
  return text;
}

/** Months since year 0: differences are numbers of calendar months. */
export function monthIndex(month: Month): number {
  return Number(month.slice(0, 4)) * 12 + Number(month.slice(5, 7)) - 1;
}

export function monthFromIndex(index: number): Month {
  const year = Math.floor(index / 12);
  return asMonth(`${year}-${String((index % 12) + 1).padStart(2, "0")}`);
}

export function addMonths(month: Month, count: number): Month {
  return monthFromIndex(monthIndex(month) + count);
}

/** Calendar months from `from` to `to`: 0 for the same month, negative where `to` is earlier. */
export function monthsBetween(from: Month, to: Month): number {
  return monthIndex(to) - monthIndex(from);
}

/** All months from `from` to `to`, both included; empty where `to` is earlier. */
export function monthRange(from: Month, to: Month): Month[] {
  const first = monthIndex(from);
  const count = Math.max(0, monthIndex(to) - first + 1);
  return Array.from({ length: count }, (_, offset) => monthFromIndex(first + offset));
}

/** Months sort as text, since the year comes first. */
export function compareMonths(left: Month, right: Month): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

export function quarterOf(month: Month): Quarter {
  return `${month.slice(0, 4)}-Q${Math.floor((Number(month.slice(5, 7)) - 1) / 3) + 1}` as Quarter;
}

/** The month that an instant falls in, by the hospital's time zone (IANA name). */
export function monthInZone(instant: Date, timeZone: string): Month {
  return asMonth(dateInZone(instant, timeZone).slice(0, 7));
}

/** The calendar date `YYYY-MM-DD` of an instant in a time zone (IANA name). */
export function dateInZone(instant: Date, timeZone: string): string {
  const parts = dateFormat(timeZone).formatToParts(instant);
  const part = (type: string) => parts.find((each) => each.type === type)?.value ?? "";
  return `${part("year")}-${part("month")}-${part("day")}`;
}

const formats = new Map<string, Intl.DateTimeFormat>();

/** Formats are costly to make and asked for with every request, so one is kept per zone. */
function dateFormat(timeZone: string): Intl.DateTimeFormat {
  let format = formats.get(timeZone);
  if (!format) {
    format = new Intl.DateTimeFormat("en-GB", {
      timeZone,
      year: "numeric",
      month: "2-digit",
      day: "2-digit",
    });
    formats.set(timeZone, format);
  }
  return format;
}

/** Last calendar date of the month, `YYYY-MM-DD`. */
export function lastDayOf(month: Month): string {
  const next = addMonths(month, 1);
  const last = new Date(Date.UTC(Number(next.slice(0, 4)), Number(next.slice(5, 7)) - 1, 0));
  return last.toISOString().slice(0, 10);
}
