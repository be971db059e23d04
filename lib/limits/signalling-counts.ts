import { ACTION_SIGMAS, ACTION_TAIL, WARNING_SIGMAS, WARNING_TAIL } from "./constants";
import { countSigma } from "./count-sigma";
import { lowerTail, upperTail } from "./count-tails";
import { exactLimit } from "./exact-limits";
import { requirePositive } from "./guards";
import { existsBasis, sigmaScale, type LimitBasis } from "./limit-basis";
import type { SignallingCounts } from "./mid-p-signals";
import { sigmaVerdict } from "./sigma-verdict";

/**
 * The counts of a month that would be beyond its limits: the largest low one and the smallest high one.
 * "With 62 discharges, 11 or more" is read from here, and power and detection follow from it.
 *
 * @param denominator above 0; a whole number where binomial. @param band which pair of limits.
 * Null on a side where no possible count is beyond, and on both where no limits exist.
 * Formula: the edge of `sigmaVerdict`, or L − 1 and U + 1 of `exactLimit`. Errors: RangeError as those.
 */
export function signallingCounts(
  basis: LimitBasis,
  denominator: number,
  band: "action" | "warning" = "action",
): SignallingCounts {
  requirePositive("denominator", denominator);
  if (!existsBasis(basis)) return { low: null, high: null };
  const { model, centre } = basis;
  let low: number;
  let high: number;
  if (basis.method === "exact") {
    const tail = band === "action" ? ACTION_TAIL : WARNING_TAIL;
    low = exactLimit(model, "lower", denominator, centre, tail) - 1;
    high = exactLimit(model, "upper", denominator, centre, tail) + 1;
  } else {
    const sigmas = (band === "action" ? ACTION_SIGMAS : WARNING_SIGMAS) * sigmaScale(basis);
    low = largestLow(basis, denominator, sigmas);
    high = smallestHigh(basis, denominator, sigmas);
  }
  return { low: low < 0 ? null : low, high: model === "binomial" && high > denominator ? null : high };
}

function smallestHigh({ model, centre }: LimitBasis, denominator: number, sigmas: number): number {
  const expected = denominator * centre;
  let count = Math.floor(expected + sigmas * countSigma(model, expected, centre));
  while (sigmaVerdict(model, count, denominator, centre, sigmas) !== 1) count += 1;
  return count;
}

function largestLow({ model, centre }: LimitBasis, denominator: number, sigmas: number): number {
  const expected = denominator * centre;
  let count = Math.ceil(expected - sigmas * countSigma(model, expected, centre));
  while (sigmaVerdict(model, count, denominator, centre, sigmas) !== -1) count -= 1;
  return count;
}

/**
 * Chance that a month of this denominator is beyond an action limit although its rate is the centre line's.
 * Summed over months it is the number of months expected to stand out by chance alone.
 *
 * Formula: P(X ≤ low) + P(X ≥ high) by exact tails. 0 where no limits exist. Errors: as `signallingCounts`.
 */
export function falseAlarmChance(basis: LimitBasis, denominator: number): number {
  const { low, high } = signallingCounts(basis, denominator);
  const below = low === null ? 0 : lowerTail(basis.model, low, denominator, basis.centre);
  const above = high === null ? 0 : upperTail(basis.model, high, denominator, basis.centre);
  return below + above;
}
