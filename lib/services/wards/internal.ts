import "server-only";
import { and, asc, eq, gt, lt, or } from "drizzle-orm";
import type { Db } from "@/db/client";
import { tallies, wards } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { inWords, longMonth } from "@/lib/indicators/chart-format";
import type { Month } from "@/lib/indicators/month";

export const wardNotFound = () => new DomainError("not-found", "There is no such ward.");

/** Fetches a ward and holds it until the transaction ends; the caller's action is a lead's, so no scope applies. */
export async function lockWard(tx: TxCtx, code: string): Promise<typeof wards.$inferSelect> {
  const [ward] = await tx.db.select().from(wards).where(eq(wards.code, code.toUpperCase())).for("update");
  if (!ward) throw wardNotFound();
  return ward;
}

/**
 * Months outside `from`–`to` in which the ward (for one indicator, or any) has figures on its chart. They would
 * vanish from sight if the months were cut, so the change is refused instead. At most a few are named.
 */
export async function sentMonthsOutside(
  db: Db,
  series: { wardId: string; indicatorId?: string },
  { from, to }: { from: Month; to: Month | null },
): Promise<Month[]> {
  const rows = await db
    .selectDistinct({ month: tallies.month })
    .from(tallies)
    .where(
      and(
        eq(tallies.wardId, series.wardId),
        series.indicatorId === undefined ? undefined : eq(tallies.indicatorId, series.indicatorId),
        eq(tallies.charted, true),
        or(lt(tallies.month, from), to === null ? undefined : gt(tallies.month, to)),
      ),
    )
    .orderBy(asc(tallies.month))
    .limit(6);
  return rows.map((row) => row.month);
}

/** Refuses a cut of months that would hide figures that were sent. */
export function refuseHidingSent(
  months: readonly Month[],
  from: Month,
  fields: { from: string; to: string } = { from: "from", to: "to" },
): void {
  const [first] = months;
  if (first === undefined) return;
  const named = inWords([...months.slice(0, 5).map(longMonth), ...(months.length > 5 ? ["more"] : [])]);
  const message = `Counts that were sent would fall outside these months: ${named}.`;
  throw new DomainError("conflict", message, {
    errors: [{ path: first < from ? fields.from : fields.to, message }],
  });
}
