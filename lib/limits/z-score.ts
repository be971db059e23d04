import { at, isPlotted } from "./columns";
import { RELATIVE_SLACK } from "./constants";
import { countSigma } from "./count-sigma";
import type { CountColumns, CountModel } from "./types";

/**
 * Distance of a month's rate from the centre in its own standard deviations; NaN where sigma is 0.
 * A month on the centre but for rounding gets exactly 0, because such a month ends a run.
 *
 * Formula: z = (x/n − c)/σ_i = (x − n·c)/σ(count). Source: Laney DB (2002), Quality Engineering 14(4):531-537.
 */
export function zScore(model: CountModel, numerator: number, denominator: number, centre: number): number {
  const expected = denominator * centre;
  const sigma = countSigma(model, expected, centre);
  if (!(sigma > 0)) return NaN;
  const distance = numerator - expected;
  return Math.abs(distance) <= RELATIVE_SLACK * expected ? 0 : distance / sigma;
}

/** `zScore` for the plotted slots of [start, end), written into `z`. */
export function markZScores(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  z: Float64Array,
  start = 0,
  end = z.length,
): Float64Array {
  for (let slot = start; slot < end; slot += 1) {
    const numerator = at(counts.numerators, slot);
    const denominator = at(counts.denominators, slot);
    if (!isPlotted(numerator, denominator)) continue;
    z[slot] = zScore(model, numerator, denominator, centre);
  }
  return z;
}
