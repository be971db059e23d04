import "server-only";
import { sql } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { TxCtx } from "@/db/transaction";
import { importWords } from "@/lib/strings/imports";
import { changesShared } from "./commit-plan";
import { conflictOf, stagedRows, type NamedRow } from "./moved-rows";
import type { ImportRun } from "./queries";
import type { MonthToRestore } from "./restore-import";

/**
 * Refuses where something stands on top of the import: a figure saved or corrected later, a return that was sent,
 * accepted, recalled or reopened, or any later change in a return that the import accepted.
 */
export async function refuseLaterChanges(
  tx: TxCtx,
  run: ImportRun,
  months: readonly MonthToRestore[],
): Promise<void> {
  const moved = months.filter((each) => each.isMoved);
  const accepted = months.filter((each) => each.wasAccepted);
  const asJson = (some: readonly MonthToRestore[]) =>
    JSON.stringify(some.map(({ wardId, month }) => ({ ward_id: wardId, month })));
  const committedAt = (run.committedAt ?? tx.now).toISOString();
  const later = await selectRows<NamedRow>(
    tx.db,
    stagedRows(
      run.id,
      sql`(
        (r.outcome in ('new', 'changed') and (
          coalesce(t.version, 0) <> r.committed_version
          or (i.shared_denominator_id is not null and r.denominator is not null
            and coalesce(d.version, 0) <> r.denominator_version + (case when ${changesShared} then 1 else 0 end))
          or (r.ward_id, r.month) in (
            select m.ward_id, m.month from json_to_recordset(${asJson(moved)}::json) as m(ward_id uuid, month text))
        ))
        or (r.outcome in ('new', 'changed', 'same') and (
          (r.ward_id, r.month) in (
            select m.ward_id, m.month from json_to_recordset(${asJson(accepted.filter((each) => each.isMoved))}::json)
              as m(ward_id uuid, month text))
          or (r.ward_id, r.month) in (
            select a.ward_id, a.month from json_to_recordset(${asJson(accepted)}::json) as a(ward_id uuid, month text)
            join tally_revisions v on v.ward_id = a.ward_id and v.month = a.month
            where v.at > ${committedAt}::timestamptz and v.import_run_id is distinct from ${run.id}::uuid)
        ))
      )`,
    ),
  );
  if (later.length > 0) throw conflictOf(later, importWords.changedSince);
}
