import "server-only";
import { uuidv7 } from "uuidv7";
import { wards } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import type { CreateWard } from "@/lib/schemas/ward";
import { writeAudit } from "@/lib/services/audit";
import type { Ward } from "./queries";

export async function createWard({ ctx, input }: { ctx: Ctx; input: CreateWard }): Promise<Ward> {
  requireAction(ctx.actor, "ward.create");
  return withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "ward.create", {});

    const [ward] = await tx.db
      .insert(wards)
      .values({ id: uuidv7(), ...input })
      .onConflictDoNothing({ target: wards.code })
      .returning();
    if (!ward) throw codeTaken(input.code);

    writeAudit(tx, { action: "ward.create", subject: { type: "ward", id: ward.id }, after: ward });
    return ward;
  });
}

function codeTaken(code: string): DomainError {
  const message = `There is a ward with the code ${code} already.`;
  return new DomainError("conflict", message, { errors: [{ path: "code", message }] });
}
