import "server-only";
import { sql, type SQL } from "drizzle-orm";

/** One series: a ward's indicator. */
export interface SeriesKey {
  wardId: string;
  indicatorId: string;
}

export const keyOf = (pair: SeriesKey): string => `${pair.wardId} ${pair.indicatorId}`;

/** The pairs as a table `pair(ward_id, indicator_id)`: one parameter, however many there are. */
export function pairTable(pairs: readonly SeriesKey[]): SQL {
  const json = JSON.stringify(
    pairs.map((pair) => ({ ward_id: pair.wardId, indicator_id: pair.indicatorId })),
  );
  return sql`json_to_recordset(${json}::json) as pair(ward_id uuid, indicator_id uuid)`;
}

/** Each series once, in a fixed order, so that two transactions lock them alike. */
export function distinctPairs(pairs: readonly SeriesKey[]): SeriesKey[] {
  const byKey = new Map(pairs.map((pair) => [keyOf(pair), pair]));
  return [...byKey.keys()].sort().flatMap((key) => byKey.get(key) ?? []);
}
