import "server-only";
import type { Ctx } from "@/db/transaction";
import { chartMonths, type ChartMonth } from "@/lib/indicators/chart-points";
import { matureOn } from "@/lib/indicators/maturity";
import type { Month } from "@/lib/indicators/month";
import { sentSaying, type SentSaying } from "@/lib/indicators/return-sent-words";
import type { BaselineStatus, Direction, Kind } from "@/lib/indicators/vocabulary";
import { limitBasis } from "@/lib/limits";
import { authorize, requireAction } from "@/lib/policy";
import { evaluateFacts, keyOf, loadSeries, type LoadedSeries } from "@/lib/services/series";
import { loadLines, wardWithReturn, type Line } from "@/lib/services/tallies";

/** Months that a line's small chart shows. */
const SMALL_CHART_MONTHS = 12;

/** One line of a return as its chart shows the month. */
export interface SentLine {
  indicator: string;
  name: string;
  kind: Kind;
  per: number;
  betterWhen: Direction;
  numeratorLabel: string;
  denominatorLabel: string;
  corrected: boolean;
  /** On the chart; null where nothing is. */
  month: ChartMonth | null;
  saying: SentSaying;
  /** The months before and this one, for a small chart. */
  recent: ChartMonth[];
  baselineStatus: BaselineStatus;
  hasLimits: boolean;
}

interface Read {
  ctx: Ctx;
  input: { ward: string; month: Month };
}

/** What a sent return shows, line by line: a few statements for the whole ward. */
export async function getSentLines({ ctx, input }: Read): Promise<SentLine[]> {
  requireAction(ctx.actor, "return.read");
  const { ward } = await wardWithReturn(ctx, input);
  authorize(ctx.actor, "return.read", { wardId: ward.id });
  const lines = await loadLines(ctx.db, { wardId: ward.id, month: input.month });
  const pairs = lines.map((line) => ({ wardId: ward.id, indicatorId: line.indicator.id }));
  const series = new Map((await loadSeries(ctx, pairs)).map((each) => [keyOf(each), each]));
  return lines.flatMap((line) => {
    const loaded = series.get(keyOf({ wardId: ward.id, indicatorId: line.indicator.id }));
    return loaded ? [sentLine(line, loaded)] : [];
  });
}

function sentLine(line: Line, { facts }: LoadedSeries): SentLine {
  const { indicator, labels, tally, month } = line;
  const evaluated = evaluateFacts(facts);
  const all = chartMonths(evaluated.assembled, evaluated.evaluation);
  const upTo = all.filter((each) => each.month <= month);
  const here =
    upTo.find((each) => each.month === month && each.state !== "open" && each.state !== "missing") ?? null;
  const { model } = evaluated.assembled.input;
  const saying = sentSaying({
    month: here,
    all,
    signals: evaluated.signals,
    bases: evaluated.evaluation.segments.map((segment) => limitBasis(model, segment)),
    model,
    betterWhen: indicator.betterWhen,
    labels: { numeratorLabel: labels.numerator, denominatorLabel: labels.denominator, per: indicator.per },
    notCollected: tally?.chartedNotCollected ?? null,
    awaited: tally?.chartedAwaited ?? null,
    matureOn: matureOn(month, indicator.matureAfterDays),
  });
  return {
    indicator: indicator.code,
    name: indicator.name,
    kind: indicator.kind,
    per: indicator.per,
    betterWhen: indicator.betterWhen,
    numeratorLabel: labels.numerator,
    denominatorLabel: labels.denominator,
    corrected: tally?.corrected ?? false,
    month: here,
    saying,
    recent: upTo.slice(-SMALL_CHART_MONTHS),
    baselineStatus: evaluated.baselineStatus,
    hasLimits: evaluated.evaluation.segments.some((segment) => segment.hasLimits),
  };
}
