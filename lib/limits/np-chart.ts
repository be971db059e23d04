import { at } from "./columns";
import { countSigma } from "./count-sigma";
import { requireCount, requirePositive } from "./guards";
import { pChartLimits } from "./p-chart";

/** Limits on the scale of counts, the same for every month. */
export interface CountLimitLine {
  centre: number;
  sigma: number;
  lower: number;
  upper: number;
}

/**
 * Limits of an np chart: the p chart of months that all have one size, on the scale of counts.
 *
 * @param centre p̄ in [0, 1]. @param size n, a whole number from 1 up. @param sigmas k.
 * Formula: n·p̄ ± k·√(n·p̄(1 − p̄)), clipped to [0, n]. Source: NIST/SEMATECH e-Handbook 6.3.3.2.
 * Errors: RangeError on arguments outside their domain.
 */
export function npChartLimits(centre: number, size: number, sigmas: number): CountLimitLine {
  requireCount("size", size);
  requirePositive("size", size);
  const { lower, upper } = pChartLimits(centre, Float64Array.of(size), sigmas);
  const expected = size * centre;
  return {
    centre: expected,
    sigma: countSigma("binomial", expected, centre),
    lower: size * at(lower, 0),
    upper: size * at(upper, 0),
  };
}
