import "server-only";
import { asc, eq } from "drizzle-orm";
import { indicators, sharedDenominators } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";
import {
  hasTallies,
  indicatorNotFound,
  loadDetails,
  type IndicatorDetail,
  type SharedDenominator,
} from "./internal";

/** Every indicator, by name. What is counted is the same for all wards, so no scope applies. */
export async function listIndicators({ ctx }: { ctx: Ctx }): Promise<IndicatorDetail[]> {
  requireAction(ctx.actor, "indicator.list");
  return loadDetails(ctx.db);
}

export async function getIndicatorByCode({
  ctx,
  code,
}: {
  ctx: Ctx;
  code: string;
}): Promise<IndicatorDetail> {
  requireAction(ctx.actor, "indicator.list");
  const [detail] = await loadDetails(ctx.db, eq(indicators.code, code.toUpperCase()));
  if (!detail) throw indicatorNotFound();
  return detail;
}

/** True once the indicator has counts, typed or sent: its kind and its shared denominator are then fixed. */
export async function isCounted({ ctx, indicatorId }: { ctx: Ctx; indicatorId: string }): Promise<boolean> {
  requireAction(ctx.actor, "indicator.list");
  return hasTallies(ctx.db, indicatorId);
}

export async function listSharedDenominators({ ctx }: { ctx: Ctx }): Promise<SharedDenominator[]> {
  requireAction(ctx.actor, "indicator.list");
  return ctx.db.select().from(sharedDenominators).orderBy(asc(sharedDenominators.code));
}
