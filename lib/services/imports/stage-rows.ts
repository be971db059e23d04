import "server-only";
import { eq, sql } from "drizzle-orm";
import { importRows, importRuns } from "@/db/schema";
import { withBookkeeping, type Ctx } from "@/db/transaction";
import type { ImportVerdict } from "@/lib/indicators/import-row";
import { inTurns } from "./yielding";

type Run = typeof importRuns.$inferInsert;

/**
 * Keeps a checked sheet: the run, then its rows in short transactions of their own, so that nobody waits for all
 * 50 000. No record changes by it, and the check's audit entry follows once all rows are there; half a sheet is
 * taken away again and could not be brought in, since its rows don't add up to its counts.
 */
export async function stageRun(
  ctx: Ctx,
  run: Run,
  verdicts: readonly ImportVerdict[],
  blankRows: readonly number[],
) {
  await withBookkeeping(ctx, (tx) => tx.db.insert(importRuns).values(run));
  try {
    await inTurns(verdicts, (some) => insertRows(ctx, run.id, some.map(stagedRow)));
    await inTurns(blankRows, (some) => insertRows(ctx, run.id, some.map(blankRow)));
  } catch (error) {
    await dropRun(ctx, run.id);
    throw error;
  }
}

export async function dropRun(ctx: Ctx, runId: string): Promise<void> {
  await withBookkeeping(ctx, async (tx) => {
    await tx.db.delete(importRows).where(eq(importRows.importRunId, runId));
    await tx.db.delete(importRuns).where(eq(importRuns.id, runId));
  });
}

interface StagedRow {
  row: number;
  ward_id: string | null;
  indicator_id: string | null;
  ward: string;
  indicator: string;
  month: string;
  numerator: number | null;
  denominator: number | null;
  not_collected: string | null;
  note: string | null;
  outcome: string;
  messages: unknown;
  tally_version: number;
  denominator_version: number;
  before: unknown;
  committed_version: number | null;
}

function stagedRow(verdict: ImportVerdict): StagedRow {
  const { line } = verdict;
  return {
    row: line.row,
    ward_id: verdict.wardId,
    indicator_id: verdict.indicatorId,
    ward: verdict.wardId === null ? line.ward : line.ward.toUpperCase(),
    indicator: verdict.indicatorId === null ? line.indicator : line.indicator.toUpperCase(),
    month: line.month ?? line.monthText,
    numerator: verdict.numerator,
    denominator: verdict.denominator,
    not_collected: line.notCollected,
    note: line.note,
    outcome: verdict.outcome,
    messages: verdict.messages,
    tally_version: verdict.tallyVersion,
    denominator_version: verdict.denominatorVersion,
    before: verdict.before,
    committed_version:
      verdict.outcome === "new" || verdict.outcome === "changed" ? verdict.tallyVersion + 1 : null,
  };
}

function blankRow(row: number): StagedRow {
  return {
    row,
    ward_id: null,
    indicator_id: null,
    ward: "",
    indicator: "",
    month: "",
    numerator: null,
    denominator: null,
    not_collected: null,
    note: null,
    outcome: "skipped",
    messages: [],
    tally_version: 0,
    denominator_version: 0,
    before: null,
    committed_version: null,
  };
}

async function insertRows(ctx: Ctx, runId: string, rows: readonly StagedRow[]): Promise<void> {
  const json = JSON.stringify(rows);
  await withBookkeeping(ctx, (tx) =>
    tx.db.execute(sql`
      insert into import_rows (import_run_id, row, ward_id, indicator_id, ward, indicator, month, numerator, denominator,
        not_collected, note, outcome, messages, tally_version, denominator_version, before,
        committed_version)
      select ${runId}::uuid, r.*
      from json_to_recordset(${json}::json) as r(row integer, ward_id uuid, indicator_id uuid, ward text, indicator text,
        month text, numerator bigint, denominator bigint, not_collected text, note text, outcome text, messages jsonb,
        tally_version integer, denominator_version integer, before jsonb, committed_version integer)`),
  );
}
