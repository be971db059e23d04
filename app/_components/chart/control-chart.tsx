import { ChartExplorer } from "@/app/_components/chart/chart-explorer";
import { ChartKey } from "@/app/_components/chart/chart-key";
import { ControlChartSvg } from "@/app/_components/chart/control-chart-svg";
import { isPlotted, type ChartData } from "@/lib/scene/chart-data";
import { buildControlChartScene, type SceneOptions } from "@/lib/scene/control-chart";
import { readMonth } from "@/lib/scene/reading";

export interface ControlChartProps {
  data: ChartData;
  /** Unique on the page. */
  id: string;
  options?: SceneOptions;
  /** Address of each month's own page, in the points' order. */
  monthLinks?: (string | null)[];
  withKey?: boolean;
}

/** Reading strip, chart and key; the page puts the figures table directly beneath. */
export function ControlChart({ data, id, options, monthLinks, withKey = true }: ControlChartProps) {
  const scene = buildControlChartScene(data, "large", options);
  const lastPlotted = data.points.findLastIndex(isPlotted);
  return (
    <>
      <ChartExplorer
        title={data.title}
        numeratorLabel={data.numeratorLabel}
        denominatorLabel={data.denominatorLabel}
        readings={data.points.map((_, index) => readMonth(data, index))}
        start={lastPlotted >= 0 ? lastPlotted : Math.max(0, data.points.length - 1)}
        geometry={{ width: scene.width, height: scene.height, plot: scene.plot, slots: scene.slots }}
        links={monthLinks}
      >
        <ControlChartSvg scene={scene} id={id} />
      </ChartExplorer>
      {withKey ? <ChartKey data={data} /> : null}
    </>
  );
}
