/** What a count is against the same ward's earlier months. Both sides are told apart alike, so that nobody counts towards one. */
export type UsualVerdict = "within" | "above" | "below" | "well-above" | "well-below";

export interface UsualRange {
  least: number;
  most: number;
  months: number;
}

/** Earlier months that a count is compared with. */
export const COMPARED_MONTHS = 7;

/** Least and greatest of the earlier counts, blanks left out; null where there are fewer than three. */
export function usualRange(counts: readonly (number | null)[]): UsualRange | null {
  const known = counts.filter((count) => count !== null);
  if (known.length < 3) return null;
  return { least: Math.min(...known), most: Math.max(...known), months: known.length };
}

/**
 * Where a count lies: "well" above is more than twice the greatest earlier count plus one, "well" below less than
 * half of the least minus one. A rule of thumb for typing slips, not a limit: it knows nothing of denominators.
 */
export function compareWithUsual(count: number, { least, most }: UsualRange): UsualVerdict {
  if (count > 2 * most + 1) return "well-above";
  if (count < (least - 1) / 2) return "well-below";
  if (count > most) return "above";
  return count < least ? "below" : "within";
}
