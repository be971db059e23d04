/** What an upload may cost. Larger gets "too-large" with the reason. */
export const MAX_UPLOAD_BYTES = 5 * 1024 * 1024;
/** All parts of a workbook together, counted while inflating: a declared size can lie. */
export const MAX_UNPACKED_BYTES = 64 * 1024 * 1024;
/** Rows under the heading that hold something in a column that is read. */
export const MAX_ROWS = 50_000;
/** Parts of the zip; a workbook of a hundred sheets has a few hundred. */
export const MAX_ZIP_ENTRIES = 2_000;
/** One text repeated in every row costs nothing in the file but much once handed over, so the sum is bounded. */
export const MAX_TEXT_CHARACTERS = 24_000_000;
/** A cell's text beyond this is cut and marked, and the row reader refuses it. */
export const MAX_CELL_CHARACTERS = 2_000;
export const MAX_SHARED_STRINGS = 500_000;
export const MAX_COLUMNS = 16_384;
export const MAX_SHEET_ROWS = 1_048_576;
export const MAX_XML_DEPTH = 64;

export const READING_MEMORY_MB = 256;
export const READING_SECONDS = 30;
/** Uploads read at the same moment; further ones wait. */
export const READERS_AT_ONCE = 2;
/** Rows handed over at a time, so that no single message holds up the main thread. */
export const ROWS_PER_MESSAGE = 500;
/** The list of blank rows stops here; the count goes on. */
export const MAX_LISTED_ROWS = 200;
