import "server-only";
import { eq } from "drizzle-orm";
import { hospital } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import type { HospitalRecord, UpdateHospitalInput } from "@/lib/schemas/hospital";
import { writeAudit } from "@/lib/services/audit";
import { HOSPITAL_ID } from "./queries";

/** Changes what is set for the whole hospital. Returns that are open keep the due day that they were given. */
export async function updateHospital({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: UpdateHospitalInput;
}): Promise<HospitalRecord> {
  requireAction(ctx.actor, "settings.update");
  return withTransaction(ctx, async (tx) => {
    const [before] = await tx.db.select().from(hospital).where(eq(hospital.id, HOSPITAL_ID)).for("update");
    if (!before) throw new DomainError("not-found", "The hospital isn't set up yet.");
    authorize(tx.actor, "settings.update", {});
    if (before.version !== input.version) {
      throw new DomainError("stale", "Somebody else changed these settings meanwhile.", { current: before });
    }

    const { version, ...changes } = input;
    const [after] = await tx.db
      .update(hospital)
      .set({ ...changes, version: version + 1 })
      .where(eq(hospital.id, HOSPITAL_ID))
      .returning();
    if (!after) throw new Error("The hospital's row is missing after its update.");
    writeAudit(tx, {
      action: "hospital.update",
      subject: { type: "hospital", id: String(HOSPITAL_ID) },
      before,
      after,
    });
    return after;
  });
}
