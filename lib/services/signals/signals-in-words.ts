import "server-only";
import { inArray, sql } from "drizzle-orm";
import { indicators, seriesState, type SeriesColumns } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { newestDefinition } from "@/lib/indicators/definition";
import { signalEvidence, type EvidenceMonth, type SignalEvidence } from "@/lib/indicators/signal-evidence";
import { signalWords, type SignalWords } from "@/lib/indicators/signal-words";
import type { CountModel } from "@/lib/limits/types";
import { requireAction } from "@/lib/policy";
import type { SignalQuery, SignalReply } from "@/lib/schemas/signal";
import { loadDetails, type IndicatorDetail } from "@/lib/services/indicators";
import { keyOf, pairTable, type SeriesKey } from "@/lib/services/series";
import { findSignals, signalReply, type ListedSignal } from "./queries";

export interface SignalInWords {
  signal: SignalReply;
  wardName: string;
  indicatorName: string;
  per: number;
  /** Null where it was withdrawn: what it rested on has changed. */
  evidence: SignalEvidence | null;
  words: SignalWords;
}

/** The list of signals with what each rests on, worked out from the stored state of its series. */
export async function listSignalsInWords({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: SignalQuery;
}): Promise<{ items: SignalInWords[]; nextCursor: string | null }> {
  requireAction(ctx.actor, "signal.list");
  const { items, nextCursor } = await findSignals({ ctx, input });
  if (items.length === 0) return { items: [], nextCursor };
  const ids = [...new Set(items.map((item) => item.indicator.id))];
  const details = await loadDetails(ctx.db, inArray(indicators.id, ids));
  const indicatorOf = new Map(details.map((each) => [each.id, each]));
  const columnsOf = await loadColumns(
    ctx,
    items.map((item) => item.signal),
  );
  return {
    items: items.flatMap((item) => {
      const indicator = indicatorOf.get(item.indicator.id);
      return indicator ? [inWords(item, indicator, columnsOf.get(keyOf(item.signal)))] : [];
    }),
    nextCursor,
  };
}

function inWords(
  { signal, ward }: ListedSignal,
  indicator: IndicatorDetail,
  columns: SeriesColumns | undefined,
): SignalInWords {
  const { numeratorLabel, denominatorLabel } = newestDefinition(indicator.definitions);
  const reply = signalReply(signal, ward.code, indicator.code);
  const model: CountModel = indicator.kind === "proportion" ? "binomial" : "poisson";
  const isActive = signal.status !== "withdrawn";
  const evidence = isActive && columns ? signalEvidence(evidenceMonths(columns), reply, model) : null;
  return {
    signal: reply,
    wardName: ward.name,
    indicatorName: indicator.name,
    per: indicator.per,
    evidence,
    words: signalWords(reply, evidence, { numeratorLabel, denominatorLabel, per: indicator.per }),
  };
}

async function loadColumns(ctx: Ctx, keys: readonly SeriesKey[]): Promise<Map<string, SeriesColumns>> {
  const rows = await ctx.db
    .select()
    .from(seriesState)
    .where(
      sql`(${seriesState.wardId}, ${seriesState.indicatorId}) in (select ward_id, indicator_id from ${pairTable(keys)})`,
    );
  return new Map(rows.map((row) => [keyOf(row), row.columns]));
}

function evidenceMonths(columns: SeriesColumns): EvidenceMonth[] {
  return columns.months.map((month, index) => ({
    month,
    numerator: columns.numerators[index] ?? null,
    denominator: columns.denominators[index] ?? null,
    value: columns.values[index] ?? null,
    centre: columns.centre[index] ?? null,
    lowerAction: columns.lowerAction[index] ?? null,
    upperAction: columns.upperAction[index] ?? null,
    lowerWarning: columns.lowerWarning[index] ?? null,
    upperWarning: columns.upperWarning[index] ?? null,
  }));
}
