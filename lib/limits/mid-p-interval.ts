import { binomialLowerTail, binomialUpperTail } from "./binomial-tails";
import { requireTailArea } from "./guards";
import { firstWhere } from "./rate-for-tail";
import { requireShare, type Interval } from "./wilson-interval";

/**
 * Mid-p interval of a proportion: as the exact one, with half the probability of the observed count; null for n = 0.
 *
 * @param x events, @param n out of, whole numbers. @param confidence two-sided, between 0 and 1.
 * Formula: low: P(X > x) + P(X = x)/2 = ε/2; high: P(X < x) + P(X = x)/2 = ε/2; 0 for x = 0 and 1 for x = n.
 * Source: Newcombe RG (1998) Stat Med 17:857-872, method 6. Errors: RangeError on arguments outside their domain.
 */
export function midPInterval(x: number, n: number, confidence = 0.95): Interval | null {
  requireShare(x, n);
  requireTailArea("confidence", confidence);
  if (n === 0) return null;
  // Twice the mid-p tail is the sum of the tails with and without the observed count.
  const twice = 1 - confidence;
  return {
    low:
      x === 0
        ? 0
        : firstWhere((p) => binomialUpperTail(x, n, p) + binomialUpperTail(x + 1, n, p) >= twice, 0, 1),
    high:
      x === n
        ? 1
        : firstWhere((p) => binomialLowerTail(x, n, p) + binomialLowerTail(x - 1, n, p) < twice, 0, 1),
  };
}
