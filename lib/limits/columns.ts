/**
 * Reads of a column's slot. The compiler can't know that a loop stays inside a typed array; the callers do,
 * because their bounds come from the column's own length. One function a kind of column keeps each read
 * monomorphic, so that the engine inlines it.
 */
export function at(column: Float64Array, slot: number): number {
  return column[slot] as number;
}

/** As `at`, for columns of -1, 0 and 1. */
export function codeAt(column: Int8Array, slot: number): number {
  return column[slot] as number;
}

/** As `at`, for columns of 0 and 1. */
export function flagAt(column: Uint8Array, slot: number): number {
  return column[slot] as number;
}

/** As `at`, for columns of positions. */
export function indexAt(column: Int32Array, slot: number): number {
  return column[slot] as number;
}

/** A column in which nothing exists yet. */
export function emptyColumn(length: number): Float64Array {
  return new Float64Array(length).fill(NaN);
}

/** A month is plotted when a count exists and there was something to count out of. */
export function isPlotted(numerator: number, denominator: number): boolean {
  return denominator > 0 && !Number.isNaN(numerator);
}
