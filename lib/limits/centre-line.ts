import { at, flagAt, isPlotted } from "./columns";
import type { CountColumns } from "./types";

export interface CentreLine {
  /** Events and denominator units of the baseline's plotted months. */
  numerator: number;
  denominator: number;
  /** Plotted months of the baseline. */
  months: number;
  /** numerator / denominator, or null where the baseline has nothing plotted. */
  centre: number | null;
}

/**
 * The centre line: total events over total denominator, never a mean of the months' rates.
 *
 * @param counts columns of equal length, NaN where nothing was counted; denominator 0 is skipped.
 * @param inBaseline 1 where a slot belongs to the baseline; same length.
 * Formula: p̄ = Σx / Σn (ū likewise). Source: Montgomery, Introduction to Statistical Quality Control, chapter on
 * attribute charts. Errors: RangeError when the columns differ in length.
 */
export function centreLine(counts: CountColumns, inBaseline: Uint8Array): CentreLine {
  const { numerators, denominators } = counts;
  if (numerators.length !== denominators.length || numerators.length !== inBaseline.length) {
    throw new RangeError("numerators, denominators and inBaseline must have one length");
  }
  let numerator = 0;
  let denominator = 0;
  let months = 0;
  for (let slot = 0; slot < numerators.length; slot += 1) {
    const count = at(numerators, slot);
    const size = at(denominators, slot);
    if (flagAt(inBaseline, slot) === 0 || !isPlotted(count, size)) continue;
    numerator += count;
    denominator += size;
    months += 1;
  }
  return { numerator, denominator, months, centre: months === 0 ? null : numerator / denominator };
}
