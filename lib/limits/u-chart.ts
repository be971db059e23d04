import { at } from "./columns";
import { RELATIVE_SLACK } from "./constants";
import { rateHalfWidth } from "./count-sigma";
import { requireNonNegative, requirePositive } from "./guards";
import { emptyLimits, type LimitColumns } from "./p-chart";

/**
 * Limits of a u chart, for every month on its own exposure.
 *
 * @param centre ū, events per unit of exposure, from 0 up. @param exposures one slot a month; NaN or 0 gives NaN.
 * @param sigmas k, times σ_z where limits allow for overdispersion. @param into columns to fill in [start, end).
 * Formula: ū ± k·√(ū/n), not below 0; a lower limit that is 0 but for rounding is 0.
 * Source: Montgomery, Introduction to Statistical Quality Control, chapter on attribute charts.
 * Errors: RangeError on a negative centre or sigmas not above 0.
 */
export function uChartLimits(
  centre: number,
  exposures: Float64Array,
  sigmas: number,
  into: LimitColumns = emptyLimits(exposures.length),
  start = 0,
  end = exposures.length,
): LimitColumns {
  requireNonNegative("centre", centre);
  requirePositive("sigmas", sigmas);
  for (let slot = start; slot < end; slot += 1) {
    const exposure = at(exposures, slot);
    if (!(exposure > 0)) continue;
    const halfWidth = rateHalfWidth("poisson", exposure, centre, sigmas);
    const lower = centre - halfWidth;
    into.lower[slot] = lower > RELATIVE_SLACK * (centre + halfWidth) ? lower : 0;
    into.upper[slot] = centre + halfWidth;
  }
  return into;
}
