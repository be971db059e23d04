import "server-only";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { TxCtx } from "@/db/transaction";
import { asMonth } from "@/lib/indicators/month";
import { effectiveAwaited, effectiveDenominator, isAnswered, joinDenominator } from "./effective";
import { inChunks, keyTable, type TallyKey } from "./keys";
import { addRevisions, type RevisionFacts, type RevisionKey } from "./revisions";

interface ChartedRow {
  ward_id: string;
  indicator_id: string;
  month: string;
  charted: boolean;
}

/**
 * Puts the figures of these lines, as they stand now, on their charts, with a revision each. Lines that say nothing
 * yet are left off, or come off where an earlier sending had charted them. Set-based: a few statements for any
 * number of lines. Answers the lines touched; working their series out again is the caller's, once for all.
 */
export async function chartTallies(
  tx: TxCtx,
  { keys, ...facts }: { keys: readonly TallyKey[] } & RevisionFacts,
): Promise<TallyKey[]> {
  const touched: RevisionKey[] = [];
  await inChunks(keys, async (chunk) => {
    const rows = await selectRows<ChartedRow>(
      tx.db,
      sql`
        update tallies t set
          charted = e.answered,
          charted_numerator = case when e.answered and t.not_collected is null then t.numerator end,
          charted_denominator = case when e.answered and t.not_collected is null then e.denominator end,
          charted_not_collected = case when e.answered then t.not_collected end,
          charted_awaited = case when e.answered and t.not_collected is null then e.awaited end,
          corrected = t.corrected or (
            t.charted and t.charted_awaited is null and (
              t.charted_numerator is distinct from case when t.not_collected is null then t.numerator end
              or t.charted_denominator is distinct from case when t.not_collected is null then e.denominator end
              or t.charted_not_collected is distinct from t.not_collected
            )
          )
        from (
          select t.id, ${effectiveDenominator} as denominator, ${effectiveAwaited} as awaited, ${isAnswered} as answered
          from ${keyTable(chunk)}
          join tallies t on t.ward_id = k.ward_id and t.indicator_id = k.indicator_id and t.month = k.month
          join indicators i on i.id = t.indicator_id
          ${joinDenominator}
        ) e
        where e.id = t.id and (e.answered or t.charted)
        returning t.ward_id, t.indicator_id, t.month, t.charted`,
    );
    for (const row of rows) touched.push({ ...keyOfRow(row), charted: row.charted });
  });
  await addRevisions(tx, touched, facts);
  return touched;
}

/** Takes the lines of these returns off their charts, with a revision each: a recall. */
export async function unchartTallies(
  tx: TxCtx,
  { keys, ...facts }: { keys: readonly TallyKey[] } & RevisionFacts,
): Promise<TallyKey[]> {
  const touched: RevisionKey[] = [];
  await inChunks(keys, async (chunk) => {
    const rows = await selectRows<ChartedRow>(
      tx.db,
      sql`
        update tallies t set charted = false, charted_numerator = null, charted_denominator = null,
          charted_not_collected = null, charted_awaited = null
        from ${keyTable(chunk)}
        where t.ward_id = k.ward_id and t.indicator_id = k.indicator_id and t.month = k.month and t.charted
        returning t.ward_id, t.indicator_id, t.month, t.charted`,
    );
    for (const row of rows) touched.push({ ...keyOfRow(row), charted: false });
  });
  await addRevisions(tx, touched, facts);
  return touched;
}

/** The saved lines of these returns that their wards are assigned. */
export async function keysOfReturns(tx: TxCtx, returnIds: readonly string[]): Promise<TallyKey[]> {
  const rows = await selectRows<Omit<ChartedRow, "charted">>(
    tx.db,
    sql`
      select t.ward_id, t.indicator_id, t.month
      from json_to_recordset(${JSON.stringify(returnIds.map((id) => ({ id })))}::json) as chosen(id uuid)
      join ward_returns r on r.id = chosen.id
      join tallies t on t.ward_id = r.ward_id and t.month = r.month
      join assignments a on a.ward_id = t.ward_id and a.indicator_id = t.indicator_id
        and a.from_month <= t.month and (a.to_month is null or a.to_month >= t.month)
      order by t.ward_id, t.month, t.indicator_id`,
  );
  return rows.map(keyOfRow);
}

function keyOfRow(row: Omit<ChartedRow, "charted">): TallyKey {
  return { wardId: row.ward_id, indicatorId: row.indicator_id, month: asMonth(row.month) };
}
