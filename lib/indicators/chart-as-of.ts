import { dateInZone } from "./month";

const HOUR = 3_600_000;
/** No time zone is further than this from UTC. */
const WIDEST_OFFSET = 15 * HOUR;

/**
 * The last millisecond of a calendar date (`YYYY-MM-DD`) in a time zone (IANA name): a chart "as known on" a day
 * holds everything that was known by its end. Days of 23 or 25 hours come out right, as the zone itself is asked.
 */
export function endOfDate(date: string, timeZone: string): Date {
  const midnight = new Date(`${date}T00:00:00.000Z`).getTime();
  let inside = midnight - WIDEST_OFFSET;
  let after = midnight + 24 * HOUR + WIDEST_OFFSET;
  while (after - inside > 1) {
    const middle = Math.floor((inside + after) / 2);
    if (dateInZone(new Date(middle), timeZone) <= date) inside = middle;
    else after = middle;
  }
  return new Date(inside);
}

/**
 * The instant that "as known on" means: the end of a date, or this moment where the date is today, or the given
 * instant itself. Null for what lies ahead.
 */
export function instantAsOf(asOf: string, now: Date, timeZone: string): Date | null {
  if (asOf.length > 10) {
    const instant = new Date(asOf);
    return instant <= now ? instant : null;
  }
  if (asOf > dateInZone(now, timeZone)) return null;
  const end = endOfDate(asOf, timeZone);
  return end <= now ? end : now;
}
