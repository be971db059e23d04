import type { LimitBasis } from "./limit-basis";
import { rateForLowerTail, rateForUpperTail } from "./rate-for-tail";
import { signallingCounts } from "./signalling-counts";
import type { Side } from "./types";

/**
 * Power of a month: the change of the true rate that the month would have shown with a given probability.
 *
 * @param denominator above 0; a whole number where binomial. @param power for instance 0.5 or 0.8.
 * @param side `upper`: the smallest rate that would be beyond the upper action limit; `lower`: the largest rate that
 * would be beyond the lower one. Null where no possible count is beyond on that side.
 * Formula: root of P(X ≥ smallest signalling count | rate) = power, or of P(X ≤ largest one | rate) = power, by exact
 * binomial or Poisson tails also where limits allow for overdispersion (which tells how wide, not how, months vary).
 * Source: definition of power. Errors: RangeError on arguments outside their domain.
 */
export function detectableRate(
  basis: LimitBasis,
  denominator: number,
  power: number,
  side: Side,
): number | null {
  const { low, high } = signallingCounts(basis, denominator);
  if (side === "upper") return high === null ? null : rateForUpperTail(basis.model, high, denominator, power);
  return low === null ? null : rateForLowerTail(basis.model, low, denominator, power);
}
