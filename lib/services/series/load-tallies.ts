import "server-only";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { asMonth } from "@/lib/indicators/month";
import type { SeriesTally } from "@/lib/indicators/series";
import { keyOf, pairTable, type SeriesKey } from "./pairs";

type Packed = [
  month: string,
  charted: boolean,
  numerator: number | null,
  denominator: number | null,
  notCollected: string | null,
  awaited: string | null,
];

interface Row {
  ward_id: string;
  indicator_id: string;
  tallies: Packed[];
}

/** Figures per series: those on the chart, or those typed so far where the month isn't on it. */
export async function loadTallies(
  ctx: Ctx,
  pairs: readonly SeriesKey[],
): Promise<Map<string, SeriesTally[]>> {
  const rows = await selectRows<Row>(
    ctx.db,
    sql`select t.ward_id, t.indicator_id,
          json_agg(json_build_array(
            t.month, t.charted,
            case when t.charted then t.charted_numerator else t.numerator end,
            case when t.charted then t.charted_denominator else coalesce(t.denominator, d.value) end,
            case when t.charted then t.charted_not_collected else t.not_collected end,
            case when t.charted then t.charted_awaited else coalesce(t.awaited, d.awaited) end
          )) as tallies
        from ${pairTable(pairs)}
        join tallies t on t.ward_id = pair.ward_id and t.indicator_id = pair.indicator_id
        join indicators i on i.id = t.indicator_id
        left join denominator_values d
          on d.ward_id = t.ward_id and d.month = t.month and d.shared_denominator_id = i.shared_denominator_id
        group by t.ward_id, t.indicator_id`,
  );
  return byKey(rows);
}

/** The same as it was known at an instant, from the revisions alone. Open returns are left out. */
export async function loadTalliesAsOf(
  ctx: Ctx,
  pairs: readonly SeriesKey[],
  asOf: Date,
): Promise<Map<string, SeriesTally[]>> {
  const rows = await selectRows<Row>(
    ctx.db,
    sql`select latest.ward_id, latest.indicator_id,
          json_agg(json_build_array(
            latest.month, latest.charted, latest.numerator, latest.denominator, latest.not_collected, latest.awaited
          )) as tallies
        from (
          select distinct on (r.ward_id, r.indicator_id, r.month) r.*
          from ${pairTable(pairs)}
          join tally_revisions r on r.ward_id = pair.ward_id and r.indicator_id = pair.indicator_id
          where r.charted is not null and r.at <= ${asOf.toISOString()}::timestamptz
          order by r.ward_id, r.indicator_id, r.month, r.at desc, r.id desc
        ) latest
        where latest.charted
        group by latest.ward_id, latest.indicator_id`,
  );
  return byKey(rows);
}

function byKey(rows: readonly Row[]): Map<string, SeriesTally[]> {
  return new Map(
    rows.map((row) => [
      keyOf({ wardId: row.ward_id, indicatorId: row.indicator_id }),
      row.tallies.map(unpack),
    ]),
  );
}

function unpack([month, charted, numerator, denominator, notCollected, awaited]: Packed): SeriesTally {
  return { month: asMonth(month), charted, numerator, denominator, notCollected, awaited };
}
