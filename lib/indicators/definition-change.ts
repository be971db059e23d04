import { DomainError, type FieldError } from "@/lib/errors";
import { longMonth } from "./chart-format";
import type { DatedDefinition } from "./definition";
import { compareMonths, type Month } from "./month";

/** The words of a definition: any change of them makes a new version. */
export interface DefinitionWords {
  numeratorLabel: string;
  denominatorLabel: string;
  attribution: string;
}

export interface DefinitionChange extends Partial<DefinitionWords> {
  effectiveFrom?: Month;
  comparable?: boolean;
  reason?: string;
}

export interface NewDefinition extends DefinitionWords {
  number: number;
  effectiveFrom: Month;
  comparable: boolean;
  reason: string;
}

/**
 * The version that a change makes after the newest one, or null where no word of the definition changes.
 * Throws DomainError `invalid` with a message for each thing that is missing or can't be.
 */
export function decideDefinition(
  newest: DatedDefinition & DefinitionWords,
  change: DefinitionChange,
): NewDefinition | null {
  const words = {
    numeratorLabel: change.numeratorLabel ?? newest.numeratorLabel,
    denominatorLabel: change.denominatorLabel ?? newest.denominatorLabel,
    attribution: change.attribution ?? newest.attribution,
  };
  const { effectiveFrom, comparable, reason } = change;
  if (!wordsDiffer(newest, words)) {
    if (effectiveFrom === undefined && comparable === undefined) return null;
    throw needsFixing([
      {
        path: effectiveFrom === undefined ? "comparable" : "effectiveFrom",
        message: "A new version changes what is counted, out of what, or which ward an event belongs to.",
      },
    ]);
  }
  const errors: FieldError[] = [];
  if (effectiveFrom === undefined) {
    errors.push({ path: "effectiveFrom", message: "Give the month from which the new words hold." });
  } else if (compareMonths(effectiveFrom, newest.effectiveFrom) <= 0) {
    const message = `Version ${newest.number} holds from ${longMonth(newest.effectiveFrom)}. Give a later month.`;
    errors.push({ path: "effectiveFrom", message });
  }
  if (comparable === undefined) {
    errors.push({ path: "comparable", message: "Say whether months before and after can be compared." });
  }
  if (reason === undefined) errors.push({ path: "reason", message: "Give a reason." });
  if (effectiveFrom === undefined || comparable === undefined || reason === undefined || errors.length > 0) {
    throw needsFixing(errors);
  }
  return { ...words, number: newest.number + 1, effectiveFrom, comparable, reason };
}

export function wordsDiffer(left: DefinitionWords, right: DefinitionWords): boolean {
  return (
    left.numeratorLabel !== right.numeratorLabel ||
    left.denominatorLabel !== right.denominatorLabel ||
    left.attribution !== right.attribution
  );
}

function needsFixing(errors: FieldError[]): DomainError {
  return new DomainError("invalid", errors[0]?.message ?? "Something needs fixing.", { errors });
}
