import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { actorName, requireAction } from "@/lib/policy";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateSeries } from "@/lib/services/series";
import { keysOfReturns } from "@/lib/services/tallies";
import { auditOf, changeRow, holdReturn, requireStatus, subjectOf, type ReturnInput } from "./internal";
import { currentReply } from "./reply";

/** A quality lead takes a sent return. Its lines are judged anew, since time may have completed some since. */
export async function acceptReturn({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: ReturnInput;
}): Promise<WardReturnReply> {
  requireAction(ctx.actor, "return.accept");
  return withTransaction(ctx, async (tx) => {
    const { ward, day, row } = await holdReturn(tx, input, "return.accept");
    requireStatus(row, ["submitted"]);

    const accepted = { status: "accepted", acceptedAt: tx.now, acceptedBy: actorName(tx.actor) } as const;
    const after = await changeRow(tx, row, accepted);
    await reevaluateSeries(tx, { pairs: await keysOfReturns(tx, [row.id]), why: "trial-limits" });
    writeAudit(tx, {
      action: "return.accept",
      subject: subjectOf({ ward, row }),
      before: auditOf({ ward, row }),
      after: auditOf({ ward, row: after }),
    });
    return currentReply(tx, after, ward, day);
  });
}
