import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateSeries } from "@/lib/services/series";
import { keysOfReturns, unchartTallies } from "@/lib/services/tallies";
import { auditOf, changeRow, holdReturn, requireStatus, subjectOf, type ReturnInput } from "./internal";
import { currentReply } from "./reply";

/** Takes a sent return back until it is accepted: open again, its figures off the charts. */
export async function recallReturn({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: ReturnInput;
}): Promise<WardReturnReply> {
  requireAction(ctx.actor, "return.recall");
  return withTransaction(ctx, async (tx) => {
    const { ward, day, row } = await holdReturn(tx, input, "return.recall");
    requireStatus(row, ["submitted"]);

    const keys = await keysOfReturns(tx, [row.id]);
    const touched = await unchartTallies(tx, { keys, event: "recalled", source: "form" });
    const after = await changeRow(tx, row, { status: "open", submittedAt: null, submittedBy: null });
    await reevaluateSeries(tx, { pairs: touched, why: "recall" });
    writeAudit(tx, {
      action: "return.recall",
      subject: subjectOf({ ward, row }),
      before: auditOf({ ward, row }),
      after: auditOf({ ward, row: after }),
    });
    return currentReply(tx, after, ward, day);
  });
}
