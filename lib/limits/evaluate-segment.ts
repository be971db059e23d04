import { centreLine } from "./centre-line";
import { at, isPlotted } from "./columns";
import { ACTION_SIGMAS, ACTION_TAIL, WARNING_SIGMAS, WARNING_TAIL } from "./constants";
import { isBelowDetection } from "./below-detection";
import { markExactLimits } from "./exact-limits";
import { existsBasis, limitBasis, sigmaScale, type LimitBasis } from "./limit-basis";
import { overdispersion } from "./overdispersion";
import { pChartLimits, type LimitColumns } from "./p-chart";
import { settleMethod } from "./settle-method";
import { markSigmaVerdicts } from "./sigma-verdict";
import type { SegmentInput, SegmentResult, SeriesEvaluation, SeriesInput } from "./types";
import { uChartLimits } from "./u-chart";
import { markZScores } from "./z-score";

/**
 * Centre line, limits, z and verdicts of one segment, written into the columns of `evaluation` in [start, end).
 * Months left out of the baseline are judged like the others. Rules aren't applied here.
 */
export function evaluateSegment(
  input: SeriesInput,
  segment: SegmentInput,
  evaluation: SeriesEvaluation,
): SegmentResult {
  const { model, counts } = input;
  const { start, end } = segment;
  const result = describeSegment(input, segment);
  if (result.centre !== null) evaluation.centre.fill(result.centre, start, end);
  const basis = limitBasis(model, result);
  if (basis === null) return result;

  markZScores(model, counts, basis.centre, evaluation.z, start, end);
  const scale = sigmaScale(basis);
  for (let slot = start; slot < end; slot += 1) evaluation.zRules[slot] = at(evaluation.z, slot) / scale;

  const action = { lower: evaluation.lowerAction, upper: evaluation.upperAction };
  const warning = { lower: evaluation.lowerWarning, upper: evaluation.upperWarning };
  if (basis.method === "exact") {
    const { beyondAction, beyondWarning } = evaluation;
    markExactLimits(model, counts, basis.centre, ACTION_TAIL, beyondAction, action, start, end);
    markExactLimits(model, counts, basis.centre, WARNING_TAIL, beyondWarning, warning, start, end);
  } else {
    fillSigmaLimits(input, basis, ACTION_SIGMAS * scale, evaluation.beyondAction, action, segment);
    fillSigmaLimits(input, basis, WARNING_SIGMAS * scale, evaluation.beyondWarning, warning, segment);
  }
  markBelowDetection(input, basis, segment, evaluation.belowDetection);
  return result;
}

function describeSegment({ model, counts }: SeriesInput, segment: SegmentInput): SegmentResult {
  const baseline = centreLine(counts, segment.inBaseline);
  const { centre } = baseline;
  const isAuto = segment.method === "auto";
  const result: SegmentResult = {
    start: segment.start,
    end: segment.end,
    centre,
    method: segment.method === "auto" ? "three-sigma" : segment.method,
    sigmaZ: null,
    baselineMonths: baseline.months,
    baselineExpected: baseline.numerator,
    hasLimits: false,
  };
  if (centre === null) return result;
  if (isAuto) result.method = settleMethod(model, counts, centre, segment.inBaseline);
  result.sigmaZ = overdispersion(model, counts, centre, segment.inBaseline).sigmaZ;
  result.hasLimits = existsBasis({ model, centre, method: result.method, sigmaZ: result.sigmaZ });
  return result;
}

function fillSigmaLimits(
  { model, counts }: SeriesInput,
  { centre }: LimitBasis,
  sigmas: number,
  verdicts: Int8Array,
  into: LimitColumns,
  { start, end }: SegmentInput,
): void {
  const limits = model === "binomial" ? pChartLimits : uChartLimits;
  limits(centre, counts.denominators, sigmas, into, start, end);
  markSigmaVerdicts(model, counts, centre, sigmas, verdicts, start, end);
}

function markBelowDetection(
  { counts, betterWhen }: SeriesInput,
  basis: LimitBasis,
  { start, end }: SegmentInput,
  belowDetection: Uint8Array,
): void {
  for (let slot = start; slot < end; slot += 1) {
    const denominator = at(counts.denominators, slot);
    if (!isPlotted(at(counts.numerators, slot), denominator)) continue;
    belowDetection[slot] = isBelowDetection(basis, denominator, betterWhen) ? 1 : 0;
  }
}
