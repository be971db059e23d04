import "server-only";
import { asc, sql } from "drizzle-orm";
import { wardReturns } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import { monthKey } from "@/lib/indicators/import-facts";
import { hospitalDay, openReturns, type ReturnRow } from "@/lib/services/tallies";
import { monthTable, type WardMonth } from "./load-facts";

/**
 * The returns of these wards and months, opened where they are missing and held to the end of the transaction, in one
 * order for everybody: each change of a ward's month takes turns on its return.
 */
export async function holdReturns(tx: TxCtx, months: readonly WardMonth[]): Promise<Map<string, ReturnRow>> {
  await openReturns(tx, months, await hospitalDay(tx));
  const rows = await tx.db
    .select()
    .from(wardReturns)
    .where(
      sql`(${wardReturns.wardId}, ${wardReturns.month}) in (select ward_id, month from ${monthTable(months)})`,
    )
    .orderBy(asc(wardReturns.wardId), asc(wardReturns.month))
    .for("update");
  return new Map(rows.map((row) => [monthKey(row.wardId, row.month), row]));
}
