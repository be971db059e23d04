/**
 * Spreadsheet programs take a CSV field that begins with one of these for a formula, so such text is written with
 * an apostrophe before it, and one apostrophe is taken off again when it is read. Text that already has
 * apostrophes before such a character gets one more: that keeps the way back exact for every text.
 */
const NEEDS_GUARD = /^'*[=+\-@\t\r\n＝＋－＠]/;
const IS_GUARDED = /^'+[=+\-@\t\r\n＝＋－＠]/;

export function guardText(text: string): string {
  return NEEDS_GUARD.test(text) ? `'${text}` : text;
}

export function unguardText(text: string): string {
  return IS_GUARDED.test(text) ? text.slice(1) : text;
}
