import { requireInteger, requireNonNegative } from "./guards";
import { poissonLogMass } from "./poisson-mass";

/** Terms below this share of the sum no longer change it. */
const NEGLIGIBLE = 1e-17;

/**
 * Exact Poisson tails, worked out as the binomial ones: the tail away from the mean is its first term times a sum
 * of positive ratios, the other one is one minus it.
 *
 * @param x whole number, any sign. @param mean from 0 up, tried to 10⁶.
 * Formulas: P(X ≥ x) = Σ_{j ≥ x} mean^j e^(−mean)/j!, P(X ≤ x) likewise downwards.
 * Source: definition; first term by Loader C (2000). Errors: RangeError on arguments outside their domain.
 */
export function poissonUpperTail(x: number, mean: number): number {
  return Math.exp(poissonLogUpperTail(x, mean));
}

/** P(X ≤ x); see `poissonUpperTail`. */
export function poissonLowerTail(x: number, mean: number): number {
  return Math.exp(poissonLogLowerTail(x, mean));
}

/** log P(X ≥ x), finite where the probability itself underflows. */
export function poissonLogUpperTail(x: number, mean: number): number {
  requireInteger("x", x);
  requireNonNegative("mean", mean);
  if (x <= 0) return 0;
  if (x > mean) return poissonLogMass(x, mean) + logUpperSum(x, mean);
  return Math.log1p(-poissonLowerTail(x - 1, mean));
}

/** log P(X ≤ x), finite where the probability itself underflows. */
export function poissonLogLowerTail(x: number, mean: number): number {
  requireInteger("x", x);
  requireNonNegative("mean", mean);
  if (x < mean) return poissonLogMass(x, mean) + logLowerSum(x, mean);
  return Math.log1p(-poissonUpperTail(x + 1, mean));
}

/** Log of the sum over j ≥ x of P(j)/P(x). */
function logUpperSum(x: number, mean: number): number {
  let term = 1;
  let sum = 1;
  for (let j = x + 1; ; j += 1) {
    const ratio = mean / j;
    term *= ratio;
    sum += term;
    if (term * ratio <= NEGLIGIBLE * sum * (1 - ratio)) return Math.log(sum);
  }
}

/** Log of the sum over j ≤ x of P(j)/P(x). */
function logLowerSum(x: number, mean: number): number {
  let term = 1;
  let sum = 1;
  for (let j = x; j > 0; j -= 1) {
    const ratio = j / mean;
    term *= ratio;
    sum += term;
    if (term * ratio < NEGLIGIBLE * sum * (1 - ratio)) break;
  }
  return Math.log(sum);
}
