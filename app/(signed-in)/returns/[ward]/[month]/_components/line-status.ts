import { rateOf } from "@/lib/indicators/return-entry";
import { missingPart, type MissingPart } from "@/lib/indicators/return-missing";
import { answerOf, type TallyAnswer, type TallyFigures } from "@/lib/indicators/tally-answer";
import type { TallyReply } from "@/lib/schemas/tally";
import { draftKey, figuresWithDrafts, pairProblem, parts, type Drafts, type Part } from "./entry-state";

/** What the page says of one line, worked out from what is saved and what is typed. */
export interface LineStatus {
  figures: TallyFigures;
  answer: TallyAnswer;
  rate: number | null;
  pair: string | null;
  /** Boxes that need fixing, that have two versions, or that aren't saved. */
  fix: Part[];
  conflict: Part[];
  unsaved: Part[];
  missing: MissingPart | null;
}

export function lineStatus(line: TallyReply, drafts: Drafts): LineStatus {
  const inState = (...states: string[]) =>
    parts.filter((part) => states.includes(drafts[draftKey(line.indicator, part)]?.state ?? ""));
  const figures = figuresWithDrafts(line, drafts);
  return {
    figures,
    answer: answerOf(figures),
    rate: line.isMature ? rateOf(line.kind, figures) : null,
    pair: pairProblem(line, drafts),
    fix: inState("fix"),
    conflict: inState("conflict"),
    unsaved: inState("dirty", "saving", "failed"),
    missing: missingPart({
      ...line,
      isShared: line.sharedDenominator !== null,
      isCountedByTeam: line.numeratorBy === "team",
    }),
  };
}

export type Hold = "fix" | "conflict" | "unsaved" | "missing";

/** Why a line keeps the return from being sent, the worst first, and the box to go to. */
export function holdOf(status: LineStatus): { why: Hold; part: Part } | null {
  if (status.fix[0]) return { why: "fix", part: status.fix[0] };
  if (status.conflict[0]) return { why: "conflict", part: status.conflict[0] };
  if (status.unsaved[0]) return { why: "unsaved", part: status.unsaved[0] };
  if (status.missing === null) return null;
  return { why: "missing", part: status.missing === "denominator" ? "denominator" : "numerator" };
}

/** True where the line says something that is saved. */
export function saysSomething(line: TallyReply): boolean {
  const answer = answerOf(line);
  return answer !== "blank" && answer !== "partial";
}

export const boxId = (indicator: string, part: Part): string => `box-${indicator}-${part}`;
