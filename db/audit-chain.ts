import { createHash } from "node:crypto";
import { eq } from "drizzle-orm";
import type { Actor } from "@/lib/policy";
import type { Db } from "./client";
import { auditEntries, auditHead } from "./schema";

/** What a verb says of a change; `before` and `after` are plain records without secrets. */
export interface AuditDraft {
  action: string;
  subject: { type: string; id: string };
  before?: unknown;
  after?: unknown;
}

export interface ChainedEntry {
  seq: number;
  at: string;
  actorKind: string;
  actorId: string | null;
  actorName: string;
  action: string;
  subjectType: string;
  subjectId: string;
  before: string | null;
  after: string | null;
  requestId: string;
}

export const FIRST_HASH = "0".repeat(64);

/** SHA-256 over the hash before and the entry's canonical text: a JSON array in fixed order, not an object. */
export function entryHash(previousHash: string, entry: ChainedEntry): string {
  const fields = [
    previousHash,
    entry.seq,
    entry.at,
    entry.actorKind,
    entry.actorId,
    entry.actorName,
    entry.action,
    entry.subjectType,
    entry.subjectId,
    entry.before,
    entry.after,
    entry.requestId,
  ];
  return createHash("sha256").update(JSON.stringify(fields)).digest("hex");
}

/** Names never written to the audit, whatever record they stand in. */
const SECRET_FIELDS = new Set(["passwordHash", "tokenHash", "password", "token"]);

function canonicalText(value: unknown): string | null {
  if (value === undefined || value === null) return null;
  return JSON.stringify(value, (key, inner: unknown) => (SECRET_FIELDS.has(key) ? undefined : inner));
}

/** Appends entries to the chain. Called last in a transaction, so that the head is locked only briefly. */
export async function appendAudit(
  tx: Db,
  who: { actor: Actor; now: Date; requestId: string },
  drafts: readonly AuditDraft[],
): Promise<void> {
  const [head] = await tx.select().from(auditHead).where(eq(auditHead.id, 1)).for("update");
  if (!head) throw new Error("The audit chain has no head.");
  let { seq, hash } = head;
  const rows = drafts.map((draft) => {
    const entry: ChainedEntry = {
      seq: (seq += 1),
      at: who.now.toISOString(),
      ...actorFields(who.actor),
      action: draft.action,
      subjectType: draft.subject.type,
      subjectId: draft.subject.id,
      before: canonicalText(draft.before),
      after: canonicalText(draft.after),
      requestId: who.requestId,
    };
    const previousHash = hash;
    hash = entryHash(previousHash, entry);
    return { ...entry, at: who.now, previousHash, hash };
  });
  await tx.insert(auditEntries).values(rows);
  await tx.update(auditHead).set({ seq, hash }).where(eq(auditHead.id, 1));
}

function actorFields(actor: Actor): Pick<ChainedEntry, "actorKind" | "actorId" | "actorName"> {
  if (actor.kind === "person") return { actorKind: "person", actorId: actor.personId, actorName: actor.name };
  if (actor.kind === "system") return { actorKind: "system", actorId: null, actorName: actor.name };
  return { actorKind: "anonymous", actorId: null, actorName: "not signed in" };
}
