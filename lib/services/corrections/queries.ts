import "server-only";
import { and, desc, eq, lt, type SQL } from "drizzle-orm";
import type { Db } from "@/db/client";
import { corrections, indicators, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { requireAction, scopeOf, type Scope } from "@/lib/policy";
import type { CorrectionListQuery, CorrectionReply } from "@/lib/schemas/correction";
import { getWardByCode, wardsWithin } from "@/lib/services/wards";

export type Correction = typeof corrections.$inferSelect;

const DEFAULT_PAGE = 100;

/** Corrections asked for in the actor's wards, newest first. Ids are ordered by time and serve as cursor. */
export async function listCorrections({ ctx, input }: { ctx: Ctx; input: CorrectionListQuery }) {
  requireAction(ctx.actor, "tally.history");
  // A ward outside the scope is not there, rather than an empty list.
  const ward = input.ward === undefined ? undefined : await getWardByCode({ ctx, code: input.ward });
  const limit = input.limit ?? DEFAULT_PAGE;
  const items = await select(
    ctx.db,
    scopeOf(ctx.actor),
    and(
      input.state ? eq(corrections.state, input.state) : undefined,
      ward && eq(wards.id, ward.id),
      input.cursor && isId(input.cursor) ? lt(corrections.id, input.cursor) : undefined,
    ),
    limit,
  );
  return { items, nextCursor: items.length === limit ? (items.at(-1)?.id ?? null) : null };
}

export async function correctionById(db: Db, scope: Scope, id: string): Promise<CorrectionReply | null> {
  const [found] = await select(db, scope, eq(corrections.id, id), 1);
  return found ?? null;
}

async function select(
  db: Db,
  scope: Scope,
  where: SQL | undefined,
  limit: number,
): Promise<CorrectionReply[]> {
  const rows = await db
    .select({ correction: corrections, ward: wards, indicator: indicators })
    .from(corrections)
    .innerJoin(wards, eq(wards.id, corrections.wardId))
    .innerJoin(indicators, eq(indicators.id, corrections.indicatorId))
    .where(and(wardsWithin(scope), where))
    .orderBy(desc(corrections.id))
    .limit(limit);
  return rows.map(({ correction, ward, indicator }) => correctionReply(correction, ward, indicator));
}

export function correctionReply(
  correction: Correction,
  ward: { code: string; name: string },
  indicator: { code: string; name: string },
): CorrectionReply {
  return {
    id: correction.id,
    ward: ward.code,
    wardName: ward.name,
    indicator: indicator.code,
    indicatorName: indicator.name,
    month: correction.month,
    numerator: correction.numerator,
    denominator: correction.denominator,
    reason: correction.reason,
    state: correction.state,
    askedBy: correction.askedBy,
    askedAt: correction.askedAt.toISOString(),
    decidedBy: correction.decidedBy,
    decidedAt: correction.decidedAt?.toISOString() ?? null,
    decisionReason: correction.decisionReason,
    version: correction.version,
  };
}

const isId = (text: string): boolean => /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text);
