import "server-only";
import type { ChartMonth } from "@/lib/indicators/chart-points";
import type { ChartQuarter } from "@/lib/indicators/chart-quarters";
import { requireAction } from "@/lib/policy";
import type { ChartPointReply, ChartReply } from "@/lib/schemas/chart";
import { noBaseline, segmentReplies } from "./chart-segments";
import type { MonthMarks } from "./month-marks";
import { readChart, type ReadChart } from "./read-chart";

/** A chart as the API says it: centre and baseline are those in force, of the last segment. */
export async function getChart(read: ReadChart): Promise<ChartReply> {
  requireAction(read.ctx.actor, "chart.read");
  const view = await readChart(read);
  const { ward, indicator } = view.series;
  const segments = segmentReplies(view.evaluated);
  const last = segments.at(-1);
  return {
    indicator: indicator.code,
    ward: ward.code,
    indicatorName: indicator.name,
    wardName: ward.name,
    numeratorLabel: view.definition.numeratorLabel,
    denominatorLabel: view.definition.denominatorLabel,
    kind: indicator.kind,
    per: indicator.per,
    betterWhen: indicator.betterWhen,
    target: indicator.target,
    by: view.query.by,
    asOf: view.asOf?.toISOString() ?? null,
    centre: last?.centre ?? null,
    baseline: last?.baseline ?? noBaseline,
    sigmaZ: last?.sigmaZ ?? null,
    limits: last?.limits ?? null,
    limitsChosen: indicator.limits,
    hasLimits: last?.hasLimits ?? false,
    segments,
    points: view.points.map((point) => pointReply(point, view.marks)),
    signals: view.signals,
  };
}

function isQuarter(point: ChartMonth | ChartQuarter): point is ChartQuarter {
  return "quarter" in point;
}

function pointReply(point: ChartMonth | ChartQuarter, marks: MonthMarks): ChartPointReply {
  if (isQuarter(point)) {
    const { months, quarter } = point;
    return {
      ...point,
      month: quarter,
      corrected: months.some((month) => marks.corrected.has(month)),
      late: months.some((month) => marks.late.has(month)),
      notes: months.flatMap((month) => marks.notes.get(month) ?? []),
      months,
      incomplete: point.incomplete,
    };
  }
  return {
    ...point,
    corrected: marks.corrected.has(point.month),
    late: marks.late.has(point.month),
    notes: marks.notes.get(point.month) ?? [],
  };
}
