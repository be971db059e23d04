import { isPlotted, type ChartData, type ChartStretch } from "@/lib/scene/chart-data";
import { textWidth } from "@/lib/scene/pens";
import { at, type SceneShape } from "@/lib/scene/scene";
import type { Layout } from "@/lib/scene/layout";

const hook = 6;
const clear = 10;

/** A bracket along the points of a run, on the run's own side, with its words. */
export function runShapes(data: ChartData, layout: Layout): SceneShape[] {
  return data.runs.flatMap((run) => runShape(data, layout, run));
}

function runShape(data: ChartData, layout: Layout, run: ChartStretch): SceneShape[] {
  const heights = data.points
    .slice(run.from, run.to + 1)
    .filter(isPlotted)
    .map((point) => layout.y(point.value));
  if (heights.length === 0) return [];
  const lowest = Math.max(...heights);
  const highest = Math.min(...heights);
  const roomBeneath = lowest + clear + hook + 18 <= layout.floor;
  const roomAbove = highest - clear - hook - 18 >= layout.top;
  const beneath = run.side === "lower" ? roomBeneath || !roomAbove : roomBeneath && !roomAbove;
  const direction = beneath ? 1 : -1;
  const tips = beneath
    ? Math.min(lowest + clear, layout.floor - 24)
    : Math.max(highest - clear, layout.top + 20);
  const bar = tips + direction * hook;
  const from = layout.x(run.from) - 5;
  const to = layout.x(run.to) + 5;
  const half = textWidth(run.label, "run") / 2;
  const middle = Math.min(Math.max((from + to) / 2, layout.left + half + 4), layout.right - half - 4);
  return [
    {
      shape: "line",
      role: "run-bracket",
      lines: [[at(from, tips), at(from, bar), at(to, bar), at(to, tips)]],
      month: run.from,
    },
    {
      shape: "label",
      role: "run",
      at: at(middle, beneath ? bar + 14 : bar - 6),
      text: run.label,
      anchor: "middle",
      month: run.from,
    },
  ];
}
