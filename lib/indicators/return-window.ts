import type { OpenMonths } from "./assigned-months";
import type { Month } from "./month";

/** A ward has a return for every month that has begun and in which it is open. */
export function hasReturn(ward: OpenMonths, month: Month, thisMonth: Month): boolean {
  return month <= thisMonth && month >= ward.openFrom && (ward.openTo === null || month <= ward.openTo);
}
