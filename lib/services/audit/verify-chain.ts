import "server-only";
import { asc, eq, gt } from "drizzle-orm";
import { entryHash, FIRST_HASH } from "@/db/audit-chain";
import { auditEntries, auditHead } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";

export interface ChainVerdict {
  intact: boolean;
  entries: number;
  /** Sequence number of the first entry that doesn't fit, or null. */
  brokenAt: number | null;
  headHash: string;
}

const BATCH = 2_000;

/**
 * Recomputes the whole chain. Finds a changed, removed or inserted entry, and a cut tail by the head kept apart.
 * Somebody who rewrites both can't be found from inside: compare `headHash` with one noted elsewhere.
 */
export async function verifyChain({ ctx }: { ctx: Ctx }): Promise<ChainVerdict> {
  requireAction(ctx.actor, "audit.read");
  let previousHash = FIRST_HASH;
  let seq = 0;
  let awaitedSeq = 0;
  for (;;) {
    const rows = await ctx.db
      .select()
      .from(auditEntries)
      .where(gt(auditEntries.seq, seq))
      .orderBy(asc(auditEntries.seq))
      .limit(BATCH);
    for (const row of rows) {
      const expected = entryHash(previousHash, { ...row, at: row.at.toISOString() });
      const fits = row.seq === seq + 1 && row.previousHash === previousHash && row.hash === expected;
      if (!fits) return { intact: false, entries: seq, brokenAt: seq + 1, headHash: previousHash };
      previousHash = row.hash;
      seq = row.seq;
    }
    if (rows.length === BATCH) continue;
    const [head] = await ctx.db.select().from(auditHead).where(eq(auditHead.id, 1));
    // Others write meanwhile: what came since the last batch is read before the head decides.
    if (head && head.seq > Math.max(seq, awaitedSeq)) {
      awaitedSeq = head.seq;
      continue;
    }
    const intact = head?.seq === seq && head.hash === previousHash;
    return { intact, entries: seq, brokenAt: intact ? null : seq + 1, headHash: previousHash };
  }
}
