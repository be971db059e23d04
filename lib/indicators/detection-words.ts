import { monthsToPool, smallestDetectableDenominator } from "@/lib/limits/below-detection";
import { detectableRate } from "@/lib/limits/detectable-rate";
import type { LimitBasis } from "@/lib/limits/limit-basis";
import type { Side } from "@/lib/limits/types";
import { zeroEventBound } from "@/lib/limits/zero-event-bound";
import { detectionSentences as say } from "@/lib/strings/detection";
import { formatCount, formatRateWords, inWords, longMonth, midSentence } from "./chart-format";
import type { ChartMonth } from "./chart-points";
import type { SeriesLabels } from "./signal-words";
import type { Direction } from "./vocabulary";

/** Chance with which a change "would probably have shown". */
const PROBABLY = 0.8;
/** Months named one by one; the smallest change is given for the latest three. */
const NAMED_MONTHS = 6;
const DETAILED_MONTHS = 3;
const USUAL_MONTHS = 12;

export interface DetectionFacts {
  months: readonly ChartMonth[];
  /** Of each segment; null where it has no limits. */
  bases: readonly (LimitBasis | null)[];
  betterWhen: Direction;
  labels: SeriesLabels;
}

export interface DetectionWords {
  title: string;
  /** Which months. */
  months: string;
  sentences: string[];
}

/**
 * What the months below detection could not have shown, what they could have, what would be needed, and for the
 * latest one without an event how high the true rate may still be. Null where no month is below detection.
 */
export function detectionWords(facts: DetectionFacts): DetectionWords | null {
  const small = facts.months.filter((month) => month.belowDetection);
  const latest = small.at(-1);
  if (!latest) return null;
  const { betterWhen } = facts;
  return {
    title: say.title[betterWhen],
    months: whichMonths(small, facts.months),
    sentences: [
      say.evenBest[betterWhen],
      ...otherHalf(small, facts),
      ...whatWouldDo(latest, facts),
      ...zeroSentence(small, facts),
    ],
  };
}

function whichMonths(small: readonly ChartMonth[], all: readonly ChartMonth[]): string {
  if (small.length <= NAMED_MONTHS) return say.months(inWords(small.map((each) => longMonth(each.month))));
  const plotted = all.filter((each) => each.state === "counted").length;
  return say.many(formatCount(small.length), formatCount(plotted), longMonth(small.at(-1)?.month ?? ""));
}

/** The change on the other side that a month would probably have shown. */
function otherHalf(small: readonly ChartMonth[], { bases, betterWhen, labels }: DetectionFacts): string[] {
  const side: Side = betterWhen === "higher" ? "lower" : "upper";
  const list = small.slice(-DETAILED_MONTHS).flatMap((month) => {
    const basis = bases[month.segment] ?? null;
    if (basis === null || month.denominator === null) return [];
    const rate = detectableRate(basis, month.denominator, PROBABLY, side);
    const name = longMonth(month.month);
    return [rate === null ? say.notEvenInMonth(name) : say.inMonth(name, formatRateWords(rate, labels.per))];
  });
  return list.length === 0 ? [] : [say.wouldHaveShown(side === "upper" ? "rise" : "fall", list.join("; "))];
}

function whatWouldDo(latest: ChartMonth, { months, bases, betterWhen, labels }: DetectionFacts): string[] {
  const basis = bases[latest.segment] ?? null;
  const needed = basis && smallestDetectableDenominator(basis, betterWhen);
  if (needed === null) return [];
  const change = betterWhen === "higher" ? "rise" : "fall";
  const sentences = [say.needs(formatCount(needed), midSentence(labels.denominatorLabel), change)];
  const usual = usualDenominator(months);
  const pooled = usual === null ? null : monthsToPool(needed, usual);
  if (usual !== null && pooled !== null && pooled > 1) {
    sentences.push(say.pool(formatCount(pooled), formatCount(usual)));
  }
  return sentences;
}

/** The middle denominator of the latest counted months, rounded down to a count. */
function usualDenominator(months: readonly ChartMonth[]): number | null {
  const sizes = months
    .filter((month) => month.state === "counted")
    .slice(-USUAL_MONTHS)
    .flatMap((month) => (month.denominator === null ? [] : [month.denominator]))
    .sort((left, right) => left - right);
  return sizes[Math.floor((sizes.length - 1) / 2)] ?? null;
}

/** Nothing counted reads like nothing happened; where higher is better a zero misleads nobody. */
function zeroSentence(small: readonly ChartMonth[], { bases, betterWhen, labels }: DetectionFacts): string[] {
  const zero = small.findLast((month) => month.numerator === 0);
  const basis = zero && bases[zero.segment];
  if (!zero || !basis || zero.denominator === null || betterWhen === "higher") return [];
  const bound = zeroEventBound(basis.model, zero.denominator);
  return [
    say.zero(
      midSentence(labels.numeratorLabel),
      longMonth(zero.month),
      formatCount(zero.denominator),
      midSentence(labels.denominatorLabel),
      formatRateWords(bound, labels.per),
    ),
  ];
}

/**
 * How blind a month without a signal was: the change away from better that it would probably have shown.
 * Null where no limits exist.
 */
export function quietWords(month: ChartMonth, facts: Omit<DetectionFacts, "months">): string | null {
  const basis = facts.bases[month.segment] ?? null;
  if (basis === null || month.denominator === null) return null;
  const side: Side = facts.betterWhen === "higher" ? "lower" : "upper";
  const change = side === "upper" ? "rise" : "fall";
  const rate = detectableRate(basis, month.denominator, PROBABLY, side);
  const name = longMonth(month.month);
  if (rate === null) return say.quietBlind(name, change);
  return say.quiet(name, change, formatRateWords(rate, facts.labels.per));
}
