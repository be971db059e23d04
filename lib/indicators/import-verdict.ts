import { rowWords, teamNames } from "@/lib/strings/imports";
import { isReportedIn, reportedMonths } from "./assigned-months";
import {
  pairKey,
  storedFor,
  type ImportFacts,
  type ImportIndicator,
  type ImportMonth,
  type ImportTally,
  type ImportWard,
} from "./import-facts";
import type { ImportColumn, ImportLine, ImportMessage, ImportVerdict, RowOutcome } from "./import-row";
import type { Suggestions } from "./import-suggestions";
import type { Month } from "./month";
import { answerOf, impossiblePair } from "./tally-answer";

interface Placed {
  line: ImportLine;
  ward: ImportWard;
  indicator: ImportIndicator;
  month: Month;
  stored: ImportMonth;
}

interface Figures {
  numerator: number | null;
  denominator: number | null;
  notCollected: string | null;
}

/**
 * What one row of a sheet will do, judged by itself: is it a line that this ward reports, can the pair be, may this
 * person change it, and what does it change. Rows that stand in each other's way are judged by `judgeTogether`.
 */
export function judgeLine(line: ImportLine, facts: ImportFacts, suggestions: Suggestions): ImportVerdict {
  if (line.blank) return verdictOf(line, "skipped", line.messages);
  const ward = facts.wards.get(line.ward.toUpperCase());
  const indicator = facts.indicators.get(line.indicator.toUpperCase());
  const messages = [...line.messages];
  if (!ward && line.ward !== "") messages.push(at(line, ["ward"], suggestions.unknownWard(line.ward)));
  if (!indicator && line.indicator !== "") {
    messages.push(at(line, ["indicator"], suggestions.unknownIndicator(line.indicator)));
  }
  if (line.onlyDenominator && (indicator?.mayType ?? true)) messages.push(line.onlyDenominator);
  if (!ward || !indicator || line.month === null) return verdictOf(line, "rejected", messages);

  const stored = storedFor(facts, ward.id, line.month);
  const placed: Placed = { line, ward, indicator, month: line.month, stored };
  messages.push(...textMessages(line), ...placeMessages(placed, facts), ...pairMessages(placed));
  if (messages.length > 0) return place(placed, verdictOf(line, "rejected", messages));
  return compare(placed, facts);
}

function at(line: ImportLine, columns: ImportColumn[], message: string): ImportMessage {
  const cells = columns.flatMap((column) => line.cells[column] ?? []);
  return { cell: cells.length > 0 ? cells.join(", ") : (columns[0] ?? ""), columns, message };
}

/** Turns a row down that was fine by itself. */
export function reject(verdict: ImportVerdict, columns: ImportColumn[], message: string): void {
  verdict.outcome = "rejected";
  verdict.messages = [
    ...verdict.messages.filter((each) => each.columns.length > 0),
    at(verdict.line, columns, message),
  ];
}

function verdictOf(line: ImportLine, outcome: RowOutcome, messages: ImportMessage[]): ImportVerdict {
  return {
    line,
    outcome,
    wardId: null,
    indicatorId: null,
    sharedDenominatorId: null,
    numerator: line.numerator,
    denominator: line.denominator,
    tallyVersion: 0,
    denominatorVersion: 0,
    before: null,
    messages,
  };
}

/** Adds where the row belongs and which versions it was compared with. */
function place({ ward, indicator, stored }: Placed, verdict: ImportVerdict): ImportVerdict {
  const tally = stored.tallies.get(indicator.id);
  const shared = sharedOf(indicator, stored);
  const isStored = tally !== undefined || shared !== undefined || stored.return !== null;
  return {
    ...verdict,
    wardId: ward.id,
    indicatorId: indicator.id,
    sharedDenominatorId: indicator.sharedDenominatorId,
    tallyVersion: tally?.version ?? 0,
    denominatorVersion: shared?.version ?? 0,
    before: isStored
      ? {
          tally: tally ? figuresBefore(tally) : null,
          shared: shared ? { value: shared.value, awaited: shared.awaited } : null,
          return: stored.return,
        }
      : null,
  };
}

function figuresBefore({ numerator, denominator, notCollected, awaited, note, corrected }: ImportTally) {
  return { numerator, denominator, notCollected, awaited, note, corrected };
}

function sharedOf({ sharedDenominatorId }: ImportIndicator, stored: ImportMonth) {
  return sharedDenominatorId === null ? undefined : stored.denominators.get(sharedDenominatorId);
}

