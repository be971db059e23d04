import "server-only";
import { setImmediate as nextTurn } from "node:timers/promises";
import { inArray, sql } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { indicators } from "@/db/schema";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { asMonth, type Month } from "@/lib/indicators/month";
import type { ReturnStatus } from "@/lib/indicators/vocabulary";
import { inScope, mayAttempt, requireAction, scopeOf, typesNumerator } from "@/lib/policy";
import type { CommitImport } from "@/lib/schemas/import";
import { importWords } from "@/lib/strings/imports";
import type { ImportRun } from "./queries";

/** A ward and month that the rows speak of, as its return stood at the check. */
export interface PlannedMonth {
  wardId: string;
  month: Month;
  status: ReturnStatus;
  /** True where a row adds or replaces something in it. */
  writes: boolean;
}

/** A row that adds or replaces, with the id for a tally that isn't there yet. */
export interface PlannedRow {
  row: number;
  tallyId: string;
  wardId: string;
  indicatorId: string;
  month: Month;
}

export interface PlannedDenominator {
  id: string;
  wardId: string;
  sharedDenominatorId: string;
  month: Month;
  value: number;
  version: number;
}

/** Everything that a commit needs and that can be worked out before anything is locked. */
export interface CommitPlan {
  run: ImportRun;
  months: PlannedMonth[];
  rows: PlannedRow[];
  denominators: PlannedDenominator[];
  accept: boolean;
  reason: string | null;
}

/** Rows read at a time. */
const ROWS_PER_STATEMENT = 5_000;

/** Reads what the check kept and refuses what can't be brought in whatever else is stored. */
export async function planCommit(ctx: Ctx, run: ImportRun, input: CommitImport): Promise<CommitPlan> {
  if (input.accept) requireAction(ctx.actor, "import.accept");
  refuseUnsettled(run, input);
  await refuseIncomplete(ctx, run);
  const months = await plannedMonths(ctx, run.id);
  await refuseOthers(ctx, run.id, months);
  const isSent = months.some((each) => each.writes && each.status !== "open");
  if (isSent) refuseChangingSent(ctx, input.reason);
  return {
    run,
    months,
    rows: await plannedRows(ctx, run.id),
    denominators: await plannedDenominators(ctx, run.id),
    accept: input.accept ?? false,
    reason: input.reason ?? null,
  };
}

function refuseUnsettled({ counts }: ImportRun, input: CommitImport): void {
  const rest = counts.new + counts.changed + counts.same;
  if (counts.rejected > 0 && !input.leaveOutRejected) {
    const message = importWords.rejectedRows(counts.rejected, rest);
    throw new DomainError("invalid", message, { errors: [{ path: "leaveOutRejected", message }] });
  }
  if (rest === 0) throw new DomainError("invalid", importWords.nothingToBringIn);
}

/** A check that was cut short left fewer rows than it counted. */
async function refuseIncomplete(ctx: Ctx, { id, counts }: ImportRun): Promise<void> {
  const [row] = await selectRows<{ rows: number }>(
    ctx.db,
    sql`select count(*)::float8 as rows from import_rows where import_run_id = ${id}::uuid and outcome <> 'skipped'`,
  );
  const expected = counts.new + counts.changed + counts.same + counts.rejected;
  if (row?.rows !== expected) throw new DomainError("precondition", importWords.checkCutShort);
}

async function plannedMonths(ctx: Ctx, runId: string): Promise<PlannedMonth[]> {
  const rows = await selectRows<{
    ward_id: string;
    month: string;
    status: ReturnStatus | null;
    writes: boolean;
  }>(
    ctx.db,
    sql`select ward_id, month, max(before -> 'return' ->> 'status') as status, bool_or(outcome <> 'same') as writes
        from import_rows where import_run_id = ${runId}::uuid and outcome in ('new', 'changed', 'same')
        group by ward_id, month order by ward_id, month`,
  );
  return rows.map((row) => ({
    wardId: row.ward_id,
    month: asMonth(row.month),
    status: row.status ?? "open",
    writes: row.writes,
  }));
}

