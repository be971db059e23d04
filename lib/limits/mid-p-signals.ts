import { lowerTail, upperTail } from "./count-tails";
import { exactLimit } from "./exact-limits";
import type { CountModel } from "./types";

export interface SignallingCounts {
  /** Largest count that would be beyond on the low side; null where none would. */
  low: number | null;
  /** Smallest count that would be beyond on the high side; null where none would. */
  high: number | null;
}

/**
 * The counts that would be beyond mid-p limits, which give half the probability of the observed count away and
 * so are a little narrower than the exact ones. For comparison; charts use the exact limits.
 *
 * @param denominator above 0 (binomial: a whole number). @param tail one-sided tail area α.
 * Formula: low where P(X < x) + P(X = x)/2 < α, high where P(X > x) + P(X = x)/2 < α. Either lies on the exact
 * limit or one beyond it. Source: Lancaster HO (1961) JASA 56:223-234. Errors: RangeError as `exactLimit`.
 */
export function midPSignals(
  model: CountModel,
  denominator: number,
  centre: number,
  tail: number,
): SignallingCounts {
  const lower = exactLimit(model, "lower", denominator, centre, tail);
  const upper = exactLimit(model, "upper", denominator, centre, tail);
  const lowerMid =
    (lowerTail(model, lower, denominator, centre) + lowerTail(model, lower - 1, denominator, centre)) / 2;
  const upperMid =
    (upperTail(model, upper, denominator, centre) + upperTail(model, upper + 1, denominator, centre)) / 2;
  const low = lowerMid < tail ? lower : lower - 1;
  const high = upperMid < tail ? upper : upper + 1;
  const most = model === "binomial" ? denominator : Infinity;
  return { low: low < 0 ? null : low, high: high > most ? null : high };
}
