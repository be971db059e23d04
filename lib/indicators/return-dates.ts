import { longMonth, shortMonth } from "./chart-format";
import { dateInZone } from "./month";

const weekdays = ["Sunday", "Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday"] as const;

const monthName = (date: string): string => longMonth(date.slice(0, 7)).slice(0, -5);

const dayNumber = (date: string): string => String(Number(date.slice(8, 10)));

function weekdayOf(date: string): string {
  return weekdays[new Date(`${date}T00:00:00Z`).getUTCDay()] ?? "";
}

/** "2026-12-10" as "Thursday 10 December". */
export function dayInWords(date: string): string {
  return `${weekdayOf(date)} ${dayNumber(date)} ${monthName(date)}`;
}

/** "2026-12-10" as "Thu 10 Dec". */
export function shortDay(date: string): string {
  return `${weekdayOf(date).slice(0, 3)} ${dayNumber(date)} ${shortMonth(date.slice(0, 7))}`;
}

/** "November", of "2026-11". */
export function monthAlone(month: string): string {
  return longMonth(month).slice(0, -5);
}

/** An instant (ISO 8601) as the hospital's clock showed it: "10:17". */
export function clockTime(instant: string, timeZone: string): string {
  return new Intl.DateTimeFormat("en-GB", {
    timeZone,
    hour: "2-digit",
    minute: "2-digit",
    hour12: false,
  }).format(new Date(instant));
}

/** "Tuesday 8 December, 09:26". */
export function instantInWords(instant: string, timeZone: string): string {
  return `${dayInWords(dateInZone(new Date(instant), timeZone))}, ${clockTime(instant, timeZone)}`;
}

/** "2 Sep 2026, 09:12", for tables. */
export function tableInstant(instant: string, timeZone: string): string {
  const date = dateInZone(new Date(instant), timeZone);
  return `${dayNumber(date)} ${shortMonth(date.slice(0, 7))} ${date.slice(0, 4)}, ${clockTime(instant, timeZone)}`;
}
