import { compareMonths, type Month } from "./month";

/** One version of what is counted out of what, from a month on. */
export interface DatedDefinition {
  number: number;
  effectiveFrom: Month;
  comparable: boolean;
}

/** Effective month of a first definition unless another is given: it holds from the beginning. */
export const FROM_THE_BEGINNING = "1900-01" as Month;

/**
 * The definition that a month is counted under: the last one in force by then. Months before the first version
 * take the first, since nothing else was ever said of them. Any order in; throws RangeError on an empty list.
 */
export function definitionFor<D extends DatedDefinition>(definitions: readonly D[], month: Month): D {
  let found: D | undefined;
  let first: D | undefined;
  for (const each of definitions) {
    if (!first || each.effectiveFrom < first.effectiveFrom) first = each;
    const isInForce = compareMonths(each.effectiveFrom, month) <= 0;
    if (isInForce && (!found || each.effectiveFrom > found.effectiveFrom)) found = each;
  }
  const answer = found ?? first;
  if (!answer) throw new RangeError("An indicator has at least one definition.");
  return answer;
}

/** The version with the highest number, in force already or not. Throws RangeError on an empty list. */
export function newestDefinition<D extends DatedDefinition>(definitions: readonly D[]): D {
  const newest = definitions.reduce<D | undefined>(
    (best, each) => (best && best.number > each.number ? best : each),
    undefined,
  );
  if (!newest) throw new RangeError("An indicator has at least one definition.");
  return newest;
}

/** First months of versions that can't be compared with the months before, in order; the first version is none. */
export function comparisonBreaks(definitions: readonly DatedDefinition[]): Month[] {
  return definitions
    .filter((each) => each.number > 1 && !each.comparable)
    .map((each) => each.effectiveFrom)
    .sort(compareMonths);
}
