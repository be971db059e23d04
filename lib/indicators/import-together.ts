import { rowWords } from "@/lib/strings/imports";
import { monthKey, storedFor, type ImportFacts, type ImportIndicator } from "./import-facts";
import type { ImportVerdict } from "./import-row";
import { reject } from "./import-verdict";
import type { Month } from "./month";
import { impossiblePair } from "./tally-answer";

type Groups = Map<string, ImportVerdict[]>;

/** Rows named in a message about rows that stand in each other's way. */
const MAX_NAMED_ROWS = 5;

/**
 * Judges rows against each other: two for one line, two values for one shared denominator, and a shared denominator
 * that a line outside the sheet can't be counted out of. Changes the verdicts that it is given.
 */
export function judgeTogether(verdicts: readonly ImportVerdict[], facts: ImportFacts): void {
  const lines: Groups = new Map();
  const shared: Groups = new Map();
  for (const verdict of verdicts) {
    const { wardId, indicatorId, sharedDenominatorId, line } = verdict;
    if (wardId === null || indicatorId === null || line.month === null) continue;
    const month = monthKey(wardId, line.month);
    collect(lines, `${month} ${indicatorId}`, verdict);
    if (sharedDenominatorId !== null && line.denominator !== null) {
      collect(shared, `${month} ${sharedDenominatorId}`, verdict);
    }
  }
  rejectTwice(lines);
  for (const group of shared.values()) rejectDifferent(group);
  rejectBreaking(shared, lines, facts);
}

function collect(groups: Groups, key: string, verdict: ImportVerdict): void {
  const group = groups.get(key);
  if (group) group.push(verdict);
  else groups.set(key, [verdict]);
}

function rejectTwice(lines: Groups): void {
  for (const group of lines.values()) {
    if (group.length < 2) continue;
    for (const verdict of group) {
      reject(verdict, ["ward", "indicator", "month"], rowWords.twice(otherRows(group, verdict)));
    }
  }
}

function otherRows(group: readonly ImportVerdict[], verdict: ImportVerdict): number[] {
  return group
    .filter((each) => each !== verdict)
    .map((each) => each.line.row)
    .slice(0, MAX_NAMED_ROWS);
}

function rejectDifferent(group: readonly ImportVerdict[]): void {
  const values = new Set(group.map((each) => each.line.denominator));
  if (values.size < 2) return;
  for (const verdict of group) {
    const others = group.filter((each) => each.line.denominator !== verdict.line.denominator);
    reject(verdict, ["denominator"], rowWords.sharedTwice(otherRows(others, verdict)));
  }
}

/** The stored lines of a month that count out of the same denominator and keep their numerator. */
function rejectBreaking(shared: Groups, lines: Groups, facts: ImportFacts): void {
  const indicatorById = new Map([...facts.indicators.values()].map((each) => [each.id, each]));
  for (const group of shared.values()) {
    const standing = group.filter((each) => each.outcome !== "rejected");
    const [first] = standing;
    if (!first || first.denominator === null || first.wardId === null || first.line.month === null) continue;
    if (first.before?.shared?.value === first.denominator) continue;
    const broken = brokenSibling(first.wardId, first.line.month, first, lines, indicatorById, facts);
    if (!broken) continue;
    for (const verdict of standing) {
      reject(
        verdict,
        ["denominator"],
        rowWords.breaksSibling(broken.name, broken.numerator, first.denominator),
      );
    }
  }
}

function brokenSibling(
  wardId: string,
  month: Month,
  { sharedDenominatorId, denominator }: ImportVerdict,
  lines: Groups,
  indicatorById: ReadonlyMap<string, ImportIndicator>,
  facts: ImportFacts,
): { name: string; numerator: number } | null {
  for (const tally of storedFor(facts, wardId, month).tallies.values()) {
    const indicator = indicatorById.get(tally.indicatorId);
    if (!indicator || indicator.sharedDenominatorId !== sharedDenominatorId) continue;
    if (tally.numerator === null || tally.notCollected !== null) continue;
    const listed = lines.get(`${monthKey(wardId, month)} ${indicator.id}`) ?? [];
    if (listed.some((each) => each.outcome !== "rejected")) continue;
    if (impossiblePair(indicator.kind, tally.numerator, denominator)) {
      return { name: indicator.name, numerator: tally.numerator };
    }
  }
  return null;
}

/** Ids of wards and months, each pair once, that the rows speak of: what has to be looked up before judging. */
export function monthsSpokenOf(
  lines: readonly { ward: string; month: Month | null }[],
  wards: ReadonlyMap<string, { id: string }>,
): { wardId: string; month: Month }[] {
  const found = new Map<string, { wardId: string; month: Month }>();
  for (const { ward, month } of lines) {
    const wardId = wards.get(ward.toUpperCase())?.id;
    if (wardId !== undefined && month !== null) found.set(monthKey(wardId, month), { wardId, month });
  }
  return [...found.values()];
}
