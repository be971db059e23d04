import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { sessions } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import { writeAudit } from "@/lib/services/audit";

export type EndedWhy = "signed-out" | "switched-off" | "new-password";

/** Signs the actor out: from now on a copy of the cookie opens nothing. */
export async function endSession({ ctx }: { ctx: Ctx }): Promise<void> {
  requireAction(ctx.actor, "session.end");
  const { actor } = ctx;
  if (actor.kind !== "person") throw new DomainError("precondition", "Only a person has a session to end.");

  await withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "session.end", {});
    const ended = await tx.db
      .update(sessions)
      .set({ endedAt: tx.now, endedWhy: "signed-out" satisfies EndedWhy })
      .where(and(eq(sessions.id, actor.sessionId), isNull(sessions.endedAt)))
      .returning({ id: sessions.id });
    if (ended.length > 0) {
      writeAudit(tx, { action: "session.end", subject: { type: "session", id: actor.sessionId } });
    }
  });
}

/** Inside a verb on a person: ends all their sessions and says how many. The verb's own audit entry says why. */
export async function endSessionsOf(tx: TxCtx, personId: string, why: EndedWhy): Promise<number> {
  const ended = await tx.db
    .update(sessions)
    .set({ endedAt: tx.now, endedWhy: why })
    .where(and(eq(sessions.personId, personId), isNull(sessions.endedAt)))
    .returning({ id: sessions.id });
  return ended.length;
}
