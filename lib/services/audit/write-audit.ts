import "server-only";
import type { AuditDraft } from "@/db/audit-chain";
import type { TxCtx } from "@/db/transaction";
import type { AuditAction } from "./audit-actions";

/**
 * Notes a change for the audit. Entries are appended at the end of the transaction that `ctx` is in, so they
 * stand or fall with the change. Several rows of one bulk change are one entry with counts.
 */
export function writeAudit(ctx: TxCtx, draft: Omit<AuditDraft, "action"> & { action: AuditAction }): void {
  ctx.audit.push(draft);
}
