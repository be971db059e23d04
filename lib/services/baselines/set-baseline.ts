import "server-only";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { SeriesFacts } from "@/lib/indicators/series";
import type { LimitMethod } from "@/lib/limits/types";
import { authorize, can, requireAction } from "@/lib/policy";
import type { BaselineReply, SetBaseline } from "@/lib/schemas/baseline";
import { writeAudit } from "@/lib/services/audit";
import { lockSeries, reevaluateSeries } from "@/lib/services/series";
import { baselineReply, loadBaselines, loadFacts, requirePlan, type Baseline } from "./internal";
import { openSeries, type OpenSeries } from "./open-series";
import { closeProposal, insertBaseline } from "./write-baseline";

interface Verb {
  ctx: Ctx;
  input: SetBaseline & { ward: string; indicator: string };
}

/**
 * Sets the first baseline of a series, which one person may do alone where their role may; every later one, and
 * every change from a month on, is kept as a proposal for another person to decide. Saying the same again changes
 * nothing.
 */
export async function setBaseline({ ctx, input }: Verb): Promise<BaselineReply> {
  requireAction(ctx.actor, "baseline.propose");
  return withTransaction(ctx, async (tx) => {
    const series = await openSeries(tx, "baseline.read", input);
    const { key, ward, indicator } = series;
    await lockSeries(tx, [key]);
    const existing = await loadBaselines(tx, key);
    const alone = isFirst(existing, input) && can(tx.actor, "baseline.set", { wardId: ward.id });
    authorize(tx.actor, alone ? "baseline.set" : "baseline.propose", {
      wardId: ward.id,
      team: indicator.team,
    });

    const facts = await loadFacts(tx, key);
    const replaced = existing.find(
      (each) => each.state === "decided" && each.appliesFrom === input.appliesFrom,
    );
    refuseStale(input.version, replaced, series, facts);
    const { limits } = requirePlan(facts, input);
    if (replaced && isSame(replaced, input, limits)) return baselineReply(replaced, series, facts);
    await withdrawOwnProposal(tx, existing, input, series, facts);

    const row = await insertBaseline(tx, { key, input, limits, decided: alone });
    if (alone) await reevaluateSeries(tx, { pairs: [key], why: "baseline" });
    const reply = baselineReply(row, series, facts);
    writeAudit(tx, {
      action: alone ? "baseline.set" : "baseline.propose",
      subject: { type: "baseline", id: row.id },
      before: replaced && baselineReply(replaced, series, facts),
      after: reply,
    });
    return reply;
  });
}

/** The chart's beginning has no baseline yet, and never had. */
function isFirst(existing: readonly Baseline[], { appliesFrom }: SetBaseline): boolean {
  return (
    appliesFrom === null && existing.every((each) => each.decidedAt === null || each.state === "declined")
  );
}

function isSame(row: Baseline, input: SetBaseline, limits: LimitMethod): boolean {
  const months = (list: readonly { month: string; reason: string }[]) =>
    JSON.stringify([...list].map((each) => [each.month, each.reason]).sort());
  const sameMonths = row.fromMonth === input.from && row.toMonth === input.to;
  return sameMonths && row.limits === limits && months(row.leftOut) === months(input.leftOut);
}

/** Whoever sends no version takes what is in force as it is. */
function refuseStale(
  version: number | undefined,
  replaced: Baseline | undefined,
  series: OpenSeries,
  facts: SeriesFacts,
): void {
  if (version === undefined || version === (replaced?.version ?? 0)) return;
  const current = replaced ? baselineReply(replaced, series, facts) : null;
  throw new DomainError("stale", "Somebody changed this baseline meanwhile.", { current });
}

/** One proposal at a time for a beginning: the proposer's own is replaced, somebody else's is decided first. */
async function withdrawOwnProposal(
  tx: TxCtx,
  existing: readonly Baseline[],
  input: SetBaseline,
  series: OpenSeries,
  facts: SeriesFacts,
): Promise<void> {
  const open = existing.find((each) => each.state === "proposed" && each.appliesFrom === input.appliesFrom);
  if (!open) return;
  const isOwn = tx.actor.kind === "person" && open.proposedById === tx.actor.personId;
  if (!isOwn) {
    const message = `A baseline proposed by ${open.proposedBy} waits for a decision. Decide that one first.`;
    throw new DomainError("conflict", message, { current: baselineReply(open, series, facts) });
  }
  await closeProposal(tx, open, {
    agree: false,
    reason: "Replaced by the proposer.",
    limits: open.limits,
  });
}
