import { requireCount, requireTailArea } from "./guards";
import { normalQuantile } from "./normal-quantile";

export interface Interval {
  low: number;
  high: number;
}

/** Errors: RangeError unless x and n are whole numbers with x ≤ n. */
export function requireShare(x: number, n: number): void {
  requireCount("x", x);
  requireCount("n", n);
  if (x > n) throw new RangeError("x must not exceed n");
}

/**
 * Wilson's score interval of a proportion, without continuity correction; null for n = 0.
 *
 * @param x events, @param n out of, whole numbers. @param confidence two-sided, between 0 and 1.
 * Formula: (p + z²/2n ± z√(p(1 − p)/n + z²/4n²)) / (1 + z²/n); the end at 0 (1) is exact for x = 0 (n).
 * Source: Newcombe RG (1998) Stat Med 17:857-872, method 3. Errors: RangeError on arguments outside their domain.
 */
export function wilsonInterval(x: number, n: number, confidence = 0.95): Interval | null {
  requireShare(x, n);
  requireTailArea("confidence", confidence);
  if (n === 0) return null;
  const z = -normalQuantile((1 - confidence) / 2);
  const square = z * z;
  const middle = x + square / 2;
  const halfWidth = z * Math.sqrt((x * (n - x)) / n + square / 4);
  const scale = n + square;
  return {
    low: x === 0 ? 0 : (middle - halfWidth) / scale,
    high: x === n ? 1 : (middle + halfWidth) / scale,
  };
}
