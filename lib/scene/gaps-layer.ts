import type { ChartData, PointState } from "@/lib/scene/chart-data";
import type { Layout } from "@/lib/scene/layout";
import { at, type SceneShape } from "@/lib/scene/scene";
import { chartWords } from "@/lib/strings/chart";

const gapWords: Partial<Record<PointState, string>> = {
  missing: chartWords.noReturn,
  "not-collected": chartWords.notCollected,
  "nothing-to-count": chartWords.nothingToCount,
};

/** Months without a point say why, once for each run of them; a missing return also has its two posts. */
export function gapShapes(data: ChartData, layout: Layout): SceneShape[] {
  return gapsOf(data).flatMap(({ state, from, to }): SceneShape[] => {
    const middle = (layout.slotFrom(from) + layout.slotTo(to)) / 2;
    const height = (layout.top + layout.floor) / 2;
    const label: SceneShape = {
      shape: "label",
      role: "gap",
      at: at(middle + 4, height),
      text: gapWords[state] ?? "",
      anchor: "middle",
      turn: -90,
      month: from,
    };
    return state === "missing" ? [posts(layout, from, to), label] : [label];
  });
}

function posts(layout: Layout, from: number, to: number): SceneShape {
  const inset = layout.slot * 0.18;
  const post = (x: number) => [at(x, layout.top), at(x, layout.floor)];
  const lines = [post(layout.slotFrom(from) + inset), post(layout.slotTo(to) - inset)];
  return { shape: "line", role: "no-return-post", lines, month: from };
}

function gapsOf(data: ChartData): { state: PointState; from: number; to: number }[] {
  const gaps: { state: PointState; from: number; to: number }[] = [];
  data.points.forEach((point, index) => {
    if (gapWords[point.state] === undefined) return;
    const last = gaps.at(-1);
    if (last && last.to === index - 1 && last.state === point.state) last.to = index;
    else gaps.push({ state: point.state, from: index, to: index });
  });
  return gaps;
}
