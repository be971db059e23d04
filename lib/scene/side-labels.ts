import { hasLimitsAt, segmentAt, type ChartData } from "@/lib/scene/chart-data";
import { formatRate, formatRateSign } from "@/lib/scene/format";
import { spread } from "@/lib/scene/spread";
import { chartWords } from "@/lib/strings/chart";
import { at, type LabelRole, type SceneShape } from "@/lib/scene/scene";
import type { Layout } from "@/lib/scene/layout";

const leastGap = 14;

interface SideLabel {
  role: LabelRole;
  text: string;
  height: number;
  indent: number;
}

/** The last month's limits and the target, named at the right and moved apart where they would touch. */
export function sideLabels(data: ChartData, layout: Layout): SceneShape[] {
  const wanted = [...limitLabels(data, layout), ...targetLabel(data, layout)];
  const heights = spread(
    wanted.map((label) => label.height),
    leastGap,
    layout.top - 8,
    layout.floor + 4,
  );
  return wanted.map((label, index) => ({
    shape: "label",
    role: label.role,
    at: at(layout.right + label.indent, (heights[index] ?? label.height) + 4),
    text: label.text,
    anchor: "start",
  }));
}

/** Dots across the plot and a solid pointer: a target is never drawn as a limit. */
export function targetShapes(data: ChartData, layout: Layout): SceneShape[] {
  if (data.target === null) return [];
  const y = layout.y(data.target);
  const { left, right } = layout;
  return [
    { shape: "line", role: "target", lines: [[at(left, y), at(right, y)]] },
    {
      shape: "area",
      role: "target-pointer",
      outlines: [[at(right, y), at(right + 8, y - 4.5), at(right + 8, y + 4.5)]],
    },
  ];
}

function targetLabel(data: ChartData, layout: Layout): SideLabel[] {
  if (data.target === null) return [];
  const text = `${chartWords.target} ${formatRateSign(data.target, data.per)}`;
  return [{ role: "target", text, height: layout.y(data.target), indent: 12 }];
}

function limitLabels(data: ChartData, layout: Layout): SideLabel[] {
  const last = data.points.findLastIndex((_, index) => hasLimitsAt(data, index));
  const point = data.points[last];
  if (point === undefined) return [];
  const label = (name: string, value: number, role: LabelRole = "limit"): SideLabel => ({
    role,
    text: `${name} ${formatRate(value, data.per)}`,
    height: layout.y(value),
    indent: 8,
  });
  const none = (text: string, height: number): SideLabel => ({ role: "limit", text, height, indent: 8 });
  const { upperAction, upperWarning, lowerWarning, lowerAction } = point;
  const centre = segmentAt(data, last)?.centre ?? point.centre;
  const earlier = segmentAt(data, last)?.earlierCentre ?? null;
  return [
    upperAction === null
      ? none(chartWords.noUpperLimit, layout.ceiling)
      : label(chartWords.upperAction, upperAction),
    ...(upperWarning === null ? [] : [label(chartWords.upperWarning, upperWarning)]),
    ...(centre === null ? [] : [label(chartWords.centre, centre, "centre")]),
    ...(earlier === null ? [] : [label(chartWords.earlierCentre, earlier)]),
    ...(lowerWarning === null ? [] : [label(chartWords.lowerWarning, lowerWarning)]),
    lowerAction === null
      ? none(chartWords.noLowerLimit, layout.floor)
      : label(chartWords.lowerAction, lowerAction),
  ];
}
