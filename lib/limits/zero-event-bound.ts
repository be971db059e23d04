import { requirePositive, requireTailArea } from "./guards";
import type { CountModel } from "./types";

/**
 * Upper bound of the true rate after a month with no event.
 *
 * @param denominator n above 0. @param confidence one-sided, between 0 and 1.
 * Formula: 1 − (1 − confidence)^(1/n) for a proportion, −log(1 − confidence)/n for a rate.
 * Source: Hanley JA, Lippman-Hand A (1983) JAMA 249:1743-1745. Errors: RangeError on arguments outside their domain.
 */
export function zeroEventBound(model: CountModel, denominator: number, confidence = 0.95): number {
  requirePositive("denominator", denominator);
  requireTailArea("confidence", confidence);
  const exponent = Math.log1p(-confidence) / denominator;
  return model === "binomial" ? -Math.expm1(exponent) : -exponent;
}

/** The rule of thumb for the 95 % bound: 3/n. Source and errors as `zeroEventBound`. */
export function ruleOfThree(denominator: number): number {
  requirePositive("denominator", denominator);
  return 3 / denominator;
}
