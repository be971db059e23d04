import "server-only";
import { setImmediate as nextTurn } from "node:timers/promises";
import { and, asc, desc, eq, gt, inArray, lt, ne, sql, type SQL } from "drizzle-orm";
import { importRows, importRuns, indicators, wards } from "@/db/schema";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import type { RowOutcome } from "@/lib/indicators/import-row";
import { authorize, can, requireAction, type Actor } from "@/lib/policy";
import type { ImportReply, ImportSummary } from "@/lib/schemas/import";
import { rowReplies, summaryOf } from "./reply";
import { ROWS_PER_TURN } from "./yielding";

export type ImportRun = typeof importRuns.$inferSelect;

const { row, ward, indicator, month, numerator, denominator, notCollected, note, outcome, messages } =
  importRows;
const shownColumns = {
  row,
  ward,
  indicator,
  month,
  numerator,
  denominator,
  notCollected,
  note,
  outcome,
  messages,
};

/** A row as far as it is shown. */
export type ImportRow = Pick<typeof importRows.$inferSelect, keyof typeof shownColumns>;

const PAGE = 200;
const LISTED_RUNS = 50;
const LISTED_SKIPPED = 50;

export const importNotFound = () => new DomainError("not-found", "There is no such import.");

interface PageInput {
  id: string;
  cursor?: string | undefined;
  limit?: number | undefined;
  show?: RowOutcome | undefined;
}

/** A checked sheet with a page of its rows: what each will do, or did. */
export async function getImport({ ctx, input }: { ctx: Ctx; input: PageInput }): Promise<ImportReply> {
  requireAction(ctx.actor, "import.read");
  const run = await findRun(ctx, input.id);
  const { rows, nextCursor } = await rowsOf(ctx, input);
  return {
    ...summaryOf(run, await needsReason(ctx, run.id)),
    columns: run.columns,
    ...rowReplies(rows),
    nextCursor,
    skippedRows: await skippedRows(ctx, run.id),
    totals: await totalsOf(ctx, run.id),
  };
}

/** A row with the names and the earlier figures that the check page shows. */
export type ShownRow = ImportRow & {
  wardName: string | null;
  indicatorName: string | null;
  before: typeof importRows.$inferSelect.before;
};

const PAGE_ROWS = 100;

/** A page of rows for the check page. */
export async function listImportRows({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: Omit<PageInput, "limit">;
}): Promise<{ rows: ShownRow[]; nextCursor: string | null }> {
  requireAction(ctx.actor, "import.read");
  await findRun(ctx, input.id);
  const rows = await ctx.db
    .select({
      ...shownColumns,
      before: importRows.before,
      wardName: wards.name,
      indicatorName: indicators.name,
    })
    .from(importRows)
    .leftJoin(wards, eq(wards.id, importRows.wardId))
    .leftJoin(indicators, eq(indicators.id, importRows.indicatorId))
    .where(rowsWithin(input.id, input.show, input.cursor === undefined ? 0 : cursorRow(input.cursor)))
    .orderBy(asc(importRows.row))
    .limit(PAGE_ROWS + 1);
  const page = rows.slice(0, PAGE_ROWS);
  return { rows: page, nextCursor: rows.length > PAGE_ROWS ? String(page.at(-1)?.row) : null };
}

/** Rows of a run after a row number; those that were skipped are shown only where asked for. */
function rowsWithin(id: string, show: RowOutcome | undefined, after: number): SQL | undefined {
  return and(
    eq(importRows.importRunId, id),
    show === undefined ? ne(importRows.outcome, "skipped") : eq(importRows.outcome, show),
    gt(importRows.row, after),
  );
}

/** Imports, newest first: one's own; a lead sees all. */
export async function listImports({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { cursor?: string | undefined; limit?: number | undefined };
}): Promise<{ items: ImportSummary[]; nextCursor: string | null }> {
  requireAction(ctx.actor, "import.read");
  const limit = input.limit ?? LISTED_RUNS;
  const runs = await ctx.db
    .select()
    .from(importRuns)
    .where(and(ownRuns(ctx.actor), input.cursor ? lt(importRuns.id, cursorId(input.cursor)) : undefined))
    .orderBy(desc(importRuns.id))
    .limit(limit + 1);
  const page = runs.slice(0, limit);
  const asking = await runsNeedingReason(
    ctx,
    page.map((run) => run.id),
  );
  return {
    items: page.map((run) => summaryOf(run, asking.has(run.id))),
    nextCursor: runs.length > limit ? (page.at(-1)?.id ?? null) : null,
  };
}

