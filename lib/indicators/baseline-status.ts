import type { SegmentResult } from "@/lib/limits/types";
import type { BaselineStatus } from "./vocabulary";

/** Under this many plotted months, or expected events, limits from a decided baseline are provisional. */
export const ENOUGH_MONTHS = 20;
export const ENOUGH_EVENTS = 20;

/** How firm a segment's limits are: none without any plotted month, trial without a decided baseline. */
export function baselineStatusOf(isDecided: boolean, result: SegmentResult): BaselineStatus {
  if (result.baselineMonths === 0) return "none";
  if (!isDecided) return "trial";
  const isShort = result.baselineMonths < ENOUGH_MONTHS || result.baselineExpected < ENOUGH_EVENTS;
  return isShort ? "provisional" : "set";
}
