import "server-only";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError, type FieldError } from "@/lib/errors";
import { missingPart } from "@/lib/indicators/return-missing";
import { requireAction } from "@/lib/policy";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateSeries } from "@/lib/services/series";
import { loadLines, lockReturn, returnLineOf, type Line } from "@/lib/services/tallies";
import { missingWords, returnChangeWords } from "@/lib/strings/returns";
import { auditOf, holdReturn, requireStatus, subjectOf, type ReturnInput } from "./internal";
import { currentReply } from "./reply";
import { sendReturns } from "./send-returns";

/** Sends a return: its figures go on the charts, and signals are judged anew. */
export async function submitReturn({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: ReturnInput;
}): Promise<WardReturnReply> {
  requireAction(ctx.actor, "return.submit");
  return withTransaction(ctx, async (tx) => {
    const { ward, day, row } = await holdReturn(tx, input, "return.submit");
    requireStatus(row, ["open"]);
    const lines = await loadLines(tx.db, { wardId: ward.id, month: input.month });
    refuseMissing(lines, day.today);

    const touched = await sendReturns(tx, { returnIds: [row.id], source: "form" });
    await reevaluateSeries(tx, { pairs: touched, why: "trial-limits" });
    const after = await lockReturn(tx, ward, input.month, day);
    writeAudit(tx, {
      action: "return.submit",
      subject: subjectOf({ ward, row }),
      before: auditOf({ ward, row }),
      after: { ...auditOf({ ward, row: after }), charted: touched.length },
    });
    return currentReply(tx, after, ward, day);
  });
}

function refuseMissing(lines: readonly Line[], today: string): void {
  const errors: FieldError[] = [];
  for (const line of lines) {
    const part = missingPart(returnLineOf(line, today));
    if (part === null) continue;
    const message = missingWords.inReturn(line.indicator.name, line.labels, part);
    errors.push({ path: line.indicator.code, message });
  }
  if (errors.length > 0)
    throw new DomainError("invalid", returnChangeWords.missing(errors.length), { errors });
}
