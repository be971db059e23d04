import "server-only";
import { and, eq, gt, isNull, ne } from "drizzle-orm";
import { invitations, people } from "@/db/schema";
import { withTransaction, type Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { AcceptInvitationInput } from "@/lib/schemas/sign-in";
import { holdsEmailName, newPassword, passwordMessages } from "@/lib/schemas/password";
import { writeAudit } from "@/lib/services/audit";
import { endSessionsOf, hashPassword } from "@/lib/services/sessions";
import { isPlaceholder } from "./first-lead-email";
import { requireFreeEmail, tokenHash } from "./internal";

/** What the page of a link may show; the token itself is the right to see it. */
export interface OpenInvitation {
  personId: string;
  /** Null for the first quality lead, who says who they are. */
  email: string | null;
  name: string | null;
}

const gone = () =>
  new DomainError("not-found", "This link was used already or is too old. Ask a quality lead for a new one.");

/** Rules on a new password that need the address; the length and the list are the schema's. */
function requireGoodPassword(password: string, email: string): void {
  const parsed = newPassword.safeParse(password);
  const message = parsed.success
    ? holdsEmailName(password, email) && passwordMessages.holdsEmail
    : (parsed.error.issues[0]?.message ?? passwordMessages.missing);
  if (message) throw new DomainError("invalid", message, { errors: [{ path: "password", message }] });
}

export async function findInvitation({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { token: string };
}): Promise<OpenInvitation | null> {
  const [row] = await ctx.db
    .select({ personId: people.id, email: people.email, name: people.name })
    .from(invitations)
    .innerJoin(people, eq(people.id, invitations.personId))
    .where(
      and(
        eq(invitations.tokenHash, tokenHash(input.token)),
        isNull(invitations.usedAt),
        gt(invitations.expiresAt, ctx.now),
        ne(people.state, "off"),
      ),
    );
  if (!row) return null;
  return isPlaceholder(row.email) ? { personId: row.personId, email: null, name: null } : row;
}

/**
 * Sets the password by a link that works once. For somebody who had one, all sessions under the old one end. No
 * role is asked: the token is the right.
 */
export async function acceptInvitation({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: AcceptInvitationInput;
}): Promise<{ email: string }> {
  const open = await findInvitation({ ctx, input });
  if (!open) throw gone();
  const email = open.email ?? input.email;
  const name = open.name ?? input.name;
  if (email === undefined || name === undefined) {
    throw new DomainError("invalid", "Give your name and your hospital email.", {
      errors: [{ path: email === undefined ? "email" : "name", message: "Fill this in." }],
    });
  }
  requireGoodPassword(input.password, email);
  const passwordHash = await hashPassword(input.password);

  // eslint-disable-next-line house/guarded-transaction -- whoever accepts has no role yet; the token is the right
  return withTransaction(ctx, async (tx) => {
    const taken = await tx.db
      .update(invitations)
      .set({ usedAt: tx.now })
      .where(and(eq(invitations.tokenHash, tokenHash(input.token)), isNull(invitations.usedAt)))
      .returning({ id: invitations.id });
    const [before] = await tx.db.select().from(people).where(eq(people.id, open.personId)).for("update");
    if (taken.length === 0 || !before || before.state === "off") throw gone();
    if (email !== before.email) await requireFreeEmail(tx.db, email);

    const [after] = await tx.db
      .update(people)
      .set({ email, name, passwordHash, state: "active", version: before.version + 1 })
      .where(eq(people.id, before.id))
      .returning();
    const sessionsEnded = await endSessionsOf(tx, before.id, "new-password");
    writeAudit(tx, {
      action: "person.accept-invitation",
      subject: { type: "person", id: before.id },
      before,
      after: { ...after, sessionsEnded },
    });
    return { email };
  });
}
