import { lowerTail, upperTail } from "./count-tails";
import { requireCount, requirePositive, requireTailArea } from "./guards";
import type { CountModel } from "./types";

/**
 * The point in [low, high] from which on `holds` is true, by halving down to neighbouring numbers.
 * `holds` must be false on a left part and true on the rest; high is returned where it never holds inside.
 */
export function firstWhere(holds: (rate: number) => boolean, low: number, high: number): number {
  let left = low;
  let right = high;
  for (;;) {
    const middle = left + (right - left) / 2;
    if (middle <= left || middle >= right) return right;
    if (holds(middle)) right = middle;
    else left = middle;
  }
}

/** A rate so high that the tail questions below are settled at it: 1, or several times the count and more. */
function highestRate(model: CountModel, count: number, denominator: number): number {
  return model === "binomial" ? 1 : (2 * count + 2000) / denominator;
}

/**
 * The smallest rate at which a count of x or more has at least this probability.
 *
 * @param x whole number from 1 up (0 needs no rate: 0 is returned). @param denominator above 0.
 * @param probability strictly between 0 and 1.
 * Returns null where no rate does it (binomial x > n). Formula: root of P(X ≥ x | rate) = probability, which is a
 * quantile of the beta (gamma) distribution. Source: Clopper CJ, Pearson ES (1934) Biometrika 26:404-413.
 * Errors: RangeError on arguments outside their domain.
 */
export function rateForUpperTail(
  model: CountModel,
  x: number,
  denominator: number,
  probability: number,
): number | null {
  requireCount("x", x);
  requirePositive("denominator", denominator);
  requireTailArea("probability", probability);
  if (model === "binomial" && x > denominator) return null;
  return upperTailRoot(model, x, denominator, probability);
}

/** `rateForUpperTail` for arguments that are known to have an answer. */
export function upperTailRoot(
  model: CountModel,
  x: number,
  denominator: number,
  probability: number,
): number {
  if (x === 0) return 0;
  const holds = (rate: number) => upperTail(model, x, denominator, rate) >= probability;
  return firstWhere(holds, 0, highestRate(model, x, denominator));
}

/**
 * The largest rate at which a count of x or fewer still has at least this probability; null where every rate does
 * (binomial x ≥ n). Other arguments, source and errors: `rateForUpperTail`.
 */
export function rateForLowerTail(
  model: CountModel,
  x: number,
  denominator: number,
  probability: number,
): number | null {
  requireCount("x", x);
  requirePositive("denominator", denominator);
  requireTailArea("probability", probability);
  if (model === "binomial" && x >= denominator) return null;
  return lowerTailRoot(model, x, denominator, probability);
}

/** `rateForLowerTail` for arguments that are known to have an answer; 1 where every proportion does. */
export function lowerTailRoot(
  model: CountModel,
  x: number,
  denominator: number,
  probability: number,
): number {
  const fails = (rate: number) => lowerTail(model, x, denominator, rate) < probability;
  return firstWhere(fails, 0, highestRate(model, x, denominator));
}
