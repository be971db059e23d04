import { lastDayOf, type Month } from "./month";

/**
 * The date on which a month's outcome has had its time to show: month end plus `matureAfterDays`.
 * With 0 days it is the last day of the month.
 */
export function matureOn(month: Month, matureAfterDays: number): string {
  const end = new Date(`${lastDayOf(month)}T00:00:00Z`);
  end.setUTCDate(end.getUTCDate() + matureAfterDays);
  return end.toISOString().slice(0, 10);
}

/** Whether the month is complete on `today` (`YYYY-MM-DD` in the hospital's time zone). */
export function isMature(month: Month, matureAfterDays: number, today: string): boolean {
  return matureAfterDays === 0 || today >= matureOn(month, matureAfterDays);
}

/** Over, and its outcome has had its time: only then is the month judged. */
export function isComplete(month: Month, matureAfterDays: number, today: string): boolean {
  return hasEnded(month, today) && isMature(month, matureAfterDays, today);
}

/** Whether the month itself is over on `today`: its last day counts, since that is when wards add up. */
export function hasEnded(month: Month, today: string): boolean {
  return today >= lastDayOf(month);
}
