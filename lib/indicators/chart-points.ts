import type { SeriesEvaluation, Side } from "@/lib/limits/types";
import type { Month } from "./month";
import type { AssembledSeries, PointState, SeriesSlot } from "./series";

/** One month of a chart as known and as judged. Values and limits are fractions of 1; null where nothing exists. */
export interface ChartMonth {
  month: Month;
  state: PointState;
  numerator: number | null;
  denominator: number | null;
  /** The rate; also of an open return that has both counts, which is drawn hollow and judged by nothing. */
  value: number | null;
  z: number | null;
  centre: number | null;
  lowerAction: number | null;
  upperAction: number | null;
  lowerWarning: number | null;
  upperWarning: number | null;
  belowDetection: boolean;
  beyond: Side | null;
  /** Outside a warning limit; also set where `beyond` is. */
  pastWarning: Side | null;
  /** Left out of the baseline of some segment. */
  leftOut: boolean;
  /** Place in the series' segments; -1 in none. */
  segment: number;
}

/** The months of an evaluated series, every calendar month with nulls where nothing is plotted. */
export function chartMonths(
  { slots, segments }: AssembledSeries,
  evaluation: SeriesEvaluation,
): ChartMonth[] {
  const leftOut = new Set<string>(
    segments.flatMap((segment) => segment.baseline?.leftOut.map((each) => each.month) ?? []),
  );
  return slots.map((slot, index) => ({
    ...slot,
    value: orNull(evaluation.values[index]) ?? openValue(slot),
    z: orNull(evaluation.z[index]),
    centre: orNull(evaluation.centre[index]),
    lowerAction: orNull(evaluation.lowerAction[index]),
    upperAction: orNull(evaluation.upperAction[index]),
    lowerWarning: orNull(evaluation.lowerWarning[index]),
    upperWarning: orNull(evaluation.upperWarning[index]),
    belowDetection: evaluation.belowDetection[index] === 1,
    beyond: sideOf(evaluation.beyondAction[index]),
    pastWarning: sideOf(evaluation.beyondWarning[index]) ?? sideOf(evaluation.beyondAction[index]),
    leftOut: leftOut.has(slot.month),
    segment: segments.findIndex((segment) => index >= segment.start && index < segment.end),
  }));
}

function openValue({ state, numerator, denominator }: SeriesSlot): number | null {
  if (state !== "open" || numerator === null || denominator === null || denominator === 0) return null;
  return numerator / denominator;
}

/** Columns say NaN where nothing exists. */
function orNull(value: number | undefined): number | null {
  return value === undefined || Number.isNaN(value) ? null : value;
}

function sideOf(code: number | undefined): Side | null {
  if (code === undefined || code === 0) return null;
  return code > 0 ? "upper" : "lower";
}
