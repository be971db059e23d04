import "server-only";
import { createHash, randomBytes } from "node:crypto";
import { and, asc, eq, isNull } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { invitations, people, personWards } from "@/db/schema";
import type { Db } from "@/db/client";
import type { TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { hasNamedWards, LEAD_ROLE, mayHoldGrants, type Grant, type Role } from "@/lib/policy";
import { wardIdsOf } from "./queries";

const DAY = 24 * 60 * 60 * 1000;
const INVITATION_LIFE = 7 * DAY;
const TOKEN_BYTES = 32;

export interface IssuedInvitation {
  /** Shown once; only its hash is kept. */
  token: string;
  expiresAt: Date;
}

export function tokenHash(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** A new link for a person; links made earlier stop working. */
export async function issueInvitation(tx: TxCtx, personId: string): Promise<IssuedInvitation> {
  const token = randomBytes(TOKEN_BYTES).toString("base64url");
  const expiresAt = new Date(tx.now.valueOf() + INVITATION_LIFE);
  await tx.db
    .update(invitations)
    .set({ usedAt: tx.now })
    .where(and(eq(invitations.personId, personId), isNull(invitations.usedAt)));
  await tx.db
    .insert(invitations)
    .values({ id: uuidv7(), personId, tokenHash: tokenHash(token), createdAt: tx.now, expiresAt });
  return { token, expiresAt };
}

/** Wards of a person whose role has named ones; everybody else's come with the role. */
export async function setWards(
  tx: TxCtx,
  personId: string,
  role: Role,
  codes: readonly string[],
): Promise<void> {
  const wardIds = hasNamedWards(role) ? await wardIdsOf(tx.db, codes) : [];
  await tx.db.delete(personWards).where(eq(personWards.personId, personId));
  if (wardIds.length > 0) {
    await tx.db.insert(personWards).values(wardIds.map((wardId) => ({ personId, wardId })));
  }
}

export function requireGrantable(role: Role, grants: readonly Grant[]): void {
  if (mayHoldGrants(role) || grants.length === 0) return;
  const message = "A board member can't be given extra powers.";
  throw new DomainError("invalid", message, { errors: [{ path: "grants", message }] });
}

/** Locks the active quality leads, in one order, so that two of them can't switch each other off at once. */
export async function lockActiveLeads(db: Db): Promise<string[]> {
  const rows = await db
    .select({ id: people.id })
    .from(people)
    .where(and(eq(people.role, LEAD_ROLE), eq(people.state, "active")))
    .orderBy(asc(people.id))
    .for("update");
  return rows.map((row) => row.id);
}

export async function requireFreeEmail(db: Db, email: string): Promise<void> {
  const [taken] = await db.select({ id: people.id }).from(people).where(eq(people.email, email));
  if (!taken) return;
  const message = "Somebody with this email is here already.";
  throw new DomainError("conflict", message, { errors: [{ path: "email", message }] });
}
