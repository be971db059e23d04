import { at, isPlotted } from "./columns";
import { RELATIVE_SLACK } from "./constants";
import { countSigma } from "./count-sigma";
import type { CountColumns, CountModel } from "./types";

/**
 * Whether a count lies strictly outside k-sigma limits: -1 below, 1 above, 0 inside or on them.
 *
 * Compared on the scale of counts, with a slack relative to the terms of the limit and not to the limit itself:
 * p̄ − k·σ may be 0 but for rounding, and a slack relative to that would be none.
 *
 * @param sigmas k, times σ_z where limits allow for overdispersion. Formula: |x − n·c| > k·σ(count).
 * Limits of no width (centre 0 or 1) flag nothing. Source: as the charts' own files.
 */
export function sigmaVerdict(
  model: CountModel,
  numerator: number,
  denominator: number,
  centre: number,
  sigmas: number,
): -1 | 0 | 1 {
  const expected = denominator * centre;
  const halfWidth = sigmas * countSigma(model, expected, centre);
  if (!(halfWidth > 0)) return 0;
  const slack = RELATIVE_SLACK * (expected + halfWidth);
  const distance = numerator - expected;
  if (distance - halfWidth > slack) return 1;
  if (-distance - halfWidth > slack) return -1;
  return 0;
}

/** `sigmaVerdict` for the plotted slots of [start, end), written into `verdicts`. */
export function markSigmaVerdicts(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  sigmas: number,
  verdicts: Int8Array,
  start = 0,
  end = verdicts.length,
): Int8Array {
  for (let slot = start; slot < end; slot += 1) {
    const numerator = at(counts.numerators, slot);
    const denominator = at(counts.denominators, slot);
    if (!isPlotted(numerator, denominator)) continue;
    verdicts[slot] = sigmaVerdict(model, numerator, denominator, centre, sigmas);
  }
  return verdicts;
}
