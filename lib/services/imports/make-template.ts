import "server-only";
import { and, asc, eq, gte, isNull, lte, or } from "drizzle-orm";
import { assignments, indicators, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import type { Month } from "@/lib/indicators/month";
import { requireAction, scopeOf } from "@/lib/policy";
import { getWardByCode, wardsWithin } from "@/lib/services/wards";
import { cautionLines } from "@/lib/strings/exports";
import { writeTemplate } from "@/lib/workbook";

/** A workbook to fill in: a row for every line that the wards report in the month. */
export async function makeTemplate({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { month: Month; ward?: string | undefined };
}): Promise<Uint8Array> {
  requireAction(ctx.actor, "import.create");
  const ward = input.ward === undefined ? null : await getWardByCode({ ctx, code: input.ward });
  const { month } = input;
  const lines = await ctx.db
    .select({ ward: wards.code, indicator: indicators.code })
    .from(assignments)
    .innerJoin(wards, eq(wards.id, assignments.wardId))
    .innerJoin(indicators, eq(indicators.id, assignments.indicatorId))
    .where(
      and(
        wardsWithin(scopeOf(ctx.actor)),
        ward ? eq(wards.id, ward.id) : undefined,
        lte(assignments.fromMonth, month),
        or(isNull(assignments.toMonth), gte(assignments.toMonth, month)),
        lte(wards.openFrom, month),
        or(isNull(wards.openTo), gte(wards.openTo, month)),
      ),
    )
    .orderBy(asc(wards.name), asc(wards.code), asc(indicators.name), asc(indicators.code));
  return writeTemplate({ lines: lines.map((line) => ({ ...line, month })), cautions: cautionLines });
}
