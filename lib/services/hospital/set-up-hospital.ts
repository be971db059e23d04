import "server-only";
import { hospital } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import { setUpHospitalSchema, type HospitalRecord, type SetUpHospitalInput } from "@/lib/schemas/hospital";
import { writeAudit } from "@/lib/services/audit";
import { findHospitalRow, HOSPITAL_ID } from "./queries";

/** Makes the hospital's row at the very first start. Where it exists already, that one stands, unchanged. */
export async function setUpHospital({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: SetUpHospitalInput;
}): Promise<HospitalRecord> {
  requireAction(ctx.actor, "settings.update");
  const parsed = setUpHospitalSchema.safeParse(input);
  if (!parsed.success) {
    const errors = parsed.error.issues.map(({ path, message }) => ({ path: path.join("."), message }));
    throw new DomainError("invalid", errors[0]?.message ?? "The hospital can't be set up so.", { errors });
  }

  return withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "settings.update", {});
    const [made] = await tx.db
      .insert(hospital)
      .values({ id: HOSPITAL_ID, ...parsed.data })
      .onConflictDoNothing()
      .returning();
    if (made) {
      writeAudit(tx, {
        action: "hospital.set-up",
        subject: { type: "hospital", id: String(HOSPITAL_ID) },
        after: parsed.data,
      });
    }
    const row = await findHospitalRow(tx);
    if (!row) throw new Error("The hospital's row is missing after its set-up.");
    return row;
  });
}
