import { hasLimitsAt, segmentAt, type ChartData, type ChartSegment } from "@/lib/scene/chart-data";
import { chartWords } from "@/lib/strings/chart";
import { at, type LineRole, type ScenePoint, type SceneShape } from "@/lib/scene/scene";
import type { Layout } from "@/lib/scene/layout";

/** Months in a row that have limits and one centre line; 0-based, both ends included. */
interface Stretch {
  from: number;
  to: number;
  tentative: boolean;
}

/** Band, stepped action limits, warning dashes and centre lines, in drawing order. */
export function limitShapes(data: ChartData, layout: Layout): SceneShape[] {
  const stretches = limitStretches(data);
  const bands = stretches.map((stretch) => bandOf(data, layout, stretch));
  const edges = stretches.flatMap((stretch) => edgesOf(data, layout, stretch));
  return [...bands, ...edges, ...warnings(data, layout), ...centres(data, layout), ...words(data, layout)];
}

export function limitStretches(data: ChartData): Stretch[] {
  const stretches: Stretch[] = [];
  let previous: ChartSegment | null = null;
  data.points.forEach((_, index) => {
    if (!hasLimitsAt(data, index)) {
      previous = null;
      return;
    }
    const segment = segmentAt(data, index);
    const open = stretches.at(-1);
    if (open && previous !== null && previous === segment) open.to = index;
    else stretches.push({ from: index, to: index, tentative: isTentative(segment) });
    previous = segment;
  });
  return stretches;
}

function isTentative(segment: ChartSegment | null): boolean {
  return segment !== null && (segment.provisional || segment.trial);
}

/** Where no limit exists the band runs on, to the floor or to the ceiling. */
function bandOf(data: ChartData, layout: Layout, stretch: Stretch): SceneShape {
  const along = (height: (index: number) => number) =>
    slotsIn(stretch).flatMap((index) => [
      at(layout.slotFrom(index), height(index)),
      at(layout.slotTo(index), height(index)),
    ]);
  const upper = along((index) => upperHeight(data, layout, index) ?? layout.ceiling);
  const lower = along((index) => lowerHeight(data, layout, index) ?? layout.floor);
  const role = stretch.tentative ? "band-provisional" : "band";
  return { shape: "area", role, outlines: [[...upper, ...lower.reverse()]] };
}

/** One polyline a run of slots with that limit; where it stops amid a stretch a riser leads to the border. */
function edgesOf(data: ChartData, layout: Layout, stretch: Stretch): SceneShape[] {
  const role: LineRole = stretch.tentative ? "action-limit-provisional" : "action-limit";
  const line = (height: (index: number) => number | null, border: number): SceneShape[] => {
    const lines = steppedLines(layout, stretch, height, border);
    return lines.length === 0 ? [] : [{ shape: "line", role, lines }];
  };
  return [
    ...line((index) => upperHeight(data, layout, index), layout.ceiling),
    ...line((index) => lowerHeight(data, layout, index), layout.floor),
  ];
}

function steppedLines(
  layout: Layout,
  stretch: Stretch,
  height: (index: number) => number | null,
  border: number,
): ScenePoint[][] {
  const lines: ScenePoint[][] = [];
  let line: ScenePoint[] | null = null;
  for (const index of slotsIn(stretch)) {
    const level = height(index);
    if (level === null) {
      line?.push(at(layout.slotFrom(index), border));
      line = null;
      continue;
    }
    if (line === null) {
      line = index > stretch.from ? [at(layout.slotFrom(index), border)] : [];
      lines.push(line);
    }
    line.push(at(layout.slotFrom(index), level), at(layout.slotTo(index), level));
  }
  return lines;
}

function upperHeight(data: ChartData, layout: Layout, index: number): number | null {
  const limit = data.points[index]?.upperAction ?? null;
  return limit === null || limit > layout.topValue ? null : layout.y(limit);
}

function lowerHeight(data: ChartData, layout: Layout, index: number): number | null {
  const limit = data.points[index]?.lowerAction ?? null;
  return limit === null ? null : layout.y(limit);
}

function slotsIn(stretch: { from: number; to: number }): number[] {
  return Array.from({ length: stretch.to - stretch.from + 1 }, (_, offset) => stretch.from + offset);
}

/** Dashes within each slot, never joined, so that nobody reads them as steps. */
function warnings(data: ChartData, layout: Layout): SceneShape[] {
  const inset = layout.slot * 0.14;
  return data.points.flatMap((point, index): SceneShape[] => {
    if (!hasLimitsAt(data, index)) return [];
    const levels = [point.upperWarning, point.lowerWarning].filter(
      (level): level is number => level !== null && level <= layout.topValue,
    );
    if (levels.length === 0) return [];
    const lines = levels.map((level) => [
      at(layout.slotFrom(index) + inset, layout.y(level)),
      at(layout.slotTo(index) - inset, layout.y(level)),
    ]);
    return [{ shape: "line", role: "warning-limit", lines, month: index }];
  });
}

function centres(data: ChartData, layout: Layout): SceneShape[] {
  const across = (segment: ChartSegment, role: LineRole, value: number): SceneShape => ({
    shape: "line",
    role,
    lines: [
      [at(layout.slotFrom(segment.from), layout.y(value)), at(layout.slotTo(segment.to), layout.y(value))],
    ],
  });
  return data.segments.flatMap((segment) => {
    const earlier = segment.earlierCentre ?? null;
    return [
      ...(segment.centre === null ? [] : [across(segment, "centre", segment.centre)]),
      ...(earlier === null ? [] : [across(segment, "earlier-centre", earlier)]),
    ];
  });
}

/** At the right end of the limits that are not settled yet. */
function words(data: ChartData, layout: Layout): SceneShape[] {
  return data.segments.filter(isTentative).flatMap((segment): SceneShape[] => {
    const last = slotsIn(segment).findLast((index) => hasLimitsAt(data, index));
    if (last === undefined) return [];
    const text = segment.trial ? chartWords.trial : chartWords.provisional;
    const place = at(layout.slotTo(last) - 8, layout.floor - 7);
    return [{ shape: "label", role: "provisional", at: place, text, anchor: "end" }];
  });
}
