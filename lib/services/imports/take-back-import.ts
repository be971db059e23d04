import "server-only";
import { eq, sql } from "drizzle-orm";
import { importRuns } from "@/db/schema";
import { selectRows } from "@/db/rows";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { monthKey } from "@/lib/indicators/import-facts";
import type { ReturnBefore } from "@/lib/indicators/import-row";
import { asMonth, monthInZone, type Month } from "@/lib/indicators/month";
import { authorize, mayAttempt, requireAction } from "@/lib/policy";
import type { ImportSummary } from "@/lib/schemas/import";
import { writeAudit } from "@/lib/services/audit";
import { hospitalDay, type ReturnRow } from "@/lib/services/tallies";
import { importWords } from "@/lib/strings/imports";
import { holdRun } from "./commit-import";
import { plannedRows } from "./commit-plan";
import { holdReturns } from "./held-returns";
import { refuseLaterChanges } from "./later-changes";
import { findRun, needsReason, type ImportRun } from "./queries";
import { summaryOf } from "./reply";
import { restoreImport, type MonthToRestore } from "./restore-import";

/**
 * Takes a committed import back: the figures that stood before come back as new revisions, and returns that it
 * accepted are again what they were. Refused where a later change stands on top of it.
 */
export async function takeBackImport({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { id: string };
}): Promise<ImportSummary> {
  requireAction(ctx.actor, "import.take-back");
  const run = await findRun(ctx, input.id);
  const asked = await needsReason(ctx, run.id);
  if (run.state === "taken-back") return summaryOf(run, asked);
  refuseUnlessCommitted(run);
  if (run.accepted || asked) requireLead(ctx);
  const months = await monthsOf(ctx, run.id);
  const rows = await plannedRows(ctx, run.id);
  return withTransaction(ctx, async (tx) => {
    const held = await holdRun(tx, input.id);
    authorize(tx.actor, "import.take-back", { authorId: held.uploadedById });
    if (held.state === "taken-back") return summaryOf(held, asked);
    refuseUnlessCommitted(held);
    const returns = await holdReturns(tx, months);
    const { timeZone } = await hospitalDay(tx);
    const monthOfCommit = monthInZone(held.committedAt ?? tx.now, timeZone);
    const planned = months.map((each) => ({ ...each, ...standing(each, returns, held, monthOfCommit) }));
    await refuseLaterChanges(tx, held, planned);

    const restored = await restoreImport(tx, held, planned, rows);
    const after = await markTakenBack(tx, held);
    writeAudit(tx, {
      action: "import.take-back",
      subject: { type: "import", id: held.id },
      before: { state: held.state },
      after: { state: after.state, ...restored },
    });
    return summaryOf(after, asked);
  });
}

function refuseUnlessCommitted(run: ImportRun): void {
  if (run.state !== "committed") throw new DomainError("precondition", importWords.nothingBroughtIn);
}

/** What only a lead can do, only a lead undoes. */
function requireLead(ctx: Ctx): void {
  if (!mayAttempt(ctx.actor, "import.accept")) throw new DomainError("forbidden", importWords.leadTakesBack);
}

async function monthsOf(ctx: Ctx, runId: string) {
  const rows = await selectRows<{ ward_id: string; month: string; before: ReturnBefore | null }>(
    ctx.db,
    sql`select distinct on (ward_id, month) ward_id, month, before -> 'return' as before
        from import_rows where import_run_id = ${runId}::uuid and outcome in ('new', 'changed', 'same')
        order by ward_id, month, row`,
  );
  return rows.map((row) => ({ wardId: row.ward_id, month: asMonth(row.month), before: row.before }));
}

/** Whether the import accepted this return, and whether the return is still in the state that it left it in. */
function standing(
  { wardId, month, before }: Pick<MonthToRestore, "wardId" | "month" | "before">,
  returns: ReadonlyMap<string, ReturnRow>,
  run: ImportRun,
  monthOfCommit: Month,
): Pick<MonthToRestore, "wasAccepted" | "isMoved" | "returnId"> {
  const row = returns.get(monthKey(wardId, month));
  const statusBefore = before?.status ?? "open";
  const wasAccepted = run.accepted && month < monthOfCommit && statusBefore !== "accepted";
  const isMoved = wasAccepted
    ? row?.acceptedAt?.getTime() !== run.committedAt?.getTime()
    : (row?.status ?? "open") !== statusBefore;
  return { wasAccepted, isMoved, returnId: row?.id ?? "" };
}

async function markTakenBack(tx: TxCtx, run: ImportRun): Promise<ImportRun> {
  const [after] = await tx.db
    .update(importRuns)
    .set({ state: "taken-back", takenBackAt: tx.now, version: run.version + 1 })
    .where(eq(importRuns.id, run.id))
    .returning();
  if (!after) throw new Error("The locked import has gone.");
  return after;
}
