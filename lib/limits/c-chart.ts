import { at } from "./columns";
import { countSigma } from "./count-sigma";
import type { CountLimitLine } from "./np-chart";
import { uChartLimits } from "./u-chart";

/**
 * Limits of a c chart: the u chart of months that all have exposure 1.
 *
 * @param centre c̄, mean count a month, from 0 up. @param sigmas k.
 * Formula: c̄ ± k·√c̄, not below 0. Source: NIST/SEMATECH e-Handbook 6.3.3.1.
 * Errors: RangeError on arguments outside their domain.
 */
export function cChartLimits(centre: number, sigmas: number): CountLimitLine {
  const { lower, upper } = uChartLimits(centre, Float64Array.of(1), sigmas);
  return { centre, sigma: countSigma("poisson", centre, centre), lower: at(lower, 0), upper: at(upper, 0) };
}
