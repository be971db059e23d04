import { at, flagAt, isPlotted } from "./columns";
import { MOVING_RANGE_CONSTANT } from "./constants";
import type { CountColumns, CountModel } from "./types";
import { zScore } from "./z-score";

export interface Overdispersion {
  /** |z_i − z_(i−1)| over successive plotted baseline months; a gap is stepped across. */
  movingRanges: Float64Array;
  /** Null with fewer than two plotted baseline months. */
  meanMovingRange: number | null;
  /** Null with fewer than two plotted baseline months, with no spread, and where z doesn't exist. */
  sigmaZ: number | null;
}

/**
 * Laney's σ_z: how much wider than chance the months vary around the centre. Not floored at 1.
 *
 * @param centre centre line of the same baseline. @param inBaseline 1 where a slot belongs to it.
 * @param constant d2 of two values, by default the tabulated 1.128.
 * Formula: σ_z = mean |z_i − z_(i−1)| / d2. Source: Laney DB (2002) Improved control charts for attributes,
 * Quality Engineering 14(4):531-537.
 */
export function overdispersion(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  inBaseline: Uint8Array,
  constant: number = MOVING_RANGE_CONSTANT,
): Overdispersion {
  const ranges = new Float64Array(inBaseline.length);
  let used = 0;
  let total = 0;
  let previous = NaN;
  for (let slot = 0; slot < inBaseline.length; slot += 1) {
    const numerator = at(counts.numerators, slot);
    const denominator = at(counts.denominators, slot);
    if (flagAt(inBaseline, slot) === 0 || !isPlotted(numerator, denominator)) continue;
    const z = zScore(model, numerator, denominator, centre);
    if (!Number.isNaN(previous)) {
      const range = Math.abs(z - previous);
      ranges[used] = range;
      used += 1;
      total += range;
    }
    previous = z;
  }
  const meanMovingRange = used === 0 ? null : total / used;
  return {
    movingRanges: ranges.subarray(0, used),
    meanMovingRange,
    sigmaZ: meanMovingRange !== null && meanMovingRange > 0 ? meanMovingRange / constant : null,
  };
}
