import "server-only";
import { and, asc, eq, gte, inArray, isNull, lte, or, type SQL } from "drizzle-orm";
import { assignments, indicators, wards } from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { definitionFor } from "@/lib/indicators/definition";
import type { Month } from "@/lib/indicators/month";
import { inScope, requireAction, scopeOf } from "@/lib/policy";
import { loadDetails, type IndicatorDefinition, type IndicatorDetail } from "@/lib/services/indicators";
import { getWardByCode, wardsWithin, type Ward } from "@/lib/services/wards";

export type Assignment = typeof assignments.$inferSelect;

/** An assignment with the codes of both its sides. */
export interface ListedAssignment extends Assignment {
  ward: string;
  indicator: string;
}

/** One line of a ward's return for a month. */
export interface AssignedIndicator {
  assignment: Assignment;
  indicator: IndicatorDetail;
  /** The version of the definition that the month is counted under. */
  definition: IndicatorDefinition;
}

interface ListInput {
  ward?: string;
  indicator?: string;
}

/** Assignments of the wards that the actor may know about, narrowed to a ward or an indicator by code. */
export async function listAssignments({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: ListInput;
}): Promise<ListedAssignment[]> {
  requireAction(ctx.actor, "assignment.list");
  // A ward outside the scope is not there, rather than an empty list.
  const ward = input.ward === undefined ? undefined : await getWardByCode({ ctx, code: input.ward });
  const rows = await ctx.db
    .select({ assignment: assignments, ward: wards.code, indicator: indicators.code })
    .from(assignments)
    .innerJoin(wards, eq(wards.id, assignments.wardId))
    .innerJoin(indicators, eq(indicators.id, assignments.indicatorId))
    .where(
      and(
        wardsWithin(scopeOf(ctx.actor)),
        ward && eq(assignments.wardId, ward.id),
        input.indicator === undefined ? undefined : eq(indicators.code, input.indicator.toUpperCase()),
      ),
    )
    .orderBy(asc(wards.code), asc(indicators.code));
  return rows.map((row) => ({ ...row.assignment, ward: row.ward, indicator: row.indicator }));
}

/** The assignment of one pair, or null; a ward outside the actor's scope is not-found. */
export async function findAssignment({
  ctx,
  wardId,
  indicatorId,
}: {
  ctx: Ctx;
  wardId: string;
  indicatorId: string;
}): Promise<Assignment | null> {
  requireAction(ctx.actor, "assignment.list");
  requireWardInScope(ctx, wardId);
  const [row] = await ctx.db
    .select()
    .from(assignments)
    .where(and(eq(assignments.wardId, wardId), eq(assignments.indicatorId, indicatorId)));
  return row ?? null;
}

/**
 * What a ward reports for a month, by the indicator's name, each with the definition in force: three statements
 * in all. Empty for a month in which the ward isn't open.
 */
export async function assignedIndicators({
  ctx,
  wardId,
  month,
}: {
  ctx: Ctx;
  wardId: string;
  month: Month;
}): Promise<AssignedIndicator[]> {
  requireAction(ctx.actor, "assignment.list");
  requireWardInScope(ctx, wardId);
  const rows = await ctx.db
    .select({ assignment: assignments })
    .from(assignments)
    .innerJoin(wards, eq(wards.id, assignments.wardId))
    .where(and(eq(assignments.wardId, wardId), ...inForce(month)));
  if (rows.length === 0) return [];
  const byIndicator = new Map(rows.map(({ assignment }) => [assignment.indicatorId, assignment]));
  const details = await loadDetails(ctx.db, inArray(indicators.id, [...byIndicator.keys()]));
  return details.flatMap((indicator) => {
    const assignment = byIndicator.get(indicator.id);
    return assignment
      ? [{ assignment, indicator, definition: definitionFor(indicator.definitions, month) }]
      : [];
  });
}

/** The month lies in the assignment and the ward is open in it. */
function inForce(month: Month): (SQL | undefined)[] {
  return [
    lte(assignments.fromMonth, month),
    or(isNull(assignments.toMonth), gte(assignments.toMonth, month)),
    lte(wards.openFrom, month),
    or(isNull(wards.openTo), gte(wards.openTo, month)),
  ];
}

function requireWardInScope(ctx: Ctx, wardId: Ward["id"]): void {
  if (!inScope(scopeOf(ctx.actor), wardId)) throw new DomainError("not-found", "There is no such ward.");
}
