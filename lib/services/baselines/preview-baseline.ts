import "server-only";
import type { Ctx } from "@/db/transaction";
import type { BaselineDraft } from "@/lib/indicators/baseline-plan";
import type { SeriesFacts } from "@/lib/indicators/series";
import { planSignals, type FoundSignal } from "@/lib/indicators/signal-life";
import { requireAction } from "@/lib/policy";
import type { PreviewBaseline, PreviewReply } from "@/lib/schemas/baseline";
import { evaluateFacts, type EvaluatedSeries } from "@/lib/services/series";
import { loadFacts, requirePlan } from "./internal";
import { openSeries, type OpenSeries } from "./open-series";

interface Read {
  ctx: Ctx;
  input: PreviewBaseline & { ward: string; indicator: string };
}

/** A chart before and after a baseline that nobody has decided; nothing is written. */
export interface BaselinePreview {
  series: OpenSeries;
  before: EvaluatedSeries;
  after: EvaluatedSeries;
  come: FoundSignal[];
  go: FoundSignal[];
  change: FoundSignal[];
}

export async function previewBaseline({ ctx, input }: Read): Promise<BaselinePreview> {
  requireAction(ctx.actor, "baseline.read");
  const series = await openSeries(ctx, "baseline.read", input);
  return previewOn(series, await loadFacts(ctx, series.key), input);
}

/** The same as the API says it. */
export async function previewBaselineReply(read: Read): Promise<PreviewReply> {
  const { before, after, come, go, change } = await previewBaseline(read);
  const told = ({ rule, side, from, to }: FoundSignal) => ({ rule, side, from, to });
  return {
    before: limitsOf(before),
    after: limitsOf(after),
    signals: { come: come.map(told), go: go.map(told), change: change.map(told) },
  };
}

function previewOn(series: OpenSeries, facts: SeriesFacts, draft: BaselineDraft): BaselinePreview {
  const { limits } = requirePlan(facts, draft);
  const others = facts.baselines.filter((each) => each.appliesFrom !== draft.appliesFrom);
  const before = evaluateFacts(facts);
  const after = evaluateFacts({ ...facts, baselines: [...others, { id: "preview", ...draft, limits }] });
  return { series, before, after, ...comeAndGo(before.signals, after.signals) };
}

/** The signals of before play the part of the stored ones. */
function comeAndGo(before: readonly FoundSignal[], after: readonly FoundSignal[]) {
  const stored = before.map((found, index) => ({
    ...found,
    id: String(index),
    status: "new" as const,
    towards: "neither" as const,
    bornAt: new Date(index),
  }));
  const plan = planSignals(stored, after);
  return { come: plan.born, go: plan.withdrawn, change: plan.moved.map((each) => each.found) };
}

function limitsOf({ evaluation, baselineStatus }: EvaluatedSeries) {
  const last = evaluation.segments.at(-1);
  return {
    centre: last?.centre ?? null,
    limits: last?.method ?? null,
    status: baselineStatus,
    months: last?.baselineMonths ?? 0,
  };
}
