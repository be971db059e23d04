import "server-only";
import type { Ctx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { instantAsOf } from "@/lib/indicators/chart-as-of";
import { chartMonths, type ChartMonth } from "@/lib/indicators/chart-points";
import { chartQuarters, type ChartQuarter } from "@/lib/indicators/chart-quarters";
import { newestDefinition } from "@/lib/indicators/definition";
import type { SeriesFacts } from "@/lib/indicators/series";
import type { LimitMethod } from "@/lib/limits/types";
import { requireAction } from "@/lib/policy";
import type { ChartQuery, ChartSignalReply } from "@/lib/schemas/chart";
import { openSeries, type OpenSeries } from "@/lib/services/baselines";
import type { IndicatorDefinition } from "@/lib/services/indicators";
import { evaluateFacts, hospitalTimeZone, loadSeries, type EvaluatedSeries } from "@/lib/services/series";
import { signalsOfSeries } from "@/lib/services/signals";
import { matchSignals } from "./match-signals";
import { loadMonthMarks, type MonthMarks } from "./month-marks";

export interface ReadChart {
  ctx: Ctx;
  input: ChartQuery & { ward: string; indicator: string };
}

/** All that a chart, its table and its words are made from. */
export interface ChartView {
  series: OpenSeries;
  definition: IndicatorDefinition;
  query: ChartQuery;
  /** Null for now. */
  asOf: Date | null;
  timeZone: string;
  facts: SeriesFacts;
  evaluated: EvaluatedSeries;
  /** Every month of the series, and those that the window shows. */
  allMonths: ChartMonth[];
  months: ChartMonth[];
  /** What is drawn: the months of the window, or their quarters. */
  points: (ChartMonth | ChartQuarter)[];
  signals: ChartSignalReply[];
  marks: MonthMarks;
}

/** One ward's indicator as a chart: as it is known now or was on a day, by month or quarter, with other limits. */
export async function readChart({ ctx, input }: ReadChart): Promise<ChartView> {
  requireAction(ctx.actor, "chart.read");
  const series = await openSeries(ctx, "chart.read", input);
  const { key, indicator, ward } = series;
  const timeZone = await hospitalTimeZone(ctx);
  const asOf = input.asOf === undefined ? null : knownAt(input.asOf, ctx.now, timeZone);
  const [loaded] = await loadSeries(ctx, [key], asOf ? { asOf } : {});
  if (!loaded) throw new DomainError("not-found", "There is no such chart.");

  const facts = input.limits ? withLimits(loaded.facts, input.limits) : loaded.facts;
  const evaluated = evaluateFacts(facts);
  const allMonths = chartMonths(evaluated.assembled, evaluated.evaluation);
  const isShown = (month: string) =>
    (input.from === undefined || month >= input.from) && (input.to === undefined || month <= input.to);
  const months = allMonths.filter((each) => isShown(each.month));
  const stored = await signalsOfSeries(ctx, key);
  const signals = matchSignals(evaluated.signals, stored, indicator.betterWhen, {
    ward: ward.code,
    indicator: indicator.code,
  });
  return {
    series,
    definition: newestDefinition(indicator.definitions),
    query: input,
    asOf,
    timeZone,
    facts,
    evaluated,
    allMonths,
    months,
    points:
      input.by === "quarter"
        ? chartQuarters(months, evaluated.evaluation, evaluated.assembled.input)
        : months,
    signals: signals.filter(
      (signal) =>
        (input.from === undefined || signal.to >= input.from) &&
        (input.to === undefined || signal.from <= input.to),
    ),
    marks: await loadMonthMarks(ctx, key, asOf ?? ctx.now, timeZone),
  };
}

function knownAt(asOf: string, now: Date, timeZone: string): Date {
  const instant = instantAsOf(asOf, now, timeZone);
  if (instant) return instant;
  const message = "Give a day that has begun.";
  throw new DomainError("invalid", message, { errors: [{ path: "asOf", message }] });
}

/** Other limits for viewing: every segment takes the method, whatever it was settled to. */
function withLimits(facts: SeriesFacts, limits: LimitMethod): SeriesFacts {
  return {
    ...facts,
    indicator: { ...facts.indicator, limits },
    baselines: facts.baselines.map((baseline) => ({ ...baseline, limits })),
  };
}
