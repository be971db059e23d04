import { detectableRate } from "@/lib/limits/detectable-rate";
import type { LimitBasis } from "@/lib/limits/limit-basis";
import type { CountModel } from "@/lib/limits/types";
import { zeroEventBound } from "@/lib/limits/zero-event-bound";
import type { MarkId } from "@/lib/strings/frame";
import { sentWords as say } from "@/lib/strings/sent-return";
import { formatCount, formatRateWords, longDate, midSentence } from "./chart-format";
import type { ChartMonth } from "./chart-points";
import { signalEvidence } from "./signal-evidence";
import { towardsOf, type FoundSignal } from "./signal-life";
import { signalWords, type SeriesLabels } from "./signal-words";
import type { Direction } from "./vocabulary";

/** Chance with which a change "would probably have shown". */
const PROBABLY = 0.8;

/** What one line of a sent return shows, and what follows from it for the ward. */
export interface SentSaying {
  mark: MarkId | null;
  title: string;
  sentence: string;
  next: string;
  isSignal: boolean;
}

export interface SentFacts {
  /** The return's month on the line's chart; null where nothing of it is on the chart. */
  month: ChartMonth | null;
  all: readonly ChartMonth[];
  /** Signals of the series as detected now. */
  signals: readonly FoundSignal[];
  /** Of each segment; null where it has no limits. */
  bases: readonly (LimitBasis | null)[];
  model: CountModel;
  betterWhen: Direction;
  labels: SeriesLabels;
  /** Why nothing was collected, and where the denominator comes from. */
  notCollected: string | null;
  awaited: string | null;
  /** `YYYY-MM-DD` on which the month is complete. */
  matureOn: string;
}

/** Says of a sent line what its month shows: a signal first, else how blind the month was. */
export function sentSaying(facts: SentFacts): SentSaying {
  const { month } = facts;
  const quiet = (mark: MarkId | null, title: string, sentence: string, next: string): SentSaying => ({
    mark,
    title,
    sentence,
    next,
    isSignal: false,
  });
  switch (month?.state) {
    case "counted":
      return signalSaying(facts, month) ?? countedSaying(facts, month);
    case "ripening":
      return quiet("ripening", say.ripening, say.ripeningUntil(longDate(facts.matureOn)), say.ripeningNext);
    case "awaited":
      return quiet("awaited", say.awaited, say.awaitedFrom(facts.awaited ?? ""), say.awaitedNext);
    case "not-collected":
      return quiet(null, say.notCollected, facts.notCollected ?? "", say.nothing);
    case "nothing-to-count":
      return quiet(null, say.nothingToCount, say.noRate, say.nothing);
    default:
      return quiet("missing", say.notEntered, say.notOnChart, say.notEnteredNext);
  }
}

function signalSaying(facts: SentFacts, month: ChartMonth): SentSaying | null {
  const here = facts.signals.filter((signal) => signal.from <= month.month && month.month <= signal.to);
  const signal = here.find((each) => each.rule === "beyond-action") ?? here[0];
  if (!signal) return null;
  const evidence = signalEvidence(facts.all, signal, facts.model);
  const words = signalWords(
    { ...signal, towards: towardsOf(signal.side, facts.betterWhen), withdrawnWhy: null },
    evidence,
    facts.labels,
  );
  const sentence = [...words.sentences, say.whatItSays].join(" ");
  return { mark: words.mark, title: `${words.what}.`, sentence, next: say.signalNext, isSignal: true };
}

function countedSaying(facts: SentFacts, month: ChartMonth): SentSaying {
  const { labels } = facts;
  const blind = blindness(facts, month);
  const quiet = (mark: MarkId | null, title: string, sentence: string): SentSaying => ({
    mark,
    title,
    sentence,
    next: say.nothing,
    isSignal: false,
  });
  if (month.pastWarning !== null) {
    return { ...quiet("warn", say.pastWarning, say.insideAction), next: say.pastWarningNext };
  }
  if (
    month.numerator === 0 &&
    month.denominator !== null &&
    facts.betterWhen === "lower" &&
    month.belowDetection
  ) {
    const bound = formatRateWords(zeroEventBound(facts.model, month.denominator), labels.per);
    const size = `${formatCount(month.denominator)} ${midSentence(labels.denominatorLabel)}`;
    return quiet("shallow", say.zeroTitle, say.zero(size, bound));
  }
  if (month.belowDetection) return quiet("shallow", say.tooSmall[facts.betterWhen], blind);
  return quiet(null, say.quiet, blind);
}

/** The change away from better that the month would probably have shown. */
function blindness({ bases, betterWhen, labels }: SentFacts, month: ChartMonth): string {
  const basis = bases[month.segment] ?? null;
  if (basis === null || month.denominator === null) return say.noLimits;
  const side = betterWhen === "higher" ? "lower" : "upper";
  const change = side === "upper" ? "rise" : "fall";
  const rate = detectableRate(basis, month.denominator, PROBABLY, side);
  if (rate === null) return say.wouldNotHaveShown(change);
  return say.wouldHaveShown(change, formatRateWords(rate, labels.per));
}
