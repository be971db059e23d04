import { isPlotted, type ChartData } from "@/lib/scene/chart-data";
import { shorten } from "@/lib/scene/format";
import { overlaps, rectangle, type Extent } from "@/lib/scene/outlines";
import { textWidth } from "@/lib/scene/pens";
import { at, type SceneShape } from "@/lib/scene/scene";
import type { Layout } from "@/lib/scene/layout";

const noteLength = 24;
const flagHeight = 17;
const flagStep = 20;

/** A flag already placed: its width and height as extents. */
interface Placed {
  across: Extent;
  down: Extent;
}

/** Changes of baseline at the top of the picture, notes beneath them; no flag covers another. */
export function flagShapes(data: ChartData, layout: Layout): SceneShape[] {
  const placed: Placed[] = [];
  return [...baselineShapes(data, layout, placed), ...noteShapes(data, layout, placed)];
}

/** Double post over the full height where the new baseline begins, with its flag. */
function baselineShapes(data: ChartData, layout: Layout, placed: Placed[]): SceneShape[] {
  return data.segments.flatMap((segment): SceneShape[] => {
    const text = segment.newBaselineLabel;
    if (text === null) return [];
    const x = layout.slotFrom(segment.from);
    const width = textWidth(text, "baseline") + 13;
    const across = sideways(x + 1.5, width, layout);
    const top = freeHeight(18, 16, across, placed, () => true);
    placed.push({ across, down: { from: top, to: top + 16 } });
    const post = (offset: number) => [at(x + offset, Math.min(18, top)), at(x + offset, layout.floor)];
    return [
      { shape: "line", role: "baseline-post", lines: [post(-1.5), post(1.5)], month: segment.from },
      {
        shape: "area",
        role: "flag",
        outlines: [rectangle(across.from, top, width, 16)],
        month: segment.from,
      },
      {
        shape: "label",
        role: "baseline",
        at: at(across.from + 6.5, top + 12),
        text,
        anchor: "start",
        month: segment.from,
      },
    ];
  });
}

/** Single post down (or up) to the month's point, with a flag of up to 24 characters. */
function noteShapes(data: ChartData, layout: Layout, placed: Placed[]): SceneShape[] {
  return data.points.flatMap((point, month): SceneShape[] => {
    if (point.note === null) return [];
    const text = shorten(point.note, noteLength);
    const x = layout.x(month);
    const width = textWidth(text, "note") + 12;
    const across = sideways(x, width, layout);
    const foot = isPlotted(point) ? layout.y(point.value) : layout.floor;
    const top = freeHeight(52, flagHeight, across, placed, (from) => foot < from - 12 || foot > from + 30);
    placed.push({ across, down: { from: top, to: top + flagHeight } });
    const post = foot > top ? [at(x, foot - 9), at(x, top)] : [at(x, foot + 9), at(x, top + flagHeight)];
    return [
      { shape: "line", role: "note-post", lines: [post], month },
      { shape: "area", role: "flag", outlines: [rectangle(across.from, top, width, flagHeight)], month },
      {
        shape: "label",
        role: "note",
        at: at(across.from + 6, top + 12.5),
        text,
        anchor: "start",
        month,
      },
    ];
  });
}

/** Flags fly to the right, or to the left where they would leave the plot. */
function sideways(post: number, width: number, layout: Layout): Extent {
  const fits = post + width <= layout.right || post - width < layout.left;
  return fits ? { from: post, to: post + width } : { from: post - width, to: post };
}

/** The first height from `start` downwards that no flag across the same stretch uses; after ten, the start. */
function freeHeight(
  start: number,
  height: number,
  across: Extent,
  placed: Placed[],
  suits: (from: number) => boolean,
): number {
  for (let step = 0; step < 10; step += 1) {
    const from = start + step * flagStep;
    const down = { from, to: from + height };
    const taken = placed.some((flag) => overlaps(flag.across, across) && overlaps(flag.down, down));
    if (!taken && suits(from)) return from;
  }
  return start;
}
