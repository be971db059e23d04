import "server-only";
import { asc, sql } from "drizzle-orm";
import { wards } from "@/db/schema";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { asMonth, type Month } from "@/lib/indicators/month";
import { scopeOf } from "@/lib/policy";
import { effectiveDenominator, isAnswered, joinDenominator } from "@/lib/services/tallies";
import { wardsWithin } from "@/lib/services/wards";
import type { WrittenTally } from "@/lib/workbook";

export interface TallyFilter {
  from?: Month | undefined;
  to?: Month | undefined;
  wardId?: string | undefined;
  indicatorId?: string | undefined;
}

type Packed = [
  indicator: string,
  month: string,
  numerator: number | null,
  denominator: number | null,
  notCollected: string | null,
  note: string | null,
];

/** The lines that say something, ward by ward, so that no statement holds up the database for long. */
export async function readTallies(ctx: Ctx, filter: TallyFilter): Promise<WrittenTally[]> {
  const wardRows = await ctx.db
    .select({ id: wards.id, code: wards.code })
    .from(wards)
    .where(wardsWithin(scopeOf(ctx.actor)))
    .orderBy(asc(wards.name), asc(wards.code));
  const tallies: WrittenTally[] = [];
  for (const ward of wardRows) {
    if (filter.wardId !== undefined && filter.wardId !== ward.id) continue;
    for (const packed of await readWard(ctx, ward.id, filter)) tallies.push(unpack(ward.code, packed));
  }
  return tallies;
}

/** With nothing to count, a numerator left blank is written as 0: blank would read as half filled. */
async function readWard(ctx: Ctx, wardId: string, { from, to, indicatorId }: TallyFilter): Promise<Packed[]> {
  const [row] = await selectRows<{ tallies: Packed[] | null }>(
    ctx.db,
    sql`select json_agg(json_build_array(
            i.code, t.month,
            case when ${effectiveDenominator} = 0 then coalesce(t.numerator, 0) else t.numerator end,
            case when t.not_collected is null then ${effectiveDenominator} end,
            t.not_collected, t.note
          ) order by t.month, i.name, i.code) as tallies
        from tallies t
        join indicators i on i.id = t.indicator_id
        join wards w on w.id = t.ward_id
        join assignments a on a.ward_id = t.ward_id and a.indicator_id = t.indicator_id
        ${joinDenominator}
        where t.ward_id = ${wardId}::uuid and ${isAnswered}
          and (t.not_collected is not null or ${effectiveDenominator} is not null)
          and (${from ?? null}::text is null or t.month >= ${from ?? null}::text)
          and (${to ?? null}::text is null or t.month <= ${to ?? null}::text)
          and (${indicatorId ?? null}::uuid is null or t.indicator_id = ${indicatorId ?? null}::uuid)
          and t.month >= a.from_month and t.month <= coalesce(a.to_month, t.month)
          and t.month >= w.open_from and t.month <= coalesce(w.open_to, t.month)`,
  );
  return row?.tallies ?? [];
}

function unpack(
  ward: string,
  [indicator, month, numerator, denominator, notCollected, note]: Packed,
): WrittenTally {
  const isCount = notCollected === null;
  return {
    ward,
    indicator,
    month: asMonth(month),
    numerator: isCount ? numerator : null,
    denominator: isCount ? denominator : null,
    notCollected,
    note,
  };
}
