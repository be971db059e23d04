import "server-only";
import type { Ctx } from "@/db/transaction";
import { limitsAt, type LimitPair } from "@/lib/indicators/chart-limits-at";
import { chartMonths, type ChartMonth } from "@/lib/indicators/chart-points";
import { towardsOf, type FoundSignal } from "@/lib/indicators/signal-life";
import { signalEvidence } from "@/lib/indicators/signal-evidence";
import { signalWords, type SignalWords } from "@/lib/indicators/signal-words";
import { limitBasis, signallingCounts, type LimitBasis } from "@/lib/limits";
import { requireAction } from "@/lib/policy";
import type { PreviewBaseline } from "@/lib/schemas/baseline";
import { chartQuery } from "@/lib/schemas/chart";
import type { ChartData } from "@/lib/scene/chart-data";
import { previewBaseline, type BaselinePreview } from "@/lib/services/baselines";
import type { EvaluatedSeries } from "@/lib/services/series";
import { chartData } from "./chart-data";
import { labelsOf } from "./chart-shows";
import { segmentReplies, segmentSentence } from "./chart-segments";
import { matchSignals } from "./match-signals";
import { readChart, type ChartView } from "./read-chart";

/** Action limits and the least count beyond the upper one; null where there is none. */
export interface LimitsForMonth {
  limits: LimitPair | null;
  standsOutAt: number | null;
}

/** A baseline that nobody has decided, drawn before and after, with what it would change. */
export interface PreviewCharts {
  before: { data: ChartData; summary: string | null };
  after: { data: ChartData; summary: string | null };
  come: SignalWords[];
  go: SignalWords[];
  change: SignalWords[];
  /** At usual denominators of the last months. */
  rows: { denominator: number; before: LimitsForMonth; after: LimitsForMonth }[];
}

interface Read {
  ctx: Ctx;
  input: PreviewBaseline & { ward: string; indicator: string };
}

export async function getPreviewCharts({ ctx, input }: Read): Promise<PreviewCharts> {
  requireAction(ctx.actor, "baseline.read");
  const { ward, indicator } = input;
  const preview = await previewBaseline({ ctx, input });
  const view = await readChart({ ctx, input: { ward, indicator, ...chartQuery.parse({}) } });
  const before = viewOf(view, preview.before);
  const after = viewOf(view, preview.after);
  return {
    before: { data: chartData(before), summary: summaryOf(before) },
    after: { data: chartData(after), summary: summaryOf(after) },
    ...comeAndGo(preview, before, after),
    rows: limitRows(before, after),
  };
}

/** The same chart with another evaluation. */
function viewOf(view: ChartView, evaluated: EvaluatedSeries): ChartView {
  const months = chartMonths(evaluated.assembled, evaluated.evaluation);
  const { ward, indicator } = view.series;
  const codes = { ward: ward.code, indicator: indicator.code };
  const signals = matchSignals(evaluated.signals, [], indicator.betterWhen, codes);
  return { ...view, evaluated, allMonths: months, months, points: months, signals };
}

function summaryOf(view: ChartView): string | null {
  const last = segmentReplies(view.evaluated).at(-1);
  return last ? segmentSentence(last, view.series.indicator.per) : null;
}

function comeAndGo({ come, go, change }: BaselinePreview, before: ChartView, after: ChartView) {
  const words = (view: ChartView) => (found: FoundSignal) => {
    const towards = towardsOf(found.side, view.series.indicator.betterWhen);
    const evidence = signalEvidence(view.allMonths, found, view.evaluated.assembled.input.model);
    return signalWords({ ...found, towards, withdrawnWhy: null }, evidence, labelsOf(view));
  };
  return { come: come.map(words(after)), go: go.map(words(before)), change: change.map(words(after)) };
}

function limitRows(before: ChartView, after: ChartView): PreviewCharts["rows"] {
  const [was, willBe] = [lastBasis(before.evaluated), lastBasis(after.evaluated)];
  return usualDenominators(before.months).map((denominator) => ({
    denominator,
    before: limitsFor(was, denominator),
    after: limitsFor(willBe, denominator),
  }));
}

function lastBasis({ assembled, evaluation }: EvaluatedSeries): LimitBasis | null {
  const last = evaluation.segments.at(-1);
  return last ? limitBasis(assembled.input.model, last) : null;
}

function limitsFor(basis: LimitBasis | null, denominator: number): LimitsForMonth {
  if (basis === null) return { limits: null, standsOutAt: null };
  return {
    limits: limitsAt(basis, denominator, "action"),
    standsOutAt: signallingCounts(basis, denominator).high,
  };
}

/** The smallest, the middle and the largest of the last twelve counted months. */
function usualDenominators(months: readonly ChartMonth[]): number[] {
  const sizes = months
    .filter((month) => month.state === "counted")
    .slice(-12)
    .flatMap((month) => (month.denominator === null ? [] : [month.denominator]))
    .sort((left, right) => left - right);
  const chosen = [sizes[0], sizes[Math.floor((sizes.length - 1) / 2)], sizes.at(-1)];
  return [...new Set(chosen.filter((size): size is number => size !== undefined))];
}
