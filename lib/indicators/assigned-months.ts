import type { Month } from "./month";

export interface OpenMonths {
  openFrom: Month;
  openTo: Month | null;
}

export interface AssignedMonths {
  fromMonth: Month;
  toMonth: Month | null;
}

/** Months in which a ward reports an indicator: assigned, and the ward open. Null ends are open. */
export function reportedMonths(
  ward: OpenMonths,
  assigned: AssignedMonths,
): { from: Month; to: Month | null } {
  const from = assigned.fromMonth > ward.openFrom ? assigned.fromMonth : ward.openFrom;
  const ends = [assigned.toMonth, ward.openTo].filter((month) => month !== null).sort();
  return { from, to: ends[0] ?? null };
}

export function isReportedIn(ward: OpenMonths, assigned: AssignedMonths, month: Month): boolean {
  const { from, to } = reportedMonths(ward, assigned);
  return month >= from && (to === null || month <= to);
}
