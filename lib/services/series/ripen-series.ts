import "server-only";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import { withTransaction, type Ctx } from "@/db/transaction";
import { isComplete } from "@/lib/indicators/maturity";
import { asMonth } from "@/lib/indicators/month";
import { requireAction } from "@/lib/policy";
import { writeAudit } from "@/lib/services/audit";
import { hospitalToday } from "./load-series";
import { distinctPairs, type SeriesKey } from "./pairs";
import { reevaluateSeries, type SignalChanges } from "./reevaluate-series";

export interface RipenResult extends SignalChanges {
  series: number;
}

interface Row {
  ward_id: string;
  indicator_id: string;
  month: string;
  mature_after_days: number;
}

/**
 * Takes in the months whose outcome has had its time since the series was last worked out: nothing else happens
 * on that day that would. Called every so often by the server; finds nothing most of the time.
 */
export async function ripenSeries({ ctx }: { ctx: Ctx }): Promise<RipenResult> {
  requireAction(ctx.actor, "series.rebuild");
  const today = await hospitalToday(ctx);
  const ripe = (await sentAfterNewest(ctx)).filter((row) =>
    isComplete(asMonth(row.month), row.mature_after_days, today),
  );
  const pairs: SeriesKey[] = distinctPairs(
    ripe.map((row) => ({ wardId: row.ward_id, indicatorId: row.indicator_id })),
  );
  if (pairs.length === 0) return { series: 0, born: 0, moved: 0, cameBack: 0, withdrawn: 0 };
  return withTransaction(ctx, async (tx) => {
    const changes = await reevaluateSeries(tx, { pairs, why: "trial-limits" });
    const result = { series: pairs.length, ...changes };
    writeAudit(tx, { action: "series.ripen", subject: { type: "series", id: "many" }, after: result });
    return result;
  });
}

/** Sent counts later than the newest month that their series counts so far. */
async function sentAfterNewest(ctx: Ctx): Promise<Row[]> {
  return selectRows<Row>(
    ctx.db,
    sql`select t.ward_id, t.indicator_id, t.month, i.mature_after_days
        from tallies t
        join indicators i on i.id = t.indicator_id
        left join series_state s on s.ward_id = t.ward_id and s.indicator_id = t.indicator_id
        where t.charted and t.charted_numerator is not null and t.charted_denominator > 0
          and (s.newest_month is null or t.month > s.newest_month)`,
  );
}
