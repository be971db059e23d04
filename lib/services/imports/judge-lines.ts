import "server-only";
import type { ImportFacts } from "@/lib/indicators/import-facts";
import {
  rowOutcomes,
  type ImportLine,
  type ImportVerdict,
  type RowOutcome,
} from "@/lib/indicators/import-row";
import { suggestionsFor } from "@/lib/indicators/import-suggestions";
import { judgeTogether } from "@/lib/indicators/import-together";
import { judgeLine } from "@/lib/indicators/import-verdict";
import { inTurns } from "./yielding";

/** The verdict on each line; `namesWards` lists the person's wards where a code is unknown. */
export async function judgeLines(
  lines: readonly ImportLine[],
  facts: ImportFacts,
  namesWards: boolean,
): Promise<ImportVerdict[]> {
  const suggestions = suggestionsFor(facts, namesWards);
  const verdicts: ImportVerdict[] = [];
  await inTurns(lines, (some) => {
    for (const line of some) verdicts.push(judgeLine(line, facts, suggestions));
  });
  judgeTogether(verdicts, facts);
  return verdicts;
}

export function countOutcomes(verdicts: readonly ImportVerdict[]): Record<RowOutcome, number> {
  const counts = Object.fromEntries(rowOutcomes.map((outcome) => [outcome, 0])) as Record<RowOutcome, number>;
  for (const { outcome } of verdicts) counts[outcome] += 1;
  return counts;
}
