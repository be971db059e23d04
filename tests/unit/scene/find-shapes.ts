import type {
  AreaRole,
  AreaShape,
  DiscRole,
  DiscShape,
  GlyphShape,
  LabelRole,
  LabelShape,
  LineRole,
  LineShape,
  Scene,
} from "@/lib/scene/scene";

export function lines(scene: Scene, role: LineRole): LineShape[] {
  return scene.shapes.filter((shape): shape is LineShape => shape.shape === "line" && shape.role === role);
}

export function areas(scene: Scene, role: AreaRole): AreaShape[] {
  return scene.shapes.filter((shape): shape is AreaShape => shape.shape === "area" && shape.role === role);
}

export function discs(scene: Scene, role: DiscRole): DiscShape[] {
  return scene.shapes.filter((shape): shape is DiscShape => shape.shape === "disc" && shape.role === role);
}

export function labels(scene: Scene, role?: LabelRole): LabelShape[] {
  return scene.shapes.filter(
    (shape): shape is LabelShape => shape.shape === "label" && (role === undefined || shape.role === role),
  );
}

export function texts(scene: Scene, role?: LabelRole): string[] {
  return labels(scene, role).map((label) => label.text);
}

export function glyphsAt(scene: Scene, month: number): string[] {
  return scene.shapes
    .filter((shape): shape is GlyphShape => shape.shape === "glyph" && shape.month === month)
    .map((shape) => shape.glyph);
}

/** All heights of a line or area, in drawing order. */
export function heights(points: readonly (readonly [number, number])[]): number[] {
  return points.map(([, y]) => y);
}
