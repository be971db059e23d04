import type { ChartData, ChartPoint } from "@/lib/scene/chart-data";
import { formatCount, noFigure, shorten } from "@/lib/scene/format";
import { chartWords } from "@/lib/strings/chart";
import { at, type SceneShape } from "@/lib/scene/scene";
import type { MarkId } from "@/lib/strings/frame";
import type { Layout } from "@/lib/scene/layout";

const glyphSize = 12;
const markLine = 14;

/** Denominators and, where there are any, marks as printed rows beneath the month scale. */
export function rowShapes(data: ChartData, layout: Layout): { shapes: SceneShape[]; bottom: number } {
  const top = layout.floor + 38;
  const middle = top + 19;
  const most = Math.max(0, ...data.points.map((_, index) => marksOf(data, index).length));
  const bottom = most === 0 ? middle : middle + 9 + markLine * Math.ceil(most / marksPerLine(layout));
  const rules = [...new Set([top, middle, bottom])];
  const shapes: SceneShape[] = [
    { shape: "line", role: "row-line", lines: rules.map((y) => [at(2, y), at(layout.right, y)]) },
    rowHead(top + 14, data.denominatorLabel),
    ...(most === 0 ? [] : [rowHead(middle + 16, chartWords.marksRow)]),
    ...data.points.map((point, index) => denominator(point, layout, index, top + 14)),
    ...data.points.flatMap((_, index) => markGlyphs(data, layout, index, middle + 6)),
  ];
  return { shapes, bottom };
}

function rowHead(y: number, text: string): SceneShape {
  return { shape: "label", role: "row-head", at: at(2, y), text: shorten(text, 22), anchor: "start" };
}

/** In bold where the month is below detection. */
function denominator(point: ChartPoint, layout: Layout, month: number, y: number): SceneShape {
  const figure = point.denominator;
  const text =
    figure === null ? noFigure : layout.denominators.grouped ? formatCount(figure) : String(figure);
  const plain = layout.denominators.tight ? "denominator-tight" : "denominator";
  const role = point.belowDetection ? "denominator-strong" : plain;
  return { shape: "label", role, at: at(layout.x(month), y), text, anchor: "middle", month };
}

function marksPerLine(layout: Layout): number {
  return Math.max(1, Math.round(layout.slot / glyphSize));
}

function markGlyphs(data: ChartData, layout: Layout, month: number, top: number): SceneShape[] {
  const marks = marksOf(data, month);
  const perLine = marksPerLine(layout);
  return marks.map((glyph, place): SceneShape => {
    const line = Math.floor(place / perLine);
    const onLine = Math.min(perLine, marks.length - line * perLine);
    const left = layout.x(month) - (onLine * glyphSize) / 2 + (place % perLine) * glyphSize;
    return { shape: "glyph", glyph, at: at(left, top + line * markLine), size: glyphSize, month };
  });
}

const stateMarks: Partial<Record<ChartPoint["state"], MarkId>> = {
  missing: "missing",
  ripening: "ripening",
  awaited: "awaited",
  open: "unsaved",
};

/** Marks of a month that the plot itself doesn't draw as such. */
export function marksOf(data: ChartData, index: number): MarkId[] {
  const point = data.points[index];
  if (point === undefined) return [];
  const state = stateMarks[point.state];
  return [
    ...(state === undefined ? [] : [state]),
    ...(data.pairs.some((pair) => pair.to === index) ? (["pair"] as const) : []),
    ...(point.belowDetection ? (["shallow"] as const) : []),
    ...(point.late ? (["late"] as const) : []),
    ...(point.corrected ? (["corrected"] as const) : []),
    ...(point.leftOut ? (["leftout"] as const) : []),
  ];
}
