/** What the reading worker loads; "@/…" holds there because the worker names the tsconfig. */
export { readBytes } from "./read-bytes";
export { ROWS_PER_MESSAGE } from "./upload-limits";
