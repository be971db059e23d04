import "server-only";
import { and, eq, sql, type SQL } from "drizzle-orm";
import { wardReturns } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import type { RevisionSource } from "@/lib/indicators/vocabulary";
import { actorName } from "@/lib/policy";
import { chartTallies, keysOfReturns, type TallyKey } from "@/lib/services/tallies";

export interface Sending {
  returnIds: readonly string[];
  source: RevisionSource;
  reason?: string | null;
  importRunId?: string | null;
  /** True for lines whose figures the caller has just charted, with their revisions. */
  isCharted?: (key: TallyKey) => boolean;
}

/** True for the rows with these ids: one parameter, however many there are. */
function isChosen(returnIds: readonly string[]): SQL {
  const json = JSON.stringify(returnIds.map((id) => ({ id })));
  return sql`${wardReturns.id} in (select chosen.id from json_to_recordset(${json}::json) as chosen(id uuid))`;
}

/**
 * Sends the open ones among these returns and charts their lines, a few statements for any number. The caller has
 * locked them, decided who may and what is missing, and works the touched series out again, once for all.
 */
export async function sendReturns(
  tx: TxCtx,
  { returnIds, isCharted, ...facts }: Sending,
): Promise<TallyKey[]> {
  const sent = await tx.db
    .update(wardReturns)
    .set({
      status: "submitted",
      firstSubmittedAt: sql`coalesce(${wardReturns.firstSubmittedAt}, ${tx.now.toISOString()}::timestamptz)`,
      submittedAt: tx.now,
      submittedBy: actorName(tx.actor),
      reopened: false,
      version: sql`${wardReturns.version} + 1`,
    })
    .where(and(isChosen(returnIds), eq(wardReturns.status, "open")))
    .returning({ id: wardReturns.id });
  const keys = await keysOfReturns(
    tx,
    sent.map((row) => row.id),
  );
  const rest = isCharted ? keys.filter((key) => !isCharted(key)) : keys;
  return chartTallies(tx, { keys: rest, event: "sent", ...facts });
}

/** Accepts the submitted ones among these returns; the caller has locked them and decided who may. */
export async function acceptReturns(tx: TxCtx, returnIds: readonly string[]): Promise<number> {
  const accepted = await tx.db
    .update(wardReturns)
    .set({
      status: "accepted",
      acceptedAt: tx.now,
      acceptedBy: actorName(tx.actor),
      version: sql`${wardReturns.version} + 1`,
    })
    .where(and(isChosen(returnIds), eq(wardReturns.status, "submitted")))
    .returning({ id: wardReturns.id });
  return accepted.length;
}
