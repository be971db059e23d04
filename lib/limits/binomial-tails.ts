import { binomialLogMass } from "./binomial-mass";
import { requireCount, requireInteger, requireProbability } from "./guards";

/** Terms below this share of the sum no longer change it. */
const NEGLIGIBLE = 1e-17;

/**
 * Exact binomial tails. The tail away from the mean is its first term times a sum of ratios, all positive, so
 * nothing cancels however small it is; the tail that contains the mean is one minus the other.
 * The sum stops where a geometric bound says that the rest can't be seen.
 *
 * @param x whole number, any sign. @param n whole number from 0 up, tried to 10⁷. @param p in [0, 1].
 * Formulas: P(X ≥ x) = Σ_{j ≥ x} C(n, j) p^j (1 − p)^(n − j), P(X ≤ x) likewise downwards.
 * Source: definition; first term by Loader C (2000). Errors: RangeError on arguments outside their domain.
 */
export function binomialUpperTail(x: number, n: number, p: number): number {
  return Math.exp(binomialLogUpperTail(x, n, p));
}

/** P(X ≤ x); see `binomialUpperTail`. */
export function binomialLowerTail(x: number, n: number, p: number): number {
  return Math.exp(binomialLogLowerTail(x, n, p));
}

/** log P(X ≥ x), finite where the probability itself underflows. */
export function binomialLogUpperTail(x: number, n: number, p: number): number {
  requireDomain(x, n, p);
  if (x <= 0) return 0;
  if (x > n * p) return binomialLogMass(x, n, p) + logUpperSum(x, n, p);
  return Math.log1p(-binomialLowerTail(x - 1, n, p));
}

/** log P(X ≤ x), finite where the probability itself underflows. */
export function binomialLogLowerTail(x: number, n: number, p: number): number {
  requireDomain(x, n, p);
  if (x >= n) return 0;
  if (x < n * p) return binomialLogMass(x, n, p) + logLowerSum(x, n, p);
  return Math.log1p(-binomialUpperTail(x + 1, n, p));
}

function requireDomain(x: number, n: number, p: number): void {
  requireInteger("x", x);
  requireCount("n", n);
  requireProbability("p", p);
}

/** Log of the sum over j ≥ x of P(j)/P(x). */
function logUpperSum(x: number, n: number, p: number): number {
  const odds = p / (1 - p);
  let term = 1;
  let sum = 1;
  for (let j = x; j < n; j += 1) {
    const ratio = ((n - j) / (j + 1)) * odds;
    term *= ratio;
    sum += term;
    if (term * ratio < NEGLIGIBLE * sum * (1 - ratio)) break;
  }
  return Math.log(sum);
}

/** Log of the sum over j ≤ x of P(j)/P(x). */
function logLowerSum(x: number, n: number, p: number): number {
  const odds = (1 - p) / p;
  let term = 1;
  let sum = 1;
  for (let j = x; j > 0; j -= 1) {
    const ratio = (j / (n - j + 1)) * odds;
    term *= ratio;
    sum += term;
    if (term * ratio < NEGLIGIBLE * sum * (1 - ratio)) break;
  }
  return Math.log(sum);
}
