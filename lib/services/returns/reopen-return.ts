import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateSeries } from "@/lib/services/series";
import { addRevisions, keysOfReturns } from "@/lib/services/tallies";
import { auditOf, changeRow, holdReturn, requireStatus, subjectOf, type ReturnInput } from "./internal";
import { currentReply } from "./reply";

type Input = ReturnInput & { reason: string };

/** Opens a sent or accepted return again, with a reason. What was sent last stays on the charts until it is sent again. */
export async function reopenReturn({ ctx, input }: { ctx: Ctx; input: Input }): Promise<WardReturnReply> {
  requireAction(ctx.actor, "return.reopen");
  return withTransaction(ctx, async (tx) => {
    const { ward, day, row } = await holdReturn(tx, input, "return.reopen");
    requireStatus(row, ["submitted", "accepted"]);

    const after = await changeRow(tx, row, {
      status: "open",
      acceptedAt: null,
      acceptedBy: null,
      reopened: true,
      reopenedReason: input.reason,
    });
    const keys = await keysOfReturns(tx, [row.id]);
    await addRevisions(
      tx,
      keys.map((key) => ({ ...key, charted: null })),
      { event: "reopened", source: "form", reason: input.reason },
    );
    await reevaluateSeries(tx, { pairs: keys, why: "trial-limits" });
    writeAudit(tx, {
      action: "return.reopen",
      subject: subjectOf({ ward, row }),
      before: auditOf({ ward, row }),
      after: auditOf({ ward, row: after }),
    });
    return currentReply(tx, after, ward, day);
  });
}
