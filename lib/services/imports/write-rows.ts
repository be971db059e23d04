import "server-only";
import { sql } from "drizzle-orm";
import type { TxCtx } from "@/db/transaction";
import { actorName } from "@/lib/policy";
import { selectRows } from "@/db/rows";
import type { PlannedDenominator, PlannedRow } from "./commit-plan";
import { inTurns } from "./yielding";

/** Writes the shared denominators that the rows give another value; one of another version stops the commit. */
export async function writeDenominators(
  tx: TxCtx,
  denominators: readonly PlannedDenominator[],
): Promise<void> {
  await inTurns(denominators, async (some) => {
    const rows = some.map((each) => ({
      id: each.id,
      ward_id: each.wardId,
      shared_id: each.sharedDenominatorId,
      month: each.month,
      value: each.value,
      version: each.version,
    }));
    const written = await selectRows<{ id: string }>(
      tx.db,
      sql`insert into denominator_values as d
            (id, ward_id, shared_denominator_id, month, value, version, updated_at, updated_by)
          select n.id, n.ward_id, n.shared_id, n.month, n.value, n.version + 1,
            ${tx.now.toISOString()}::timestamptz, ${actorName(tx.actor)}::text
          from json_to_recordset(${JSON.stringify(rows)}::json)
            as n(id uuid, ward_id uuid, shared_id uuid, month text, value bigint, version integer)
          on conflict (ward_id, shared_denominator_id, month) do update set
            value = excluded.value, awaited = null, version = excluded.version,
            updated_at = excluded.updated_at, updated_by = excluded.updated_by
          where d.version = excluded.version - 1
          returning d.id`,
    );
    requireAll(written.length, some.length);
  });
}

export interface RowToWrite extends PlannedRow {
  /** True where the figures go on the chart with it: the return is sent, or accepted in the same moment. */
  charted: boolean;
}

/** Writes the rows that add or replace; a tally of another version stops the commit. */
export async function writeTallies(tx: TxCtx, runId: string, rows: readonly RowToWrite[]): Promise<void> {
  await inTurns(rows, async (some) => {
    const json = JSON.stringify(some.map(({ row, tallyId, charted }) => ({ row, id: tallyId, charted })));
    const [written] = await selectRows<{ rows: number }>(
      tx.db,
      sql`with written as (
            insert into tallies as t (id, ward_id, indicator_id, month, numerator, denominator, not_collected, note,
              version, updated_at, updated_by, charted, charted_numerator, charted_denominator, charted_not_collected)
            select n.id, r.ward_id, r.indicator_id, r.month, r.numerator,
              case when i.shared_denominator_id is null then r.denominator end, r.not_collected, r.note,
              r.committed_version, ${tx.now.toISOString()}::timestamptz, ${actorName(tx.actor)}::text,
              n.charted, case when n.charted then r.numerator end, case when n.charted then r.denominator end,
              case when n.charted then r.not_collected end
            from json_to_recordset(${json}::json) as n(row integer, id uuid, charted boolean)
            join import_rows r on r.import_run_id = ${runId}::uuid and r.row = n.row
            join indicators i on i.id = r.indicator_id
            on conflict (ward_id, indicator_id, month) do update set
              numerator = excluded.numerator, denominator = excluded.denominator,
              not_collected = excluded.not_collected, awaited = null, note = coalesce(excluded.note, t.note),
              version = excluded.version, updated_at = excluded.updated_at, updated_by = excluded.updated_by,
              charted = t.charted or excluded.charted, ${chartedColumns}
            where t.version = excluded.version - 1
            returning 1
          )
          select count(*)::float8 as rows from written`,
    );
    requireAll(written?.rows ?? 0, some.length);
  });
}

/** A figure that was on the chart and wasn't awaited is corrected where it changes. */
const chartedColumns = sql`
  charted_numerator = case when excluded.charted then excluded.charted_numerator else t.charted_numerator end,
  charted_denominator = case when excluded.charted then excluded.charted_denominator else t.charted_denominator end,
  charted_not_collected = case when excluded.charted then excluded.charted_not_collected else t.charted_not_collected end,
  charted_awaited = case when excluded.charted then null else t.charted_awaited end,
  corrected = t.corrected or (excluded.charted and t.charted and t.charted_awaited is null and (
    t.charted_numerator is distinct from excluded.charted_numerator
    or t.charted_denominator is distinct from excluded.charted_denominator
    or t.charted_not_collected is distinct from excluded.charted_not_collected))`;

/** The returns are held and the versions were compared, so anything else is a writer that holds no return. */
function requireAll(written: number, wanted: number): void {
  if (written !== wanted) throw new Error(`Only ${written} of ${wanted} rows were written.`);
}
