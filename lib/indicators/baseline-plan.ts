import type { FieldError } from "@/lib/errors";
import { centreLine, type CentreLine } from "@/lib/limits/centre-line";
import { settleMethod } from "@/lib/limits/settle-method";
import type { LimitMethod } from "@/lib/limits/types";
import { longMonth } from "./chart-format";
import type { Month } from "./month";
import { baselineMonths, comparableStretch } from "./segments";
import { assembleSeries, type AssembledSeries, type SeriesFacts } from "./series";

/** The months that somebody wants limits to be worked out from. */
export interface BaselineDraft {
  from: Month;
  to: Month;
  leftOut: readonly { month: Month; reason: string }[];
  /** Null for the beginning of the chart. */
  appliesFrom: Month | null;
}

/** A draft with what the series makes of it today. */
export interface BaselinePlan {
  problems: FieldError[];
  /** Events, denominator and plotted months of the baseline. */
  line: CentreLine;
  /** What the indicator's choice comes to on these months; settled when the baseline is decided. */
  limits: LimitMethod;
}

/**
 * Checks a draft against the series and settles its limits.
 *
 * Months: at least one counted one; none after the last one shown; all under one definition, and under the one
 * that holds where the limits begin. A change begins inside the chart. Limits by domain rule 3: `auto` is exact
 * where a baseline month expects fewer than 5.
 */
export function planBaseline(facts: SeriesFacts, draft: BaselineDraft): BaselinePlan {
  const series = assembleSeries(facts);
  const inBaseline = monthsOf(series, facts.definitionBreaks, draft);
  const line = centreLine(series.input.counts, inBaseline);
  const choice = facts.indicator.limits;
  const { model, counts } = series.input;
  const auto = () => (line.centre === null ? "exact" : settleMethod(model, counts, line.centre, inBaseline));
  return {
    problems: problemsOf(series, facts.definitionBreaks, draft, line.months),
    line,
    limits: choice === "auto" ? auto() : choice,
  };
}

/** 1 where a slot takes part in the draft's limits. */
function monthsOf(series: AssembledSeries, breaks: readonly Month[], draft: BaselineDraft): Uint8Array {
  const { slots } = series;
  const begins = draft.appliesFrom ?? slots[0]?.month ?? draft.from;
  const slot = slots.findIndex((each) => each.month >= begins);
  return baselineMonths(slots, draft, comparableStretch(slots, breaks, Math.max(0, slot)));
}

function problemsOf(
  { slots }: AssembledSeries,
  breaks: readonly Month[],
  draft: BaselineDraft,
  countedMonths: number,
): FieldError[] {
  const first = slots[0]?.month;
  const last = slots.at(-1)?.month;
  if (first === undefined || last === undefined) {
    return [{ path: "from", message: "Nothing has been counted here yet." }];
  }
  const { from, to, appliesFrom } = draft;
  const problems: FieldError[] = [];
  if (to > last) problems.push({ path: "to", message: `The chart goes up to ${longMonth(last)}.` });
  if (appliesFrom !== null && (appliesFrom <= first || appliesFrom > last)) {
    const message = `A new baseline holds from a month after ${longMonth(first)}, up to ${longMonth(last)}. Leave this out for the chart's beginning.`;
    problems.push({ path: "appliesFrom", message });
  }
  const amid = breaks.find((month) => month > from && month <= to);
  const before = breaks.find((month) => month > (appliesFrom ?? first) && month <= from);
  if (amid !== undefined) {
    const message = `The definition changed in ${longMonth(amid)}; months before and after can't be taken together.`;
    problems.push({ path: "from", message });
  } else if (before !== undefined) {
    const message = `The definition changed in ${longMonth(before)}. Limits from these months hold from then on, not earlier.`;
    problems.push({ path: "appliesFrom", message });
  }
  if (problems.length === 0 && countedMonths === 0) {
    const message = `No month is counted between ${longMonth(from)} and ${longMonth(to)}.`;
    problems.push({ path: "from", message });
  }
  return problems;
}
