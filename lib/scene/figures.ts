import { isPlotted, segmentAt, type ChartData, type ChartSegment } from "@/lib/scene/chart-data";
import { formatCount, formatRate, formatRateSign, noFigure, tableMonth } from "@/lib/scene/format";
import { countText, monthSayings, type Saying } from "@/lib/scene/reading";
import { chartWords, figuresTableWords as words } from "@/lib/strings/chart";

/** One month of the table under a chart, as text. */
export interface FigureRow {
  month: string;
  label: string;
  numerator: string;
  denominator: string;
  rate: string;
  isWorkedOut: boolean;
  /** Lower action, lower warning, centre, upper warning, upper action; null where the month has none of them. */
  limits: string[] | null;
  says: Saying[];
}

/** Months under one baseline, newest first, under a heading that says which; the newest group has none. */
export interface FigureGroup {
  heading: string | null;
  rows: FigureRow[];
}

export function figureGroups(data: ChartData): FigureGroup[] {
  const starts = data.segments.map((segment) => segment.from).filter((from) => from > 0);
  const bounds = [...new Set([0, ...starts])].sort((a, b) => b - a);
  return bounds.map((from, place) => {
    const to = (bounds[place - 1] ?? data.points.length) - 1;
    const rows = data.points.slice(from, to + 1).map((_, offset) => figureRow(data, from + offset));
    return { heading: place === 0 ? null : headingOf(data, to), rows: rows.reverse() };
  });
}

function headingOf(data: ChartData, to: number): string {
  const segment = segmentAt(data, to);
  const summary = segment?.summary ?? null;
  if (summary !== null) return summary;
  const upTo = data.points[to]?.label ?? "";
  if (segment === null || segment.centre === null) return words.earlierBaselineNoCentre(upTo);
  const sentence = words.earlierBaseline(upTo, formatRateSign(segment.centre, data.per));
  return [sentence, standingOf(segment)].filter(Boolean).join(" ");
}

function standingOf(segment: ChartSegment): string | null {
  if (segment.trial) return words.isTrial;
  return segment.provisional ? words.isProvisional : null;
}

function figureRow(data: ChartData, index: number): FigureRow {
  const point = data.points[index];
  if (point === undefined) throw new RangeError(`No month at ${index}`);
  const worked = isPlotted(point);
  const limits = [point.lowerAction, point.lowerWarning, point.centre, point.upperWarning, point.upperAction];
  const limitText = (limit: number | null) =>
    limit === null ? chartWords.none : formatRate(limit, data.per);
  const limited = data.hasLimits && worked && limits.some((limit) => limit !== null);
  return {
    month: point.month,
    label: tableMonth(point.month),
    numerator: countText(point),
    denominator: point.denominator === null ? noFigure : formatCount(point.denominator),
    rate: worked ? formatRate(point.value, data.per) : noFigure,
    isWorkedOut: worked,
    limits: limited ? limits.map(limitText) : null,
    says: monthSayings(data, index),
  };
}
