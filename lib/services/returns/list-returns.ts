import "server-only";
import { sql, type SQL } from "drizzle-orm";
import { selectRows } from "@/db/rows";
import type { Ctx } from "@/db/transaction";
import { dueDate } from "@/lib/indicators/due-date";
import { addMonths, asMonth, monthRange, type Month } from "@/lib/indicators/month";
import type { ReturnStatus } from "@/lib/indicators/vocabulary";
import { requireAction, scopeOf, type Scope } from "@/lib/policy";
import type { ReturnListItem, ReturnListQuery } from "@/lib/schemas/ward-return";
import { effectiveAwaited, hospitalDay, isAnswered, type HospitalDay } from "@/lib/services/tallies";
import { getWardByCode } from "@/lib/services/wards";
import { lateness } from "./reply";

/** Months that the list reaches back, the present one included. */
const LISTED_MONTHS = 12;

interface Row {
  code: string;
  name: string;
  month: string;
  status: ReturnStatus | null;
  due_on: string | null;
  first_submitted: number | null;
  submitted: number | null;
  submitted_by: string | null;
  accepted: number | null;
  reopened: boolean | null;
  lines: number;
  answered: number;
  awaited: number;
}

/**
 * The returns of the actor's wards for the last twelve months, newest first, or for one month of any time. Returns
 * that nobody has looked at yet are listed as open, with the day on which they would be due.
 */
export async function listReturns({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: ReturnListQuery;
}): Promise<ReturnListItem[]> {
  requireAction(ctx.actor, "return.read");
  // A ward outside the scope is not there, rather than an empty list.
  const ward = input.ward === undefined ? undefined : await getWardByCode({ ctx, code: input.ward });
  const day = await hospitalDay(ctx);
  const months = input.month
    ? [input.month].filter((month) => month <= day.thisMonth)
    : monthRange(addMonths(day.thisMonth, 1 - LISTED_MONTHS), day.thisMonth);
  const rows = await selectRows<Row>(ctx.db, query(scopeOf(ctx.actor), months, ward?.code));
  return rows.map((row) => itemOf(row, day));
}

function withinScope(scope: Scope): SQL {
  if (scope.wards === "all") return sql`true`;
  const json = JSON.stringify(scope.wards.map((id) => ({ id })));
  return sql`w.id in (select own.id from json_to_recordset(${json}::json) as own(id uuid))`;
}

function query(scope: Scope, months: readonly Month[], ward: string | undefined): SQL {
  const monthRows = JSON.stringify(months.map((month) => ({ month })));
  return sql`
    select w.code, w.name, m.month, r.status, r.due_on,
      (extract(epoch from r.first_submitted_at) * 1000)::float8 as first_submitted,
      (extract(epoch from r.submitted_at) * 1000)::float8 as submitted, r.submitted_by,
      (extract(epoch from r.accepted_at) * 1000)::float8 as accepted, r.reopened,
      count(*)::int as lines,
      (count(*) filter (where ${isAnswered}))::int as answered,
      (count(*) filter (where t.not_collected is null and ${effectiveAwaited} is not null))::int as awaited
    from wards w
    cross join json_to_recordset(${monthRows}::json) as m(month text)
    join assignments a on a.ward_id = w.id
      and a.from_month <= m.month and (a.to_month is null or a.to_month >= m.month)
    join indicators i on i.id = a.indicator_id
    left join ward_returns r on r.ward_id = w.id and r.month = m.month
    left join tallies t on t.ward_id = w.id and t.indicator_id = i.id and t.month = m.month
    left join denominator_values d
      on d.ward_id = w.id and d.month = m.month and d.shared_denominator_id = i.shared_denominator_id
    where ${withinScope(scope)} and (${ward ?? null}::text is null or w.code = ${ward ?? null}::text)
      and w.open_from <= m.month and (w.open_to is null or w.open_to >= m.month)
    group by w.id, m.month, r.id
    order by m.month desc, w.name, w.code`;
}

const instantOf = (milliseconds: number | null): Date | null =>
  milliseconds === null ? null : new Date(milliseconds);

function itemOf(row: Row, day: HospitalDay): ReturnListItem {
  const month = asMonth(row.month);
  const dueOn = row.due_on ?? dueDate(month, day.dueDay, day.holidays);
  return {
    ward: row.code,
    wardName: row.name,
    month,
    status: row.status ?? "open",
    dueOn,
    late: lateness(
      { dueOn, firstSubmittedAt: instantOf(row.first_submitted), acceptedAt: instantOf(row.accepted) },
      day,
    ),
    submittedAt: instantOf(row.submitted)?.toISOString() ?? null,
    submittedBy: row.submitted_by,
    acceptedAt: instantOf(row.accepted)?.toISOString() ?? null,
    reopened: row.reopened ?? false,
    lines: row.lines,
    answered: row.answered,
    awaited: row.awaited,
  };
}
