import "server-only";
import { and, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { people } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { authorize, LEAD_ROLE, requireAction } from "@/lib/policy";
import { writeAudit } from "@/lib/services/audit";
import { FIRST_LEAD_EMAIL } from "./first-lead-email";
import { issueInvitation, type IssuedInvitation } from "./internal";

/**
 * While nobody could set anything up, a link by which the first quality lead comes in; null once there is one.
 * Each call makes a new link and ends the one before.
 */
export async function inviteFirstLead({ ctx }: { ctx: Ctx }): Promise<IssuedInvitation | null> {
  requireAction(ctx.actor, "people.invite");
  return withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "people.invite", {});
    const [lead] = await tx.db
      .select({ id: people.id })
      .from(people)
      .where(and(eq(people.role, LEAD_ROLE), eq(people.state, "active")));
    if (lead) return null;

    await tx.db
      .insert(people)
      .values({
        id: uuidv7(),
        email: FIRST_LEAD_EMAIL,
        name: "First quality lead",
        role: LEAD_ROLE,
        grants: [],
        state: "invited",
      })
      .onConflictDoNothing();
    const [standIn] = await tx.db
      .select()
      .from(people)
      .where(eq(people.email, FIRST_LEAD_EMAIL))
      .for("update");
    if (!standIn) throw new Error("The first lead's stand-in is missing.");
    const invitation = await issueInvitation(tx, standIn.id);
    writeAudit(tx, {
      action: "person.invite",
      subject: { type: "person", id: standIn.id },
      after: { firstLead: true, expiresAt: invitation.expiresAt },
    });
    return invitation;
  });
}
