import type { LimitMethod, Side } from "@/lib/limits/types";

/**
 * Everything that a control chart shows of one series, in month order: what the scene, the reading strip and the
 * table are made from. Values and limits are fractions (numerator over denominator); `per` scales them for
 * reading. Months are addressed by their 0-based place in `points`; `from` and `to` are both included.
 */
export interface ChartData {
  /** Indicator and ward, as in "unplanned readmissions, Osier ward". */
  title: string;
  /** 100 shows percent, 1000 a rate per 1000, and so on. */
  per: number;
  kind: "proportion" | "rate";
  /** "percent", or "per 1000 bed days". */
  unitWords: string;
  betterWhen: "lower" | "higher" | "neither";
  numeratorLabel: string;
  denominatorLabel: string;
  points: ChartPoint[];
  segments: ChartSegment[];
  runs: ChartStretch[];
  /** Two of three past the same warning limit. */
  pairs: ChartStretch[];
  /** A fraction, like the values. */
  target: number | null;
  /** False where no limits exist (no events in the baseline): points only, and the page says why. */
  hasLimits: boolean;
}

export type PointState =
  "counted" | "open" | "ripening" | "awaited" | "not-collected" | "nothing-to-count" | "missing";

export interface ChartPoint {
  /** `YYYY-MM`. */
  month: string;
  /** "June 2026". */
  label: string;
  numerator: number | null;
  denominator: number | null;
  value: number | null;
  state: PointState;
  /** After the state's own words: "until 30 December", a reason, a source. */
  stateDetail?: string | null;
  centre: number | null;
  lowerAction: number | null;
  upperAction: number | null;
  lowerWarning: number | null;
  upperWarning: number | null;
  belowDetection: boolean;
  /** Outside an action limit. */
  beyond: Side | null;
  /** Outside a warning limit; also set where `beyond` is. */
  pastWarning: Side | null;
  leftOut: boolean;
  corrected: boolean;
  late: boolean;
  note: string | null;
  /** The count of a month that is not complete yet. */
  countSoFar: number | null;
}

export interface ChartSegment {
  from: number;
  to: number;
  centre: number | null;
  provisional: boolean;
  trial: boolean;
  /** "New baseline from Jan 2025"; null for the series' first segment. */
  newBaselineLabel: string | null;
  method: LimitMethod;
  /** The centre line before a shift away from better, drawn through this segment. */
  earlierCentre?: number | null;
  /** A sentence for the table's dividing row, in place of the built one. */
  summary?: string | null;
}

export interface ChartStretch {
  from: number;
  to: number;
  side: Side;
  /** "Run of 8 below the centre line". */
  label: string;
}

/** The segment that a month belongs to; null where none covers it. */
export function segmentAt(data: ChartData, index: number): ChartSegment | null {
  return data.segments.find((segment) => index >= segment.from && index <= segment.to) ?? null;
}

/** A month whose value takes part in the record. */
export function isPlotted(point: ChartPoint | undefined): point is ChartPoint & { value: number } {
  return point !== undefined && point.state === "counted" && point.value !== null;
}

/** A month in whose slot limits are drawn. */
export function hasLimitsAt(data: ChartData, index: number): boolean {
  const point = data.points[index];
  if (!data.hasLimits || !isPlotted(point)) return false;
  return point.lowerAction !== null || point.upperAction !== null;
}
