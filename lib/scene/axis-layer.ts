import type { ChartData } from "@/lib/scene/chart-data";
import { shortMonth } from "@/lib/scene/format";
import { rectangle } from "@/lib/scene/outlines";
import { niceTicks, tickLabels } from "@/lib/scene/ticks";
import { at, type SceneShape } from "@/lib/scene/scene";
import type { Layout } from "@/lib/scene/layout";

/** Hairlines and figures of the value axis, which starts at zero. */
export function gridShapes(data: ChartData, layout: Layout): SceneShape[] {
  const ticks = niceTicks(layout.topValue * data.per);
  const labels = tickLabels(ticks);
  return ticks.flatMap((tick, index): SceneShape[] => {
    const y = layout.y(tick / data.per);
    return [
      { shape: "line", role: "grid", lines: [[at(layout.left, y), at(layout.right, y)]] },
      {
        shape: "label",
        role: "tick",
        at: at(layout.left - 8, y + 4),
        text: labels[index] ?? "",
        anchor: "end",
      },
    ];
  });
}

/** The month scale: filled and empty in turn, one segment a month, with names beneath and years under January. */
export function monthScaleShapes(data: ChartData, layout: Layout): SceneShape[] {
  const top = layout.floor + 1;
  const segment = (index: number) => rectangle(layout.slotFrom(index), top, layout.slot, 5);
  const places = data.points.map((_, index) => index);
  const frame = rectangle(layout.left, top, layout.slot * data.points.length, 5);
  return [
    { shape: "area", role: "scale-full", outlines: places.filter((index) => index % 2 === 0).map(segment) },
    { shape: "area", role: "scale-empty", outlines: places.filter((index) => index % 2 === 1).map(segment) },
    { shape: "line", role: "scale-frame", lines: [[...frame, ...frame.slice(0, 1)]] },
    ...monthNames(data, layout),
    {
      shape: "line",
      role: "axis",
      lines: [[at(layout.left, layout.top), at(layout.left, layout.floor + 6)]],
    },
  ];
}

function monthNames(data: ChartData, layout: Layout): SceneShape[] {
  return data.points.flatMap(({ month }, index): SceneShape[] => {
    const name: SceneShape = {
      shape: "label",
      role: "month",
      at: at(layout.x(index), layout.floor + 20),
      text: shortMonth(month),
      anchor: "middle",
      month: index,
    };
    return index === 0 || month.endsWith("-01") ? [name, yearLabel(data, layout, index)] : [name];
  });
}

/** Under January and the first month; in narrow slots the year begins with its month. */
function yearLabel(data: ChartData, layout: Layout, index: number): SceneShape {
  const x = layout.x(index);
  const y = layout.floor + 33;
  const text = data.points[index]?.month.slice(0, 4) ?? "";
  const label = (place: number, anchor: "start" | "middle" | "end"): SceneShape => ({
    shape: "label",
    role: "year",
    at: at(place, y),
    text,
    anchor,
    month: index,
  });
  if (layout.slot >= 30) return label(x, "middle");
  // The first month's year steps aside where a January follows at once.
  const crowded = index === 0 && data.points[1]?.month.endsWith("-01");
  return crowded ? label(x + 8.6, "end") : label(x - 10.6, "start");
}
