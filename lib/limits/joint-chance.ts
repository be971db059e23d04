import { at, isPlotted } from "./columns";
import { RELATIVE_SLACK } from "./constants";
import { lowerTail, upperTail } from "./count-tails";
import type { CountColumns, CountModel, Side } from "./types";

/**
 * Exact probability that a month lies strictly on one side of the centre line, if its rate is the centre's.
 *
 * @param denominator above 0 (binomial: a whole number). @param centre rate of the centre line.
 * Formula: P(X > n·c) or P(X < n·c); a count on the centre itself belongs to neither side. An n·c that is whole but
 * for rounding is taken as whole. Source: definition. Errors: RangeError as the exact tails.
 */
export function sideChance(model: CountModel, side: Side, denominator: number, centre: number): number {
  const expected = denominator * centre;
  const nearest = Math.round(expected);
  const isWhole = Math.abs(expected - nearest) <= RELATIVE_SLACK * expected;
  if (side === "upper") {
    return upperTail(model, isWhole ? nearest + 1 : Math.ceil(expected), denominator, centre);
  }
  return lowerTail(model, isWhole ? nearest - 1 : Math.floor(expected), denominator, centre);
}

/**
 * Probability that all plotted months from `first` to `last` (slots, inclusive) lie on one side of the centre:
 * the product of their `sideChance`.
 */
export function runChance(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  side: Side,
  first: number,
  last: number,
): number {
  let product = 1;
  for (let slot = first; slot <= last; slot += 1) {
    const denominator = at(counts.denominators, slot);
    if (!isPlotted(at(counts.numerators, slot), denominator)) continue;
    product *= sideChance(model, side, denominator, centre);
  }
  return product;
}

export interface PooledChance {
  numerator: number;
  denominator: number;
  /** P(X ≤ numerator) and P(X ≥ numerator) of the months taken as one. */
  atMost: number;
  atLeast: number;
}

/**
 * The plotted months from `first` to `last` (slots, inclusive) taken as one month, with its exact chances; null
 * where none is plotted. Counts of one rate add up to a count of the same model, so the tails stay exact.
 */
export function pooledChance(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  first: number,
  last: number,
): PooledChance | null {
  let numerator = 0;
  let denominator = 0;
  for (let slot = first; slot <= last; slot += 1) {
    const size = at(counts.denominators, slot);
    if (!isPlotted(at(counts.numerators, slot), size)) continue;
    numerator += at(counts.numerators, slot);
    denominator += size;
  }
  if (denominator === 0) return null;
  return {
    numerator,
    denominator,
    atMost: lowerTail(model, numerator, denominator, centre),
    atLeast: upperTail(model, numerator, denominator, centre),
  };
}
