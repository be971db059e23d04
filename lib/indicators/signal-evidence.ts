import { lowerTail, upperTail } from "@/lib/limits/count-tails";
import { sideChance } from "@/lib/limits/joint-chance";
import type { CountModel, Side } from "@/lib/limits/types";
import type { Month } from "./month";

/** What a month of a chart must say for a signal's evidence; null where nothing is plotted. */
export interface EvidenceMonth {
  month: string;
  numerator: number | null;
  denominator: number | null;
  /** The rate, where the month is plotted. */
  value: number | null;
  centre: number | null;
  lowerAction: number | null;
  upperAction: number | null;
  lowerWarning: number | null;
  upperWarning: number | null;
}

export interface SignalMonths {
  rule: string;
  side: Side;
  from: Month;
  to: Month;
}

/** What a signal rests on: its plotted months taken together. Rates are fractions of 1. */
export interface SignalEvidence {
  /** Plotted months from the first to the last. */
  months: number;
  observed: number;
  denominator: number;
  expected: number;
  /** observed / denominator. */
  rate: number;
  centre: number;
  /** The limit that the last month is beyond, for rules about limits; null for the others. */
  limit: number | null;
  /** Exact probability of as much or more by chance; null where the rule has no plain one. */
  chance: number | null;
}

interface Plotted {
  numerator: number;
  denominator: number;
  centre: number;
}

/**
 * The evidence of a signal at the figures and centre line in force; null where no month of it is plotted any
 * more (its evidence has gone).
 *
 * Chance: of a run on one side, the product of its months' exact chances of that side; of rules about limits, the
 * exact binomial or Poisson tail of the months taken as one. Trends and months too close to the centre have none.
 */
export function signalEvidence(
  all: readonly EvidenceMonth[],
  signal: SignalMonths,
  model: CountModel,
): SignalEvidence | null {
  const inside = all.filter(({ month }) => month >= signal.from && month <= signal.to);
  const plotted = inside.flatMap(({ numerator, denominator, centre, value }): Plotted[] =>
    numerator === null || denominator === null || centre === null || value === null
      ? []
      : [{ numerator, denominator, centre }],
  );
  const last = plotted.at(-1);
  if (!last) return null;
  const sum = (of: (month: Plotted) => number) => plotted.reduce((total, each) => total + of(each), 0);
  const observed = sum((each) => each.numerator);
  const denominator = sum((each) => each.denominator);
  return {
    months: plotted.length,
    observed,
    denominator,
    expected: sum((each) => each.denominator * each.centre),
    rate: observed / denominator,
    centre: last.centre,
    limit: limitOf(
      inside.findLast((each) => each.value !== null),
      signal,
    ),
    chance: chanceOf(plotted, { observed, denominator, centre: last.centre }, signal, model),
  };
}

function limitOf(month: EvidenceMonth | undefined, { rule, side }: SignalMonths): number | null {
  if (!month) return null;
  if (rule === "beyond-action") return side === "upper" ? month.upperAction : month.lowerAction;
  if (rule === "two-of-three") return side === "upper" ? month.upperWarning : month.lowerWarning;
  return null;
}

function chanceOf(
  plotted: readonly Plotted[],
  pooled: { observed: number; denominator: number; centre: number },
  { rule, side }: SignalMonths,
  model: CountModel,
): number | null {
  switch (rule) {
    case "one-side":
      return plotted.reduce(
        (product, each) => product * sideChance(model, side, each.denominator, each.centre),
        1,
      );
    case "beyond-action":
    case "two-of-three":
    case "four-of-five": {
      const tail = side === "upper" ? upperTail : lowerTail;
      return tail(model, pooled.observed, pooled.denominator, pooled.centre);
    }
    default:
      return null;
  }
}
