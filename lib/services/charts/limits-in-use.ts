import "server-only";
import {
  flagMonth,
  formatCount,
  formatRateWords,
  inWords,
  longMonth,
  midSentence,
} from "@/lib/indicators/chart-format";
import { formatExpected } from "@/lib/indicators/signal-words";
import { ONE_SIDE_LENGTH, isSmallCount } from "@/lib/limits";
import type { ChartSegmentReply } from "@/lib/schemas/chart";
import { limitsSentences as say } from "@/lib/strings/charts";
import { segmentReplies } from "./chart-segments";
import type { ChartView } from "./read-chart";

/** From this many times the spread of chance on, limits that allow for it are suggested. */
const MUCH_SPREAD = 1.3;
const ENOUGH_FOR_SPREAD = 20;

/** Which limits are in use and why, a sentence each; those of the last segment. */
export function limitsInUse(view: ChartView): string[] {
  const segment = segmentReplies(view.evaluated).at(-1);
  if (!segment) return [];
  if (!segment.hasLimits || segment.centre === null) return [whyNone(segment), ...statusSentences(segment)];
  return [
    methodSentence(segment, view),
    centreSentence(segment, segment.centre, view),
    ...statusSentences(segment),
    ...spreadSentences(segment),
    ...guardSentence(segment.centre, view),
  ];
}

function whyNone({ centre, limits, baseline }: ChartSegmentReply): string {
  if (centre === null || baseline.months === 0) return say.noBaselineMonth;
  if (centre === 0) return say.noEvents;
  return limits === "overdispersed" && centre < 1 ? say.noSpread : say.onlyEvents;
}

function methodSentence({ limits, sigmaZ }: ChartSegmentReply, view: ChartView): string {
  if (limits === "overdispersed") return say.overdispersed(twoDecimals(sigmaZ));
  if (limits === "three-sigma") return say["three-sigma"];
  const isChosen = view.query.limits === "exact" || view.series.indicator.limits === "exact";
  return isChosen ? say.exactChosen : say.exact;
}

function centreSentence(segment: ChartSegmentReply, centre: number, view: ChartView): string {
  const { months, expected } = segment.baseline;
  const denominator = formatCount(Math.round(expected / centre));
  return say.centre(
    formatRateWords(centre, view.series.indicator.per),
    formatCount(Math.round(expected)),
    `${denominator} ${midSentence(view.definition.denominatorLabel)}`,
    say.months(formatCount(months)),
  );
}

function statusSentences({ baseline }: ChartSegmentReply): string[] {
  const { status, from, to, leftOut, months, expected } = baseline;
  if (from === null || to === null) return [];
  const span = `${longMonth(from)} to ${longMonth(to)}`;
  const named = inWords(leftOut.map((each) => flagMonth(each.month)));
  return [
    ...(status === "trial" ? [say.trial(span)] : [say.set(span)]),
    ...(leftOut.length > 0 ? [say.leftOut(leftOut.length, named)] : []),
    ...(status === "provisional"
      ? [say.provisional(say.months(formatCount(months)), formatExpected(expected))]
      : []),
  ];
}

function spreadSentences({ limits, sigmaZ, baseline }: ChartSegmentReply): string[] {
  if (sigmaZ === null || limits === "overdispersed") return [];
  const suggests = sigmaZ >= MUCH_SPREAD && baseline.months >= ENOUGH_FOR_SPREAD;
  return [say.sigmaZ(twoDecimals(sigmaZ)), ...(suggests ? [say.suggestWider] : [])];
}

function guardSentence(centre: number, view: ChartView): string[] {
  const rule = view.facts.indicator.rules.find((each) => each.name === "one-side");
  const model = view.evaluated.assembled.input.model;
  const hasSmall = view.months.some(
    (month) => month.state === "counted" && isSmallCount(model, month.denominator ?? 0, centre),
  );
  if (!rule || !hasSmall) return [];
  const length = rule.length ?? ONE_SIDE_LENGTH;
  return [say.smallRuns(String(length), formatCount(2 ** length))];
}

function twoDecimals(value: number | null): string {
  return (value ?? 1).toFixed(2);
}
