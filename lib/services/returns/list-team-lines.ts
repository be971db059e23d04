import "server-only";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { addMonths, asMonth, monthRange, type Month } from "@/lib/indicators/month";
import { teams, type Team } from "@/lib/indicators/vocabulary";
import { mayAttempt, requireAction, typesNumerator } from "@/lib/policy";
import { hospitalDay } from "@/lib/services/tallies";

/** Months before the present one that are still looked at. */
const LOOKED_BACK = 3;

export interface TeamLine {
  ward: string;
  wardName: string;
  month: Month;
  indicator: string;
  indicatorName: string;
  isCounted: boolean;
}

interface Row {
  ward: string;
  ward_name: string;
  month: string;
  indicator: string;
  indicator_name: string;
  counted: boolean;
}

/** The team whose numerators the actor counts, or null where they count for no team alone. */
export function teamOf(actor: Ctx["actor"]): Team | null {
  // Whoever sends returns types wards' lines as well; a team's own counter doesn't.
  if (actor.kind !== "person" || mayAttempt(actor, "return.submit")) return null;
  return teams.find((team) => typesNumerator(actor, { numeratorBy: "team", team })) ?? null;
}

/** Lines of open returns whose numerators the actor's team counts, newest month first. */
export async function listTeamLines({ ctx }: { ctx: Ctx }): Promise<TeamLine[]> {
  requireAction(ctx.actor, "tally.save");
  const team = teamOf(ctx.actor);
  if (team === null) return [];
  const { thisMonth } = await hospitalDay(ctx);
  const months = monthRange(addMonths(thisMonth, -LOOKED_BACK), addMonths(thisMonth, -1));
  const rows = await selectRows<Row>(
    ctx.db,
    sql`
      select w.code as ward, w.name as ward_name, m.month, i.code as indicator, i.name as indicator_name,
        (t.numerator is not null or t.not_collected is not null) as counted
      from indicators i
      join assignments a on a.indicator_id = i.id
      join wards w on w.id = a.ward_id
      cross join json_to_recordset(${JSON.stringify(months.map((month) => ({ month })))}::json) as m(month text)
      left join ward_returns r on r.ward_id = w.id and r.month = m.month
      left join tallies t on t.ward_id = w.id and t.indicator_id = i.id and t.month = m.month
      where i.numerator_by = 'team' and i.team = ${team} and coalesce(r.status, 'open') = 'open'
        and a.from_month <= m.month and (a.to_month is null or a.to_month >= m.month)
        and w.open_from <= m.month and (w.open_to is null or w.open_to >= m.month)
      order by m.month desc, w.name, i.name`,
  );
  return rows.map((row) => ({
    ward: row.ward,
    wardName: row.ward_name,
    month: asMonth(row.month),
    indicator: row.indicator,
    indicatorName: row.indicator_name,
    isCounted: row.counted,
  }));
}
