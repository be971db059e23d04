import "server-only";
import { sql } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { seriesState, signalHistory, signals, type SignalChange } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import type { FoundSignal } from "@/lib/indicators/signal-life";
import type { WithdrawnReason } from "@/lib/indicators/vocabulary";
import type { FullPlan } from "./plan-all";

/** Rows a statement: well below the drivers' limit on parameters. */
const CHUNK = 500;

type HistoryRow = typeof signalHistory.$inferInsert;

/** Writes states, signals and their history by a constant number of statements per 500 rows. */
export async function writePlan(ctx: TxCtx, plan: FullPlan, why: WithdrawnReason): Promise<void> {
  await writeStates(ctx, plan);
  const history: HistoryRow[] = [];
  const note = (
    signalId: string,
    change: SignalChange,
    found: Pick<FoundSignal, "from" | "to">,
    reason?: string,
  ) =>
    history.push({
      id: uuidv7(),
      signalId,
      change,
      fromMonth: found.from,
      toMonth: found.to,
      why: reason ?? null,
      at: ctx.now,
    });

  const born = plan.born.map((each) => ({
    id: uuidv7(),
    wardId: each.wardId,
    indicatorId: each.indicatorId,
    rule: each.found.rule,
    side: each.found.side,
    towards: each.towards,
    fromMonth: each.found.from,
    toMonth: each.found.to,
    segmentFrom: each.found.segmentFrom,
    spansGap: each.found.spansGap,
    onNewest: each.onNewest,
    bornAt: ctx.now,
    changedAt: ctx.now,
  }));
  for (const chunk of chunksOf(born)) await ctx.db.insert(signals).values(chunk);
  for (const row of born) note(row.id, "born", { from: row.fromMonth, to: row.toMonth });

  for (const { signal, found } of plan.moved) {
    note(signal.id, found.to > signal.to || found.from < signal.from ? "grew" : "shrank", found, why);
  }
  for (const { signal, found } of plan.cameBack) note(signal.id, "came-back", found, why);
  for (const signal of plan.withdrawn) note(signal.id, "withdrawn", signal, why);

  await moveSignals(ctx, plan);
  await withdrawSignals(ctx, plan, why);
  await turnSignals(ctx, plan);
  for (const chunk of chunksOf(history)) await ctx.db.insert(signalHistory).values(chunk);
}

async function writeStates(ctx: TxCtx, plan: FullPlan): Promise<void> {
  const rows = plan.states.map((state) => ({ ...state, updatedAt: ctx.now }));
  for (const chunk of chunksOf(rows)) {
    await ctx.db
      .insert(seriesState)
      .values(chunk)
      .onConflictDoUpdate({
        target: [seriesState.wardId, seriesState.indicatorId],
        set: {
          columns: sql`excluded.columns`,
          centre: sql`excluded.centre`,
          baselineStatus: sql`excluded.baseline_status`,
          hasLimits: sql`excluded.has_limits`,
          activeSignals: sql`excluded.active_signals`,
          newestMonth: sql`excluded.newest_month`,
          updatedAt: sql`excluded.updated_at`,
        },
      });
  }
}

/** New months for signals that grew, shrank or came back; what came back is new again. */
async function moveSignals(ctx: TxCtx, plan: FullPlan): Promise<void> {
  const rows = [
    ...plan.moved.map((each) => ({ ...each, status: each.signal.status })),
    ...plan.cameBack.map((each) => ({ ...each, status: "new" as const })),
  ].map(({ signal, found, status }) => ({
    id: signal.id,
    from_month: found.from,
    to_month: found.to,
    spans_gap: found.spansGap,
    status,
  }));
  if (rows.length === 0) return;
  await ctx.db.execute(
    sql`update signals s set from_month = r.from_month, to_month = r.to_month, spans_gap = r.spans_gap,
          status = r.status, withdrawn_why = null, changed_at = ${ctx.now.toISOString()}::timestamptz, version = s.version + 1
        from json_to_recordset(${JSON.stringify(rows)}::json)
          as r(id uuid, from_month text, to_month text, spans_gap boolean, status text)
        where s.id = r.id`,
  );
}

async function withdrawSignals(ctx: TxCtx, plan: FullPlan, why: WithdrawnReason): Promise<void> {
  if (plan.withdrawn.length === 0) return;
  const rows = plan.withdrawn.map((signal) => ({ id: signal.id }));
  await ctx.db.execute(
    sql`update signals s set status = 'withdrawn', withdrawn_why = ${why},
          changed_at = ${ctx.now.toISOString()}::timestamptz, version = s.version + 1
        from json_to_recordset(${JSON.stringify(rows)}::json) as r(id uuid)
        where s.id = r.id`,
  );
}

async function turnSignals(ctx: TxCtx, plan: FullPlan): Promise<void> {
  if (plan.turned.length === 0) return;
  await ctx.db.execute(
    sql`update signals s set towards = r.towards, changed_at = ${ctx.now.toISOString()}::timestamptz, version = s.version + 1
        from json_to_recordset(${JSON.stringify(plan.turned)}::json) as r(id uuid, towards text)
        where s.id = r.id`,
  );
}

function chunksOf<Row>(rows: readonly Row[]): Row[][] {
  const chunks: Row[][] = [];
  for (let start = 0; start < rows.length; start += CHUNK) chunks.push(rows.slice(start, start + CHUNK));
  return chunks;
}