/** The run, where the actor may know of it. */
export async function findRun(ctx: Ctx, id: string): Promise<ImportRun> {
  const [run] = await ctx.db.select().from(importRuns).where(eq(importRuns.id, id));
  if (!run) throw importNotFound();
  authorize(ctx.actor, "import.read", { authorId: run.uploadedById });
  return run;
}

/** Somebody else's imports are shown only to whom every import is. */
function ownRuns(actor: Actor) {
  if (can(actor, "import.read", { authorId: null })) return undefined;
  return actor.kind === "person" ? eq(importRuns.uploadedById, actor.personId) : sql`false`;
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

function cursorId(cursor: string): string {
  if (!UUID.test(cursor)) throw unknownCursor();
  return cursor;
}

function cursorRow(cursor: string): number {
  if (!/^\d{1,7}$/.test(cursor)) throw unknownCursor();
  return Number(cursor);
}

const unknownCursor = () => {
  const message = "This cursor wasn't made here.";
  return new DomainError("invalid", message, { errors: [{ path: "cursor", message }] });
};

/** As many rows as asked for, read a few thousand at a time so that nobody waits for all of them. */
async function rowsOf(ctx: Ctx, { id, cursor, limit = PAGE, show }: PageInput) {
  const rows: ImportRow[] = [];
  let after = cursor === undefined ? 0 : cursorRow(cursor);
  for (;;) {
    const wanted = Math.min(ROWS_PER_TURN, limit + 1 - rows.length);
    const some = await ctx.db
      .select(shownColumns)
      .from(importRows)
      .where(rowsWithin(id, show, after))
      .orderBy(asc(importRows.row))
      .limit(wanted);
    rows.push(...some);
    after = some.at(-1)?.row ?? after;
    if (some.length < wanted || rows.length > limit) break;
    await nextTurn();
  }
  const page = rows.slice(0, limit);
  return { rows: page, nextCursor: rows.length > limit ? String(page.at(-1)?.row) : null };
}

async function skippedRows(ctx: Ctx, id: string): Promise<number[]> {
  const rows = await ctx.db
    .select({ row: importRows.row })
    .from(importRows)
    .where(and(eq(importRows.importRunId, id), eq(importRows.outcome, "skipped")))
    .orderBy(asc(importRows.row))
    .limit(LISTED_SKIPPED);
  return rows.map((each) => each.row);
}

export async function needsReason(ctx: Ctx, id: string): Promise<boolean> {
  return (await runsNeedingReason(ctx, [id])).has(id);
}

async function runsNeedingReason(ctx: Ctx, ids: readonly string[]): Promise<Set<string>> {
  if (ids.length === 0) return new Set();
  const rows = await ctx.db
    .selectDistinct({ id: importRows.importRunId })
    .from(importRows)
    .where(
      and(
        inArray(importRows.importRunId, [...ids]),
        inArray(importRows.outcome, ["new", "changed"]),
        sql`${importRows.before} -> 'return' ->> 'status' in ('submitted', 'accepted')`,
      ),
    );
  return new Set(rows.map((row) => row.id));
}

interface TotalsRow {
  code: string;
  name: string;
  rows: number;
  numerator_before: number;
  denominator_before: number;
  numerator_after: number;
  denominator_after: number;
}

/** Sums per indicator over the rows that can be brought in, as stored at the check and as they would be. */
async function totalsOf(ctx: Ctx, id: string): Promise<ImportReply["totals"]> {
  const rows = await selectRows<TotalsRow>(
    ctx.db,
    sql`select i.code, i.name, count(*)::float8 as rows,
          coalesce(sum((r.before -> 'tally' ->> 'numerator')::bigint), 0)::float8 as numerator_before,
          coalesce(sum(coalesce((r.before -> 'tally' ->> 'denominator')::bigint,
            case when i.shared_denominator_id is not null then (r.before -> 'shared' ->> 'value')::bigint end)), 0)::float8
            as denominator_before,
          coalesce(sum(r.numerator), 0)::float8 as numerator_after,
          coalesce(sum(r.denominator), 0)::float8 as denominator_after
        from import_rows r join indicators i on i.id = r.indicator_id
        where r.import_run_id = ${id}::uuid and r.outcome in ('new', 'changed', 'same')
        group by i.code, i.name order by i.name, i.code`,
  );
  return rows.map((row) => ({
    indicator: row.code,
    name: row.name,
    rows: row.rows,
    before: { numerator: row.numerator_before, denominator: row.denominator_before },
    after: { numerator: row.numerator_after, denominator: row.denominator_after },
  }));
}
