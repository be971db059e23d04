import type { LimitMethod } from "@/lib/limits/types";
import type { Month } from "./month";
import type { SeriesSlot } from "./series";

/** A decided baseline, as far as a chart needs it. */
export interface BaselineFacts {
  id: string;
  from: Month;
  to: Month;
  /** Null for the first baseline of a series. */
  appliesFrom: Month | null;
  leftOut: readonly { month: Month; reason: string }[];
  limits: LimitMethod;
}

export interface SeriesSegment {
  /** Slots [start, end). */
  start: number;
  end: number;
  /** Identity of the segment in signals: FIRST_SEGMENT, or the month from which it holds. */
  from: Month;
  begins: "first" | "baseline" | "definition";
  baseline: BaselineFacts | null;
  /** 1 where the slot takes part in centre line and limits. */
  inBaseline: Uint8Array;
}

/** Stands for the start of the series, which moves when older months are brought in later. */
export const FIRST_SEGMENT = "1900-01" as Month;

/** Trial limits take at most this many plotted months, then stay (domain rule: Baseline). */
export const TRIAL_MONTHS = 25;

/**
 * Cuts a series at changes of baseline and at definitions that can't be compared. A segment without a decided
 * baseline has trial limits from its own first plotted months.
 */
export function segmentsOf(
  slots: readonly SeriesSlot[],
  baselines: readonly BaselineFacts[],
  definitionBreaks: readonly Month[],
): SeriesSegment[] {
  const firstMonth = slots[0]?.month;
  if (firstMonth === undefined) return [];
  const cuts = new Map<Month, "baseline" | "definition">();
  for (const month of definitionBreaks) if (month > firstMonth) cuts.set(month, "definition");
  for (const { appliesFrom } of baselines) {
    if (appliesFrom !== null && appliesFrom > firstMonth && !cuts.has(appliesFrom))
      cuts.set(appliesFrom, "baseline");
  }
  const starts = [...cuts.keys()].sort();
  const bounds = [0, ...starts.map((month) => indexOfMonth(slots, month)), slots.length];
  const segments: SeriesSegment[] = [];
  for (let index = 0; index + 1 < bounds.length; index += 1) {
    const start = bounds[index] ?? 0;
    const end = bounds[index + 1] ?? 0;
    if (end <= start) continue;
    const cut = index === 0 ? undefined : starts[index - 1];
    const baseline = baselineFor(baselines, cut ?? null, firstMonth);
    segments.push({
      start,
      end,
      from: cut ?? FIRST_SEGMENT,
      begins: cut === undefined ? "first" : (cuts.get(cut) ?? "baseline"),
      baseline,
      inBaseline:
        baseline === null
          ? trialMonths(slots, start, end)
          : baselineMonths(slots, baseline, comparableStretch(slots, definitionBreaks, start)),
    });
  }
  return segments;
}

/** The first segment also takes a later baseline that reaches back to or before the series' first month. */
function baselineFor(
  baselines: readonly BaselineFacts[],
  cut: Month | null,
  firstMonth: Month,
): BaselineFacts | null {
  if (cut !== null) return baselines.find((each) => each.appliesFrom === cut) ?? null;
  const early = baselines
    .filter((each) => each.appliesFrom === null || each.appliesFrom <= firstMonth)
    .sort((left, right) => ((left.appliesFrom ?? "") < (right.appliesFrom ?? "") ? 1 : -1));
  return early[0] ?? null;
}

function indexOfMonth(slots: readonly SeriesSlot[], month: Month): number {
  const found = slots.findIndex((slot) => slot.month >= month);
  return found === -1 ? slots.length : found;
}

function trialMonths(slots: readonly SeriesSlot[], start: number, end: number): Uint8Array {
  const chosen = new Uint8Array(slots.length);
  let taken = 0;
  for (let index = start; index < end && taken < TRIAL_MONTHS; index += 1) {
    if (slots[index]?.state !== "counted") continue;
    chosen[index] = 1;
    taken += 1;
  }
  return chosen;
}

/** Slots [start, end) round one slot that can be compared with it: a break of the definition ends them. */
export function comparableStretch(
  slots: readonly SeriesSlot[],
  definitionBreaks: readonly Month[],
  slot: number,
): { start: number; end: number } {
  const cuts = definitionBreaks.map((month) => indexOfMonth(slots, month));
  return {
    start: Math.max(0, ...cuts.filter((cut) => cut <= slot)),
    end: Math.min(slots.length, ...cuts.filter((cut) => cut > slot)),
  };
}

/** Marks the counted months of a baseline: not left out, and comparable with the months that it judges. */
export function baselineMonths(
  slots: readonly SeriesSlot[],
  baseline: Pick<BaselineFacts, "from" | "to" | "leftOut">,
  stretch: { start: number; end: number },
): Uint8Array {
  const chosen = new Uint8Array(slots.length);
  const leftOut = new Set<string>(baseline.leftOut.map((each) => each.month));
  slots.forEach((slot, index) => {
    const inside = slot.month >= baseline.from && slot.month <= baseline.to && !leftOut.has(slot.month);
    const comparable = index >= stretch.start && index < stretch.end;
    if (inside && comparable && slot.state === "counted") chosen[index] = 1;
  });
  return chosen;
}
