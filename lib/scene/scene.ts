import type { MarkId } from "@/lib/strings/frame";

/**
 * A chart as plain data: shapes with positions in drawing order, and what each of them is. Screen, print and PDF
 * render the same scene; colours and pens belong to the roles (pens.ts), so a scene holds no style.
 */
export interface Scene {
  size: "large" | "small";
  width: number;
  height: number;
  plot: PlotBox;
  /** One slot a month, left to right. */
  slots: SceneSlot[];
  shapes: SceneShape[];
  /** What the picture is, for those who don't see it. */
  label: string;
}

export interface PlotBox {
  left: number;
  right: number;
  top: number;
  floor: number;
}

export interface SceneSlot {
  from: number;
  to: number;
  centre: number;
}

export type ScenePoint = readonly [x: number, y: number];

export type SceneShape = LineShape | AreaShape | DiscShape | LabelShape | GlyphShape;

interface OfMonth {
  /** The month's place in the data, where the shape belongs to one. */
  month?: number;
}

/** Open polylines. */
export interface LineShape extends OfMonth {
  shape: "line";
  role: LineRole;
  lines: ScenePoint[][];
}

/** Closed outlines. */
export interface AreaShape extends OfMonth {
  shape: "area";
  role: AreaRole;
  outlines: ScenePoint[][];
}

export interface DiscShape extends OfMonth {
  shape: "disc";
  role: DiscRole;
  at: ScenePoint;
  radius: number;
}

export interface LabelShape extends OfMonth {
  shape: "label";
  role: LabelRole;
  at: ScenePoint;
  text: string;
  anchor: "start" | "middle" | "end";
  /** Degrees, anticlockwise negative; absent for level text. */
  turn?: number;
}

/** A mark of the sprite; `at` is its top left corner. */
export interface GlyphShape extends OfMonth {
  shape: "glyph";
  glyph: MarkId;
  at: ScenePoint;
  size: number;
}

export type LineRole =
  | "grid"
  | "axis"
  | "action-limit"
  | "action-limit-provisional"
  | "warning-limit"
  | "centre"
  | "earlier-centre"
  | "target"
  | "record"
  | "beyond-bar"
  | "run-bracket"
  | "left-out"
  | "baseline-post"
  | "note-post"
  | "no-return-post"
  | "ripening-stem"
  | "row-line"
  | "scale-frame";

export type AreaRole =
  | "band"
  | "band-provisional"
  | "beyond-diamond"
  | "warning-diamond"
  | "target-pointer"
  | "flag"
  | "scale-full"
  | "scale-empty";

export type DiscRole = "point" | "point-below-detection" | "point-ripening" | "point-open";

export type LabelRole =
  | "tick"
  | "limit"
  | "centre"
  | "target"
  | "provisional"
  | "value"
  | "value-in-band"
  | "run"
  | "baseline"
  | "note"
  | "gap"
  | "month"
  | "year"
  | "row-head"
  | "denominator"
  | "denominator-strong"
  | "denominator-tight";

/** Positions are kept to a hundredth of a pixel, which keeps pages small and scenes comparable. */
export function at(x: number, y: number): ScenePoint {
  return [Math.round(x * 100) / 100, Math.round(y * 100) / 100];
}
