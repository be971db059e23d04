import { hasLimitsAt, isPlotted, segmentAt, type ChartData } from "@/lib/scene/chart-data";
import { diamond } from "@/lib/scene/outlines";
import { limitShapes } from "@/lib/scene/limits-layer";
import { recordRuns } from "@/lib/scene/record-layer";
import { at, type Scene, type SceneShape } from "@/lib/scene/scene";
import { slotsOf, type Layout } from "@/lib/scene/layout";

export interface SmallChartOptions {
  /** The latest so many months; twelve unless set. */
  months?: number;
  /** Lowest and highest value as fractions, to share one scale; without it the axis starts at zero. */
  domain?: readonly [low: number, high: number];
  /** False where the months are shown alone, before their limits may be seen. */
  channel?: boolean;
}

const width = 96;
const height = 40;
const margin = 3;

/** Band, edges, centre, record, diamonds and the last point at 96 × 40. */
export function buildSmallScene(whole: ChartData, label: string, options: SmallChartOptions = {}): Scene {
  const data = lastMonths(whole, options.months ?? 12);
  const layout = smallLayout(data, options.domain ?? [0, highest(data, options.channel !== false)]);
  const limits = options.channel === false ? [] : limitShapes(data, layout).filter(isSmallLimit);
  return {
    size: "small",
    width,
    height,
    plot: { left: 0, right: width, top: margin, floor: height - margin },
    slots: slotsOf(layout, data.points.length),
    shapes: [...limits, ...smallRecord(data, layout), ...smallMarks(data, layout, options.channel !== false)],
    label,
  };
}

function isSmallLimit(shape: SceneShape): boolean {
  return shape.shape === "area" || (shape.shape === "line" && shape.role !== "warning-limit");
}

function lastMonths(data: ChartData, months: number): ChartData {
  const skip = Math.max(0, data.points.length - months);
  const moved = <T extends { from: number; to: number }>(list: T[]): T[] =>
    list
      .filter((each) => each.to >= skip)
      .map((each) => ({ ...each, from: Math.max(0, each.from - skip), to: each.to - skip }));
  return {
    ...data,
    points: data.points.slice(skip),
    segments: moved(data.segments),
    runs: moved(data.runs),
    pairs: moved(data.pairs),
  };
}

function highest(data: ChartData, withLimits: boolean): number {
  const values = data.points.flatMap((point, index) => [
    point.value ?? 0,
    withLimits && hasLimitsAt(data, index) ? (point.upperAction ?? 0) : 0,
  ]);
  return Math.max(...values, 0) || 1 / data.per;
}

function smallLayout(data: ChartData, [low, high]: readonly [number, number]): Layout {
  const slot = width / Math.max(1, data.points.length);
  const reach = high > low ? high - low : 1;
  const floor = height - margin;
  const y = (value: number) => {
    const share = Math.min(1, Math.max(0, (value - low) / reach));
    return floor - share * (floor - margin);
  };
  return {
    width,
    left: 0,
    right: width,
    top: margin,
    floor,
    slot,
    topValue: high,
    ceiling: data.kind === "proportion" && high > 1 ? y(1) : margin,
    denominators: { grouped: true, tight: false, least: 0 },
    x: (index) => slot * (index + 0.5),
    slotFrom: (index) => slot * index,
    slotTo: (index) => slot * (index + 1),
    y,
  };
}

function smallRecord(data: ChartData, layout: Layout): SceneShape[] {
  const lines = recordRuns(data)
    .filter((run) => run.length > 1)
    .map((run) => run.map(([index, value]) => at(layout.x(index), layout.y(value))));
  return lines.length === 0 ? [] : [{ shape: "line", role: "record", lines }];
}

/** Diamonds, the last month's point, and points that no line reaches. */
function smallMarks(data: ChartData, layout: Layout, verdicts: boolean): SceneShape[] {
  const last = data.points.findLastIndex(isPlotted);
  return data.points.flatMap((point, month): SceneShape[] => {
    const x = layout.x(month);
    if (point.state === "open" && point.value !== null) {
      return [{ shape: "disc", role: "point-open", at: at(x, layout.y(point.value)), radius: 2.6, month }];
    }
    if (!isPlotted(point)) return [];
    const y = layout.y(point.value);
    if (verdicts && point.beyond !== null) {
      return [{ shape: "area", role: "beyond-diamond", outlines: [diamond(x, y, 4)], month }];
    }
    if (verdicts && point.pastWarning !== null) {
      return [{ shape: "area", role: "warning-diamond", outlines: [diamond(x, y, 3.5)], month }];
    }
    const alone = !joins(data, month, month - 1) && !joins(data, month, month + 1);
    if (!(alone || (verdicts && month === last))) return [];
    const role = verdicts && point.belowDetection ? "point-below-detection" : "point";
    return [{ shape: "disc", role, at: at(x, y), radius: alone && month !== last ? 1.6 : 2.4, month }];
  });
}

function joins(data: ChartData, one: number, other: number): boolean {
  return isPlotted(data.points[other]) && segmentAt(data, one) === segmentAt(data, other);
}
