/**
 * Shapes shared by the methods of this folder. Everything is columnar: one typed array a column, one slot a
 * calendar month, so that a sweep over thousands of series allocates no object a point.
 */

/** Binomial for proportions (p chart), Poisson for rates (u chart). */
export type CountModel = "binomial" | "poisson";

/** How limits are worked out; `auto` is settled to one of these when the baseline is set. */
export type LimitMethod = "three-sigma" | "exact" | "overdispersed";

export type Side = "upper" | "lower";

/** Rules on by default, then rules that are switched on per indicator. */
export type RuleName =
  "beyond-action" | "two-of-three" | "one-side" | "four-of-five" | "trend" | "within-one-sigma";

export interface RuleSettings {
  name: RuleName;
  /** Run length for `one-side`, `trend` and `within-one-sigma`; ignored by the others. */
  length?: number;
}

/**
 * One series in month order. NaN in either column: nothing is plotted in that slot (missing, not collected,
 * awaited, not complete yet); denominator 0 likewise. Every calendar month has a slot, so that gaps are counted.
 */
export interface CountColumns {
  numerators: Float64Array;
  denominators: Float64Array;
}

/** A stretch of months under one centre line. Slots are [start, end), 0-based. */
export interface SegmentInput {
  start: number;
  end: number;
  /** 1 where the slot belongs to the baseline (and is not left out), else 0; length of the whole series. */
  inBaseline: Uint8Array;
  /** `auto` settles by domain rule 3 from the baseline's slots. */
  method: LimitMethod | "auto";
}

export interface SeriesInput {
  model: CountModel;
  counts: CountColumns;
  segments: SegmentInput[];
  rules: RuleSettings[];
  /** Which direction is better: decides below detection. */
  betterWhen: "lower" | "higher" | "neither";
}

export interface SegmentResult {
  start: number;
  end: number;
  /** Total numerators over total denominators of the baseline; null with no denominator in it. */
  centre: number | null;
  method: LimitMethod;
  /** Laney's sigma z over the baseline; null with fewer than two plotted baseline months or no spread. */
  sigmaZ: number | null;
  /** Plotted baseline months, and events expected in them (sum of n times the centre line). */
  baselineMonths: number;
  baselineExpected: number;
  /** False where no limits exist: centre 0, centre 1 (binomial), or no baseline. */
  hasLimits: boolean;
}

/** One signal of one rule, slots inclusive and 0-based. */
export interface DetectedSignal {
  rule: RuleName;
  /** Of a `trend`: upper where rising. `within-one-sigma` has no side and is always given as upper. */
  side: Side;
  first: number;
  last: number;
  segment: number;
  /** True where unplotted slots lie between first and last. */
  spansGap: boolean;
}

/** Columns have the series' length; NaN where nothing exists. */
export interface SeriesEvaluation {
  segments: SegmentResult[];
  values: Float64Array;
  centre: Float64Array;
  /** (value - centre) / sigma_i; `zRules` divides by sigma_z too where limits are overdispersed. */
  z: Float64Array;
  zRules: Float64Array;
  lowerAction: Float64Array;
  upperAction: Float64Array;
  lowerWarning: Float64Array;
  upperWarning: Float64Array;
  /** -1 below the lower, 1 above the upper action limit, 0 inside or not plotted. */
  beyondAction: Int8Array;
  beyondWarning: Int8Array;
  /** 1 where even the best possible count would not be beyond the action limit on the better side. */
  belowDetection: Uint8Array;
  signals: DetectedSignal[];
}
