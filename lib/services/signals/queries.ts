import "server-only";
import { and, desc, eq, inArray, sql } from "drizzle-orm";
import { indicators, signals, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { requireAction, scopeOf } from "@/lib/policy";
import type { SignalQuery, SignalReply } from "@/lib/schemas/signal";
import { getIndicatorByCode } from "@/lib/services/indicators";
import type { SeriesKey } from "@/lib/services/series";
import { getWardByCode, wardsWithin, type Ward } from "@/lib/services/wards";

export type Signal = typeof signals.$inferSelect;

/** A stored signal with the ward that it belongs to and its indicator's code. */
export interface ListedSignal {
  signal: Signal;
  ward: Ward;
  indicator: { id: string; code: string };
}

const PAGE = 50;

interface Read {
  ctx: Ctx;
  input: SignalQuery;
}

/** Stored signals of the wards in scope, newest first, and where the next page begins. */
export async function findSignals({
  ctx,
  input,
}: Read): Promise<{ items: ListedSignal[]; nextCursor: string | null }> {
  requireAction(ctx.actor, "signal.list");
  // A ward outside the scope is not there, rather than an empty list.
  const ward = input.ward === undefined ? undefined : await getWardByCode({ ctx, code: input.ward });
  const indicator =
    input.indicator === undefined ? undefined : await getIndicatorByCode({ ctx, code: input.indicator });
  const limit = input.limit ?? PAGE;
  const rows = await ctx.db
    .select({ signal: signals, ward: wards, indicator: { id: indicators.id, code: indicators.code } })
    .from(signals)
    .innerJoin(wards, eq(wards.id, signals.wardId))
    .innerJoin(indicators, eq(indicators.id, signals.indicatorId))
    .where(
      and(
        wardsWithin(scopeOf(ctx.actor)),
        ward && eq(signals.wardId, ward.id),
        indicator && eq(signals.indicatorId, indicator.id),
        input.team && eq(indicators.team, input.team),
        input.status && inArray(signals.status, input.status),
        input.cursor && before(input.cursor),
      ),
    )
    .orderBy(desc(signals.bornAt), desc(signals.id))
    .limit(limit + 1);
  const items = rows.slice(0, limit);
  const last = rows.length > limit ? items.at(-1)?.signal : undefined;
  return { items, nextCursor: last ? `${last.bornAt.toISOString()}_${last.id}` : null };
}

function before({ bornAt, id }: { bornAt: string; id: string }) {
  return sql`(${signals.bornAt}, ${signals.id}) < (${bornAt}::timestamptz, ${id}::uuid)`;
}

/** The same as the API says it. */
export async function listSignals(read: Read): Promise<{ items: SignalReply[]; nextCursor: string | null }> {
  const { items, nextCursor } = await findSignals(read);
  return {
    items: items.map(({ signal, ward, indicator }) => signalReply(signal, ward.code, indicator.code)),
    nextCursor,
  };
}

export function signalReply(signal: Signal, ward: string, indicator: string): SignalReply {
  return {
    id: signal.id,
    ward,
    indicator,
    rule: signal.rule,
    from: signal.fromMonth,
    to: signal.toMonth,
    side: signal.side,
    towards: signal.towards,
    status: signal.status,
    version: signal.version,
    withdrawnWhy: signal.withdrawnWhy,
    spansGap: signal.spansGap,
    onNewest: signal.onNewest,
    bornAt: signal.bornAt.toISOString(),
    changedAt: signal.changedAt.toISOString(),
  };
}

/** All signals that one series ever had. Not guarded: the calling read has decided what the actor may see. */
export async function signalsOfSeries(ctx: Ctx, { wardId, indicatorId }: SeriesKey): Promise<Signal[]> {
  return ctx.db
    .select()
    .from(signals)
    .where(and(eq(signals.wardId, wardId), eq(signals.indicatorId, indicatorId)))
    .orderBy(desc(signals.bornAt), desc(signals.id));
}
