import { ACTION_SIGMAS, ACTION_TAIL, RELATIVE_SLACK } from "./constants";
import { lowerTail, upperTail } from "./count-tails";
import { requireNonNegative, requirePositive } from "./guards";
import { existsBasis, sigmaScale, type LimitBasis } from "./limit-basis";
import { sigmaVerdict } from "./sigma-verdict";
import type { SeriesInput } from "./types";

export type BetterWhen = SeriesInput["betterWhen"];

/**
 * The best count a month could have had: 0, or all of the denominator where higher is better. Where neither
 * direction is better, 0 is taken. A rate that is better when higher has no best count.
 */
function bestCount(basis: LimitBasis, denominator: number, betterWhen: BetterWhen): number | null {
  if (betterWhen !== "higher") return 0;
  return basis.model === "binomial" ? denominator : null;
}

/**
 * Whether a month is below detection: even the best possible count wouldn't be beyond the action limit, so that the
 * month can't show an improvement. Never so for a rate that is better when higher (no count is the best one), and
 * never where no limits exist (there is nothing to be beyond).
 *
 * @param denominator above 0; a whole number where binomial.
 * Formula: 3-sigma, lower better: n ≤ k²(1 − p̄)/p̄, or k²/ū; exact: P(X ≤ 0) ≥ α, or P(X ≥ n) > α where higher is better.
 * Source: Montgomery, chapter on attribute charts (smallest n with a lower limit above 0), and the definition of the
 * exact limits. Errors: RangeError on arguments outside their domain.
 */
export function isBelowDetection(basis: LimitBasis, denominator: number, betterWhen: BetterWhen): boolean {
  requirePositive("denominator", denominator);
  if (!existsBasis(basis)) return false;
  const best = bestCount(basis, denominator, betterWhen);
  if (best === null) return false;
  const { model, centre } = basis;
  if (basis.method !== "exact") {
    return sigmaVerdict(model, best, denominator, centre, ACTION_SIGMAS * sigmaScale(basis)) === 0;
  }
  return best === 0
    ? lowerTail(model, 0, denominator, centre) >= ACTION_TAIL * (1 - RELATIVE_SLACK)
    : upperTail(model, best, denominator, centre) > ACTION_TAIL * (1 + RELATIVE_SLACK);
}

/**
 * The smallest whole denominator that wouldn't be below detection; null where the question doesn't arise (no limits,
 * or a rate that is better when higher).
 *
 * Formula: just above k²(1 − p̄)/p̄, k²p̄/(1 − p̄) or k²/ū; exact: just above log α/log(1 − p̄), log α/log p̄ or −log α/ū.
 * The last step is settled by `isBelowDetection` itself. Source and errors: as there.
 */
export function smallestDetectableDenominator(basis: LimitBasis, betterWhen: BetterWhen): number | null {
  if (!existsBasis(basis) || bestCount(basis, 1, betterWhen) === null) return null;
  let denominator = Math.max(1, Math.floor(detectionBound(basis, betterWhen)));
  while (denominator > 1 && !isBelowDetection(basis, denominator - 1, betterWhen)) denominator -= 1;
  while (isBelowDetection(basis, denominator, betterWhen)) denominator += 1;
  return denominator;
}

function detectionBound(basis: LimitBasis, betterWhen: BetterWhen): number {
  const { model, centre } = basis;
  const isHigher = betterWhen === "higher";
  if (basis.method === "exact") {
    if (model === "poisson") return -Math.log(ACTION_TAIL) / centre;
    return Math.log(ACTION_TAIL) / (isHigher ? Math.log(centre) : Math.log1p(-centre));
  }
  const squared = (ACTION_SIGMAS * sigmaScale(basis)) ** 2;
  if (model === "poisson") return squared / centre;
  return isHigher ? (squared * centre) / (1 - centre) : (squared * (1 - centre)) / centre;
}

/**
 * How many months of a usual size would have to be pooled to reach a denominator; null where nothing is counted
 * in a month. Errors: RangeError on negative or infinite arguments.
 */
export function monthsToPool(needed: number, denominatorPerMonth: number): number | null {
  requireNonNegative("needed", needed);
  requireNonNegative("denominatorPerMonth", denominatorPerMonth);
  return denominatorPerMonth === 0 ? null : Math.ceil(needed / denominatorPerMonth);
}
