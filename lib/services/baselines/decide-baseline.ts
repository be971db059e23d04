import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import type { BaselineReply, DecideBaseline } from "@/lib/schemas/baseline";
import { writeAudit } from "@/lib/services/audit";
import { lockSeries, reevaluateSeries } from "@/lib/services/series";
import { baselineReply, draftOf, loadBaselines, loadFacts, requirePlan } from "./internal";
import { openSeries } from "./open-series";
import { closeProposal, supersedeDecided } from "./write-baseline";

interface Verb {
  ctx: Ctx;
  input: DecideBaseline & { ward: string; indicator: string };
}

/**
 * Decides a proposed baseline; the proposer never does. Agreed, it takes the place of the one with the same
 * beginning, with limits settled on the figures of this moment.
 */
export async function decideBaseline({ ctx, input }: Verb): Promise<BaselineReply> {
  requireAction(ctx.actor, "baseline.decide");
  return withTransaction(ctx, async (tx) => {
    const series = await openSeries(tx, "baseline.read", input);
    const { key, ward } = series;
    await lockSeries(tx, [key]);
    const proposal = (await loadBaselines(tx, key)).find((each) => each.id === input.id);
    if (!proposal) throw new DomainError("not-found", "There is no such proposal.");
    authorize(tx.actor, "baseline.decide", { wardId: ward.id, authorId: proposal.proposedById });

    const facts = await loadFacts(tx, key);
    const before = baselineReply(proposal, series, facts);
    if (proposal.version !== input.version) {
      throw new DomainError("stale", "Somebody changed this proposal meanwhile.", { current: before });
    }
    if (proposal.state !== "proposed") {
      throw new DomainError("conflict", "This baseline has been decided already.", { current: before });
    }

    const limits = input.agree ? requirePlan(facts, draftOf(proposal)).limits : proposal.limits;
    if (input.agree) await supersedeDecided(tx, key, proposal);
    const row = await closeProposal(tx, proposal, { agree: input.agree, reason: input.reason, limits });
    if (input.agree) await reevaluateSeries(tx, { pairs: [key], why: "baseline" });
    const after = baselineReply(row, series, facts);
    writeAudit(tx, { action: "baseline.decide", subject: { type: "baseline", id: row.id }, before, after });
    return after;
  });
}
