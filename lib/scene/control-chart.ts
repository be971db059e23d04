import { gridShapes, monthScaleShapes } from "@/lib/scene/axis-layer";
import { flagShapes } from "@/lib/scene/flags-layer";
import { gapShapes } from "@/lib/scene/gaps-layer";
import { layOut, slotsOf, type LayoutOptions } from "@/lib/scene/layout";
import { limitShapes } from "@/lib/scene/limits-layer";
import { recordShapes } from "@/lib/scene/record-layer";
import { rowShapes } from "@/lib/scene/rows-layer";
import { runShapes } from "@/lib/scene/runs-layer";
import { sideLabels, targetShapes } from "@/lib/scene/side-labels";
import { buildSmallScene, type SmallChartOptions } from "@/lib/scene/small-chart";
import { chartWords } from "@/lib/strings/chart";
import type { ChartData } from "@/lib/scene/chart-data";
import type { Scene } from "@/lib/scene/scene";

export type SceneOptions = LayoutOptions & SmallChartOptions;

/**
 * A control chart as plain data, by the grammar of charts: limits follow each month's denominator in steps, the
 * record breaks where nothing was counted, and every state has its own shape. Options of the other size are
 * ignored.
 */
export function buildControlChartScene(
  data: ChartData,
  size: "large" | "small",
  options: SceneOptions = {},
): Scene {
  const label = chartLabel(data);
  return size === "small" ? buildSmallScene(data, label, options) : buildLargeScene(data, label, options);
}

function buildLargeScene(data: ChartData, label: string, options: LayoutOptions): Scene {
  const layout = layOut(data, options);
  const rows = rowShapes(data, layout);
  const hundredth = (value: number) => Math.round(value * 100) / 100;
  return {
    size: "large",
    width: hundredth(layout.width),
    height: hundredth(rows.bottom + 6),
    plot: {
      left: layout.left,
      right: hundredth(layout.right),
      top: layout.top,
      floor: layout.floor,
    },
    slots: slotsOf(layout, data.points.length),
    shapes: [
      ...gridShapes(data, layout),
      ...limitShapes(data, layout),
      ...targetShapes(data, layout),
      ...gapShapes(data, layout),
      ...runShapes(data, layout).filter((shape) => shape.shape === "line"),
      ...recordShapes(data, layout),
      ...flagShapes(data, layout),
      ...runShapes(data, layout).filter((shape) => shape.shape === "label"),
      ...sideLabels(data, layout),
      ...monthScaleShapes(data, layout),
      ...rows.shapes,
    ],
    label,
  };
}

function chartLabel(data: ChartData): string {
  const first = data.points[0];
  const last = data.points.at(-1);
  if (first === undefined || last === undefined) return chartWords.emptyChartName(data.title);
  return chartWords.chartName(data.title, first.label, last.label);
}
