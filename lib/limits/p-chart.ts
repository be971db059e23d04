import { at, emptyColumn } from "./columns";
import { RELATIVE_SLACK } from "./constants";
import { rateHalfWidth } from "./count-sigma";
import { requirePositive, requireProbability } from "./guards";

/** Limits of every slot, as rates; NaN where a month has no denominator. */
export interface LimitColumns {
  lower: Float64Array;
  upper: Float64Array;
}

export function emptyLimits(length: number): LimitColumns {
  return { lower: emptyColumn(length), upper: emptyColumn(length) };
}

/**
 * Limits of a p chart, for every month on its own denominator.
 *
 * @param centre p̄ in [0, 1]. @param denominators one slot a month; NaN or 0 gives NaN.
 * @param sigmas k, times σ_z where limits allow for overdispersion. @param into columns to fill in [start, end).
 * Formula: p̄ ± k·√(p̄(1 − p̄)/n), clipped to [0, 1]; a lower limit that is 0 but for rounding is 0.
 * Source: Montgomery, Introduction to Statistical Quality Control, chapter on attribute charts; NIST/SEMATECH
 * e-Handbook 6.3.3.2. Errors: RangeError on a centre outside [0, 1] or sigmas not above 0.
 */
export function pChartLimits(
  centre: number,
  denominators: Float64Array,
  sigmas: number,
  into: LimitColumns = emptyLimits(denominators.length),
  start = 0,
  end = denominators.length,
): LimitColumns {
  requireProbability("centre", centre);
  requirePositive("sigmas", sigmas);
  for (let slot = start; slot < end; slot += 1) {
    const denominator = at(denominators, slot);
    if (!(denominator > 0)) continue;
    const halfWidth = rateHalfWidth("binomial", denominator, centre, sigmas);
    const lower = centre - halfWidth;
    into.lower[slot] = lower > RELATIVE_SLACK * (centre + halfWidth) ? lower : 0;
    into.upper[slot] = Math.min(1, centre + halfWidth);
  }
  return into;
}
