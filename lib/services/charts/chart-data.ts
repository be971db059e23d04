import "server-only";
import type { ChartMonth } from "@/lib/indicators/chart-points";
import type { ChartQuarter } from "@/lib/indicators/chart-quarters";
import {
  flagMonth,
  longDate,
  longMonth,
  midSentence,
  perWords,
  shortMonth,
} from "@/lib/indicators/chart-format";
import { matureOn } from "@/lib/indicators/maturity";
import type { Month } from "@/lib/indicators/month";
import { whatWasSeen } from "@/lib/indicators/signal-words";
import type { ChartSegmentReply, ChartSignalReply } from "@/lib/schemas/chart";
import type { ChartData, ChartPoint, ChartSegment, ChartStretch } from "@/lib/scene/chart-data";
import { chartDataWords as words } from "@/lib/strings/charts";
import { segmentReplies, segmentSummary } from "./chart-segments";
import type { ChartView } from "./read-chart";

type Point = ChartMonth | ChartQuarter;

/** What the chart, its reading strip and its table are drawn from. */
export function chartData(view: ChartView): ChartData {
  const { indicator, ward } = view.series;
  const segments = segmentReplies(view.evaluated);
  const isMonthly = view.query.by === "month";
  return {
    title: words.title(midSentence(indicator.name), ward.name),
    per: indicator.per,
    kind: indicator.kind,
    unitWords: unitWords(view),
    betterWhen: indicator.betterWhen,
    numeratorLabel: view.definition.numeratorLabel,
    denominatorLabel: view.definition.denominatorLabel,
    points: view.points.map((point) => chartPoint(point, view)),
    segments: segments.flatMap((segment, index) => chartSegment(segment, segments[index - 1], index, view)),
    runs: isMonthly ? stretches(view, ["one-side", "trend", "within-one-sigma"]) : [],
    pairs: isMonthly ? stretches(view, ["two-of-three", "four-of-five"]) : [],
    target: indicator.target,
    hasLimits: segments.some((segment) => segment.hasLimits),
  };
}

/** "percent", or "per 1000 catheter days". */
export function unitWords({ series, definition }: Pick<ChartView, "series" | "definition">): string {
  const { kind, per } = series.indicator;
  const unit = perWords(per);
  return kind === "rate" && per !== 100 ? `${unit} ${midSentence(definition.denominatorLabel)}` : unit;
}

function chartPoint(point: Point, view: ChartView): ChartPoint {
  const isProportion = view.series.indicator.kind === "proportion";
  const months = "quarter" in point ? point.months : [point.month];
  const notes = months.flatMap((month) => view.marks.notes.get(month) ?? []);
  const isRipening = point.state === "ripening";
  return {
    month: point.month,
    label: "quarter" in point ? quarterLabel(point) : longMonth(point.month),
    numerator: point.numerator,
    denominator: point.denominator,
    value: isRipening ? null : point.value,
    state: point.state,
    stateDetail: stateDetail(point, view),
    centre: point.centre,
    lowerAction: aboveFloor(point.lowerAction),
    upperAction: belowCeiling(point.upperAction, isProportion),
    lowerWarning: aboveFloor(point.lowerWarning),
    upperWarning: belowCeiling(point.upperWarning, isProportion),
    belowDetection: point.belowDetection,
    beyond: point.beyond,
    pastWarning: point.pastWarning,
    leftOut: point.leftOut,
    corrected: months.some((month) => view.marks.corrected.has(month)),
    late: months.some((month) => view.marks.late.has(month)),
    note: notes.length > 0 ? notes.join("; ") : null,
    countSoFar: isRipening ? point.numerator : null,
  };
}

/** "Jan to Mar 2026": short, as it heads the reading strip. A quarter never spans years. */
function quarterLabel({ month, until }: ChartQuarter): string {
  return month === until ? flagMonth(month) : words.span(shortMonth(month), flagMonth(until));
}

/** A limit at the floor or the ceiling can't be passed: it is drawn as none. */
function aboveFloor(limit: number | null): number | null {
  return limit !== null && limit <= 0 ? null : limit;
}

function belowCeiling(limit: number | null, isProportion: boolean): number | null {
  return limit !== null && isProportion && limit >= 1 ? null : limit;
}

function stateDetail(point: Point, view: ChartView): string | null {
  if (point.state === "ripening") {
    const { matureAfterDays } = view.series.indicator;
    return words.until(longDate(matureOn(point.month, matureAfterDays)));
  }
  const tally = view.facts.tallies.find((each) => each.month === point.month);
  if (point.state === "awaited") return tally?.awaited ?? null;
  return point.state === "not-collected" ? (tally?.notCollected ?? null) : null;
}

function chartSegment(
  segment: ChartSegmentReply,
  earlier: ChartSegmentReply | undefined,
  index: number,
  view: ChartView,
): ChartSegment[] {
  const places = view.points.flatMap((point, place) => (point.segment === index ? [place] : []));
  const [from] = places;
  const to = places.at(-1);
  if (from === undefined || to === undefined) return [];
  const { status } = segment.baseline;
  return [
    {
      from,
      to,
      centre: segment.centre,
      provisional: status === "provisional",
      trial: status === "trial",
      newBaselineLabel: flagOf(segment),
      method: segment.limits,
      earlierCentre: earlierCentre(segment, earlier, view),
      summary: segmentSummary(segment, view.series.indicator.per),
    },
  ];
}

function flagOf({ begins, from }: ChartSegmentReply): string | null {
  if (begins === "first") return null;
  return begins === "baseline" ? words.newBaseline(flagMonth(from)) : words.newDefinition(flagMonth(from));
}

/** After a decided shift away from better the old centre line stays in sight. */
function earlierCentre(
  segment: ChartSegmentReply,
  earlier: ChartSegmentReply | undefined,
  { series }: ChartView,
): number | null {
  const { betterWhen } = series.indicator;
  const before = earlier?.centre ?? null;
  if (segment.begins !== "baseline" || before === null || segment.centre === null) return null;
  const isAway = betterWhen === "lower" ? segment.centre > before : segment.centre < before;
  return betterWhen !== "neither" && isAway ? before : null;
}

/** Signals of some rules as stretches of the drawn months; what the window cuts begins or ends at its edge. */
function stretches(view: ChartView, rules: readonly string[]): ChartStretch[] {
  return view.signals
    .filter((signal) => rules.includes(signal.rule))
    .flatMap((signal): ChartStretch[] => {
      const from = view.points.findIndex((point) => point.month >= signal.from);
      const to = view.points.findLastIndex((point) => point.month <= signal.to);
      if (from < 0 || to < from) return [];
      return [{ from, to, side: signal.side, label: stretchLabel(signal, view.allMonths) }];
    });
}

function stretchLabel(signal: ChartSignalReply, months: readonly ChartMonth[]): string {
  return whatWasSeen(signal, plottedBetween(months, signal.from, signal.to));
}

function plottedBetween(months: readonly ChartMonth[], from: Month, to: Month): number {
  return months.filter((each) => each.state === "counted" && each.month >= from && each.month <= to).length;
}
