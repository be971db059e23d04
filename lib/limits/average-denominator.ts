import { at, isPlotted } from "./columns";
import { ACTION_SIGMAS } from "./constants";
import { rateHalfWidth } from "./count-sigma";
import { sigmaVerdict } from "./sigma-verdict";
import type { CountColumns, CountModel } from "./types";
import { zScore } from "./z-score";

export interface AverageDenominatorView {
  /** Mean denominator of the plotted months; null where none is plotted, with limits likewise. */
  meanDenominator: number | null;
  lower: number | null;
  upper: number | null;
  /** -1, 0 or 1 against the limits at the mean denominator, and against the month's own. */
  verdicts: Int8Array;
  ownVerdicts: Int8Array;
  /** 1 where only the month's own limit decides. */
  ownLimitDecides: Uint8Array;
}

/**
 * One pair of limits at the mean denominator, and what they can be trusted for: inside with n_i < n̄ is in control for
 * certain, outside with n_i > n̄ is out for certain; in the other two cases the month's own limit decides.
 *
 * @param counts columns of the series. @param centre rate of the centre line. @param sigmas k.
 * Formula: limits of the p (u) chart at n̄ = Σn/months. A point on the centre is inside every limit.
 * Source: Montgomery, chapter on attribute charts, "variable sample size". Errors: none on columns of one length.
 */
export function averageDenominatorView(
  model: CountModel,
  counts: CountColumns,
  centre: number,
  sigmas: number = ACTION_SIGMAS,
): AverageDenominatorView {
  const { numerators, denominators } = counts;
  const mean = meanDenominator(counts);
  const halfWidth = mean === null ? null : rateHalfWidth(model, mean, centre, sigmas);
  const most = model === "binomial" ? 1 : Infinity;
  const view: AverageDenominatorView = {
    meanDenominator: mean,
    lower: halfWidth === null ? null : Math.max(0, centre - halfWidth),
    upper: halfWidth === null ? null : Math.min(most, centre + halfWidth),
    verdicts: new Int8Array(numerators.length),
    ownVerdicts: new Int8Array(numerators.length),
    ownLimitDecides: new Uint8Array(numerators.length),
  };
  if (mean === null) return view;
  for (let slot = 0; slot < numerators.length; slot += 1) {
    const numerator = at(numerators, slot);
    const size = at(denominators, slot);
    if (!isPlotted(numerator, size)) continue;
    const verdict = sigmaVerdict(model, (numerator / size) * mean, mean, centre, sigmas);
    const isOnCentre = zScore(model, numerator, size, centre) === 0;
    view.verdicts[slot] = verdict;
    view.ownVerdicts[slot] = sigmaVerdict(model, numerator, size, centre, sigmas);
    const decides = verdict === 0 ? size > mean && !isOnCentre : size < mean;
    view.ownLimitDecides[slot] = decides ? 1 : 0;
  }
  return view;
}

function meanDenominator({ numerators, denominators }: CountColumns): number | null {
  let total = 0;
  let months = 0;
  for (let slot = 0; slot < numerators.length; slot += 1) {
    if (!isPlotted(at(numerators, slot), at(denominators, slot))) continue;
    total += at(denominators, slot);
    months += 1;
  }
  return months === 0 ? null : total / months;
}
