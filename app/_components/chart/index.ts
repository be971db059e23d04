export { ChartExplorer } from "@/app/_components/chart/chart-explorer";
export { ChartKey } from "@/app/_components/chart/chart-key";
export { ControlChart } from "@/app/_components/chart/control-chart";
export { ControlChartSvg } from "@/app/_components/chart/control-chart-svg";
export { FiguresTable } from "@/app/_components/chart/figures-table";
export { ReadingStrip } from "@/app/_components/chart/reading-strip";
export { Sayings } from "@/app/_components/chart/sayings";
export { SmallChart } from "@/app/_components/chart/small-chart";
