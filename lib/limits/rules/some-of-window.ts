import { codeAt, flagAt } from "../columns";
import { noHits, type RuleHits } from "./rule-hits";

/**
 * "2 of 3" and "4 of 5": complete at a point that is itself beyond and makes `needed` points beyond on its side among
 * the last `window` ones. Near the start fewer points than the window suffice once the count is reached.
 *
 * @param codes -1, 0 or 1 a position: beyond the line in question. @param restarts of the same order.
 * The evidence begins at the earliest point of the window that counts.
 * Source: Western Electric (1956) Statistical Quality Control Handbook, tests for unnatural patterns.
 */
export function someOfWindow(
  codes: Int8Array,
  restarts: Uint8Array,
  needed: number,
  window: number,
): RuleHits {
  const hits = noHits(codes.length);
  let start = 0;
  for (let position = 0; position < codes.length; position += 1) {
    if (flagAt(restarts, position) === 1) start = position;
    const side = codeAt(codes, position);
    if (side === 0) continue;
    const earliest = Math.max(start, position - window + 1);
    let found = 0;
    let first = position;
    for (let back = position; back >= earliest; back -= 1) {
      if (codeAt(codes, back) !== side) continue;
      found += 1;
      first = back;
    }
    if (found < needed) continue;
    hits.sides[position] = side;
    hits.firsts[position] = first;
  }
  return hits;
}
