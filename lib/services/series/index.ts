export { columnsOf, evaluateFacts, type EvaluatedSeries } from "./evaluate";
export {
  hospitalTimeZone,
  hospitalToday,
  lastDueMonth,
  loadSeries,
  type LoadedSeries,
  type LoadOptions,
} from "./load-series";
export {
  allSeries,
  lockSeries,
  reevaluateIndicator,
  reevaluateSeries,
  type SignalChanges,
} from "./reevaluate-series";
export { rebuildSeries, type RebuildResult } from "./rebuild-series";
export { ripenSeries, type RipenResult } from "./ripen-series";
export { keyOf, pairTable, type SeriesKey } from "./pairs";
