export { exportTallies, type ExportFormat } from "./export-tallies";
