import "server-only";
import { eq } from "drizzle-orm";
import { assignments, wards } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import { closesBeforeOpening, wardSchema, type UpdateWard } from "@/lib/schemas/ward";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateSeries } from "@/lib/services/series";
import { lockWard, refuseHidingSent, sentMonthsOutside } from "./internal";
import type { Ward } from "./queries";

type Input = UpdateWard & { code: string };

export async function updateWard({ ctx, input }: { ctx: Ctx; input: Input }): Promise<Ward> {
  requireAction(ctx.actor, "ward.update");
  return withTransaction(ctx, async (tx) => {
    const before = await lockWard(tx, input.code);
    authorize(tx.actor, "ward.update", { wardId: before.id });
    if (input.version !== undefined && before.version !== input.version) {
      throw new DomainError("stale", "Somebody changed this ward meanwhile.", {
        current: wardSchema.parse(before),
      });
    }

    const values = {
      name: input.name ?? before.name,
      division: input.division ?? before.division,
      openFrom: input.openFrom ?? before.openFrom,
      openTo: input.openTo === undefined ? before.openTo : input.openTo,
    };
    if (closesBeforeOpening(values)) throw closesTooEarly();
    await refuseCuttingMonths(tx, before, values);
    if (isSame(before, values)) return before;

    const [ward] = await tx.db
      .update(wards)
      .set({ ...values, version: before.version + 1 })
      .where(eq(wards.id, before.id))
      .returning();
    if (!ward) throw new Error("The locked ward has gone.");

    if (before.openTo !== ward.openTo) await redrawSeries(tx, ward.id);
    writeAudit(tx, { action: "ward.update", subject: { type: "ward", id: ward.id }, before, after: ward });
    return ward;
  });
}

type Values = Pick<Ward, "name" | "division" | "openFrom" | "openTo">;

function isSame(before: Ward, values: Values): boolean {
  return (
    before.name === values.name &&
    before.division === values.division &&
    before.openFrom === values.openFrom &&
    before.openTo === values.openTo
  );
}

async function refuseCuttingMonths(tx: Ctx, before: Ward, values: Values): Promise<void> {
  if (before.openFrom === values.openFrom && before.openTo === values.openTo) return;
  const outside = await sentMonthsOutside(
    tx.db,
    { wardId: before.id },
    { from: values.openFrom, to: values.openTo },
  );
  refuseHidingSent(outside, values.openFrom, { from: "openFrom", to: "openTo" });
}

/** The ward's last month decides how far its charts are drawn where months are missing. */
async function redrawSeries(tx: TxCtx, wardId: string): Promise<void> {
  const pairs = await tx.db
    .select({ wardId: assignments.wardId, indicatorId: assignments.indicatorId })
    .from(assignments)
    .where(eq(assignments.wardId, wardId));
  await reevaluateSeries(tx, { pairs, why: "definition" });
}

function closesTooEarly(): DomainError {
  const message = "The last month can't come before the first.";
  return new DomainError("invalid", message, { errors: [{ path: "openTo", message }] });
}
