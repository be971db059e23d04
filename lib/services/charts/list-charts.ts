import "server-only";
import { and, asc, eq, inArray, ne } from "drizzle-orm";
import {
  assignments,
  baselines,
  indicators,
  seriesState,
  signals,
  wards,
  type SeriesColumns,
} from "@/db/schema";
import type { Ctx } from "@/db/transaction";
import { markOf } from "@/lib/indicators/signal-words";
import type { BaselineStatus } from "@/lib/indicators/vocabulary";
import { requireAction, scopeOf } from "@/lib/policy";
import { keyOf, type SeriesKey } from "@/lib/services/series";
import { getWardByCode, wardsWithin } from "@/lib/services/wards";
import type { MarkId } from "@/lib/strings/frame";

/** One chart in the list: where it is, and what its newest counted month says. */
export interface ListedChart {
  ward: { code: string; name: string };
  indicator: { code: string; name: string; per: number };
  newest: { month: string; numerator: number; denominator: number; value: number } | null;
  status: BaselineStatus;
  hasLimits: boolean;
  /** Of the newest counted month: beyond a limit, past a warning limit, or at the end of a signal. */
  marks: MarkId[];
  /** Somebody has proposed a baseline that nobody has decided yet. */
  isProposed: boolean;
}

/** The charts of the wards in scope by ward and indicator, from the stored states: four statements for any number. */
export async function listCharts({
  ctx,
  input,
}: {
  ctx: Ctx;
  input: { ward?: string };
}): Promise<ListedChart[]> {
  requireAction(ctx.actor, "chart.read");
  const ward = input.ward === undefined ? undefined : await getWardByCode({ ctx, code: input.ward });
  const within = and(wardsWithin(scopeOf(ctx.actor)), ward && eq(wards.id, ward.id));
  const rows = await ctx.db
    .select({ ward: wards, indicator: indicators, state: seriesState })
    .from(assignments)
    .innerJoin(wards, eq(wards.id, assignments.wardId))
    .innerJoin(indicators, eq(indicators.id, assignments.indicatorId))
    .leftJoin(
      seriesState,
      and(eq(seriesState.wardId, assignments.wardId), eq(seriesState.indicatorId, assignments.indicatorId)),
    )
    .where(within)
    .orderBy(asc(wards.name), asc(wards.code), asc(indicators.name), asc(indicators.code));
  const active = await ctx.db
    .select({ signal: signals })
    .from(signals)
    .innerJoin(wards, eq(wards.id, signals.wardId))
    .where(and(within, ne(signals.status, "withdrawn")));
  const proposed = await ctx.db
    .select({ wardId: baselines.wardId, indicatorId: baselines.indicatorId })
    .from(baselines)
    .innerJoin(wards, eq(wards.id, baselines.wardId))
    .where(and(within, inArray(baselines.state, ["proposed"])));
  const waiting = new Set(proposed.map(keyOf));

  return rows.map(({ ward: own, indicator, state }) => {
    const key: SeriesKey = { wardId: own.id, indicatorId: indicator.id };
    const place = state ? state.columns.months.indexOf(state.newestMonth ?? "") : -1;
    const ending = active
      .map((each) => each.signal)
      .filter((signal) => keyOf(signal) === keyOf(key) && signal.toMonth === state?.newestMonth);
    return {
      ward: { code: own.code, name: own.name },
      indicator: { code: indicator.code, name: indicator.name, per: indicator.per },
      newest: state ? newestOf(state.columns, place) : null,
      status: state?.baselineStatus ?? "none",
      hasLimits: state?.hasLimits ?? false,
      marks: state ? marksOf(state.columns, place, ending) : [],
      isProposed: waiting.has(keyOf(key)),
    };
  });
}

function newestOf(columns: SeriesColumns, place: number): ListedChart["newest"] {
  const month = columns.months[place];
  const numerator = columns.numerators[place] ?? null;
  const denominator = columns.denominators[place] ?? null;
  const value = columns.values[place] ?? null;
  if (month === undefined || numerator === null || denominator === null || value === null) return null;
  return { month, numerator, denominator, value };
}

function marksOf(
  columns: SeriesColumns,
  place: number,
  ending: readonly { rule: string; side: "upper" | "lower" }[],
): MarkId[] {
  const beyond = columns.beyondAction[place] ?? 0;
  const warning = columns.beyondWarning[place] ?? 0;
  const own: MarkId[] = beyond !== 0 ? [beyond > 0 ? "above" : "below"] : warning !== 0 ? ["warn"] : [];
  const small: MarkId[] = columns.belowDetection[place] ? ["shallow"] : [];
  return [...new Set([...own, ...ending.map(markOf), ...small])];
}
