export { getBaselinePage, type BaselineItem, type BaselinePage } from "./baseline-page";
export { decideBaseline } from "./decide-baseline";
export { loadBaselines, type Baseline } from "./internal";
export { openSeries, type OpenSeries } from "./open-series";
export { previewBaseline, previewBaselineReply, type BaselinePreview } from "./preview-baseline";
export { listBaselines } from "./queries";
export { setBaseline } from "./set-baseline";
