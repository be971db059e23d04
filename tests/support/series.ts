import { uuidv7 } from "uuidv7";
import { tallies, tallyRevisions } from "@/db/schema";
import { withTransaction, type TxCtx } from "@/db/transaction";
import { addMonths, asMonth, type Month } from "@/lib/indicators/month";
import type { WithdrawnReason } from "@/lib/indicators/vocabulary";
import type { Actor } from "@/lib/policy";
import { chartQuery, chartSchema, type ChartReply } from "@/lib/schemas/chart";
import { getChart } from "@/lib/services/charts";
import { submitReturn } from "@/lib/services/returns";
import { reevaluateSeries, type SeriesKey, type SignalChanges } from "@/lib/services/series";
import { saveTally } from "@/lib/services/tallies";
import type { TestStore } from "./store";

/** A new ward that reports a new indicator, `CODE` and `CODE-I`. */
export async function newSeries(
  store: TestStore,
  code: string,
  values: Parameters<TestStore["addIndicator"]>[1] = {},
): Promise<SeriesKey> {
  const ward = await store.addWard(code);
  const indicator = await store.addIndicator(`${code}-I`, values);
  await store.assign(ward.id, indicator.id);
  return { wardId: ward.id, indicatorId: indicator.id };
}

/** That ward's chart, read as the route reads it. */
export async function chartOf(
  store: TestStore,
  code: string,
  query: Record<string, string> = {},
  { actor, at }: { actor?: Actor; at?: Date } = {},
): Promise<ChartReply> {
  const input = { ward: code, indicator: `${code}-I`, ...chartQuery.parse(query) };
  return chartSchema.parse(await getChart({ ctx: store.ctxFor(actor ?? store.lead, at), input }));
}

/** Months about 10 of 100, on both sides in turn, so that nothing signals. */
export const steadyCounts: Counts = Array.from({ length: 24 }, (_, index) => [index % 2 === 0 ? 9 : 11, 100]);

export const on = (date: string): Date => new Date(`${date}T10:00:00.000Z`);

/** A month's numerator and denominator; null leaves the month out. */
export type Counts = readonly (readonly [numerator: number, denominator: number] | null)[];

/** Long before any test's now, so that what was charted was known on every day that a test asks for. */
export const CHARTED_AT = new Date("2024-01-02T08:00:00.000Z");

/** Puts counts on a chart from a month on, as if sent at `at`, and works the series out. */
export async function chartCounts(
  store: TestStore,
  key: SeriesKey,
  from: string,
  counts: Counts,
  at: Date = CHARTED_AT,
): Promise<SignalChanges> {
  return inTransaction(store, at, async (tx) => {
    for (const [index, pair] of counts.entries()) {
      if (pair) await chartMonth(tx, key, addMonths(asMonth(from), index), pair);
    }
    return reevaluateSeries(tx, { pairs: [key], why: "trial-limits" });
  });
}

/** Replaces a charted month's figures, as a correction does. */
export async function correctMonth(
  store: TestStore,
  key: SeriesKey,
  month: string,
  pair: readonly [number, number],
  at: Date,
  why: WithdrawnReason = "correction",
): Promise<SignalChanges> {
  return inTransaction(store, at, async (tx) => {
    await chartMonth(tx, key, asMonth(month), pair, "corrected");
    return reevaluateSeries(tx, { pairs: [key], why });
  });
}

export async function reevaluate(
  store: TestStore,
  key: SeriesKey,
  at: Date,
  why: WithdrawnReason,
): Promise<SignalChanges> {
  return inTransaction(store, at, (tx) => reevaluateSeries(tx, { pairs: [key], why }));
}

async function inTransaction<Result>(
  store: TestStore,
  at: Date,
  work: (tx: TxCtx) => Promise<Result>,
): Promise<Result> {
  return withTransaction(store.ctxFor(store.lead, at), work);
}

async function chartMonth(
  tx: TxCtx,
  { wardId, indicatorId }: SeriesKey,
  month: Month,
  [numerator, denominator]: readonly [number, number],
  event: "sent" | "corrected" = "sent",
): Promise<void> {
  const figures = { numerator, denominator, charted: true, corrected: event === "corrected" };
  const columns = { ...figures, chartedNumerator: numerator, chartedDenominator: denominator };
  const stamp = { updatedAt: tx.now, updatedBy: "Test lead" };
  await tx.db
    .insert(tallies)
    .values({ id: uuidv7(), wardId, indicatorId, month, ...columns, ...stamp })
    .onConflictDoUpdate({
      target: [tallies.wardId, tallies.indicatorId, tallies.month],
      set: { ...columns, ...stamp },
    });
  await tx.db.insert(tallyRevisions).values({
    id: uuidv7(),
    wardId,
    indicatorId,
    month,
    event,
    charted: true,
    numerator,
    denominator,
    tallyVersion: 1,
    source: "import",
    actorName: "Test lead",
    at: tx.now,
  });
}

/** Enters and sends one month of a ward that reports one indicator, by the verbs that people use. */
export async function sendMonth(
  store: TestStore,
  month: string,
  line: { ward: string; indicator: string; numerator: number; denominator: number },
  at: Date,
): Promise<void> {
  const ctx = store.ctxFor(store.lead, at);
  const { ward, indicator, numerator, denominator } = line;
  await saveTally({
    ctx,
    input: { ward, month: asMonth(month), indicator, numerator, denominator, version: 0 },
  });
  await submitReturn({ ctx, input: { ward, month: asMonth(month) } });
}
