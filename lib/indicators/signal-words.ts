import type { Side } from "@/lib/limits/types";
import { ruleWords, signalSentences as say, towardsWords, withdrawnWords } from "@/lib/strings/signals";
import type { MarkId } from "@/lib/strings/frame";
import {
  formatCount,
  formatOdds,
  formatRateSign,
  formatRateWords,
  longMonth,
  midSentence,
} from "./chart-format";
import type { Month } from "./month";
import type { SignalEvidence } from "./signal-evidence";
import type { Towards, WithdrawnReason } from "./vocabulary";

/** What the words about a series' figures need besides the figures. */
export interface SeriesLabels {
  numeratorLabel: string;
  denominatorLabel: string;
  per: number;
}

export interface SignalToSay {
  rule: string;
  side: Side;
  from: Month;
  to: Month;
  towards: Towards;
  spansGap: boolean;
  withdrawnWhy: WithdrawnReason | null;
}

/** A signal in words: a mark, a heading, and sentences on what was counted and what the chart says. */
export interface SignalWords {
  mark: MarkId;
  /** "Run of 8 below the centre line". */
  what: string;
  /** "February 2026 to September 2026". */
  months: string;
  /** "away from better", or null where neither direction is. */
  towards: string | null;
  sentences: string[];
  /** "1 in 830", or null. */
  odds: string | null;
}

/** Says what was counted first, then what the chart says, then how easily chance does the same. */
export function signalWords(
  signal: SignalToSay,
  evidence: SignalEvidence | null,
  labels: SeriesLabels,
): SignalWords {
  const odds = evidence?.chance == null ? null : formatOdds(evidence.chance);
  const withdrawn = signal.withdrawnWhy === null ? [] : [say.withdrawn(withdrawnWords[signal.withdrawnWhy])];
  const gap = signal.spansGap ? [say.spansGap] : [];
  const facts = evidence ? factSentences(signal, evidence, labels, odds) : [say.evidenceGone];
  return {
    mark: markOf(signal),
    what: whatWasSeen(signal, evidence?.months ?? 0),
    months: spanInWords(signal.from, signal.to),
    towards: towardsWords[signal.towards],
    sentences: [...withdrawn, ...facts, ...gap],
    odds,
  };
}

export function markOf({ rule, side }: { rule: string; side: Side }): MarkId {
  if (rule === "beyond-action") return side === "upper" ? "above" : "below";
  if (rule === "two-of-three" || rule === "four-of-five") return "pair";
  return "run";
}

/** The rule's name with its side and, for runs, its length in plotted months. */
export function whatWasSeen({ rule, side }: { rule: string; side: Side }, months: number): string {
  switch (rule) {
    case "beyond-action":
      return ruleWords.beyond(side);
    case "two-of-three":
      return ruleWords.twoOfThree(side);
    case "one-side":
      return ruleWords.run(months, side);
    case "four-of-five":
      return ruleWords.fourOfFive(side);
    case "trend":
      return ruleWords.trend(months, side);
    case "within-one-sigma":
      return ruleWords.withinOne(months);
    default:
      return ruleWords.other;
  }
}

export function spanInWords(from: Month, to: Month): string {
  return from === to ? longMonth(from) : say.monthSpan(longMonth(from), longMonth(to));
}

/** "6 infections in 268 catheter days, 22.4 per 1000." */
export function countedSentence(numerator: number, denominator: number, labels: SeriesLabels): string {
  const label = midSentence(labels.numeratorLabel);
  const outOf = midSentence(labels.denominatorLabel);
  const size = formatCount(denominator);
  if (numerator === 0) return say.noneCounted(label, size, outOf);
  const rate = formatRateWords(numerator / denominator, labels.per);
  if (numerator === 1) return say.oneCounted(label, size, outOf, rate);
  return say.counted(formatCount(numerator), label, size, outOf, rate);
}

/** An expected number: whole from 20 up, one decimal below. */
export function formatExpected(expected: number): string {
  return expected >= 20 ? formatCount(Math.round(expected)) : expected.toFixed(1);
}

function factSentences(
  { rule, side }: SignalToSay,
  evidence: SignalEvidence,
  labels: SeriesLabels,
  odds: string | null,
): string[] {
  const counted = countedSentence(evidence.observed, evidence.denominator, labels);
  const expected = formatExpected(evidence.expected);
  const centre = formatRateWords(evidence.centre, labels.per);
  const what = evidence.months === 1 ? "month" : "stretch";
  const tailOdds = odds === null ? [] : [oddsSentence(side, evidence.observed, odds, what)];
  const limit = evidence.limit === null ? null : limitText(evidence.limit, evidence.rate, labels.per);
  switch (rule) {
    case "beyond-action": {
      const passed =
        evidence.months > 1 ? say.limitsPassed(side, evidence.months) : limit && say.limit(side, limit);
      return [counted, ...(passed ? [passed] : []), say.expected(expected), ...tailOdds];
    }
    case "two-of-three":
      return [counted, ...(limit ? [say.warning(side, limit)] : []), say.expected(expected), ...tailOdds];
    case "one-side":
      return [counted, say.expectedAtCentre(expected, centre), ...(odds === null ? [] : [say.oddsRun(odds)])];
    case "within-one-sigma":
      return [counted, say.withinOne];
    default:
      return [counted, say.expectedAtCentre(expected, centre), ...tailOdds];
  }
}

/** One decimal, or two where the limit would read like the rate that lies beyond it. */
function limitText(limit: number, rate: number, per: number): string {
  const text = formatRateSign(limit, per);
  if (text !== formatRateSign(rate, per)) return text;
  return per === 100 ? `${(limit * per).toFixed(2)}%` : (limit * per).toFixed(2);
}

function oddsSentence(side: Side, observed: number, odds: string, what: "month" | "stretch"): string {
  if (side === "lower" && observed === 0) return say.oddsNone(odds, what);
  return (side === "upper" ? say.oddsMore : say.oddsFewer)(formatCount(observed), odds, what);
}
