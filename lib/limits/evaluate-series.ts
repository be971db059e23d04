import { at, emptyColumn, isPlotted } from "./columns";
import { evaluateSegment } from "./evaluate-segment";
import { collectSignals } from "./rules/collect-signals";
import { findHits, valuesInOrder } from "./rules/find-hits";
import { plottedOrder } from "./rules/plotted-order";
import type { CountColumns, SegmentResult, SeriesEvaluation, SeriesInput } from "./types";
import { validateSeries } from "./validate-series";

/**
 * Judges a whole series: values, centre lines, limits, verdicts, below detection and signals.
 *
 * @param given columns with one slot a calendar month; NaN or denominator 0: nothing is plotted in that slot, which
 * changes no other month's limits and neither lengthens nor ends a run. Slots outside every segment get a value only.
 * Where a segment has no limits (no baseline, centre 0 or 1) it has no signals either.
 * Signals come segment by segment and rule by rule in the order of the input. Formulas and sources: the single
 * methods' own files. Errors: RangeError on a series that no chart can be drawn of.
 */
export function evaluateSeries(given: SeriesInput): SeriesEvaluation {
  validateSeries(given);
  const input = { ...given, counts: plottedCounts(given.counts) };
  const length = input.counts.numerators.length;
  const evaluation: SeriesEvaluation = {
    segments: [],
    values: rates(input.counts),
    centre: emptyColumn(length),
    z: emptyColumn(length),
    zRules: emptyColumn(length),
    lowerAction: emptyColumn(length),
    upperAction: emptyColumn(length),
    lowerWarning: emptyColumn(length),
    upperWarning: emptyColumn(length),
    beyondAction: new Int8Array(length),
    beyondWarning: new Int8Array(length),
    belowDetection: new Uint8Array(length),
    signals: [],
  };
  for (const segment of input.segments) {
    const result = evaluateSegment(input, segment, evaluation);
    evaluation.segments.push(result);
    applyRules(input, result, evaluation);
  }
  return evaluation;
}

/** A month of which one half is missing has no point and no limits: both halves become NaN. */
function plottedCounts({ numerators, denominators }: CountColumns): CountColumns {
  const plotted = {
    numerators: emptyColumn(numerators.length),
    denominators: emptyColumn(numerators.length),
  };
  for (let slot = 0; slot < numerators.length; slot += 1) {
    if (!isPlotted(at(numerators, slot), at(denominators, slot))) continue;
    plotted.numerators[slot] = at(numerators, slot);
    plotted.denominators[slot] = at(denominators, slot);
  }
  return plotted;
}

function rates({ numerators, denominators }: CountColumns): Float64Array {
  const values = new Float64Array(numerators.length);
  for (let slot = 0; slot < values.length; slot += 1) {
    values[slot] = at(numerators, slot) / at(denominators, slot);
  }
  return values;
}

function applyRules(input: SeriesInput, result: SegmentResult, evaluation: SeriesEvaluation): void {
  if (!result.hasLimits || result.centre === null) return;
  const order = plottedOrder(evaluation.values, result.start, result.end);
  const ground = {
    model: input.model,
    centre: result.centre,
    denominators: input.counts.denominators,
    beyondAction: evaluation.beyondAction,
    beyondWarning: evaluation.beyondWarning,
    order,
    z: valuesInOrder(evaluation.zRules, order),
  };
  const segment = evaluation.segments.length - 1;
  for (const rule of input.rules) {
    collectSignals(findHits(rule, ground), order, rule.name, segment, evaluation.signals);
  }
}
