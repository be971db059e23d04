import "server-only";
import { desc, lt } from "drizzle-orm";
import { auditEntries } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";

export type AuditEntry = typeof auditEntries.$inferSelect;

/** Newest first; `cursor` is the sequence number to continue below. */
export async function listAudit({ ctx, input }: { ctx: Ctx; input: { cursor?: number; limit?: number } }) {
  requireAction(ctx.actor, "audit.read");
  const limit = Math.min(input.limit ?? 100, 500);
  const items = await ctx.db
    .select()
    .from(auditEntries)
    .where(input.cursor === undefined ? undefined : lt(auditEntries.seq, input.cursor))
    .orderBy(desc(auditEntries.seq))
    .limit(limit);
  return { items, nextCursor: items.length === limit ? String(items.at(-1)?.seq) : null };
}
