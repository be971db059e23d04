import "server-only";
import { sql, type SQL } from "drizzle-orm";
import type { Month } from "@/lib/indicators/month";

/** One line of one month. */
export interface TallyKey {
  wardId: string;
  indicatorId: string;
  month: Month;
}

/** Keys a statement, so that one never blocks the embedded database for long. */
const CHUNK = 5_000;

/** The keys as a table `k(ward_id, indicator_id, month)`: one parameter, however many there are. */
export function keyTable(keys: readonly TallyKey[]): SQL {
  const json = JSON.stringify(
    keys.map((key) => ({ ward_id: key.wardId, indicator_id: key.indicatorId, month: key.month })),
  );
  return sql`json_to_recordset(${json}::json) as k(ward_id uuid, indicator_id uuid, month text)`;
}

/** Does the work chunk by chunk, with a look at the event loop between. */
export async function inChunks<Item>(
  items: readonly Item[],
  work: (chunk: Item[]) => Promise<void>,
): Promise<void> {
  for (let start = 0; start < items.length; start += CHUNK) {
    if (start > 0) await new Promise((resolve) => setImmediate(resolve));
    await work(items.slice(start, start + CHUNK));
  }
}
