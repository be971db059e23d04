import "server-only";
import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { people } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction } from "@/lib/policy";
import type { InvitePersonInput, PersonRecord } from "@/lib/schemas/person";
import { writeAudit } from "@/lib/services/audit";
import {
  issueInvitation,
  requireFreeEmail,
  requireGrantable,
  setWards,
  type IssuedInvitation,
} from "./internal";
import { toRecords } from "./queries";

export interface InvitedPerson {
  person: PersonRecord;
  invitation: IssuedInvitation;
}

/** Adds somebody who can't sign in yet, with a link to choose a password. */
export async function invitePerson({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: InvitePersonInput;
}): Promise<InvitedPerson> {
  requireAction(ctx.actor, "people.invite");
  requireGrantable(input.role, input.grants);
  return withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "people.invite", {});
    await requireFreeEmail(tx.db, input.email);
    const { email, name, role, grants } = input;
    const [row] = await tx.db
      .insert(people)
      .values({ id: uuidv7(), email, name, role, grants, state: "invited" })
      .returning();
    if (!row) throw new Error("A person was not added.");
    await setWards(tx, row.id, role, input.wards);
    const invitation = await issueInvitation(tx, row.id);
    const [person] = await toRecords(tx.db, [row]);
    if (!person) throw new Error("A person can't be read back.");
    writeAudit(tx, { action: "person.invite", subject: { type: "person", id: row.id }, after: person });
    return { person, invitation };
  });
}

/** A new link for somebody who lost theirs or forgot the password. A password in use holds until the link is taken. */
export async function inviteAgain({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { id: string };
}): Promise<InvitedPerson> {
  requireAction(ctx.actor, "people.invite");
  return withTransaction(ctx, async (tx) => {
    const [row] = await tx.db.select().from(people).where(eq(people.id, input.id)).for("update");
    if (!row) throw new DomainError("not-found", "There is no such person.");
    authorize(tx.actor, "people.invite", {});
    if (row.state === "off")
      throw new DomainError("precondition", `${row.name} is switched off. Switch on first.`);
    const invitation = await issueInvitation(tx, row.id);
    const [person] = await toRecords(tx.db, [row]);
    if (!person) throw new Error("A person can't be read back.");
    writeAudit(tx, {
      action: "person.invite",
      subject: { type: "person", id: row.id },
      after: { again: true, expiresAt: invitation.expiresAt },
    });
    return { person, invitation };
  });
}
