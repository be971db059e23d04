export { columnsOf, evaluateFacts, type EvaluatedSeries } from "./evaluate";
export { lastDueMonth, loadSeries, type LoadedSeries, type LoadOptions } from "./load-series";
export { allSeries, reevaluateIndicator, reevaluateSeries, type SignalChanges } from "./reevaluate-series";
export { keyOf, type SeriesKey } from "./pairs";
