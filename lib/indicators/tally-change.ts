import { DomainError } from "@/lib/errors";
import type { TallyFigures } from "./tally-answer";

/** Everything about a line that a person can change. A shared denominator is filled in. */
export interface TallyContent extends TallyFigures {
  note: string | null;
}

/** What a save asks for: a field left out keeps its value. */
export type TallyChange = { [Field in keyof TallyContent]?: TallyContent[Field] | undefined };

export type TallyField = keyof TallyContent;

export const BLANK_TALLY: TallyContent = {
  numerator: null,
  denominator: null,
  notCollected: null,
  awaited: null,
  note: null,
};

const fields = Object.keys(BLANK_TALLY) as TallyField[];

/** Fields in which two states of a line differ. */
export function differingFields(left: TallyContent, right: TallyContent): TallyField[] {
  return fields.filter((field) => left[field] !== right[field]);
}

/**
 * The line after a change. Answers exclude one another: "not collected" clears the figures and a count clears "not
 * collected"; "awaited" clears the denominator and a denominator clears "awaited". A shared denominator belongs to
 * the ward, so what one line says of itself leaves it alone. Throws DomainError `invalid` where a change contradicts
 * itself.
 */
export function applyTallyChange(
  current: TallyContent,
  change: TallyChange,
  isShared: boolean,
): TallyContent {
  refuseContradiction(change, isShared);
  const next: TallyContent = { ...current };
  for (const field of fields) {
    const value = change[field];
    if (value !== undefined) Object.assign(next, { [field]: value });
  }
  if (hasValue(change.notCollected)) {
    next.numerator = null;
    if (!isShared) Object.assign(next, { denominator: null, awaited: null });
    return next;
  }
  if (hasValue(change.awaited)) next.denominator = null;
  if (hasValue(change.denominator)) next.awaited = null;
  const ownFigure = hasValue(change.numerator) || (!isShared && saysDenominator(change));
  if (ownFigure) next.notCollected = null;
  return next;
}

const hasValue = (value: number | string | null | undefined): boolean =>
  value !== null && value !== undefined;

const saysDenominator = (change: TallyChange) => hasValue(change.denominator) || hasValue(change.awaited);

function refuseContradiction(change: TallyChange, isShared: boolean): void {
  const countsToo = hasValue(change.numerator) || (!isShared && saysDenominator(change));
  if (hasValue(change.notCollected) && countsToo) {
    throw needsFixing("notCollected", "Give a count, or say why nothing was collected, not both.");
  }
  if (hasValue(change.awaited) && hasValue(change.denominator)) {
    throw needsFixing("awaited", "Give the denominator, or say where it is still to come from, not both.");
  }
}

function needsFixing(path: string, message: string): DomainError {
  return new DomainError("invalid", message, { errors: [{ path, message }] });
}
