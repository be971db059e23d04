import "server-only";
import type { Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";
import type { AuditPage } from "@/lib/schemas/audit";
import { listAudit, type AuditEntry } from "./list-audit";
import { verifyChain } from "./verify-chain";

interface Read {
  ctx: Ctx;
  input: { cursor?: number; limit?: number };
}

/** A page of the record of changes for the reader, with the verdict on the whole chain. */
export async function getAuditPage({ ctx, input }: Read): Promise<AuditPage> {
  requireAction(ctx.actor, "audit.read");
  const chain = await verifyChain({ ctx });
  const { items, nextCursor } = await listAudit({ ctx, input });
  return { items: items.map(toReply), nextCursor, chain };
}

function toReply(entry: AuditEntry): AuditPage["items"][number] {
  return {
    seq: entry.seq,
    at: entry.at.toISOString(),
    actor: { kind: entry.actorKind, id: entry.actorId, name: entry.actorName },
    action: entry.action,
    subjectType: entry.subjectType,
    subjectId: entry.subjectId,
    before: parsed(entry.before),
    after: parsed(entry.after),
    requestId: entry.requestId,
    hash: entry.hash,
  };
}

/** Entries hold JSON text; one that was altered by hand may not, and is shown as it is. */
function parsed(text: string | null): unknown {
  if (text === null) return null;
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return text;
  }
}
