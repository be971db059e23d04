import "server-only";
import { and, eq, gt, inArray, isNull, lte, or, sql } from "drizzle-orm";
import { assignments, baselines, hospital, indicatorDefinitions, indicators, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { dueDate } from "@/lib/indicators/due-date";
import { addMonths, asMonth, dateInZone, type Month } from "@/lib/indicators/month";
import type { BaselineFacts } from "@/lib/indicators/segments";
import type { SeriesFacts } from "@/lib/indicators/series";
import { loadTallies, loadTalliesAsOf } from "./load-tallies";
import { distinctPairs, keyOf, pairTable, type SeriesKey } from "./pairs";

export interface LoadedSeries extends SeriesKey {
  facts: SeriesFacts;
}

export interface LoadOptions {
  /** Draw the series as it was known at this instant. */
  asOf?: Date;
}

/**
 * Everything that a chart is worked out from, for many series by a constant number of statements. Not guarded: the
 * calling verb or read has decided what the actor may see.
 */
export async function loadSeries(
  ctx: Ctx,
  pairs: readonly SeriesKey[],
  options: LoadOptions = {},
): Promise<LoadedSeries[]> {
  if (pairs.length === 0) return [];
  // Named twice, a pair would be joined with its tallies twice.
  const distinct = distinctPairs(pairs);
  const asOf = options.asOf ?? ctx.now;
  const settings = await hospitalSettings(ctx);
  const today = dateInZone(asOf, settings.timeZone);
  const lastDue = lastDueMonth(today, settings.dueDay, settings.holidays);
  const tallies = options.asOf
    ? await loadTalliesAsOf(ctx, distinct, asOf)
    : await loadTallies(ctx, distinct);
  const indicatorById = await loadIndicators(ctx, distinct, asOf);
  const baselineRows = await loadBaselines(ctx, distinct, asOf);
  const endOf = await loadEnds(ctx, distinct);

  return pairs.map((pair) => {
    const indicator = indicatorById.get(pair.indicatorId);
    if (!indicator) throw new DomainError("not-found", "There is no such record.");
    const end = endOf.get(keyOf(pair)) ?? null;
    return {
      ...pair,
      facts: {
        indicator: indicator.row,
        definitionBreaks: indicator.breaks,
        baselines: baselineRows.get(keyOf(pair)) ?? [],
        tallies: tallies.get(keyOf(pair)) ?? [],
        showUntil: end !== null && end < lastDue ? end : lastDue,
        today,
      },
    };
  });
}

/** The calendar date at an instant, by the hospital's clock. */
export async function hospitalToday(ctx: Ctx, at: Date = ctx.now): Promise<string> {
  return dateInZone(at, (await hospitalSettings(ctx)).timeZone);
}

/** The hospital's time zone, an IANA name. */
export async function hospitalTimeZone(ctx: Ctx): Promise<string> {
  return (await hospitalSettings(ctx)).timeZone;
}

async function hospitalSettings(ctx: Ctx) {
  const [row] = await ctx.db.select().from(hospital).where(eq(hospital.id, 1));
  if (!row) throw new Error("The hospital has not been set up.");
  return row;
}

/** Before this day nothing can have been due: months begin in 1900. */
const FIRST_DAY = "1900-04-01";

/** The last month whose return is due by `today`. */
export function lastDueMonth(today: string, dueDay: number, holidays: readonly string[]): Month {
  if (today < FIRST_DAY) return asMonth("1900-01");
  const previous = addMonths(asMonth(today.slice(0, 7)), -1);
  return today > dueDate(previous, dueDay, holidays) ? previous : addMonths(previous, -1);
}

async function loadIndicators(ctx: Ctx, pairs: readonly SeriesKey[], asOf: Date) {
  const ids = [...new Set(pairs.map((pair) => pair.indicatorId))];
  const rows = await ctx.db.select().from(indicators).where(inArray(indicators.id, ids));
  const breaks = await ctx.db
    .select({ indicatorId: indicatorDefinitions.indicatorId, from: indicatorDefinitions.effectiveFrom })
    .from(indicatorDefinitions)
    .where(
      and(
        inArray(indicatorDefinitions.indicatorId, ids),
        eq(indicatorDefinitions.comparable, false),
        gt(indicatorDefinitions.number, 1),
        // A definition that was decided later wasn't known then.
        lte(indicatorDefinitions.decidedAt, asOf),
      ),
    );
  return new Map(
    rows.map((row) => [
      row.id,
      { row, breaks: breaks.filter((each) => each.indicatorId === row.id).map((each) => each.from) },
    ]),
  );
}

async function loadBaselines(ctx: Ctx, pairs: readonly SeriesKey[], asOf: Date) {
  const rows = await ctx.db
    .select()
    .from(baselines)
    .where(
      and(
        sql`(${baselines.wardId}, ${baselines.indicatorId}) in (select ward_id, indicator_id from ${pairTable(pairs)})`,
        inArray(baselines.state, ["decided", "superseded"]),
        lte(baselines.decidedAt, asOf),
        or(isNull(baselines.supersededAt), gt(baselines.supersededAt, asOf)),
      ),
    );
  const byKey = new Map<string, BaselineFacts[]>();
  for (const row of rows) {
    const facts = { ...row, from: row.fromMonth, to: row.toMonth };
    byKey.set(keyOf(row), [...(byKey.get(keyOf(row)) ?? []), facts]);
  }
  return byKey;
}

/** The month after which the ward no longer reports the indicator, where there is one. */
async function loadEnds(ctx: Ctx, pairs: readonly SeriesKey[]): Promise<Map<string, Month | null>> {
  const rows = await ctx.db
    .select({
      wardId: assignments.wardId,
      indicatorId: assignments.indicatorId,
      toMonth: assignments.toMonth,
      openTo: wards.openTo,
    })
    .from(assignments)
    .innerJoin(wards, eq(wards.id, assignments.wardId))
    .where(
      sql`(${assignments.wardId}, ${assignments.indicatorId}) in (select ward_id, indicator_id from ${pairTable(pairs)})`,
    );
  return new Map(rows.map((row) => [keyOf(row), earlier(row.toMonth, row.openTo)]));
}

function earlier(left: Month | null, right: Month | null): Month | null {
  if (left === null || right === null) return left ?? right;
  return left < right ? left : right;
}
