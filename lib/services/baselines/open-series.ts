import "server-only";
import { and, eq } from "drizzle-orm";
import { tallies } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { authorize, type Action } from "@/lib/policy";
import { findAssignment } from "@/lib/services/assignments";
import { getIndicatorByCode, type IndicatorDetail } from "@/lib/services/indicators";
import type { SeriesKey } from "@/lib/services/series";
import { getWardByCode, type Ward } from "@/lib/services/wards";

export interface OpenSeries {
  ward: Ward;
  indicator: IndicatorDetail;
  key: SeriesKey;
}

/** A ward's indicator by codes, within the actor's scope; a pair that was never counted isn't there. */
export async function openSeries(
  ctx: Ctx,
  action: Action,
  codes: { ward: string; indicator: string },
): Promise<OpenSeries> {
  const ward = await getWardByCode({ ctx, code: codes.ward });
  authorize(ctx.actor, action, { wardId: ward.id });
  const indicator = await getIndicatorByCode({ ctx, code: codes.indicator });
  const key = { wardId: ward.id, indicatorId: indicator.id };
  const assignment = await findAssignment({ ctx, ...key });
  if (!assignment && !(await hasTally(ctx, key)))
    throw new DomainError("not-found", "There is no such chart.");
  return { ward, indicator, key };
}

async function hasTally(ctx: Ctx, { wardId, indicatorId }: SeriesKey): Promise<boolean> {
  const rows = await ctx.db
    .select({ id: tallies.id })
    .from(tallies)
    .where(and(eq(tallies.wardId, wardId), eq(tallies.indicatorId, indicatorId)))
    .limit(1);
  return rows.length > 0;
}
