import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { tallyRevisions } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import type { Month } from "@/lib/indicators/month";
import { authorize, requireAction } from "@/lib/policy";
import type { TallyHistory, TallyRevision } from "@/lib/schemas/tally";
import { loadLines, tallyReply } from "./lines";
import { wardWithReturn } from "./return-row";
import { findLine } from "./save-tally";

interface Read {
  ctx: Ctx;
  input: { ward: string; month: Month; indicator: string };
}

/** Every value that one line ever had, oldest first. */
export async function getTallyHistory({ ctx, input }: Read): Promise<TallyHistory> {
  requireAction(ctx.actor, "tally.history");
  const { ward, day } = await wardWithReturn(ctx, input);
  authorize(ctx.actor, "tally.history", { wardId: ward.id });
  const line = findLine(await loadLines(ctx.db, { wardId: ward.id, month: input.month }), input.indicator);
  const rows = await ctx.db
    .select()
    .from(tallyRevisions)
    .where(
      and(
        eq(tallyRevisions.wardId, ward.id),
        eq(tallyRevisions.indicatorId, line.indicator.id),
        eq(tallyRevisions.month, input.month),
      ),
    )
    .orderBy(asc(tallyRevisions.at), asc(tallyRevisions.id));
  return {
    ward: ward.code,
    wardName: ward.name,
    month: input.month,
    tally: tallyReply(line, day.today),
    items: rows.map(revisionReply),
  };
}

function revisionReply(row: typeof tallyRevisions.$inferSelect): TallyRevision {
  return {
    event: row.event,
    charted: row.charted,
    numerator: row.numerator,
    denominator: row.denominator,
    notCollected: row.notCollected,
    awaited: row.awaited,
    note: row.note,
    version: row.tallyVersion,
    source: row.source,
    reason: row.reason,
    by: row.actorName,
    at: row.at.toISOString(),
  };
}
