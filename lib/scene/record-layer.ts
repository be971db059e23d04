import { isPlotted, segmentAt, type ChartData, type ChartPoint } from "@/lib/scene/chart-data";
import { formatRateSign } from "@/lib/scene/format";
import { soFarShare, type Layout } from "@/lib/scene/layout";
import { diamond } from "@/lib/scene/outlines";
import { at, type ScenePoint, type SceneShape } from "@/lib/scene/scene";

/** The record's line and its months' points. */
export function recordShapes(data: ChartData, layout: Layout): SceneShape[] {
  return [
    ...recordLine(data, layout),
    ...data.points.flatMap((_, index) => pointShapes(data, layout, index)),
  ];
}

/** Joins neighbours under one centre line only: a gap or a change of baseline breaks it. */
function recordLine(data: ChartData, layout: Layout): SceneShape[] {
  const lines = recordRuns(data)
    .filter((run) => run.length > 1)
    .map((run) => run.map(([index, value]) => at(layout.x(index), layout.y(value))));
  return lines.length === 0 ? [] : [{ shape: "line", role: "record", lines }];
}

/** Runs of joined months as [place, value] pairs. */
export function recordRuns(data: ChartData, first = 0): [index: number, value: number][][] {
  const runs: [number, number][][] = [];
  let previous = -2;
  for (let index = first; index < data.points.length; index += 1) {
    const point = data.points[index];
    if (!isPlotted(point)) continue;
    const joined = previous === index - 1 && segmentAt(data, previous) === segmentAt(data, index);
    if (joined) runs.at(-1)?.push([index, point.value]);
    else runs.push([[index, point.value]]);
    previous = index;
  }
  return runs;
}

function pointShapes(data: ChartData, layout: Layout, index: number): SceneShape[] {
  const point = data.points[index];
  if (point === undefined) return [];
  if (point.state === "ripening") return ripeningShapes(data, layout, index);
  if (point.state === "open") return openShapes(point, layout, index);
  if (!isPlotted(point)) return [];
  const x = layout.x(index);
  const y = layout.y(point.value);
  const brackets = point.leftOut ? leftOutShape(x, y, index) : [];
  return [...markOf(point, x, y, index), ...brackets, ...valueLabel(data, layout, index)];
}

function markOf(point: ChartPoint, x: number, y: number, month: number): SceneShape[] {
  if (point.beyond !== null) {
    const bar = point.beyond === "upper" ? y + 10 : y - 10;
    return [
      { shape: "area", role: "beyond-diamond", outlines: [diamond(x, y, 6.5)], month },
      { shape: "line", role: "beyond-bar", lines: [[at(x - 8, bar), at(x + 8, bar)]], month },
    ];
  }
  if (point.pastWarning !== null) {
    return [{ shape: "area", role: "warning-diamond", outlines: [diamond(x, y, 5.5)], month }];
  }
  const small = point.belowDetection;
  const role = small ? "point-below-detection" : "point";
  return [{ shape: "disc", role, at: at(x, y), radius: small ? 3.3 : 3, month }];
}

/** Square brackets about the point and a stroke across it. */
function leftOutShape(x: number, y: number, month: number): SceneShape[] {
  const bracket = (side: number): ScenePoint[] => [
    at(x + side * 7, y - 9),
    at(x + side * 11, y - 9),
    at(x + side * 11, y + 9),
    at(x + side * 7, y + 9),
  ];
  const stroke = [at(x - 9, y + 9), at(x + 9, y - 9)];
  return [{ shape: "line", role: "left-out", lines: [bracket(-1), bracket(1), stroke], month }];
}

/** The value beside a month outside the action limits, and beside the latest one past a warning limit. */
function valueLabel(data: ChartData, layout: Layout, index: number): SceneShape[] {
  const point = data.points[index];
  if (!isPlotted(point)) return [];
  const isLatest = !data.points.slice(index + 1).some(isPlotted);
  if (point.beyond === null && !(point.pastWarning !== null && isLatest)) return [];
  const text = formatRateSign(point.value, data.per);
  const role = point.beyond === null ? "value-in-band" : "value";
  const away = point.leftOut ? 16 : point.beyond === null ? 10 : 12;
  const next = data.points[index + 1];
  const level = isPlotted(next) && Math.abs(layout.y(next.value) - layout.y(point.value)) < 16;
  const toLeft = index > 1 && (isLatest || level || index >= data.points.length - 2);
  const x = layout.x(index) + (toLeft ? -away : away);
  const y = layout.y(point.value) + 4;
  return [{ shape: "label", role, at: at(x, y), text, anchor: toLeft ? "end" : "start", month: index }];
}

/** Hollow ring at the count so far, a dotted stem up to a dotted line at the warning limit's height. */
function ripeningShapes(data: ChartData, layout: Layout, month: number): SceneShape[] {
  const point = data.points[month];
  const share = point ? soFarShare(point) : null;
  if (share === null) return [];
  const x = layout.x(month);
  const y = layout.y(share);
  const ring: SceneShape = { shape: "disc", role: "point-ripening", at: at(x, y), radius: 3.6, month };
  const level = stemHeight(data, layout, month);
  if (level === null || level + 2 >= y - 5) return [ring];
  const half = Math.min(7, layout.slot * 0.4);
  const lines = [
    [at(x, y - 5), at(x, level + 2)],
    [at(x - half, level), at(x + half, level)],
  ];
  return [{ shape: "line", role: "ripening-stem", lines, month }, ring];
}

/** The month's own warning limit, else that of the last month that has one. */
function stemHeight(data: ChartData, layout: Layout, index: number): number | null {
  if (!data.hasLimits) return null;
  const warning = data.points
    .slice(0, index + 1)
    .findLast((point) => point.upperWarning !== null)?.upperWarning;
  return warning === undefined || warning === null ? null : layout.y(warning);
}

function openShapes(point: ChartPoint, layout: Layout, month: number): SceneShape[] {
  if (point.value === null) return [];
  const centre = at(layout.x(month), layout.y(point.value));
  return [{ shape: "disc", role: "point-open", at: centre, radius: 3.6, month }];
}
