import "server-only";
import { uuidv7 } from "uuidv7";
import { annotations } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { isReportedIn } from "@/lib/indicators/assigned-months";
import { actorName, authorize, requireAction } from "@/lib/policy";
import type { AnnotationReply, CreateAnnotation } from "@/lib/schemas/annotation";
import { findAssignment } from "@/lib/services/assignments";
import { writeAudit } from "@/lib/services/audit";
import { getIndicatorByCode } from "@/lib/services/indicators";
import { getWardByCode } from "@/lib/services/wards";

interface Verb {
  ctx: Ctx;
  input: CreateAnnotation;
}

/** Sets a note on one month of a chart. Notes carry no verdict, so no signal is touched. */
export async function createAnnotation({ ctx, input }: Verb): Promise<AnnotationReply> {
  requireAction(ctx.actor, "annotation.create");
  return withTransaction(ctx, async (tx) => {
    const ward = await getWardByCode({ ctx: tx, code: input.ward });
    const indicator = await getIndicatorByCode({ ctx: tx, code: input.indicator });
    authorize(tx.actor, "annotation.create", { wardId: ward.id, team: indicator.team });
    const assignment = await findAssignment({ ctx: tx, wardId: ward.id, indicatorId: indicator.id });
    if (!assignment || !isReportedIn(ward, assignment, input.month)) throw notCounted();

    const [row] = await tx.db
      .insert(annotations)
      .values({
        id: uuidv7(),
        wardId: ward.id,
        indicatorId: indicator.id,
        month: input.month,
        text: input.text,
        createdBy: actorName(tx.actor),
        createdAt: tx.now,
      })
      .returning();
    if (!row) throw new Error("No note was written.");

    const reply: AnnotationReply = {
      id: row.id,
      ward: ward.code,
      indicator: indicator.code,
      month: row.month,
      text: row.text,
      createdBy: row.createdBy,
      createdAt: row.createdAt.toISOString(),
    };
    writeAudit(tx, {
      action: "annotation.create",
      subject: { type: "annotation", id: row.id },
      after: reply,
    });
    return reply;
  });
}

function notCounted(): DomainError {
  const message = "The ward doesn't count this indicator in that month.";
  return new DomainError("invalid", message, { errors: [{ path: "month", message }] });
}
