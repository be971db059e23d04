import { addMonths, dateInZone, type Month } from "./month";

const SATURDAY = 6;
const SUNDAY = 0;

/**
 * The date on which a month's return is due: `dueDay` of the next month, moved on to the next day that is neither
 * a weekend nor one of the hospital's holidays (`YYYY-MM-DD`).
 */
export function dueDate(month: Month, dueDay: number, holidays: readonly string[]): string {
  const closed = new Set(holidays);
  const date = new Date(`${addMonths(month, 1)}-${String(dueDay).padStart(2, "0")}T00:00:00Z`);
  while (isWeekend(date) || closed.has(isoDate(date))) date.setUTCDate(date.getUTCDate() + 1);
  return isoDate(date);
}

/** Late is judged by calendar dates in the hospital's time zone: on the due day itself it is in time. */
export function isLate(dueOn: string, sentOn: string | null, today: string): boolean {
  return (sentOn ?? today) > dueOn;
}

export interface FirstSending {
  dueOn: string;
  /** The first sending, whatever was recalled afterwards; null while nothing was sent. */
  firstSubmittedAt: Date | null;
  acceptedAt: Date | null;
}

/**
 * Whether a return came late, or is late by `today` where it hasn't come. Sent and accepted in one act is history
 * brought in, which nobody was late with.
 */
export function cameLate(sending: FirstSending, timeZone: string, today: string): boolean {
  const { dueOn, firstSubmittedAt, acceptedAt } = sending;
  if (firstSubmittedAt !== null && firstSubmittedAt.getTime() === acceptedAt?.getTime()) return false;
  return isLate(dueOn, firstSubmittedAt ? dateInZone(firstSubmittedAt, timeZone) : null, today);
}

function isWeekend(date: Date): boolean {
  return date.getUTCDay() === SATURDAY || date.getUTCDay() === SUNDAY;
}

function isoDate(date: Date): string {
  return date.toISOString().slice(0, 10);
}
