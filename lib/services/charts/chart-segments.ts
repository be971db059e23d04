import "server-only";
import { flagMonth, formatRateSign, inWords, longMonth } from "@/lib/indicators/chart-format";
import type { SeriesSegment } from "@/lib/indicators/segments";
import type { SeriesSlot } from "@/lib/indicators/series";
import { baselineStatusOf } from "@/lib/indicators/baseline-status";
import type { SegmentResult } from "@/lib/limits/types";
import type { ChartReply, ChartSegmentReply } from "@/lib/schemas/chart";
import type { EvaluatedSeries } from "@/lib/services/series";
import { chartDataWords as words } from "@/lib/strings/charts";

type BaselineInForce = ChartReply["baseline"];

/** The segments of an evaluated series as the API says them: each under one centre line. */
export function segmentReplies({ assembled, evaluation }: EvaluatedSeries): ChartSegmentReply[] {
  return assembled.segments.flatMap((segment, index) => {
    const result = evaluation.segments[index];
    const from = assembled.slots[segment.start]?.month;
    const to = assembled.slots[segment.end - 1]?.month;
    if (!result || !from || !to) return [];
    return [
      {
        from,
        to,
        begins: segment.begins,
        centre: result.centre,
        limits: result.method,
        hasLimits: result.hasLimits,
        sigmaZ: result.sigmaZ,
        baseline: baselineInForce(segment, result, assembled.slots),
      },
    ];
  });
}

/** Without a decided baseline: the first and last month that the trial limits use. */
function baselineInForce(
  segment: SeriesSegment,
  result: SegmentResult,
  slots: readonly SeriesSlot[],
): BaselineInForce {
  const { baseline, inBaseline } = segment;
  const used = slots.filter((_, index) => inBaseline[index] === 1).map((slot) => slot.month);
  return {
    from: baseline?.from ?? used[0] ?? null,
    to: baseline?.to ?? used.at(-1) ?? null,
    leftOut: baseline?.leftOut.map((each) => ({ ...each })) ?? [],
    status: baselineStatusOf(baseline !== null, result),
    appliesFrom: baseline?.appliesFrom ?? null,
    months: result.baselineMonths,
    expected: result.baselineExpected,
  };
}

/** What a series without any month says. */
export const noBaseline: BaselineInForce = {
  from: null,
  to: null,
  leftOut: [],
  status: "none",
  appliesFrom: null,
  months: 0,
  expected: 0,
};

/** "Up to December 2024: centre 12.7%, from 12 months, Dec 2023 to Dec 2024, 1 left out (Jan 2024). Provisional." */
export function segmentSummary(segment: ChartSegmentReply, per: number): string | null {
  const sentence = segmentSentence(segment, per);
  return sentence && words.upTo(longMonth(segment.to), sentence);
}

/** "centre 12.7%, from 12 months, Dec 2023 to Dec 2024, 1 left out (Jan 2024). Provisional." */
export function segmentSentence({ centre, baseline }: ChartSegmentReply, per: number): string | null {
  if (centre === null || baseline.from === null || baseline.to === null) return null;
  const { status, leftOut } = baseline;
  const sentence = words.centre(
    formatRateSign(centre, per),
    words.months(baseline.months),
    words.span(flagMonth(baseline.from), flagMonth(baseline.to)),
  );
  const named = inWords(leftOut.map((each) => flagMonth(each.month)));
  const rest = leftOut.length > 0 ? words.leftOut(leftOut.length, named) : "";
  const standing = status === "trial" || status === "provisional" ? words.standing[status] : "";
  return `${sentence}${rest}.${standing}`;
}
