import { at } from "./columns";
import type { SeriesInput } from "./types";

/**
 * Refuses a series that no chart can be drawn of. Errors: RangeError on columns of different lengths, negative or
 * broken counts, a proportion's numerator above its denominator, segments that overlap or leave the series.
 */
export function validateSeries({ model, counts, segments }: SeriesInput): void {
  const { numerators, denominators } = counts;
  if (numerators.length !== denominators.length) {
    throw new RangeError("numerators and denominators must have one length");
  }
  for (let slot = 0; slot < numerators.length; slot += 1) {
    const numerator = at(numerators, slot);
    const denominator = at(denominators, slot);
    if (!isMissing(numerator) && !isCount(numerator)) {
      throw new RangeError(`the numerator of slot ${slot} must be a whole number from 0 up`);
    }
    if (isMissing(denominator)) continue;
    if (!(denominator >= 0 && denominator < Infinity)) {
      throw new RangeError(`the denominator of slot ${slot} must be a number from 0 up`);
    }
    if (model !== "binomial") continue;
    if (!isCount(denominator)) {
      throw new RangeError(`the denominator of slot ${slot} must be a whole number from 0 up`);
    }
    if (denominator > 0 && numerator > denominator) {
      throw new RangeError(`the numerator of slot ${slot} exceeds its denominator`);
    }
  }
  let free = 0;
  for (const { start, end, inBaseline } of segments) {
    if (!(Number.isInteger(start) && Number.isInteger(end) && start >= free && end >= start)) {
      throw new RangeError("segments must be whole stretches in order that don't overlap");
    }
    if (end > numerators.length) throw new RangeError("a segment must not leave the series");
    if (inBaseline.length !== numerators.length) {
      throw new RangeError("inBaseline must have the length of the series");
    }
    free = end;
  }
}

function isMissing(value: number): boolean {
  return Number.isNaN(value);
}

function isCount(value: number): boolean {
  return Number.isSafeInteger(value) && value >= 0;
}
