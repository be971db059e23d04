import {
  ACTION_SIGMAS,
  centreLine,
  evaluateSeries,
  pChartLimits,
  uChartLimits,
  WARNING_SIGMAS,
  type CountColumns,
  type CountModel,
  type LimitColumns,
} from "@/lib/limits";
import { countSigma } from "@/lib/limits/count-sigma";
import { markSigmaVerdicts } from "@/lib/limits/sigma-verdict";
import { markZScores } from "@/lib/limits/z-score";
import type { Fields } from "../case-format";
import { positionsWhere, scaled } from "../read-fields";

export interface SigmaChartInput {
  model: CountModel;
  counts: CountColumns;
  inBaseline: Uint8Array;
  /** k of the action and of the warning limits. */
  action: number;
  warning: number;
  /** Factor of every rate. */
  per: number;
}

/** The columns of a chart, as the whole evaluation draws them or as the single methods do. */
interface ChartColumns {
  z: Float64Array;
  action: LimitColumns;
  warning: LimitColumns;
  beyondAction: Int8Array;
  beyondWarning: Int8Array;
}

/**
 * A p or u chart under the names of the reference cases. The usual widths go through the evaluation that every page
 * calls; it has no other widths and draws no band of no width, so those cases call the single methods.
 */
export function sigmaChartFields(input: SigmaChartInput): Fields {
  const { model, counts, inBaseline, per } = input;
  const { centre, numerator, denominator, months } = centreLine(counts, inBaseline);
  if (centre === null) return { center: null, sum_x: 0, subgroups_used: 0 };
  const columns = wholeEvaluation(input) ?? singleMethods(input, centre);
  const skipped: number[] = [];
  const values: number[] = [];
  const sigmas: number[] = [];
  counts.numerators.forEach((count, slot) => {
    const size = counts.denominators[slot] ?? NaN;
    const isSkipped = !(size > 0) || Number.isNaN(count);
    if (isSkipped) skipped.push(slot + 1);
    values.push(isSkipped ? NaN : (per * count) / size);
    sigmas.push(isSkipped ? NaN : (per * countSigma(model, size * centre, centre)) / size);
  });
  const total =
    model === "binomial" ? { sum_n: denominator, p: values } : { sum_exposure: denominator, u: values };
  return {
    ...total,
    center: centre * per,
    sum_x: numerator,
    subgroups_used: months,
    sigma: sigmas,
    ucl: scaled(columns.action.upper, per),
    lcl: scaled(columns.action.lower, per),
    upper_warning: scaled(columns.warning.upper, per),
    lower_warning: scaled(columns.warning.lower, per),
    z: scaled(columns.z),
    beyond_action: positionsWhere(columns.beyondAction),
    beyond_warning: positionsWhere(columns.beyondWarning),
    skipped,
  };
}

function wholeEvaluation({
  model,
  counts,
  inBaseline,
  action,
  warning,
}: SigmaChartInput): ChartColumns | null {
  if (action !== ACTION_SIGMAS || warning !== WARNING_SIGMAS) return null;
  const evaluation = evaluateSeries({
    model,
    counts,
    segments: [{ start: 0, end: counts.numerators.length, inBaseline, method: "three-sigma" }],
    rules: [],
    betterWhen: "lower",
  });
  if (evaluation.segments[0]?.hasLimits !== true) return null;
  const { z, beyondAction, beyondWarning } = evaluation;
  return {
    z,
    beyondAction,
    beyondWarning,
    action: { lower: evaluation.lowerAction, upper: evaluation.upperAction },
    warning: { lower: evaluation.lowerWarning, upper: evaluation.upperWarning },
  };
}

function singleMethods({ model, counts, action, warning }: SigmaChartInput, centre: number): ChartColumns {
  const length = counts.numerators.length;
  const limits = model === "binomial" ? pChartLimits : uChartLimits;
  const sizes = counts.denominators.map((size, slot) => (Number.isNaN(counts.numerators[slot]) ? NaN : size));
  return {
    z: markZScores(model, counts, centre, new Float64Array(length).fill(NaN)),
    action: limits(centre, sizes, action),
    warning: limits(centre, sizes, warning),
    beyondAction: markSigmaVerdicts(model, counts, centre, action, new Int8Array(length)),
    beyondWarning: markSigmaVerdicts(model, counts, centre, warning, new Int8Array(length)),
  };
}
