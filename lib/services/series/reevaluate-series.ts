import "server-only";
import { eq, sql } from "drizzle-orm";
import { assignments, signals, tallies } from "@/db/schema";
import { selectRows } from "@/db/rows";
import type { TxCtx } from "@/db/transaction";
import type { StoredSignal } from "@/lib/indicators/signal-life";
import type { WithdrawnReason } from "@/lib/indicators/vocabulary";
import { writeAudit } from "@/lib/services/audit";
import { loadSeries } from "./load-series";
import { distinctPairs, keyOf, pairTable, type SeriesKey } from "./pairs";
import { planAll } from "./plan-all";
import { writePlan } from "./write-plan";

export interface SignalChanges {
  born: number;
  moved: number;
  cameBack: number;
  withdrawn: number;
}

/**
 * Works the touched series out again in the transaction that touched them: stores their state and lets signals be
 * born, grow, come back or be withdrawn (with `why`). Any number of series costs the same few statements.
 */
export async function reevaluateSeries(
  ctx: TxCtx,
  input: { pairs: readonly SeriesKey[]; why: WithdrawnReason },
): Promise<SignalChanges> {
  const pairs = distinctPairs(input.pairs);
  if (pairs.length === 0) return { born: 0, moved: 0, cameBack: 0, withdrawn: 0 };
  await lockSeries(ctx, pairs);
  const plan = await planAll(await loadSeries(ctx, pairs), await loadStoredSignals(ctx, pairs));
  await writePlan(ctx, plan, input.why);
  const changes = {
    born: plan.born.length,
    moved: plan.moved.length,
    cameBack: plan.cameBack.length,
    withdrawn: plan.withdrawn.length,
  };
  if (Object.values(changes).some((each) => each > 0)) {
    writeAudit(ctx, {
      action: "signal.change",
      subject: {
        type: "series",
        id: pairs.length === 1 ? keyOf(pairs[0] ?? { wardId: "", indicatorId: "" }) : "many",
      },
      after: { ...changes, why: input.why, series: pairs.length },
    });
  }
  return changes;
}

/** All series of an indicator, after a change of its definition, rules or limits. */
export async function reevaluateIndicator(
  ctx: TxCtx,
  input: { indicatorId: string; why: WithdrawnReason },
): Promise<void> {
  const rows = await ctx.db
    .selectDistinct({ wardId: tallies.wardId, indicatorId: tallies.indicatorId })
    .from(tallies)
    .where(eq(tallies.indicatorId, input.indicatorId));
  const assigned = await ctx.db
    .select({ wardId: assignments.wardId, indicatorId: assignments.indicatorId })
    .from(assignments)
    .where(eq(assignments.indicatorId, input.indicatorId));
  await reevaluateSeries(ctx, { pairs: [...rows, ...assigned], why: input.why });
}

/** Two changes of one series take turns; held to the end of the transaction, and free to take again inside it. */
export async function lockSeries(ctx: TxCtx, pairs: readonly SeriesKey[]): Promise<void> {
  await ctx.db.execute(
    sql`select pg_advisory_xact_lock(hashtextextended(locked.key, 0))
        from (select pair.ward_id::text || ' ' || pair.indicator_id::text as key from ${pairTable(pairs)} order by 1) locked`,
  );
}

async function loadStoredSignals(
  ctx: TxCtx,
  pairs: readonly SeriesKey[],
): Promise<Map<string, StoredSignal[]>> {
  const rows = await ctx.db
    .select()
    .from(signals)
    .where(
      sql`(${signals.wardId}, ${signals.indicatorId}) in (select ward_id, indicator_id from ${pairTable(pairs)})`,
    );
  const byKey = new Map<string, StoredSignal[]>();
  for (const row of rows) {
    const stored: StoredSignal = { ...row, from: row.fromMonth, to: row.toMonth };
    byKey.set(keyOf(row), [...(byKey.get(keyOf(row)) ?? []), stored]);
  }
  return byKey;
}

/** Every series that has a tally or a stored state; for commands that work all of them out again. */
export async function allSeries(ctx: { db: TxCtx["db"] }): Promise<SeriesKey[]> {
  const rows = await selectRows<{ ward_id: string; indicator_id: string }>(
    ctx.db,
    sql`select ward_id, indicator_id from tallies union select ward_id, indicator_id from series_state`,
  );
  return rows.map((row) => ({ wardId: row.ward_id, indicatorId: row.indicator_id }));
}
