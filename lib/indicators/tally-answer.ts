/** The figures of one line; a shared denominator is already filled in. */
export interface TallyFigures {
  numerator: number | null;
  denominator: number | null;
  notCollected: string | null;
  awaited: string | null;
}

/**
 * What a line says. A count (zero included), nothing to count, not collected and awaited are answers and never
 * mixed up; `partial` (one of the two blank) and `blank` are drafts.
 */
export type TallyAnswer = "count" | "nothing-to-count" | "not-collected" | "awaited" | "partial" | "blank";

export function answerOf(figures: TallyFigures): TallyAnswer {
  if (figures.notCollected !== null) return "not-collected";
  if (figures.awaited !== null && figures.denominator === null) return "awaited";
  if (figures.denominator === 0)
    return figures.numerator === null || figures.numerator === 0 ? "nothing-to-count" : "partial";
  if (figures.numerator !== null && figures.denominator !== null) return "count";
  return figures.numerator === null && figures.denominator === null ? "blank" : "partial";
}

/** Why a pair can't be, or null: more events than units in a proportion, events where nothing could be counted. */
export function impossiblePair(
  kind: "proportion" | "rate",
  numerator: number | null,
  denominator: number | null,
): "numerator-above-denominator" | "events-without-denominator" | null {
  if (numerator === null || denominator === null) return null;
  if (denominator === 0 && numerator > 0) return "events-without-denominator";
  if (kind === "proportion" && numerator > denominator) return "numerator-above-denominator";
  return null;
}
