import { requireInteger, requireNonNegative } from "./guards";
import { deviance, stirlingError } from "./saddle-point";

/**
 * Log of the Poisson probability of exactly x events; -Infinity where it can't happen.
 *
 * @param x whole number. @param mean from 0 up, tried to 10⁶.
 * Formula: log(mean^x e^(−mean) / x!) in saddle-point form. Source: Loader C (2000).
 * Errors: RangeError on arguments outside their domain.
 */
export function poissonLogMass(x: number, mean: number): number {
  requireInteger("x", x);
  requireNonNegative("mean", mean);
  if (x < 0) return -Infinity;
  if (mean === 0) return x === 0 ? 0 : -Infinity;
  if (x === 0) return -mean;
  return -stirlingError(x) - deviance(x, mean) - 0.5 * Math.log(2 * Math.PI * x);
}

/** Poisson probability of exactly x events; arguments and errors as `poissonLogMass`. */
export function poissonMass(x: number, mean: number): number {
  return Math.exp(poissonLogMass(x, mean));
}
