import "server-only";
import { and, eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { wardReturns } from "@/db/schema";
import { withBookkeeping, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { dueDate } from "@/lib/indicators/due-date";
import { dateInZone, monthInZone, type Month } from "@/lib/indicators/month";
import { hasReturn } from "@/lib/indicators/return-window";
import { findHospitalRow } from "@/lib/services/hospital";
import { getWardByCode, type Ward } from "@/lib/services/wards";

export type ReturnRow = typeof wardReturns.$inferSelect;

/** What verbs on a return need of the hospital. */
export interface HospitalDay {
  timeZone: string;
  dueDay: number;
  holidays: readonly string[];
  /** `YYYY-MM-DD` in the hospital's time zone. */
  today: string;
  thisMonth: Month;
}

export const returnNotFound = () => new DomainError("not-found", "There is no such return.");

export async function hospitalDay(ctx: Ctx): Promise<HospitalDay> {
  const row = await findHospitalRow(ctx);
  if (!row) throw new DomainError("not-found", "The hospital isn't set up yet.");
  const { timeZone, dueDay, holidays } = row;
  const today = dateInZone(ctx.now, timeZone);
  return { timeZone, dueDay, holidays, today, thisMonth: monthInZone(ctx.now, timeZone) };
}

/** The ward, where the actor may know about it and it has a return for the month; not-found otherwise. */
export async function wardWithReturn(
  ctx: Ctx,
  input: { ward: string; month: Month },
): Promise<{ ward: Ward; day: HospitalDay }> {
  const ward = await getWardByCode({ ctx, code: input.ward });
  const day = await hospitalDay(ctx);
  if (!hasReturn(ward, input.month, day.thisMonth)) throw returnNotFound();
  return { ward, day };
}

/**
 * Makes the rows of these returns where they are missing, with the day on which each is due. Bookkeeping, without an
 * audit entry: the calendar opens a return, nobody decides it.
 */
export async function openReturns(
  ctx: Ctx,
  wanted: readonly { wardId: string; month: Month }[],
  day: HospitalDay,
): Promise<void> {
  if (wanted.length === 0) return;
  const rows = wanted.map(({ wardId, month }) => ({
    id: uuidv7(),
    wardId,
    month,
    dueOn: dueDate(month, day.dueDay, day.holidays),
  }));
  await withBookkeeping(ctx, async (tx) => {
    for (let start = 0; start < rows.length; start += 500) {
      await tx.db
        .insert(wardReturns)
        .values(rows.slice(start, start + 500))
        .onConflictDoNothing({ target: [wardReturns.wardId, wardReturns.month] });
    }
  });
}

const rowOf = (wardId: string, month: Month) =>
  and(eq(wardReturns.wardId, wardId), eq(wardReturns.month, month));

/** The row of a return, opened at its first use. */
export async function readReturn(ctx: Ctx, ward: Ward, month: Month, day: HospitalDay): Promise<ReturnRow> {
  const [known] = await ctx.db.select().from(wardReturns).where(rowOf(ward.id, month));
  if (known) return known;
  await openReturns(ctx, [{ wardId: ward.id, month }], day);
  const [opened] = await ctx.db.select().from(wardReturns).where(rowOf(ward.id, month));
  if (!opened) throw new Error("The return was neither found nor opened.");
  return opened;
}

/** The row of a return, held to the end of the transaction: every change of a ward's month takes turns on it. */
export async function lockReturn(tx: TxCtx, ward: Ward, month: Month, day: HospitalDay): Promise<ReturnRow> {
  await openReturns(tx, [{ wardId: ward.id, month }], day);
  const [row] = await tx.db.select().from(wardReturns).where(rowOf(ward.id, month)).for("update");
  if (!row) throw new Error("The return was neither found nor opened.");
  return row;
}
