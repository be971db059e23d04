import "server-only";
import { and, eq, sql, type SQL } from "drizzle-orm";
import {
  assignments,
  denominatorValues,
  hospital,
  indicators,
  tallies,
  wardReturns,
  wards,
} from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import {
  monthKey,
  pairKey,
  type ImportDenominator,
  type ImportFacts,
  type ImportMonth,
  type ImportTally,
} from "@/lib/indicators/import-facts";
import type { ImportLine } from "@/lib/indicators/import-row";
import { monthsSpokenOf } from "@/lib/indicators/import-together";
import { monthInZone, type Month } from "@/lib/indicators/month";
import { mayAttempt, scopeOf, typesNumerator } from "@/lib/policy";
import { wardsWithin } from "@/lib/services/wards";
import { inTurns } from "./yielding";

export interface WardMonth {
  wardId: string;
  month: Month;
}

/** Wards and months a statement. */
const MONTHS_PER_STATEMENT = 100;

/** What the lines are judged by: wards in the person's scope, definitions, and all that is stored for their months. */
export async function loadFacts(ctx: Ctx, lines: readonly ImportLine[]): Promise<ImportFacts> {
  const scope = scopeOf(ctx.actor);
  const wardRows = await ctx.db.select().from(wards).where(wardsWithin(scope));
  const indicatorRows = await ctx.db.select().from(indicators);
  const assigned = await ctx.db
    .select({
      wardId: assignments.wardId,
      indicatorId: assignments.indicatorId,
      fromMonth: assignments.fromMonth,
      toMonth: assignments.toMonth,
    })
    .from(assignments)
    .innerJoin(wards, and(eq(wards.id, assignments.wardId), wardsWithin(scope)));
  const wardsByCode = new Map(wardRows.map((ward) => [ward.code, ward]));
  return {
    thisMonth: monthInZone(ctx.now, await timeZoneOf(ctx)),
    wards: wardsByCode,
    indicators: new Map(
      indicatorRows.map((row) => [row.code, { ...row, mayType: typesNumerator(ctx.actor, row) }]),
    ),
    assignments: new Map(assigned.map((row) => [pairKey(row.wardId, row.indicatorId), row])),
    months: await loadMonths(ctx, monthsSpokenOf(lines, wardsByCode)),
    mayCorrect: mayAttempt(ctx.actor, "correction.decide"),
  };
}

async function timeZoneOf(ctx: Ctx): Promise<string> {
  const [row] = await ctx.db.select({ timeZone: hospital.timeZone }).from(hospital).where(eq(hospital.id, 1));
  if (!row) throw new Error("The hospital has not been set up.");
  return row.timeZone;
}

/** Wards and months as a table `pair(ward_id, month)`: one parameter, however many there are. */
export function monthTable(pairs: readonly WardMonth[]): SQL {
  const json = JSON.stringify(pairs.map(({ wardId, month }) => ({ ward_id: wardId, month })));
  return sql`json_to_recordset(${json}::json) as pair(ward_id uuid, month text)`;
}

interface StoredMonth extends ImportMonth {
  tallies: Map<string, ImportTally>;
  denominators: Map<string, ImportDenominator>;
}

async function loadMonths(ctx: Ctx, pairs: readonly WardMonth[]): Promise<Map<string, ImportMonth>> {
  const months = new Map<string, StoredMonth>();
  const monthOf = ({ wardId, month }: WardMonth): StoredMonth => {
    const key = monthKey(wardId, month);
    const known = months.get(key) ?? { return: null, tallies: new Map(), denominators: new Map() };
    months.set(key, known);
    return known;
  };
  await inTurns(
    pairs,
    async (some) => {
      for (const row of await loadReturns(ctx, some)) monthOf(row).return = row.return;
      for (const { tally, ...key } of await loadTallies(ctx, some))
        monthOf(key).tallies.set(tally.indicatorId, tally);
      for (const { sharedId, value, awaited, version, ...key } of await loadDenominators(ctx, some)) {
        monthOf(key).denominators.set(sharedId, { value, awaited, version });
      }
    },
    MONTHS_PER_STATEMENT,
  );
  return months;
}

async function loadReturns(ctx: Ctx, pairs: readonly WardMonth[]) {
  const rows = await ctx.db
    .select()
    .from(wardReturns)
    .where(
      sql`(${wardReturns.wardId}, ${wardReturns.month}) in (select ward_id, month from ${monthTable(pairs)})`,
    );
  return rows.map((row) => ({
    wardId: row.wardId,
    month: row.month,
    return: {
      status: row.status,
      reopened: row.reopened,
      reopenedReason: row.reopenedReason,
      firstSubmittedAt: row.firstSubmittedAt?.toISOString() ?? null,
      submittedAt: row.submittedAt?.toISOString() ?? null,
      submittedBy: row.submittedBy,
      acceptedAt: row.acceptedAt?.toISOString() ?? null,
      acceptedBy: row.acceptedBy,
    },
  }));
}

async function loadTallies(ctx: Ctx, pairs: readonly WardMonth[]) {
  const rows = await ctx.db
    .select({
      wardId: tallies.wardId,
      month: tallies.month,
      indicatorId: tallies.indicatorId,
      numerator: tallies.numerator,
      denominator: tallies.denominator,
      notCollected: tallies.notCollected,
      awaited: tallies.awaited,
      note: tallies.note,
      corrected: tallies.corrected,
      version: tallies.version,
    })
    .from(tallies)
    .where(sql`(${tallies.wardId}, ${tallies.month}) in (select ward_id, month from ${monthTable(pairs)})`);
  return rows.map(({ wardId, month, ...tally }) => ({ wardId, month, tally }));
}

async function loadDenominators(ctx: Ctx, pairs: readonly WardMonth[]) {
  return ctx.db
    .select({
      wardId: denominatorValues.wardId,
      month: denominatorValues.month,
      sharedId: denominatorValues.sharedDenominatorId,
      value: denominatorValues.value,
      awaited: denominatorValues.awaited,
      version: denominatorValues.version,
    })
    .from(denominatorValues)
    .where(
      sql`(${denominatorValues.wardId}, ${denominatorValues.month}) in (select ward_id, month from ${monthTable(pairs)})`,
    );
}
