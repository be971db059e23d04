/** The columns of a sheet of tallies, in the order in which they are written. */
export const tallyColumns = [
  { key: "ward", title: "Ward", required: true },
  { key: "indicator", title: "Indicator", required: true },
  { key: "month", title: "Month", required: true },
  { key: "numerator", title: "Numerator", required: true },
  { key: "denominator", title: "Denominator", required: true },
  { key: "notCollected", title: "Not collected", required: false },
  { key: "note", title: "Note", required: false },
] as const;

export type TallyColumn = (typeof tallyColumns)[number]["key"];

export const TALLIES_SHEET = "Tallies";

/** Names are matched without regard to case, outer spaces and how many spaces stand between words. */
export function plainName(text: string): string {
  return text.trim().replace(/\s+/g, " ").toLowerCase();
}

export function columnTitle(key: TallyColumn): string {
  return tallyColumns.find((column) => column.key === key)?.title ?? key;
}
