import { requireCount, requireInteger, requireProbability } from "./guards";
import { deviance, stirlingError } from "./saddle-point";

/**
 * Log of the binomial probability of exactly x events among n; -Infinity where it can't happen.
 *
 * @param x whole number. @param n whole number from 0 up, tried to 10⁷. @param p probability of an event, [0, 1].
 * Formula: log C(n, x) p^x (1 − p)^(n − x) in saddle-point form. Source: Loader C (2000).
 * Errors: RangeError on arguments outside their domain.
 */
export function binomialLogMass(x: number, n: number, p: number): number {
  requireInteger("x", x);
  requireCount("n", n);
  requireProbability("p", p);
  if (x < 0 || x > n) return -Infinity;
  if (p === 0) return x === 0 ? 0 : -Infinity;
  if (p === 1) return x === n ? 0 : -Infinity;
  if (x === 0) return n * Math.log1p(-p);
  if (x === n) return n * Math.log(p);
  const rest = n - x;
  return (
    stirlingError(n) -
    stirlingError(x) -
    stirlingError(rest) -
    deviance(x, n * p) -
    deviance(rest, n * (1 - p)) +
    0.5 * Math.log(n / (2 * Math.PI * x * rest))
  );
}

/** Binomial probability of exactly x events among n; arguments and errors as `binomialLogMass`. */
export function binomialMass(x: number, n: number, p: number): number {
  return Math.exp(binomialLogMass(x, n, p));
}
