import "server-only";
import { sql } from "drizzle-orm";
import type { TxCtx } from "@/db/transaction";
import type { ReturnBefore } from "@/lib/indicators/import-row";
import { actorName } from "@/lib/policy";
import { reevaluateSeries } from "@/lib/services/series";
import { addRevisions, type TallyKey } from "@/lib/services/tallies";
import { importWords } from "@/lib/strings/imports";
import { changesShared, type PlannedRow } from "./commit-plan";
import type { WardMonth } from "./load-facts";
import type { ImportRun } from "./queries";
import { restoreCharts } from "./restore-charts";
import { inTurns } from "./yielding";

export interface MonthToRestore extends WardMonth {
  /** The return as it stood at the check; null where there was none. */
  before: ReturnBefore | null;
  returnId: string;
  wasAccepted: boolean;
  isMoved: boolean;
}

/** Puts back what stood before, as new versions and revisions. Everything is held by the caller. */
export async function restoreImport(
  tx: TxCtx,
  run: ImportRun,
  months: readonly MonthToRestore[],
  written: readonly PlannedRow[],
) {
  await restoreDenominators(tx, run.id);
  await restoreTallies(tx, run.id, written);
  const charted = await restoreCharts(tx, run);
  const chartedKeys = new Set(charted.map(textOf));
  const saved = written.filter((key) => !chartedKeys.has(textOf(key)));
  await addRevisions(
    tx,
    saved.map((key) => ({ ...key, charted: null })),
    {
      event: "saved",
      source: "import",
      reason: importWords.takenBackReason,
      importRunId: run.id,
    },
  );
  const accepted = months.filter((each) => each.wasAccepted);
  await restoreReturns(tx, accepted);
  await reevaluateSeries(tx, { pairs: charted, why: "import-taken-back" });
  return { rows: written.length, charted: charted.length, returns: accepted.length };
}

const textOf = ({ wardId, indicatorId, month }: TallyKey) => `${wardId} ${indicatorId} ${month}`;

async function restoreDenominators(tx: TxCtx, runId: string): Promise<void> {
  await tx.db.execute(sql`
    update denominator_values d set value = b.value, awaited = b.awaited, version = d.version + 1,
      updated_at = ${tx.now.toISOString()}::timestamptz, updated_by = ${actorName(tx.actor)}::text
    from (
      select distinct on (r.ward_id, r.month, i.shared_denominator_id) r.ward_id, r.month, i.shared_denominator_id,
        (r.before -> 'shared' ->> 'value')::bigint as value, r.before -> 'shared' ->> 'awaited' as awaited
      from import_rows r join indicators i on i.id = r.indicator_id
      where r.import_run_id = ${runId}::uuid and r.outcome in ('new', 'changed') and ${changesShared}
      order by r.ward_id, r.month, i.shared_denominator_id, r.row
    ) b
    where d.ward_id = b.ward_id and d.month = b.month and d.shared_denominator_id = b.shared_denominator_id`);
}

async function restoreTallies(tx: TxCtx, runId: string, rows: readonly PlannedRow[]): Promise<void> {
  await inTurns(rows, async (some) => {
    const json = JSON.stringify(some.map(({ row }) => ({ row })));
    await tx.db.execute(sql`
      update tallies t set
        numerator = (r.before -> 'tally' ->> 'numerator')::bigint,
        denominator = (r.before -> 'tally' ->> 'denominator')::bigint,
        not_collected = r.before -> 'tally' ->> 'notCollected',
        awaited = r.before -> 'tally' ->> 'awaited',
        note = r.before -> 'tally' ->> 'note',
        version = t.version + 1, updated_at = ${tx.now.toISOString()}::timestamptz,
        updated_by = ${actorName(tx.actor)}::text
      from json_to_recordset(${json}::json) as n(row integer)
      join import_rows r on r.import_run_id = ${runId}::uuid and r.row = n.row
      where t.ward_id = r.ward_id and t.indicator_id = r.indicator_id and t.month = r.month`);
  });
}

/** Returns that the import accepted are again what they were; one that wasn't there yet is open. */
async function restoreReturns(tx: TxCtx, months: readonly MonthToRestore[]): Promise<void> {
  if (months.length === 0) return;
  const rows = months.map(({ returnId, before }) => ({
    id: returnId,
    status: before?.status ?? "open",
    reopened: before?.reopened ?? false,
    reopened_reason: before?.reopenedReason ?? null,
    first_submitted_at: before?.firstSubmittedAt ?? null,
    submitted_at: before?.submittedAt ?? null,
    submitted_by: before?.submittedBy ?? null,
  }));
  await tx.db.execute(sql`
    update ward_returns r set status = b.status, reopened = b.reopened, reopened_reason = b.reopened_reason,
      first_submitted_at = b.first_submitted_at, submitted_at = b.submitted_at, submitted_by = b.submitted_by,
      accepted_at = null, accepted_by = null, version = r.version + 1
    from json_to_recordset(${JSON.stringify(rows)}::json) as b(id uuid, status text, reopened boolean,
      reopened_reason text, first_submitted_at timestamptz, submitted_at timestamptz, submitted_by text)
    where r.id = b.id`);
}
