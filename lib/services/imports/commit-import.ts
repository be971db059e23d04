import "server-only";
import { eq } from "drizzle-orm";
import { importRuns } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { actorName, authorize, requireAction } from "@/lib/policy";
import type { CommitImport, ImportSummary } from "@/lib/schemas/import";
import { writeAudit } from "@/lib/services/audit";
import { importWords } from "@/lib/strings/imports";
import { applyCommit, type Applied } from "./apply-commit";
import { planCommit, type CommitPlan } from "./commit-plan";
import { holdReturns } from "./held-returns";
import { refuseMoved } from "./moved-rows";
import { findRun, importNotFound, needsReason, type ImportRun } from "./queries";
import { summaryOf } from "./reply";

type Input = CommitImport & { id: string };

/**
 * Brings a checked sheet in, all or nothing. Open returns are filled and stay open unless a lead accepts them with
 * it; months that were sent are corrected. A second call changes nothing and answers as the first.
 */
export async function commitImport({ ctx, input }: { ctx: Ctx; input: Input }): Promise<ImportSummary> {
  requireAction(ctx.actor, "import.commit");
  const run = await findRun(ctx, input.id);
  if (run.state === "committed") return summaryOf(run, await needsReason(ctx, run.id));
  refuseUnlessChecked(run);
  const plan = await planCommit(ctx, run, input);
  const asked = await needsReason(ctx, run.id);
  return withTransaction(ctx, async (tx) => {
    const held = await holdRun(tx, input.id);
    authorize(tx.actor, "import.commit", { authorId: held.uploadedById });
    if (held.state === "committed") return summaryOf(held, asked);
    refuseUnlessChecked(held);
    const returns = await holdReturns(tx, plan.months);
    await refuseMoved(tx, plan, returns);

    const applied = await applyCommit(tx, plan, returns);
    const after = await markCommitted(tx, held, plan);
    writeAudit(tx, {
      action: "import.commit",
      subject: { type: "import", id: held.id },
      before: { state: held.state },
      after: auditOf(after, applied),
    });
    return summaryOf(after, asked);
  });
}

export async function holdRun(tx: TxCtx, id: string): Promise<ImportRun> {
  const [run] = await tx.db.select().from(importRuns).where(eq(importRuns.id, id)).for("update");
  if (!run) throw importNotFound();
  return run;
}

function refuseUnlessChecked(run: ImportRun): void {
  if (run.state !== "checked") throw new DomainError("precondition", importWords.takenBackAlready);
}

async function markCommitted(tx: TxCtx, run: ImportRun, plan: CommitPlan): Promise<ImportRun> {
  const [after] = await tx.db
    .update(importRuns)
    .set({
      state: "committed",
      committedAt: tx.now,
      committedBy: actorName(tx.actor),
      reason: plan.reason,
      accepted: plan.accept,
      version: run.version + 1,
    })
    .where(eq(importRuns.id, run.id))
    .returning();
  if (!after) throw new Error("The locked import has gone.");
  return after;
}

function auditOf(run: ImportRun, applied: Applied) {
  const { state, fileName, checksum, counts, reason, accepted } = run;
  return { state, fileName, checksum, counts, reason, accepted, ...applied };
}
