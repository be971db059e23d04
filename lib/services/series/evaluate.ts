import "server-only";
import type { SeriesColumns } from "@/db/schema";
import { baselineStatusOf } from "@/lib/indicators/baseline-status";
import { assembleSeries, type AssembledSeries, type SeriesFacts } from "@/lib/indicators/series";
import { inMonths, type FoundSignal } from "@/lib/indicators/signal-life";
import type { BaselineStatus } from "@/lib/indicators/vocabulary";
import { evaluateSeries, type SeriesEvaluation } from "@/lib/limits";

export interface EvaluatedSeries {
  assembled: AssembledSeries;
  evaluation: SeriesEvaluation;
  /** Of the last segment, which is the one in force. */
  baselineStatus: BaselineStatus;
  signals: FoundSignal[];
}

/** Assembles a series and works out limits, verdicts and signals: what every chart and every detection calls. */
export function evaluateFacts(facts: SeriesFacts): EvaluatedSeries {
  const assembled = assembleSeries(facts);
  const evaluation = evaluateSeries(assembled.input);
  const months = assembled.slots.map((slot) => slot.month);
  const last = evaluation.segments.at(-1);
  const lastSegment = assembled.segments.at(-1);
  return {
    assembled,
    evaluation,
    baselineStatus: last && lastSegment ? baselineStatusOf(lastSegment.baseline !== null, last) : "none",
    signals: evaluation.signals.map((signal) => {
      const segment = assembled.segments[signal.segment];
      if (!segment) throw new RangeError("A signal names no segment of its series.");
      return inMonths(signal, months, segment.from);
    }),
  };
}

const orNull = (value: number): number | null => (Number.isNaN(value) ? null : value);
const list = (column: Float64Array): (number | null)[] => Array.from(column, orNull);

/** The columns as stored in series_state: plain arrays, null where nothing exists. */
export function columnsOf({ assembled, evaluation }: EvaluatedSeries): SeriesColumns {
  return {
    months: assembled.slots.map((slot) => slot.month),
    numerators: list(assembled.input.counts.numerators),
    denominators: list(assembled.input.counts.denominators),
    values: list(evaluation.values),
    centre: list(evaluation.centre),
    z: list(evaluation.z),
    lowerAction: list(evaluation.lowerAction),
    upperAction: list(evaluation.upperAction),
    lowerWarning: list(evaluation.lowerWarning),
    upperWarning: list(evaluation.upperWarning),
    beyondAction: Array.from(evaluation.beyondAction),
    beyondWarning: Array.from(evaluation.beyondWarning),
    belowDetection: Array.from(evaluation.belowDetection, (flag) => flag === 1),
  };
}
