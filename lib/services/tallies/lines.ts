import "server-only";
import { and, asc, eq, gte, inArray, isNull, lte, or, sql } from "drizzle-orm";
import type { Db } from "@/db/client";
import {
  assignments,
  denominatorValues,
  indicatorDefinitions,
  indicators,
  sharedDenominators,
  tallies,
} from "@/db/schema";
import { definitionFor } from "@/lib/indicators/definition";
import { isMature, matureOn } from "@/lib/indicators/maturity";
import type { Month } from "@/lib/indicators/month";
import type { ReturnLine } from "@/lib/indicators/return-missing";
import { BLANK_TALLY, type TallyContent } from "@/lib/indicators/tally-change";
import type { TallyReply } from "@/lib/schemas/tally";

type Indicator = typeof indicators.$inferSelect;
type Tally = typeof tallies.$inferSelect;
type DenominatorValue = typeof denominatorValues.$inferSelect;

/** One assigned indicator of a ward's month, with what is saved for it so far. */
export interface Line {
  month: Month;
  indicator: Indicator;
  labels: { numerator: string; denominator: string };
  shared: { id: string; code: string; value: DenominatorValue | null } | null;
  tally: Tally | null;
}

/** Every line that the ward reports in the month, by the indicator's name: two statements. Not guarded. */
export async function loadLines(
  db: Db,
  { wardId, month }: { wardId: string; month: Month },
): Promise<Line[]> {
  const rows = await db
    .select({ indicator: indicators, shared: sharedDenominators, tally: tallies, value: denominatorValues })
    .from(assignments)
    .innerJoin(indicators, eq(indicators.id, assignments.indicatorId))
    .leftJoin(sharedDenominators, eq(sharedDenominators.id, indicators.sharedDenominatorId))
    .leftJoin(
      tallies,
      and(
        eq(tallies.wardId, assignments.wardId),
        eq(tallies.indicatorId, indicators.id),
        eq(tallies.month, month),
      ),
    )
    .leftJoin(
      denominatorValues,
      and(
        eq(denominatorValues.wardId, assignments.wardId),
        eq(denominatorValues.sharedDenominatorId, indicators.sharedDenominatorId),
        eq(denominatorValues.month, month),
      ),
    )
    .where(
      and(
        eq(assignments.wardId, wardId),
        lte(assignments.fromMonth, month),
        or(isNull(assignments.toMonth), gte(assignments.toMonth, month)),
      ),
    )
    .orderBy(asc(sql`lower(${indicators.name})`), asc(indicators.code));
  const labels = await labelsFor(
    db,
    rows.map((row) => row.indicator.id),
    month,
  );
  return rows.map(({ indicator, shared, tally, value }) => ({
    month,
    indicator,
    labels: labels.get(indicator.id) ?? { numerator: "", denominator: "" },
    shared: shared ? { id: shared.id, code: shared.code, value } : null,
    tally,
  }));
}

/** The words of the definition that the month is counted under. */
async function labelsFor(db: Db, indicatorIds: readonly string[], month: Month) {
  const labels = new Map<string, Line["labels"]>();
  if (indicatorIds.length === 0) return labels;
  const versions = await db
    .select()
    .from(indicatorDefinitions)
    .where(inArray(indicatorDefinitions.indicatorId, [...indicatorIds]));
  for (const id of new Set(versions.map((version) => version.indicatorId))) {
    const own = versions.filter((version) => version.indicatorId === id);
    const { numeratorLabel, denominatorLabel } = definitionFor(own, month);
    labels.set(id, { numerator: numeratorLabel, denominator: denominatorLabel });
  }
  return labels;
}

/** What a line says now, its shared denominator filled in. */
export function contentOf({ tally, shared }: Line): TallyContent {
  const own = tally ?? BLANK_TALLY;
  return {
    numerator: own.numerator,
    denominator: shared ? (shared.value?.value ?? null) : own.denominator,
    notCollected: own.notCollected,
    awaited: shared ? (shared.value?.awaited ?? null) : own.awaited,
    note: own.note,
  };
}

/** The line as far as it may hold its return back. */
export function returnLineOf(line: Line, today: string): ReturnLine {
  return {
    ...contentOf(line),
    isShared: line.shared !== null,
    isCountedByTeam: line.indicator.numeratorBy === "team",
    isMature: isMature(line.month, line.indicator.matureAfterDays, today),
  };
}

/** Other lines of the same month that count out of the same thing. */
export function siblingsOf(line: Line, lines: readonly Line[]): Line[] {
  const { shared } = line;
  if (!shared) return [];
  return lines.filter((each) => each.shared?.id === shared.id && each.indicator.id !== line.indicator.id);
}

/** A line as the API sends it. */
export function tallyReply(line: Line, today: string): TallyReply {
  const { indicator, tally, shared, month } = line;
  const { numerator, denominator, notCollected, awaited, note } = contentOf(line);
  return {
    indicator: indicator.code,
    name: indicator.name,
    kind: indicator.kind,
    per: indicator.per,
    numeratorLabel: line.labels.numerator,
    denominatorLabel: line.labels.denominator,
    numeratorBy: indicator.numeratorBy,
    team: indicator.team,
    sharedDenominator: shared?.code ?? null,
    matureOn: matureOn(month, indicator.matureAfterDays),
    isMature: isMature(month, indicator.matureAfterDays, today),
    numerator,
    denominator,
    notCollected,
    awaited,
    note,
    version: tally?.version ?? 0,
    ...(shared ? { denominatorVersion: shared.value?.version ?? 0 } : {}),
    corrected: tally?.corrected ?? false,
    savedBy: tally?.updatedBy ?? null,
    savedAt: tally?.updatedAt.toISOString() ?? null,
    denominatorSavedBy: shared?.value?.updatedBy ?? tally?.updatedBy ?? null,
    denominatorSavedAt: (shared?.value?.updatedAt ?? tally?.updatedAt)?.toISOString() ?? null,
  };
}
