import "server-only";
import { and, asc, eq, lte } from "drizzle-orm";
import { annotations, tallyRevisions, wardReturns } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { cameLate } from "@/lib/indicators/due-date";
import { type Month } from "@/lib/indicators/month";
import type { SeriesKey } from "@/lib/services/series";

/** What stands beside the figures of a chart's months. */
export interface MonthMarks {
  corrected: ReadonlySet<Month>;
  late: ReadonlySet<Month>;
  notes: ReadonlyMap<Month, string[]>;
}

/** Corrections, late returns and notes of one series as known at an instant. */
export async function loadMonthMarks(
  ctx: Ctx,
  { wardId, indicatorId }: SeriesKey,
  at: Date,
  timeZone: string,
): Promise<MonthMarks> {
  const corrections = await ctx.db
    .selectDistinct({ month: tallyRevisions.month })
    .from(tallyRevisions)
    .where(
      and(
        eq(tallyRevisions.wardId, wardId),
        eq(tallyRevisions.indicatorId, indicatorId),
        eq(tallyRevisions.event, "corrected"),
        lte(tallyRevisions.at, at),
      ),
    );
  const sent = await ctx.db
    .select({
      month: wardReturns.month,
      dueOn: wardReturns.dueOn,
      firstSubmittedAt: wardReturns.firstSubmittedAt,
      acceptedAt: wardReturns.acceptedAt,
    })
    .from(wardReturns)
    .where(and(eq(wardReturns.wardId, wardId), lte(wardReturns.firstSubmittedAt, at)));
  const written = await ctx.db
    .select({ month: annotations.month, text: annotations.text })
    .from(annotations)
    .where(
      and(
        eq(annotations.wardId, wardId),
        eq(annotations.indicatorId, indicatorId),
        lte(annotations.createdAt, at),
      ),
    )
    .orderBy(asc(annotations.month), asc(annotations.createdAt), asc(annotations.id));

  // Only what was sent stands here, so today's date decides nothing.
  const late = sent.filter((each) => cameLate(each, timeZone, each.dueOn));
  const notes = new Map<Month, string[]>();
  for (const { month, text } of written) notes.set(month, [...(notes.get(month) ?? []), text]);
  return {
    corrected: new Set(corrections.map((each) => each.month)),
    late: new Set(late.map((each) => each.month)),
    notes,
  };
}