/** What the person could do at the check they may not be able to do any more. */
async function refuseOthers(ctx: Ctx, runId: string, months: readonly PlannedMonth[]): Promise<void> {
  const scope = scopeOf(ctx.actor);
  if (months.some((each) => !inScope(scope, each.wardId))) {
    throw new DomainError("forbidden", importWords.notYourWards);
  }
  const changed = await selectRows<{ indicator_id: string }>(
    ctx.db,
    sql`select distinct indicator_id from import_rows
        where import_run_id = ${runId}::uuid and outcome in ('new', 'changed')
          and (numerator is distinct from (before -> 'tally' ->> 'numerator')::bigint or not_collected is not null)`,
  );
  if (changed.length === 0) return;
  const lines = await ctx.db
    .select({ numeratorBy: indicators.numeratorBy, team: indicators.team })
    .from(indicators)
    .where(
      inArray(
        indicators.id,
        changed.map((row) => row.indicator_id),
      ),
    );
  if (lines.some((line) => !typesNumerator(ctx.actor, line))) {
    throw new DomainError("forbidden", importWords.notYourLines);
  }
}

function refuseChangingSent(ctx: Ctx, reason: string | undefined): void {
  if (!mayAttempt(ctx.actor, "correction.decide"))
    throw new DomainError("forbidden", importWords.leadBringsIn);
  if (reason !== undefined) return;
  const message = importWords.reasonMissing;
  throw new DomainError("invalid", message, { errors: [{ path: "reason", message }] });
}

export async function plannedRows(ctx: Ctx, runId: string): Promise<PlannedRow[]> {
  const planned: PlannedRow[] = [];
  for (;;) {
    const rows = await selectRows<{ row: number; ward_id: string; indicator_id: string; month: string }>(
      ctx.db,
      sql`select row, ward_id, indicator_id, month from import_rows
          where import_run_id = ${runId}::uuid and outcome in ('new', 'changed') and row > ${planned.at(-1)?.row ?? 0}
          order by row limit ${ROWS_PER_STATEMENT}`,
    );
    for (const { row, ward_id: wardId, indicator_id: indicatorId, month } of rows) {
      planned.push({ row, tallyId: uuidv7(), wardId, indicatorId, month: asMonth(month) });
    }
    if (rows.length < ROWS_PER_STATEMENT) return planned;
    await nextTurn();
  }
}

interface DenominatorRow {
  ward_id: string;
  shared_denominator_id: string;
  month: string;
  value: number;
  version: number;
}

/** SQL over a staged row `r` and its indicator `i`: the row gives its shared denominator another value. */
export const changesShared = sql`(i.shared_denominator_id is not null and r.denominator is not null and (
  (r.before -> 'shared' ->> 'value')::bigint is distinct from r.denominator or r.before -> 'shared' ->> 'awaited' is not null
))`;

async function plannedDenominators(ctx: Ctx, runId: string): Promise<PlannedDenominator[]> {
  const rows = await selectRows<DenominatorRow>(
    ctx.db,
    sql`select distinct on (r.ward_id, r.month, i.shared_denominator_id) r.ward_id, i.shared_denominator_id, r.month,
          r.denominator::float8 as value, r.denominator_version as version
        from import_rows r join indicators i on i.id = r.indicator_id
        where r.import_run_id = ${runId}::uuid and r.outcome in ('new', 'changed') and ${changesShared}
        order by r.ward_id, r.month, i.shared_denominator_id, r.row`,
  );
  return rows.map((row) => ({
    id: uuidv7(),
    wardId: row.ward_id,
    sharedDenominatorId: row.shared_denominator_id,
    month: asMonth(row.month),
    value: row.value,
    version: row.version,
  }));
}
