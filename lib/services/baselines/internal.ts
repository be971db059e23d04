import "server-only";
import { and, desc, eq } from "drizzle-orm";
import { baselines } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { DomainError, type FieldError } from "@/lib/errors";
import { planBaseline, type BaselineDraft, type BaselinePlan } from "@/lib/indicators/baseline-plan";
import type { SeriesFacts } from "@/lib/indicators/series";
import type { BaselineReply } from "@/lib/schemas/baseline";
import { loadSeries, type SeriesKey } from "@/lib/services/series";
import type { OpenSeries } from "./open-series";

export type Baseline = typeof baselines.$inferSelect;

/** All baselines that a series ever had or was proposed, newest first. */
export async function loadBaselines(ctx: Ctx, { wardId, indicatorId }: SeriesKey): Promise<Baseline[]> {
  return ctx.db
    .select()
    .from(baselines)
    .where(and(eq(baselines.wardId, wardId), eq(baselines.indicatorId, indicatorId)))
    .orderBy(desc(baselines.proposedAt), desc(baselines.id));
}

export async function loadFacts(ctx: Ctx, key: SeriesKey): Promise<SeriesFacts> {
  const [loaded] = await loadSeries(ctx, [key]);
  if (!loaded) throw new DomainError("not-found", "There is no such chart.");
  return loaded.facts;
}

/** The plan of a draft that can be; throws `invalid` with what can't. */
export function requirePlan(facts: SeriesFacts, draft: BaselineDraft): BaselinePlan {
  const plan = planBaseline(facts, draft);
  refuse(plan.problems);
  return plan;
}

function refuse(errors: FieldError[]): void {
  const [first] = errors;
  if (first) throw new DomainError("invalid", first.message, { errors });
}

export function draftOf(row: Baseline): BaselineDraft {
  return { from: row.fromMonth, to: row.toMonth, appliesFrom: row.appliesFrom, leftOut: row.leftOut };
}

/** A baseline as the API and the audit name it. */
export function baselineReply(
  row: Baseline,
  { ward, indicator }: Pick<OpenSeries, "ward" | "indicator">,
  facts: SeriesFacts,
): BaselineReply {
  const { line } = planBaseline(facts, draftOf(row));
  return {
    id: row.id,
    ward: ward.code,
    indicator: indicator.code,
    from: row.fromMonth,
    to: row.toMonth,
    leftOut: row.leftOut,
    appliesFrom: row.appliesFrom,
    state: row.state,
    limits: row.limits,
    centre: line.centre,
    months: line.months,
    reason: row.reason,
    proposedBy: row.proposedBy,
    proposedAt: row.proposedAt.toISOString(),
    decidedBy: row.decidedBy,
    decidedAt: row.decidedAt?.toISOString() ?? null,
    decisionReason: row.decisionReason,
    supersededAt: row.supersededAt?.toISOString() ?? null,
    version: row.version,
  };
}
