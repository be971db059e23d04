import { requireCount, requirePositive, requireTailArea } from "./guards";
import { lowerTailRoot, upperTailRoot } from "./rate-for-tail";
import { requireShare, type Interval } from "./wilson-interval";

/**
 * Exact (Clopper-Pearson) interval of a proportion, half of the error in each tail also for x = 0 and x = n;
 * null for n = 0.
 *
 * @param x events, @param n out of, whole numbers. @param confidence two-sided, between 0 and 1.
 * Formula: low: P(X ≥ x | low) = ε/2; high: P(X ≤ x | high) = ε/2, with ε = 1 − confidence.
 * Source: Clopper CJ, Pearson ES (1934) Biometrika 26:404-413. Errors: RangeError on arguments outside their domain.
 */
export function clopperPearsonInterval(x: number, n: number, confidence = 0.95): Interval | null {
  requireShare(x, n);
  requireTailArea("confidence", confidence);
  if (n === 0) return null;
  const tail = (1 - confidence) / 2;
  return {
    low: upperTailRoot("binomial", x, n, tail),
    high: lowerTailRoot("binomial", x, n, tail),
  };
}

/**
 * Exact (Garwood) interval of a rate of events, per unit of exposure.
 *
 * @param x events, whole number. @param exposure above 0. @param confidence two-sided, between 0 and 1.
 * Formula: as for the proportion, with Poisson tails. Source: Garwood F (1936) Biometrika 28:437-442.
 * Errors: RangeError on arguments outside their domain.
 */
export function garwoodInterval(x: number, exposure: number, confidence = 0.95): Interval {
  requireCount("x", x);
  requirePositive("exposure", exposure);
  requireTailArea("confidence", confidence);
  const tail = (1 - confidence) / 2;
  return {
    low: upperTailRoot("poisson", x, exposure, tail),
    high: lowerTailRoot("poisson", x, exposure, tail),
  };
}
