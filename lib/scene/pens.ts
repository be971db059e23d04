import type { AreaRole, DiscRole, LabelRole, LineRole } from "@/lib/scene/scene";

/** Colour tokens that a chart may use; the renderer turns them into classes or inks. */
export type Ink = "ink" | "ink2" | "edge" | "channel" | "over" | "hair" | "rule" | "sheet";

export interface LinePen {
  stroke: Ink;
  width: number;
  dash?: readonly number[];
  round?: boolean;
}

export interface AreaPen {
  fill: Ink;
  fillOpacity?: number;
  stroke?: Ink;
  width?: number;
  dash?: readonly number[];
}

export interface TextPen {
  fill: Ink;
  size: number;
  /** Percent of the normal width. */
  stretch: number;
  weight: number;
  italic: boolean;
  /** Drawn in this colour behind the letters, so that lines beneath don't cross them. */
  halo?: Ink;
}

export const linePens: Record<LineRole, LinePen> = {
  grid: { stroke: "hair", width: 0.8 },
  axis: { stroke: "ink", width: 1 },
  "action-limit": { stroke: "edge", width: 1.5 },
  "action-limit-provisional": { stroke: "edge", width: 1.5, dash: [6, 3] },
  "warning-limit": { stroke: "edge", width: 1, dash: [3, 2] },
  centre: { stroke: "edge", width: 1 },
  "earlier-centre": { stroke: "ink2", width: 1.2, dash: [8, 3, 2, 3] },
  target: { stroke: "ink2", width: 1.6, dash: [0.1, 5], round: true },
  record: { stroke: "ink", width: 1.4 },
  "beyond-bar": { stroke: "over", width: 2.2 },
  "run-bracket": { stroke: "over", width: 1.5 },
  "left-out": { stroke: "ink", width: 1.4 },
  "baseline-post": { stroke: "ink", width: 1 },
  "note-post": { stroke: "ink", width: 1 },
  "no-return-post": { stroke: "rule", width: 1, dash: [2, 3] },
  "ripening-stem": { stroke: "ink", width: 1.3, dash: [1.5, 2.5] },
  "row-line": { stroke: "hair", width: 1 },
  "scale-frame": { stroke: "ink", width: 1 },
};

/** Small charts draw the same roles with finer pens. */
export const smallLinePens: Partial<Record<LineRole, LinePen>> = {
  "action-limit": { stroke: "edge", width: 1 },
  "action-limit-provisional": { stroke: "edge", width: 1, dash: [4, 2] },
  record: { stroke: "ink", width: 1.15 },
};

export const areaPens: Record<AreaRole, AreaPen> = {
  band: { fill: "channel" },
  "band-provisional": { fill: "channel", fillOpacity: 0.5 },
  "beyond-diamond": { fill: "over", stroke: "sheet", width: 1 },
  "warning-diamond": { fill: "sheet", stroke: "over", width: 1.9 },
  "target-pointer": { fill: "ink2" },
  flag: { fill: "sheet", stroke: "ink", width: 1 },
  "scale-full": { fill: "ink" },
  "scale-empty": { fill: "sheet" },
};

export const discPens: Record<DiscRole, AreaPen> = {
  point: { fill: "ink" },
  "point-below-detection": { fill: "sheet", stroke: "ink", width: 1.5 },
  "point-ripening": { fill: "sheet", stroke: "ink", width: 1.5 },
  "point-open": { fill: "sheet", stroke: "ink", width: 1.4, dash: [2, 1.6] },
};

const plain: TextPen = { fill: "ink", size: 12, stretch: 100, weight: 400, italic: false };
const narrow: TextPen = { ...plain, size: 11.5, stretch: 87 };

export const textPens: Record<LabelRole, TextPen> = {
  tick: { ...plain, fill: "ink2" },
  limit: { ...plain, italic: true },
  centre: { ...plain, italic: true, weight: 650 },
  target: plain,
  provisional: { ...plain, italic: true, halo: "sheet" },
  value: { ...plain, fill: "over", weight: 650, halo: "sheet" },
  "value-in-band": { ...plain, fill: "over", weight: 650, halo: "channel" },
  run: { ...plain, fill: "over", weight: 650, halo: "channel" },
  baseline: { ...plain, weight: 650 },
  note: plain,
  gap: { ...plain, italic: true, halo: "sheet" },
  month: narrow,
  year: { ...narrow, weight: 650 },
  "row-head": { ...narrow, italic: true },
  denominator: narrow,
  "denominator-strong": { ...narrow, weight: 650 },
  "denominator-tight": { ...narrow, stretch: 74 },
};

/** About how wide a text will be, by rounded widths of the font's letters and figures. Layout only, never a claim. */
export function textWidth(text: string, role: LabelRole): number {
  const pen = textPens[role];
  const figures = text.replace(/\D/g, "").length;
  const characters = figures * 0.6 + (text.length - figures) * 0.53;
  return characters * pen.size * (pen.stretch / 100) * (pen.weight >= 600 ? 1.04 : 1);
}
