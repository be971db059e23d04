import "server-only";
import { setImmediate as nextTurn } from "node:timers/promises";

/** Items handled between two looks at the event loop. */
export const ROWS_PER_TURN = 2_000;

/** Hands the items over in slices, so that others are answered between them. */
export async function inTurns<Item>(
  items: readonly Item[],
  work: (slice: readonly Item[]) => void | Promise<void>,
  size = ROWS_PER_TURN,
): Promise<void> {
  for (let start = 0; start < items.length; start += size) {
    if (start > 0) await nextTurn();
    await work(items.slice(start, start + size));
  }
}
