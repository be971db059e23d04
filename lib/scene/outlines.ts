import { at, type ScenePoint } from "@/lib/scene/scene";

export function diamond(x: number, y: number, reach: number): ScenePoint[] {
  return [at(x, y - reach), at(x + reach, y), at(x, y + reach), at(x - reach, y)];
}

export function rectangle(x: number, y: number, width: number, height: number): ScenePoint[] {
  return [at(x, y), at(x + width, y), at(x + width, y + height), at(x, y + height)];
}

/** A stretch of the horizontal axis or of a column, for keeping labels off each other. */
export interface Extent {
  from: number;
  to: number;
}

export function overlaps(one: Extent, other: Extent): boolean {
  return one.from < other.to && other.from < one.to;
}
