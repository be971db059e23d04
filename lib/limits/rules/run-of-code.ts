import { codeAt, flagAt } from "../columns";
import { noHits, type RuleHits } from "./rule-hits";

/**
 * Runs of one code: complete at every point that ends `length` or more consecutive points of the same code. Code 0
 * (on the centre line, inside the limits) ends a run. Length 1 finds the points themselves and joins neighbours.
 *
 * Serves "beyond an action limit" (length 1), "8 on one side of the centre" and "15 within one sigma".
 * @param codes -1, 0 or 1 a position. @param restarts of the same order.
 * Source: Western Electric (1956) Statistical Quality Control Handbook, tests for unnatural patterns.
 */
export function runOfCode(codes: Int8Array, restarts: Uint8Array, length: number): RuleHits {
  const hits = noHits(codes.length);
  let first = 0;
  let previous = 0;
  for (let position = 0; position < codes.length; position += 1) {
    const code = codeAt(codes, position);
    if (code !== previous || flagAt(restarts, position) === 1) first = position;
    previous = code;
    if (code === 0 || position - first + 1 < length) continue;
    hits.sides[position] = code;
    hits.firsts[position] = first;
  }
  return hits;
}
