/** Numbers and months in British English, as the interface writes them. */

const monthNames = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
] as const;

/** Stands for a figure that does not exist. */
export const noFigure = "–";

/** 2068 as "2,068". Counts and denominators only: whole numbers of any size. */
export function formatCount(count: number): string {
  const digits = String(Math.abs(Math.trunc(count))).replace(/\B(?=(\d{3})+$)/g, ",");
  return count < 0 ? `−${digits}` : digits;
}

/** A fraction scaled by `per`, one decimal: 0.0517 per 100 as "5.2". Without its unit. */
export function formatRate(fraction: number, per: number): string {
  const [whole = "0", decimal = "0"] = (fraction * per).toFixed(1).split(".");
  const sign = whole.startsWith("-") ? "−" : "";
  return `${sign}${whole.replace("-", "").replace(/\B(?=(\d{3})+$)/g, ",")}.${decimal}`;
}

/** The rate with a percent sign where it is a percentage: "5.2%"; other rates stay bare: "22.4". */
export function formatRateSign(fraction: number, per: number): string {
  return per === 100 ? `${formatRate(fraction, per)}%` : formatRate(fraction, per);
}

/** The rate in words that stand on their own: "5.2%", "22.4 per 1000". */
export function formatRateWords(fraction: number, per: number): string {
  return per === 100 ? formatRateSign(fraction, per) : `${formatRate(fraction, per)} ${perWords(per)}`;
}

/** "percent", "per 1000", "per 10,000": four figures are written without a comma. */
export function perWords(per: number): string {
  if (per === 100) return "percent";
  return `per ${per < 10_000 ? String(per) : formatCount(per)}`;
}

/** "2026-06" as "Jun". */
export function shortMonth(month: string): string {
  return monthNameOf(month).slice(0, 3);
}

/** "2026-06" as "June 2026". */
export function longMonth(month: string): string {
  return `${monthNameOf(month)} ${month.slice(0, 4)}`;
}

/** "2026-12-30" as "30 December 2026". */
export function longDate(date: string): string {
  return `${Number(date.slice(8, 10))} ${longMonth(date.slice(0, 7))}`;
}

/** "2026-06" as "Jun 2026", for flags and short ranges. */
export function flagMonth(month: string): string {
  return `${shortMonth(month)} ${month.slice(0, 4)}`;
}

/** "2026-06" as "Jun 26", for table rows. */
export function tableMonth(month: string): string {
  return `${shortMonth(month)} ${month.slice(2, 4)}`;
}

function monthNameOf(month: string): string {
  const name = monthNames[Number(month.slice(5, 7)) - 1];
  if (name === undefined) throw new RangeError(`Not a month: ${month.slice(0, 20)}`);
  return name;
}

/** Cut to `length` characters with an ellipsis inside that length, at a word's end where one is near. */
export function shorten(text: string, length: number): string {
  if (text.length <= length) return text;
  const cut = text.slice(0, length - 1);
  const space = cut.lastIndexOf(" ");
  return `${(space > length * 0.6 ? cut.slice(0, space) : cut).trimEnd()}…`;
}

/** Above this many, "one in …" is written in millions. */
const MOST = 1e15;
const MILLION = 1_000_000;

/**
 * A chance as odds: 0.0012 as "1 in 830", two figures at most. Chances over a half are no odds worth naming and
 * give null; odds beyond all imagining are not told apart.
 */
export function formatOdds(chance: number): string | null {
  if (!(chance <= 0.5)) return null;
  const many = 1 / chance;
  if (!(many < MOST)) return "1 in over a thousand million million";
  const digits = Math.max(0, Math.floor(Math.log10(many)) - 1);
  const rounded = Math.round(many / 10 ** digits) * 10 ** digits;
  if (rounded < MILLION) return `1 in ${formatCount(rounded)}`;
  const millions = rounded / MILLION;
  return `1 in ${millions < 10 ? String(Number(millions.toFixed(1))) : formatCount(millions)} million`;
}

/** A list in a sentence: "July", "July and August", "July, August and June". */
export function inWords(items: readonly string[]): string {
  if (items.length < 2) return items[0] ?? "";
  return `${items.slice(0, -1).join(", ")} and ${items.at(-1) ?? ""}`;
}

/** "Readmitted patients" inside a sentence; a word with capitals of its own ("MRSA") keeps them. */
export function midSentence(label: string): string {
  const second = label.charAt(1);
  return second === second.toUpperCase() && second !== second.toLowerCase()
    ? label
    : label.charAt(0).toLowerCase() + label.slice(1);
}
