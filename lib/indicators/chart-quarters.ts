import { isBelowDetection } from "@/lib/limits/below-detection";
import { limitBasis, type LimitBasis } from "@/lib/limits/limit-basis";
import type { SeriesEvaluation, SeriesInput } from "@/lib/limits/types";
import { zScore } from "@/lib/limits/z-score";
import { limitsAt, sideBeyond } from "./chart-limits-at";
import type { ChartMonth } from "./chart-points";
import { quarterOf, type Month, type Quarter } from "./month";

/** Three months as one. `month` is the first of those that the point stands for, `until` the last. */
export interface ChartQuarter extends ChartMonth {
  quarter: Quarter;
  until: Month;
  /** The counted months in it. */
  months: Month[];
  /** Fewer than three counted months: one is missing, still to come, or under another baseline. */
  incomplete: boolean;
}

/**
 * A series by quarter: counts of the counted months added up and judged against the same centre line, at the
 * pooled denominator. A change of baseline or definition amid a quarter parts it, since nothing is pooled across.
 * Left-out months are pooled like the others. Runs belong to the months, so no rule is applied here.
 */
export function chartQuarters(
  months: readonly ChartMonth[],
  evaluation: SeriesEvaluation,
  input: SeriesInput,
): ChartQuarter[] {
  return groups(months).map((group) => {
    const segment = evaluation.segments[group[0]?.segment ?? -1];
    const basis = segment ? limitBasis(input.model, segment) : null;
    return poolQuarter(group, segment?.centre ?? null, basis, input.betterWhen);
  });
}

/** Months of one quarter and one segment. */
function groups(months: readonly ChartMonth[]): ChartMonth[][] {
  const found: ChartMonth[][] = [];
  for (const month of months) {
    const open = found.at(-1);
    const last = open?.at(-1);
    const joins = last && last.segment === month.segment && quarterOf(last.month) === quarterOf(month.month);
    if (open && joins) open.push(month);
    else found.push([month]);
  }
  return found;
}

function poolQuarter(
  group: readonly ChartMonth[],
  centre: number | null,
  basis: LimitBasis | null,
  betterWhen: SeriesInput["betterWhen"],
): ChartQuarter {
  const last = group.at(-1);
  const first = group[0];
  if (!first || !last) throw new RangeError("A quarter has a month.");
  const counted = group.filter((each) => each.state === "counted");
  const isPlotted = counted.length > 0;
  const numerator = counted.reduce((sum, each) => sum + (each.numerator ?? 0), 0);
  const denominator = counted.reduce((sum, each) => sum + (each.denominator ?? 0), 0);
  return {
    ...noVerdict,
    month: first.month,
    quarter: quarterOf(first.month),
    until: last.month,
    months: counted.map((each) => each.month),
    incomplete: counted.length < 3,
    state: isPlotted ? "counted" : last.state,
    numerator: isPlotted ? numerator : null,
    denominator: isPlotted ? denominator : null,
    value: isPlotted ? numerator / denominator : null,
    centre,
    leftOut: false,
    segment: first.segment,
    ...(isPlotted && basis ? judge(basis, numerator, denominator, betterWhen) : {}),
  };
}

const noVerdict = {
  z: null,
  lowerAction: null,
  upperAction: null,
  lowerWarning: null,
  upperWarning: null,
  belowDetection: false,
  beyond: null,
  pastWarning: null,
} satisfies Partial<ChartMonth>;

function judge(
  basis: LimitBasis,
  numerator: number,
  denominator: number,
  betterWhen: SeriesInput["betterWhen"],
) {
  const action = limitsAt(basis, denominator, "action");
  const warning = limitsAt(basis, denominator, "warning");
  const beyond = sideBeyond(basis, numerator, denominator, "action");
  return {
    z: zScore(basis.model, numerator, denominator, basis.centre),
    lowerAction: action.lower,
    upperAction: action.upper,
    lowerWarning: warning.lower,
    upperWarning: warning.upper,
    belowDetection: isBelowDetection(basis, denominator, betterWhen),
    beyond,
    pastWarning: beyond ?? sideBeyond(basis, numerator, denominator, "warning"),
  };
}
