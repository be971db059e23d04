import { binomialLowerTail, binomialUpperTail } from "./binomial-tails";
import { requirePositive } from "./guards";
import { poissonLowerTail, poissonUpperTail } from "./poisson-tails";
import type { CountModel } from "./types";

/**
 * P(X ≤ x) of a month: binomial out of `denominator` with probability `rate`, or Poisson with mean
 * denominator·rate. Arguments and errors as in the two models' own files.
 */
export function lowerTail(model: CountModel, x: number, denominator: number, rate: number): number {
  return model === "binomial"
    ? binomialLowerTail(x, denominator, rate)
    : poissonLowerTail(x, denominator * rate);
}

/** P(X ≥ x) of a month; see `lowerTail`. */
export function upperTail(model: CountModel, x: number, denominator: number, rate: number): number {
  return model === "binomial"
    ? binomialUpperTail(x, denominator, rate)
    : poissonUpperTail(x, denominator * rate);
}

/** The two exact chances of a count, under a stated rate. */
export interface CountChance {
  /** P(X ≤ count). */
  atMost: number;
  /** P(X ≥ count). */
  atLeast: number;
}

/**
 * How likely a count at most as large, and one at least as large, would be at the centre line's rate.
 *
 * @param count whole number from 0 up. @param denominator above 0 (binomial: a whole number).
 * @param rate centre line. Source: definition. Errors: RangeError on arguments outside their domain.
 */
export function chanceOfCount(
  model: CountModel,
  count: number,
  denominator: number,
  rate: number,
): CountChance {
  requirePositive("denominator", denominator);
  return {
    atMost: lowerTail(model, count, denominator, rate),
    atLeast: upperTail(model, count, denominator, rate),
  };
}
