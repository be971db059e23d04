import { at, codeAt, indexAt } from "../columns";
import { sideChance } from "../joint-chance";
import { isSmallCount } from "../settle-method";
import type { CountModel } from "../types";
import type { PlottedOrder } from "./plotted-order";
import type { RuleHits } from "./rule-hits";

/**
 * Takes hits of a run on one side away where small counts make such a run easy: a run with a small month in it counts
 * only once the product of its months' exact chances of that side is at most 2^(−length), which is 1/256 for a run
 * of 8 and what the same run would have where both sides are equally likely. A run that has once counted goes on.
 *
 * @param hits of `runOfCode` on the sides of the centre, changed in place. @param denominators column of the series.
 * Small is meant on both ends (n·p̄ or n·(1 − p̄) below 5), as in the choice of exact limits: near 100 % it is the
 * months below which are rare and a run above that is easy. Source: a guard of Ebbline's own.
 */
export function guardSmallCounts(
  hits: RuleHits,
  order: PlottedOrder,
  model: CountModel,
  denominators: Float64Array,
  centre: number,
  length: number,
): void {
  if (!hasSmallMonthIn(order, model, denominators, centre)) return;
  const bound = 2 ** -length;
  let first = -1;
  let next = 0;
  let product = 1;
  let hasSmallMonth = false;
  let hasCounted = false;
  for (let position = 0; position < hits.sides.length; position += 1) {
    const side = codeAt(hits.sides, position);
    if (side === 0) continue;
    if (indexAt(hits.firsts, position) !== first) {
      first = indexAt(hits.firsts, position);
      next = first;
      product = 1;
      hasSmallMonth = false;
      hasCounted = false;
    }
    for (; next <= position; next += 1) {
      const denominator = at(denominators, indexAt(order.slots, next));
      hasSmallMonth ||= isSmallCount(model, denominator, centre);
      product *= sideChance(model, side > 0 ? "upper" : "lower", denominator, centre);
    }
    hasCounted ||= !hasSmallMonth || product <= bound;
    if (!hasCounted) hits.sides[position] = 0;
  }
}

/** Spares the exact chances of series that have no small month at all. */
function hasSmallMonthIn(
  { slots }: PlottedOrder,
  model: CountModel,
  denominators: Float64Array,
  centre: number,
): boolean {
  for (const slot of slots) if (isSmallCount(model, at(denominators, slot), centre)) return true;
  return false;
}
