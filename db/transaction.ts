import type { Actor } from "@/lib/policy";
import { appendAudit, type AuditDraft } from "./audit-chain";
import type { Db } from "./client";

/** What every verb and read is given. Verbs read `now`, never the clock. */
export interface Ctx {
  actor: Actor;
  db: Db;
  now: Date;
  requestId: string;
}

/** A ctx inside a transaction: its `db` is the transaction, and audit entries collect in it. */
export interface TxCtx extends Ctx {
  readonly audit: AuditDraft[];
}

export function isInTransaction(ctx: Ctx): ctx is TxCtx {
  return "audit" in ctx;
}

/**
 * Runs work in one transaction, or joins the one that the ctx is in. The outermost appends the collected audit
 * entries last; a failed append rolls everything back. Inside, use the
 * ctx that is handed in: the outer `db` would wait for this transaction for ever on the embedded database.
 */
export async function withTransaction<Result>(
  ctx: Ctx,
  work: (tx: TxCtx) => Promise<Result>,
): Promise<Result> {
  if (isInTransaction(ctx)) return work(ctx);
  return ctx.db.transaction(async (db) => {
    const tx: TxCtx = { ...ctx, db, audit: [] };
    const result = await work(tx);
    if (tx.audit.length > 0) await appendAudit(db, tx, tx.audit);
    return result;
  });
}

/** For sessions, throttle and other bookkeeping that is no change of a record: a transaction without audit. */
export async function withBookkeeping<Result>(ctx: Ctx, work: (tx: Ctx) => Promise<Result>): Promise<Result> {
  if (isInTransaction(ctx)) return work(ctx);
  return ctx.db.transaction(async (db) => work({ ...ctx, db }));
}
