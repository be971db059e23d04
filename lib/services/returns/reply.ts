import "server-only";
import { cameLate, type FirstSending } from "@/lib/indicators/due-date";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { loadLines, tallyReply, type HospitalDay, type Line, type ReturnRow } from "@/lib/services/tallies";
import type { Ward } from "@/lib/services/wards";
import type { Ctx } from "@/db/transaction";

/** Late by the hospital's calendar. */
export function lateness(sending: FirstSending, day: HospitalDay): boolean {
  return cameLate(sending, day.timeZone, day.today);
}

/** A return as the API sends it, every assigned indicator in it. */
export function returnReply(
  row: ReturnRow,
  ward: Pick<Ward, "code" | "name" | "division">,
  lines: readonly Line[],
  day: HospitalDay,
): WardReturnReply {
  return {
    ward: ward.code,
    wardName: ward.name,
    division: ward.division,
    month: row.month,
    status: row.status,
    dueOn: row.dueOn,
    version: row.version,
    late: lateness(row, day),
    firstSubmittedAt: row.firstSubmittedAt?.toISOString() ?? null,
    submittedAt: row.submittedAt?.toISOString() ?? null,
    submittedBy: row.submittedBy,
    acceptedAt: row.acceptedAt?.toISOString() ?? null,
    acceptedBy: row.acceptedBy,
    reopened: row.reopened,
    reopenedReason: row.reopenedReason,
    tallies: lines.map((line) => tallyReply(line, day.today)),
  };
}

/** The reply with the lines as they stand. */
export async function currentReply(
  ctx: Ctx,
  row: ReturnRow,
  ward: Ward,
  day: HospitalDay,
): Promise<WardReturnReply> {
  return returnReply(row, ward, await loadLines(ctx.db, { wardId: ward.id, month: row.month }), day);
}
