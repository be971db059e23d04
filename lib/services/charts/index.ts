export { getChart } from "./get-chart";
export { readChart, type ChartView } from "./read-chart";
export { chartData, unitWords } from "./chart-data";
export { getChartPage, type ChartPage } from "./chart-page";
export type { Shown } from "./chart-shows";
export { listCharts, type ListedChart } from "./list-charts";
export { getPreviewCharts, type LimitsForMonth, type PreviewCharts } from "./preview-charts";
