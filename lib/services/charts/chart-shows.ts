import "server-only";
import { formatCount, formatRate, formatRateSign, longDate, longMonth } from "@/lib/indicators/chart-format";
import type { ChartMonth } from "@/lib/indicators/chart-points";
import { matureOn } from "@/lib/indicators/maturity";
import { dateInZone } from "@/lib/indicators/month";
import { signalEvidence } from "@/lib/indicators/signal-evidence";
import { signalWords, spanInWords, type SeriesLabels } from "@/lib/indicators/signal-words";
import type { Baseline } from "@/lib/services/baselines";
import { showsSentences as say } from "@/lib/strings/charts";
import type { MarkId } from "@/lib/strings/frame";
import { signalSentences } from "@/lib/strings/signals";
import type { ChartView } from "./read-chart";

/** One thing that a chart shows: its mark, a lead in bold, the rest, and small print. */
export interface Shown {
  key: string;
  mark: MarkId;
  lead: string;
  text: string;
  small: string | null;
  month: string;
}

/** Months back to which single warnings and gaps are named; older ones stand in the table. */
const RECENT_MONTHS = 12;

/** What the months of the window show, newest first: signals, then what else needs a word. */
export function chartShows(view: ChartView, baselines: readonly Baseline[]): Shown[] {
  const recent = view.months.slice(-RECENT_MONTHS);
  const items = [
    ...signalItems(view),
    ...recent.flatMap((month) => [...warningItem(month, view), ...stateItem(month, view)]),
    ...segmentItems(view, baselines),
    ...leftOutItems(view),
  ];
  return items.sort((left, right) => (left.month < right.month ? 1 : left.month > right.month ? -1 : 0));
}

export function labelsOf({ series, definition }: Pick<ChartView, "series" | "definition">): SeriesLabels {
  const { numeratorLabel, denominatorLabel } = definition;
  return { numeratorLabel, denominatorLabel, per: series.indicator.per };
}

function signalItems(view: ChartView): Shown[] {
  const labels = labelsOf(view);
  const { model } = view.evaluated.assembled.input;
  return view.signals.map((signal) => {
    const words = signalWords(signal, signalEvidence(view.allMonths, signal, model), labels);
    return {
      key: `${signal.rule} ${signal.side} ${signal.from}`,
      mark: words.mark,
      lead: `${signalSentences.heading(words.what, words.months)}.`,
      text: words.sentences.join(" "),
      small: words.towards,
      month: signal.to,
    };
  });
}

/** Past a warning limit, inside the action limit, and part of no signal about it. */
function warningItem(month: ChartMonth, view: ChartView): Shown[] {
  const { pastWarning, beyond, value } = month;
  const isTold = view.signals.some(
    (signal) => signal.rule === "two-of-three" && month.month >= signal.from && month.month <= signal.to,
  );
  if (pastWarning === null || beyond !== null || value === null || isTold) return [];
  const { per } = view.series.indicator;
  const [warning, action] =
    pastWarning === "upper"
      ? [month.upperWarning, month.upperAction]
      : [month.lowerWarning, month.lowerAction];
  if (warning === null) return [];
  const text =
    action === null || (pastWarning === "lower" && action <= 0)
      ? say.warningAlone(formatRate(warning, per))
      : say.warningInside(formatRate(warning, per), formatRate(action, per));
  const lead = say.warning(longMonth(month.month), formatRateSign(value, per));
  return [item(month.month, "warn", lead, `${text} ${say.oneAlone}`)];
}

function stateItem({ month, state, numerator, denominator }: ChartMonth, view: ChartView): Shown[] {
  const lead = longMonth(month);
  switch (state) {
    case "ripening": {
      const until = longDate(matureOn(month, view.series.indicator.matureAfterDays));
      const soFar = say.ripeningUntil(until, formatCount(numerator ?? 0), formatCount(denominator ?? 0));
      return [item(month, "ripening", lead, `${soFar} ${say.ripening}`)];
    }
    case "awaited": {
      const tally = view.facts.tallies.find((each) => each.month === month);
      return [item(month, "awaited", lead, say.awaited(tally?.awaited ?? null))];
    }
    case "open":
      return [item(month, "unsaved", lead, say.openReturn)];
    case "missing":
      return [item(month, "missing", lead, say.missing)];
    default:
      return [];
  }
}

function segmentItems(view: ChartView, baselines: readonly Baseline[]): Shown[] {
  const isShown = new Set(view.months.map((month) => month.segment));
  return view.evaluated.assembled.segments.flatMap((segment, index): Shown[] => {
    if (!isShown.has(index)) return [];
    const row = baselines.find((each) => each.id === segment.baseline?.id);
    const isNew = segment.begins !== "first";
    const start = view.evaluated.assembled.slots[segment.start]?.month ?? segment.from;
    const items: Shown[] = [];
    if (segment.begins === "definition") {
      items.push(item(start, "base", say.newDefinition(longMonth(start)), say.newDefinitionNote));
    }
    if (row) {
      const lead = isNew
        ? say.newBaseline(longMonth(start))
        : say.firstBaseline(spanInWords(row.fromMonth, row.toMonth));
      items.push({
        ...item(start, "base", lead, row.reason),
        key: row.id,
        small: byWhom(row, view.timeZone),
      });
    }
    return items;
  });
}

function byWhom(row: Baseline, timeZone: string): string {
  const date = longDate(dateInZone(row.decidedAt ?? row.proposedAt, timeZone));
  const decidedBy = row.decidedBy ?? row.proposedBy;
  const isOne = row.decidedById === row.proposedById && decidedBy === row.proposedBy;
  return isOne ? say.byOne(decidedBy, date) : say.byPeople(row.proposedBy, decidedBy, date);
}

function leftOutItems(view: ChartView): Shown[] {
  const shown = new Set<string>(view.months.map((each) => each.month));
  const named = view.evaluated.assembled.segments.flatMap((segment) => segment.baseline?.leftOut ?? []);
  return named
    .filter((each, place) => named.findIndex((other) => other.month === each.month) === place)
    .filter((each) => shown.has(each.month))
    .map((each) => item(each.month, "leftout", longMonth(each.month), say.leftOut(each.reason)));
}

function item(month: string, mark: MarkId, lead: string, text: string): Shown {
  return { key: `${mark} ${month}`, mark, lead, text, small: null, month };
}
