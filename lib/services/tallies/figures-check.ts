import "server-only";
import { DomainError, type FieldError } from "@/lib/errors";
import { impossiblePair } from "@/lib/indicators/tally-answer";
import type { TallyContent } from "@/lib/indicators/tally-change";
import { figureWords } from "@/lib/strings/returns";
import { contentOf, type Line } from "./lines";

/** What is impossible about a line's figures, in words with the numbers, or null. */
function complaint(line: Line, content: Pick<TallyContent, "numerator" | "denominator">): string | null {
  const { numerator, denominator } = content;
  const problem = impossiblePair(line.indicator.kind, numerator, denominator);
  if (problem === null || numerator === null || denominator === null) return null;
  const words = { numerator: line.labels.numerator, denominator: line.labels.denominator };
  return problem === "events-without-denominator"
    ? figureWords.eventsWithoutDenominator(words, numerator)
    : figureWords.moreThanDenominator(words, numerator, denominator);
}

/**
 * Refuses figures that can't be: of the line itself, and of every line that shares its denominator. Throws
 * DomainError `invalid`; a sibling is named, since its numerator stands in another line.
 */
export function refuseImpossible(line: Line, next: TallyContent, siblings: readonly Line[]): void {
  const errors: FieldError[] = [];
  const own = complaint(line, next);
  if (own !== null) errors.push({ path: "numerator", message: own });
  for (const sibling of siblings) {
    const { numerator } = contentOf(sibling);
    const message = complaint(sibling, { numerator, denominator: next.denominator });
    if (message !== null) {
      errors.push({ path: "denominator", message: figureWords.inLine(sibling.indicator.name, message) });
    }
  }
  const [first] = errors;
  if (first) throw new DomainError("invalid", first.message, { errors });
}
