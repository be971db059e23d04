/**
 * Workbooks write characters that XML can't hold as `_xHHHH_` (a carriage return is `_x000D_`), and an underscore
 * that would begin such a group as `_x005F_`.
 */
export function decodeExcelText(text: string): string {
  if (!text.includes("_x")) return text;
  return text.replace(/_x([0-9A-Fa-f]{4})_/g, (_, code: string) => String.fromCharCode(parseInt(code, 16)));
}

/** The way back. The XML writer drops control characters and XML turns carriage returns into line feeds. */
export function encodeExcelText(text: string): string {
  return text
    .replace(/_(?=x[0-9A-Fa-f]{4}_)/g, "_x005F_")
    .replace(/[\p{Surrogate}\x00-\x08\x0B-\x1F\x7F\uFFFE\uFFFF]/gu, (character) => {
      return `_x${character.charCodeAt(0).toString(16).toUpperCase().padStart(4, "0")}_`;
    });
}