/** Longest note and reason that a line takes. */
export const MAX_LINE_TEXT = 300;

function textMessages(line: ImportLine): ImportMessage[] {
  const columns: ImportColumn[] = ["notCollected", "note"];
  return columns
    .filter((column) => (column === "note" ? line.note : line.notCollected)?.slice(MAX_LINE_TEXT))
    .map((column) => at(line, [column], rowWords.tooLong(MAX_LINE_TEXT)));
}

function placeMessages({ line, ward, indicator, month }: Placed, facts: ImportFacts): ImportMessage[] {
  if (month > facts.thisMonth) return [at(line, ["month"], rowWords.futureMonth(month))];
  const assigned = facts.assignments.get(pairKey(ward.id, indicator.id));
  if (!assigned) return [at(line, ["indicator"], rowWords.notAssigned(ward.name, indicator.name))];
  if (isReportedIn(ward, assigned, month)) return [];
  const { from, to } = reportedMonths(ward, assigned);
  if (to !== null && to < from)
    return [at(line, ["indicator"], rowWords.notAssigned(ward.name, indicator.name))];
  return [at(line, ["month"], rowWords.outsideMonths(ward.name, indicator.name, from, to))];
}

function pairMessages({ line, indicator, stored }: Placed): ImportMessage[] {
  const { denominator } = line;
  const numerator = line.onlyDenominator
    ? (stored.tallies.get(indicator.id)?.numerator ?? null)
    : line.numerator;
  if (numerator === null || denominator === null) return [];
  const columns: ImportColumn[] = ["numerator", "denominator"];
  switch (impossiblePair(indicator.kind, numerator, denominator)) {
    case "numerator-above-denominator":
      return [at(line, columns, rowWords.numeratorAbove(numerator, denominator))];
    case "events-without-denominator":
      return [at(line, columns, rowWords.eventsWithoutDenominator(numerator))];
    case null:
      return [];
  }
}

/** Compares a row that can be with what is stored, and asks whether this person may change it. */
function compare(placed: Placed, facts: ImportFacts): ImportVerdict {
  const { line, indicator, month, stored } = placed;
  const tally = stored.tallies.get(indicator.id);
  const next: Figures = {
    numerator: line.onlyDenominator ? (tally?.numerator ?? null) : line.numerator,
    denominator: line.denominator,
    notCollected: line.notCollected,
  };
  const verdict = place(placed, { ...verdictOf(line, "same", []), numerator: next.numerator });
  if (isSame(placed, next)) return verdict;
  verdict.outcome = isBlank(tally) ? "new" : "changed";

  const team = teamNames[indicator.team];
  if (!indicator.mayType) {
    if (
      !sameCount(next, { numerator: tally?.numerator ?? null }) ||
      next.notCollected !== (tally?.notCollected ?? null)
    ) {
      reject(verdict, ["numerator"], rowWords.countedByTeam(indicator.name, team, tally?.numerator ?? null));
      return verdict;
    }
    verdict.messages.push({ ...at(line, ["numerator"], rowWords.denominatorOnly(team)), columns: [] });
  }
  const status = stored.return?.status ?? "open";
  if (status !== "open") {
    if (!facts.mayCorrect) reject(verdict, ["month"], rowWords.sentMonth(month, status));
    else verdict.messages.push({ ...at(line, ["month"], rowWords.needsReason(month, status)), columns: [] });
  }
  return verdict;
}

/** A line without any answer of its own; a shared denominator that stands there is not its own. */
function isBlank(tally: ImportTally | undefined): boolean {
  return tally === undefined || answerOf(tally) === "blank";
}

function isSame({ line, indicator, stored }: Placed, next: Figures): boolean {
  const tally = stored.tallies.get(indicator.id);
  if (!tally || (line.note !== null && line.note !== tally.note)) return false;
  if (next.notCollected !== null || tally.notCollected !== null)
    return next.notCollected === tally.notCollected;
  const now = indicator.sharedDenominatorId === null ? tally : sharedOf(indicator, stored);
  if (!now || now.awaited !== null) return false;
  const denominator = "value" in now ? now.value : now.denominator;
  return denominator === next.denominator && sameCount({ ...next, denominator }, tally);
}

/** Nothing counted out of nothing is the same whether the numerator is written as 0 or left blank. */
function sameCount(
  next: { numerator: number | null; denominator: number | null },
  now: { numerator: number | null },
) {
  if (next.denominator === 0) return (next.numerator ?? 0) === (now.numerator ?? 0);
  return next.numerator === now.numerator;
}
