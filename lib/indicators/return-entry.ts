import { impossiblePair, type TallyFigures } from "./tally-answer";
import { compareWithUsual, usualRange, type UsualRange, type UsualVerdict } from "./tally-usual-range";
import type { Kind } from "./vocabulary";

const MOST = 1_000_000_000;

/** A line's figures in an earlier month: those on the chart, or those typed so far. */
export interface EarlierFigures {
  numerator: number | null;
  denominator: number | null;
  corrected: boolean;
}

/** Steps of a return that somebody's role allows; its state decides the rest. */
export interface ReturnSteps {
  submit: boolean;
  recall: boolean;
  accept: boolean;
  reopen: boolean;
  correct: boolean;
  decide: boolean;
}

/** What somebody types in a line. */
export interface TypedParts {
  numerator: boolean;
  line: boolean;
}

export type ReadCount = { ok: true; value: number | null } | { ok: false };

/** What a person typed into a box: a whole number with or without separators of thousands, or nothing. */
export function readCount(text: string): ReadCount {
  const plain = text.trim().replace(/(?<=\d)[,\s\u00a0\u202f](?=\d{3}(?!\d))/g, "");
  if (plain === "") return { ok: true, value: null };
  if (!/^\d{1,10}$/.test(plain)) return { ok: false };
  const value = Number(plain);
  return value <= MOST ? { ok: true, value } : { ok: false };
}

/** The usual range of one box and where the count lies in it; null where either is missing. */
export interface UsualCheck {
  verdict: UsualVerdict;
  range: UsualRange;
}

export function usualCheck(count: number | null, earlier: readonly (number | null)[]): UsualCheck | null {
  const range = usualRange(earlier);
  return count === null || range === null ? null : { range, verdict: compareWithUsual(count, range) };
}

/** The rate so far as a fraction; null where it can't be or there is none. */
export function rateOf(kind: Kind, { numerator, denominator, notCollected }: TallyFigures): number | null {
  if (notCollected !== null || numerator === null || denominator === null || denominator === 0) return null;
  return impossiblePair(kind, numerator, denominator) === null ? numerator / denominator : null;
}
