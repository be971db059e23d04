import { at, flagAt, isPlotted } from "./columns";
import { RELATIVE_SLACK, SMALL_COUNT } from "./constants";
import type { CountColumns, CountModel } from "./types";

/**
 * Whether so few events, or so few non-events, are expected that the normal approximation isn't trusted.
 *
 * @param denominator above 0. @param centre rate of the centre line.
 * Formula: n·p̄ < 5 or n·(1 − p̄) < 5; for rates n·ū < 5. Source: the usual rule for the normal approximation to the
 * binomial (Montgomery, chapter on attribute charts). An expectation of 5 but for rounding isn't small.
 */
export function isSmallCount(model: CountModel, denominator: number, centre: number): boolean {
  const bound = SMALL_COUNT * (1 - RELATIVE_SLACK);
  return denominator * centre < bound || (model === "binomial" && denominator * (1 - centre) < bound);
}

/**
 * What `auto` comes to: exact limits where any plotted baseline month is small, else 3-sigma limits.
 *
 * @param counts columns of the series. @param inBaseline 1 where a slot belongs to the baseline; same length.
 * @param centre centre line of that baseline.
 */
export function settleMethod(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  inBaseline: Uint8Array,
): "exact" | "three-sigma" {
  for (let slot = 0; slot < inBaseline.length; slot += 1) {
    const denominator = at(counts.denominators, slot);
    if (flagAt(inBaseline, slot) === 0 || !isPlotted(at(counts.numerators, slot), denominator)) continue;
    if (isSmallCount(model, denominator, centre)) return "exact";
  }
  return "three-sigma";
}
