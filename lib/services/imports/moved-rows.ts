import "server-only";
import { sql, type SQL } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { monthKey } from "@/lib/indicators/import-facts";
import type { ReturnRow } from "@/lib/services/tallies";
import { importWords, monthName } from "@/lib/strings/imports";
import type { CommitPlan } from "./commit-plan";

/** Rows named in a refusal; there may be more. */
const MAX_NAMED = 50;

export interface NamedRow {
  row: number;
  ward: string;
  indicator: string;
  month: string;
  total: number;
}

/** 409 with the rows that stand in the way. */
export function conflictOf(rows: readonly NamedRow[], words: (count: number) => string): DomainError {
  return new DomainError("conflict", words(rows[0]?.total ?? rows.length), {
    errors: rows.map(({ row, ward, indicator, month }) => ({
      path: `rows.${row}`,
      message: importWords.namedRow(row, ward, indicator, monthName(month)),
    })),
  });
}

/** Staged rows `r` with tally `t`, indicator `i`, shared denominator `d`, ward `w` and assignment `a`. */
export function stagedRows(runId: string, condition: SQL): SQL {
  return sql`select r.row, r.ward, r.indicator, r.month, (count(*) over ())::float8 as total
    from import_rows r
    join indicators i on i.id = r.indicator_id
    join wards w on w.id = r.ward_id
    left join assignments a on a.ward_id = r.ward_id and a.indicator_id = r.indicator_id
    left join tallies t on t.ward_id = r.ward_id and t.indicator_id = r.indicator_id and t.month = r.month
    left join denominator_values d
      on d.ward_id = r.ward_id and d.month = r.month and d.shared_denominator_id = i.shared_denominator_id
    where r.import_run_id = ${runId}::uuid and ${condition}
    order by r.row limit ${MAX_NAMED}`;
}

const noLongerReported = sql`(
  a.id is null or r.month < a.from_month or r.month > coalesce(a.to_month, r.month)
  or r.month < w.open_from or r.month > coalesce(w.open_to, r.month)
)`;

/** Refuses where anything that the check rested on has moved since. The returns are held by the caller. */
export async function refuseMoved(
  tx: TxCtx,
  plan: CommitPlan,
  returns: ReadonlyMap<string, ReturnRow>,
): Promise<void> {
  const otherState = plan.months.filter(
    (each) => (returns.get(monthKey(each.wardId, each.month))?.status ?? "open") !== each.status,
  );
  const json = JSON.stringify(otherState.map(({ wardId, month }) => ({ ward_id: wardId, month })));
  const moved = await selectRows<NamedRow>(
    tx.db,
    stagedRows(
      plan.run.id,
      sql`r.outcome in ('new', 'changed', 'same') and (
        coalesce(t.version, 0) <> r.tally_version
        or (i.shared_denominator_id is not null and coalesce(d.version, 0) <> r.denominator_version)
        or ${noLongerReported}
        or (r.ward_id, r.month) in (
          select other.ward_id, other.month from json_to_recordset(${json}::json) as other(ward_id uuid, month text))
      )`,
    ),
  );
  if (moved.length > 0) throw conflictOf(moved, importWords.movedSinceCheck);
}
