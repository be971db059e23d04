import { requireCount, requirePositive, requireTailArea } from "./guards";
import { normalQuantile } from "./normal-quantile";
import type { Interval } from "./wilson-interval";

/**
 * Byar's approximation to the exact interval of a rate of events, per unit of exposure.
 *
 * @param x events, whole number. @param exposure above 0. @param confidence two-sided, between 0 and 1.
 * Formula: x(1 − 1/9x − z/3√x)³ and (x + 1)(1 − 1/9(x + 1) + z/3√(x + 1))³, divided by the exposure; 0 below for x = 0.
 * Source: Breslow NE, Day NE (1987) Statistical Methods in Cancer Research II, p. 69.
 * Errors: RangeError on arguments outside their domain.
 */
export function byarInterval(x: number, exposure: number, confidence = 0.95): Interval {
  requireCount("x", x);
  requirePositive("exposure", exposure);
  requireTailArea("confidence", confidence);
  const z = -normalQuantile((1 - confidence) / 2);
  const next = x + 1;
  return {
    low: x === 0 ? 0 : (x * (1 - 1 / (9 * x) - z / (3 * Math.sqrt(x))) ** 3) / exposure,
    high: (next * (1 - 1 / (9 * next) + z / (3 * Math.sqrt(next))) ** 3) / exposure,
  };
}
