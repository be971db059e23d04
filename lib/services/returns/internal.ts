import "server-only";
import { eq } from "drizzle-orm";
import { wardReturns } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { Month } from "@/lib/indicators/month";
import { authorize, type Action } from "@/lib/policy";
import { lockReturn, wardWithReturn, type HospitalDay, type ReturnRow } from "@/lib/services/tallies";
import type { Ward } from "@/lib/services/wards";
import { returnChangeWords } from "@/lib/strings/returns";
import { currentReply } from "./reply";

export interface ReturnInput {
  ward: string;
  month: Month;
  /** The version that was seen; without one the return is taken as it stands. */
  version?: number | undefined;
}

export interface LockedReturn {
  ward: Ward;
  day: HospitalDay;
  row: ReturnRow;
}

/** What every change of a return begins with: fetch within scope, hold, decide who may, compare the version. */
export async function holdReturn(tx: TxCtx, input: ReturnInput, action: Action): Promise<LockedReturn> {
  const { ward, day } = await wardWithReturn(tx, input);
  const row = await lockReturn(tx, ward, input.month, day);
  authorize(tx.actor, action, { wardId: ward.id });
  if (input.version !== undefined && input.version !== row.version) {
    const current = await currentReply(tx, row, ward, day);
    throw new DomainError("stale", returnChangeWords.changedMeanwhile, { current });
  }
  return { ward, day, row };
}

/** Refuses a step that doesn't follow from the state that the return is in. */
export function requireStatus(row: ReturnRow, allowed: readonly ReturnRow["status"][]): void {
  if (allowed.includes(row.status)) return;
  throw new DomainError("conflict", returnChangeWords.wrongState[row.status]);
}

/** Writes new values into the held row and moves its version. */
export async function changeRow(
  tx: TxCtx,
  row: ReturnRow,
  values: Partial<Omit<ReturnRow, "id" | "version">>,
): Promise<ReturnRow> {
  const [changed] = await tx.db
    .update(wardReturns)
    .set({ ...values, version: row.version + 1 })
    .where(eq(wardReturns.id, row.id))
    .returning();
  if (!changed) throw new Error("The locked return has gone.");
  return changed;
}

/** A return's row as the audit keeps it. */
export function auditOf({ ward, row }: { ward: Ward; row: ReturnRow }) {
  return {
    ward: ward.code,
    month: row.month,
    status: row.status,
    reopened: row.reopened,
    reopenedReason: row.reopenedReason,
    firstSubmittedAt: row.firstSubmittedAt?.toISOString() ?? null,
    version: row.version,
  };
}

export const subjectOf = ({ ward, row }: { ward: Ward; row: ReturnRow }) => ({
  type: "return",
  id: `${ward.code}/${row.month}`,
});
