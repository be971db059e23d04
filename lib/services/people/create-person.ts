import "server-only";
import { uuidv7 } from "uuidv7";
import { people } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, requireAction, type Role } from "@/lib/policy";
import { writeAudit } from "@/lib/services/audit";
import { hashPassword } from "@/lib/services/sessions";
import { setWards } from "./internal";

interface NewPerson {
  email: string;
  name: string;
  role: Role;
  wards: readonly string[];
  password: string;
}

/**
 * A person with a password from the start: for set-up without a mailbox, such as the demo. People are otherwise
 * invited and choose their own, so only the system itself may call it.
 */
export async function createPerson({ ctx, input }: { ctx: Ctx; input: NewPerson }) {
  requireAction(ctx.actor, "people.invite");
  if (ctx.actor.kind !== "system") throw new DomainError("forbidden", "People choose their own passwords.");
  const passwordHash = await hashPassword(input.password);
  return withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "people.invite", {});
    const [person] = await tx.db
      .insert(people)
      .values({
        id: uuidv7(),
        email: input.email.toLowerCase(),
        name: input.name,
        role: input.role,
        grants: [],
        state: "active",
        passwordHash,
      })
      .returning();
    if (!person) throw new Error("The person was not made.");
    await setWards(tx, person.id, person.role, input.wards);
    const { id, email, name, role } = person;
    writeAudit(tx, {
      action: "person.invite",
      subject: { type: "person", id },
      after: { email, name, role, wards: input.wards, state: "active" },
    });
    return person;
  });
}
