export { createIndicator } from "./create-indicator";
export { loadDetails, type Indicator, type IndicatorDefinition, type IndicatorDetail } from "./internal";
export { getIndicatorByCode, isCounted, listIndicators, listSharedDenominators } from "./queries";
export { indicatorReply } from "./reply";
export { updateIndicator } from "./update-indicator";
