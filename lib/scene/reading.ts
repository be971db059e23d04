import { isPlotted, type ChartData, type ChartPoint, type ChartStretch } from "@/lib/scene/chart-data";
import { formatCount, formatRate, formatRateSign, noFigure } from "@/lib/scene/format";
import { chartSays, chartWords } from "@/lib/strings/chart";
import type { MarkId } from "@/lib/strings/frame";

/** One thing that the chart says about a month: its mark, if it has one, and the words. */
export interface Saying {
  mark: MarkId | null;
  words: string;
}

/** One month's figures as text, for the strip above the chart. */
export interface MonthReading {
  month: string;
  numerator: string;
  denominator: string;
  rate: string;
  actionLimits: string;
  warningLimits: string;
  says: Saying[];
}

export function readMonth(data: ChartData, index: number): MonthReading {
  const point = data.points[index];
  if (point === undefined) throw new RangeError(`No month at ${index}`);
  const says = [...monthSayings(data, index), ...withinStretch(data, index)];
  return {
    month: point.label,
    numerator: countText(point),
    denominator: point.denominator === null ? noFigure : formatCount(point.denominator),
    rate: isPlotted(point) || isOpenRate(point) ? formatRateSign(point.value, data.per) : noFigure,
    actionLimits: limitText(data, point, point.lowerAction, point.upperAction),
    warningLimits: limitText(data, point, point.lowerWarning, point.upperWarning),
    says: says.length > 0 ? says : [quietSaying(data, point)],
  };
}

function isOpenRate(point: ChartPoint): point is ChartPoint & { value: number } {
  return point.state === "open" && point.value !== null;
}

/** The numerator; "6 so far" while the month isn't complete. */
export function countText(point: ChartPoint): string {
  if (point.state === "ripening" && point.countSoFar !== null) {
    return chartWords.soFar(formatCount(point.countSoFar));
  }
  return point.numerator === null ? noFigure : formatCount(point.numerator);
}

function limitText(data: ChartData, point: ChartPoint, lower: number | null, upper: number | null): string {
  if (!data.hasLimits || !isPlotted(point)) return noFigure;
  if (lower === null && upper === null) return chartWords.none;
  const text = (limit: number | null) => (limit === null ? chartWords.none : formatRate(limit, data.per));
  return chartWords.limitRange(text(lower), text(upper));
}

function quietSaying(data: ChartData, point: ChartPoint): Saying {
  const limited = data.hasLimits && (point.lowerAction !== null || point.upperAction !== null);
  return { mark: null, words: limited ? chartSays.quiet : chartSays.noLimits };
}

/** What the chart says about a month: its state, what it is outside of, and its marks. */
export function monthSayings(data: ChartData, index: number): Saying[] {
  const point = data.points[index];
  if (point === undefined) return [];
  const ending = (list: ChartStretch[], mark: MarkId): Saying[] =>
    list.filter((each) => each.to === index).map((each) => ({ mark, words: each.label }));
  return [
    ...stateSaying(point),
    ...limitSaying(point),
    ...ending(data.pairs, "pair"),
    ...ending(data.runs, "run"),
    ...(point.belowDetection ? [{ mark: "shallow", words: tooSmallWords(data) } as const] : []),
    ...(point.note === null ? [] : [{ mark: "note", words: point.note } as const]),
    ...(point.late ? [{ mark: "late", words: chartSays.late } as const] : []),
    ...(point.corrected ? [{ mark: "corrected", words: chartSays.corrected } as const] : []),
    ...(point.leftOut ? [{ mark: "leftout", words: chartSays.leftOut } as const] : []),
  ];
}

/** A month inside a run or a pair that ends later: the table says it once, the strip for each of its months. */
function withinStretch(data: ChartData, index: number): Saying[] {
  const inside = (list: ChartStretch[], mark: MarkId): Saying[] =>
    list.filter((each) => index >= each.from && index < each.to).map((each) => ({ mark, words: each.label }));
  return [...inside(data.runs, "run"), ...inside(data.pairs, "pair")];
}

function stateSaying(point: ChartPoint): Saying[] {
  const detail = point.stateDetail ?? null;
  const say = (mark: MarkId | null, words: string): Saying[] => [
    { mark, words: detail === null ? words : chartSays.withDetail(words, detail) },
  ];
  switch (point.state) {
    case "missing":
      return say("missing", chartSays.noReturn);
    case "open":
      return say("unsaved", chartSays.open);
    case "ripening":
      return say("ripening", chartSays.ripening);
    case "awaited":
      return say("awaited", chartSays.awaited);
    case "not-collected":
      return say(null, chartSays.notCollected);
    case "nothing-to-count":
      return say(null, chartSays.nothingToCount);
    case "counted":
      return [];
  }
}

function limitSaying(point: ChartPoint): Saying[] {
  if (!isPlotted(point)) return [];
  if (point.beyond === "upper") return [{ mark: "above", words: chartSays.above }];
  if (point.beyond === "lower") return [{ mark: "below", words: chartSays.below }];
  return point.pastWarning === null ? [] : [{ mark: "warn", words: chartSays.pastWarning }];
}

function tooSmallWords(data: ChartData): string {
  return data.betterWhen === "neither" ? chartSays.tooSmallToTell : chartSays.tooSmall[data.betterWhen];
}
