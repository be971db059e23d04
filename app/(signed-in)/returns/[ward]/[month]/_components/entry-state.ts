import { readCount } from "@/lib/indicators/return-entry";
import { impossiblePair, type TallyFigures } from "@/lib/indicators/tally-answer";
import type { TallyReply } from "@/lib/schemas/tally";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { figureWords } from "@/lib/strings/returns";

export type Part = "numerator" | "denominator";
export const parts = ["numerator", "denominator"] as const;

/** What stands in a box and isn't saved: why, and what is wrong with it. */
export interface Draft {
  text: string;
  state: "dirty" | "saving" | "fix" | "conflict" | "failed";
  message?: string;
}

export type Drafts = Readonly<Record<string, Draft>>;

export interface EntryState {
  wardReturn: WardReturnReply;
  drafts: Drafts;
  /** When a line was last saved from this page, by indicator: an instant. */
  savedAt: Readonly<Record<string, string>>;
  /** What went wrong with a save that no box is to blame for. */
  failure: string | null;
}

export const draftKey = (indicator: string, part: Part): string => `${indicator} ${part}`;

export function lineOf(state: EntryState, indicator: string): TallyReply {
  const line = state.wardReturn.tallies.find((each) => each.indicator === indicator);
  if (!line) throw new RangeError(`No line ${indicator}`);
  return line;
}

/** The line's figures with what is typed in its boxes; text that is no number counts as blank. */
export function figuresWithDrafts(line: TallyReply, drafts: Drafts): TallyFigures {
  const typed = (part: Part): number | null => {
    const draft = drafts[draftKey(line.indicator, part)];
    if (!draft) return line[part];
    const read = readCount(draft.text);
    return read.ok ? read.value : null;
  };
  const numerator = typed("numerator");
  const denominator = typed("denominator");
  const isTyped = numerator !== line.numerator || denominator !== line.denominator;
  return {
    numerator,
    denominator,
    notCollected: isTyped ? null : line.notCollected,
    awaited: denominator === null ? line.awaited : null,
  };
}

/** Why the pair in the boxes can't be, in words with the numbers, or null. */
export function pairProblem(line: TallyReply, drafts: Drafts): string | null {
  const { numerator, denominator } = figuresWithDrafts(line, drafts);
  const problem = impossiblePair(line.kind, numerator, denominator);
  if (problem === null || numerator === null || denominator === null) return null;
  const words = { numerator: line.numeratorLabel, denominator: line.denominatorLabel };
  return problem === "events-without-denominator"
    ? figureWords.eventsWithoutDenominator(words, numerator)
    : figureWords.moreThanDenominator(words, numerator, denominator);
}

/** The return with a line as the server has it now; a shared denominator reaches its other lines. */
export function withTally(wardReturn: WardReturnReply, fresh: TallyReply): WardReturnReply {
  const { sharedDenominator, denominator, awaited, denominatorVersion } = fresh;
  const { denominatorSavedBy, denominatorSavedAt } = fresh;
  return {
    ...wardReturn,
    tallies: wardReturn.tallies.map((line) => {
      if (line.indicator === fresh.indicator) return fresh;
      if (sharedDenominator === null || line.sharedDenominator !== sharedDenominator) return line;
      return { ...line, denominator, awaited, denominatorVersion, denominatorSavedBy, denominatorSavedAt };
    }),
  };
}

/** The first line that shows a shared denominator types it; the others repeat it. */
export function typedIn(line: TallyReply, lines: readonly TallyReply[]): TallyReply {
  if (line.sharedDenominator === null) return line;
  return lines.find((each) => each.sharedDenominator === line.sharedDenominator) ?? line;
}

export function without(drafts: Drafts, keys: readonly string[]): Drafts {
  return Object.fromEntries(Object.entries(drafts).filter(([key]) => !keys.includes(key)));
}
