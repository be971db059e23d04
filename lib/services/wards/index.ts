export { createWard } from "./create-ward";
export { lockWard, refuseHidingSent, sentMonthsOutside } from "./internal";
export { getWardByCode, listWards, wardsWithin, type Ward } from "./queries";
export { updateWard } from "./update-ward";
