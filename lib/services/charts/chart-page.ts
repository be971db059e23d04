import "server-only";
import {
  detectionWords,
  quietWords,
  type DetectionFacts,
  type DetectionWords,
} from "@/lib/indicators/detection-words";
import { limitBasis } from "@/lib/limits";
import { can, requireAction } from "@/lib/policy";
import type { ChartData } from "@/lib/scene/chart-data";
import { loadBaselines } from "@/lib/services/baselines";
import { detectionSentences } from "@/lib/strings/detection";
import { chartData } from "./chart-data";
import { chartShows, labelsOf, type Shown } from "./chart-shows";
import { limitsInUse } from "./limits-in-use";
import { readChart, type ChartView, type ReadChart } from "./read-chart";

/** All that the chart page shows, in words and as data to draw. */
export interface ChartPage {
  view: ChartView;
  data: ChartData;
  shows: Shown[];
  /** How blind the newest counted month was, where it is part of no signal. */
  quiet: string | null;
  detection: DetectionWords | null;
  limits: string[];
  canAnnotate: boolean;
}

export async function getChartPage(read: ReadChart): Promise<ChartPage> {
  requireAction(read.ctx.actor, "chart.read");
  const view = await readChart(read);
  const baselines = await loadBaselines(read.ctx, view.series.key);
  const { input } = view.evaluated.assembled;
  const facts: Omit<DetectionFacts, "months"> = {
    bases: view.evaluated.evaluation.segments.map((segment) => limitBasis(input.model, segment)),
    betterWhen: view.series.indicator.betterWhen,
    labels: labelsOf(view),
  };
  return {
    view,
    data: chartData(view),
    shows: chartShows(view, baselines),
    quiet: quietOf(view, facts),
    // By quarter the panel would speak of months that aren't drawn.
    detection: view.query.by === "month" ? detectionWords({ ...facts, months: view.months }) : null,
    limits: limitsInUse(view),
    canAnnotate: can(read.ctx.actor, "annotation.create", { wardId: view.series.ward.id }),
  };
}

function quietOf(view: ChartView, facts: Omit<DetectionFacts, "months">): string | null {
  const newest = view.months.findLast((month) => month.state === "counted");
  if (!newest || newest.beyond !== null) return null;
  const inSignal = view.signals.some((signal) => signal.from <= newest.month && signal.to >= newest.month);
  const words = inSignal ? null : quietWords(newest, facts);
  return words && `${words} ${detectionSentences.noProof}`;
}
