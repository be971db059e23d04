import type { SegmentInput, SeriesInput } from "@/lib/limits/types";
import { isComplete } from "./maturity";
import { compareMonths, monthRange, monthsBetween, type Month } from "./month";
import { segmentsOf, type BaselineFacts, type SeriesSegment } from "./segments";
import { answerOf, type TallyFigures } from "./tally-answer";
import type { Direction, Kind, LimitChoice, WatchedRule } from "./vocabulary";

/** What a month of a chart is; only `counted` months are plotted with limits and judged. */
export type PointState =
  "counted" | "open" | "ripening" | "awaited" | "not-collected" | "nothing-to-count" | "missing";

export interface SeriesIndicator {
  kind: Kind;
  betterWhen: Direction;
  limits: LimitChoice;
  rules: readonly { name: WatchedRule; length?: number }[];
  matureAfterDays: number;
}

/** One month as known: the figures on the chart, or those typed so far while the return is open. */
export interface SeriesTally extends TallyFigures {
  month: Month;
  charted: boolean;
}

export interface SeriesFacts {
  indicator: SeriesIndicator;
  /** First months of definitions that can't be compared with the one before. */
  definitionBreaks: readonly Month[];
  baselines: readonly BaselineFacts[];
  tallies: readonly SeriesTally[];
  /** Last month to show even where nothing came in, such as the last one that is due; null for none. */
  showUntil: Month | null;
  /** Date in the hospital's time zone, for what isn't complete yet. */
  today: string;
}

export interface SeriesSlot {
  month: Month;
  state: PointState;
  numerator: number | null;
  denominator: number | null;
}

export interface AssembledSeries {
  slots: SeriesSlot[];
  segments: SeriesSegment[];
  /** Ready for lib/limits. */
  input: SeriesInput;
}

/** Puts one series into month order, a slot for every calendar month, cut into segments of one baseline each. */
export function assembleSeries(facts: SeriesFacts): AssembledSeries {
  const slots = slotsOf(facts);
  const numerators = new Float64Array(slots.length).fill(Number.NaN);
  const denominators = new Float64Array(slots.length).fill(Number.NaN);
  slots.forEach((slot, index) => {
    if (slot.state !== "counted") return;
    numerators[index] = slot.numerator ?? Number.NaN;
    denominators[index] = slot.denominator ?? Number.NaN;
  });
  const segments = segmentsOf(slots, facts.baselines, facts.definitionBreaks);
  return {
    slots,
    segments,
    input: {
      model: facts.indicator.kind === "proportion" ? "binomial" : "poisson",
      counts: { numerators, denominators },
      segments: segments.map((segment) => segmentInput(segment, facts.indicator.limits)),
      rules: facts.indicator.rules.map((rule) => ({ ...rule })),
      betterWhen: facts.indicator.betterWhen,
    },
  };
}

function segmentInput(segment: SeriesSegment, choice: LimitChoice): SegmentInput {
  return {
    start: segment.start,
    end: segment.end,
    inBaseline: segment.inBaseline,
    // A decided baseline settled its method; trial limits follow the indicator's choice.
    method: segment.baseline?.limits ?? choice,
  };
}

function slotsOf(facts: SeriesFacts): SeriesSlot[] {
  const known = [...facts.tallies].sort((left, right) => compareMonths(left.month, right.month));
  const first = known[0]?.month;
  if (first === undefined) return [];
  const lastKnown = known.at(-1)?.month ?? first;
  const last = facts.showUntil !== null && facts.showUntil > lastKnown ? facts.showUntil : lastKnown;
  const slots: SeriesSlot[] = monthRange(first, last).map((month) => ({
    month,
    state: "missing",
    numerator: null,
    denominator: null,
  }));
  for (const tally of known) {
    slots[monthsBetween(first, tally.month)] = {
      month: tally.month,
      state: stateOf(tally, facts.indicator.matureAfterDays, facts.today),
      numerator: tally.numerator,
      denominator: tally.denominator,
    };
  }
  return slots;
}

function stateOf(tally: SeriesTally, matureAfterDays: number, today: string): PointState {
  if (!tally.charted) return answerOf(tally) === "blank" ? "missing" : "open";
  switch (answerOf(tally)) {
    case "count":
      return isComplete(tally.month, matureAfterDays, today) ? "counted" : "ripening";
    case "nothing-to-count":
      return "nothing-to-count";
    case "not-collected":
      return "not-collected";
    case "awaited":
      return "awaited";
    default:
      return "missing";
  }
}
