import { at, isPlotted } from "./columns";
import { RELATIVE_SLACK } from "./constants";
import { countSigma } from "./count-sigma";
import { lowerTail, upperTail } from "./count-tails";
import { requirePositive, requireTailArea } from "./guards";
import { normalQuantile } from "./normal-quantile";
import { emptyLimits, type LimitColumns } from "./p-chart";
import type { CountColumns, CountModel, Side } from "./types";

/**
 * An exact limit of a month, as a count: the last count that is still inside.
 *
 * @param model binomial or Poisson. @param denominator above 0; a whole number where binomial.
 * @param centre rate of the centre line. @param tail one-sided tail area α, between 0 and 1.
 * Formula: lower L = smallest x with P(X ≤ x) ≥ α; upper U = smallest x with P(X > x) ≤ α, the upper tail
 * computed directly. Outside: x < L or x > U. A tail equal to α but for rounding counts as α.
 * Method: a normal guess corrected for skewness, then a search on the exact tail.
 * Source: definition; guess by Cornish EA, Fisher RA (1938). Errors: RangeError on arguments outside their domain.
 */
export function exactLimit(
  model: CountModel,
  side: Side,
  denominator: number,
  centre: number,
  tail: number,
): number {
  requirePositive("denominator", denominator);
  requireTailArea("tail", tail);
  const most = model === "binomial" ? denominator : Infinity;
  let inside = Math.min(most, guess(model, side, denominator, centre, tail));
  let outside = inside - 1;
  let step = 1;
  if (reaches(model, side, inside, denominator, centre, tail)) {
    while (outside >= 0 && reaches(model, side, outside, denominator, centre, tail)) {
      inside = outside;
      step *= 2;
      outside = Math.max(-1, inside - step);
    }
  } else {
    do {
      outside = inside;
      inside = Math.min(most, outside + step);
      step *= 2;
    } while (!reaches(model, side, inside, denominator, centre, tail));
  }
  while (inside - outside > 1) {
    const middle = Math.floor((inside + outside) / 2);
    if (reaches(model, side, middle, denominator, centre, tail)) inside = middle;
    else outside = middle;
  }
  return inside;
}

/** Whether the count x satisfies the inequality that defines the limit; monotone in x. */
function reaches(
  model: CountModel,
  side: Side,
  x: number,
  denominator: number,
  centre: number,
  tail: number,
): boolean {
  return side === "lower"
    ? lowerTail(model, x, denominator, centre) >= tail * (1 - RELATIVE_SLACK)
    : upperTail(model, x + 1, denominator, centre) <= tail * (1 + RELATIVE_SLACK);
}

function guess(model: CountModel, side: Side, denominator: number, centre: number, tail: number): number {
  const expected = denominator * centre;
  const z = normalQuantile(side === "lower" ? tail : 1 - tail);
  const skew = model === "binomial" ? 1 - 2 * centre : 1;
  const size = expected + z * countSigma(model, expected, centre) + ((z * z - 1) * skew) / 6;
  return Math.max(0, Math.floor(size));
}

/**
 * Exact limits of every month and the months' verdicts against them.
 *
 * @param counts columns of the series. @param into limits as rates (count / denominator). @param verdicts -1 below,
 * 1 above, 0 inside. Both are filled in [start, end) where a month is plotted.
 * Months of one denominator share one search. Formula, source and errors: `exactLimit`.
 */
export function markExactLimits(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  tail: number,
  verdicts: Int8Array,
  into: LimitColumns = emptyLimits(verdicts.length),
  start = 0,
  end = verdicts.length,
): LimitColumns {
  const lowerBySize = new Map<number, number>();
  const upperBySize = new Map<number, number>();
  for (let slot = start; slot < end; slot += 1) {
    const denominator = at(counts.denominators, slot);
    const numerator = at(counts.numerators, slot);
    if (!isPlotted(numerator, denominator)) continue;
    let lower = lowerBySize.get(denominator);
    let upper = upperBySize.get(denominator);
    if (lower === undefined || upper === undefined) {
      lower = exactLimit(model, "lower", denominator, centre, tail);
      upper = exactLimit(model, "upper", denominator, centre, tail);
      lowerBySize.set(denominator, lower);
      upperBySize.set(denominator, upper);
    }
    into.lower[slot] = lower / denominator;
    into.upper[slot] = upper / denominator;
    verdicts[slot] = numerator < lower ? -1 : numerator > upper ? 1 : 0;
  }
  return into;
}
