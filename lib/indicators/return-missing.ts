import { answerOf, type TallyFigures } from "./tally-answer";

/** One line of a return, as far as it may hold the sending back. */
export interface ReturnLine extends TallyFigures {
  /** True where the denominator is one that several lines share. */
  isShared: boolean;
  /** True where the owning team counts the numerator. */
  isCountedByTeam: boolean;
  /** False while the month's outcome still needs time: the line then has its own due day. */
  isMature: boolean;
}

export type MissingPart = "line" | "numerator" | "denominator";

/**
 * The part that is still to enter before a return can be sent, or null where the line doesn't hold it back: it says
 * something, isn't complete yet, is awaited, or its team hasn't counted. Once the team has counted, the
 * ward's denominator is asked for. A shared denominator that is awaited frees no line from its own numerator.
 */
export function missingPart(line: ReturnLine): MissingPart | null {
  if (!line.isMature) return null;
  const answer = answerOf(line);
  if (line.isCountedByTeam) return answer === "partial" && line.denominator === null ? "denominator" : null;
  if (answer === "awaited") return line.isShared && line.numerator === null ? "numerator" : null;
  if (answer === "blank") return "line";
  if (answer !== "partial") return null;
  return line.numerator === null ? "numerator" : "denominator";
}
