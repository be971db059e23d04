import { at, flagAt } from "../columns";
import { RELATIVE_SLACK } from "../constants";
import { noHits, type RuleHits } from "./rule-hits";

/**
 * Trends: complete at every point that ends `length` or more consecutive points which all rise, or all fall.
 * Equal neighbours (but for rounding) end a trend. Rising is the upper side, falling the lower.
 *
 * @param z standardised value a position. @param restarts of the same order. @param length points, not steps.
 * Source: Nelson LS (1984) Journal of Quality Technology 16:237-239, test 3.
 */
export function trend(z: Float64Array, restarts: Uint8Array, length: number): RuleHits {
  const hits = noHits(z.length);
  let first = 0;
  let direction = 0;
  for (let position = 1; position < z.length; position += 1) {
    const step = flagAt(restarts, position) === 1 ? 0 : stepDirection(at(z, position - 1), at(z, position));
    if (step === 0) first = position;
    else if (step !== direction) first = position - 1;
    direction = step;
    if (step === 0 || position - first + 1 < length) continue;
    hits.sides[position] = step;
    hits.firsts[position] = first;
  }
  return hits;
}

function stepDirection(from: number, to: number): number {
  const slack = RELATIVE_SLACK * Math.max(Math.abs(from), Math.abs(to));
  return Math.abs(to - from) <= slack ? 0 : Math.sign(to - from);
}
