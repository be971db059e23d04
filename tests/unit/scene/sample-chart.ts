import { longMonth } from "@/lib/scene/format";
import type { ChartData, ChartPoint, ChartSegment } from "@/lib/scene/chart-data";

/** A point whose limits are worked out here by the 3-sigma formula, so that scenes have something true to draw. */
export function pointOf(
  month: string,
  numerator: number,
  denominator: number,
  centre: number | null,
  over: Partial<ChartPoint> = {},
): ChartPoint {
  const limits = centre === null ? noLimits : limitsOf(centre, denominator);
  const value = numerator / denominator;
  const beyond =
    limits.upperAction !== null && value > limits.upperAction
      ? "upper"
      : limits.lowerAction !== null && value < limits.lowerAction
        ? "lower"
        : null;
  const pastWarning =
    limits.upperWarning !== null && value > limits.upperWarning
      ? "upper"
      : limits.lowerWarning !== null && value < limits.lowerWarning
        ? "lower"
        : null;
  return {
    ...emptyPoint(month),
    numerator,
    denominator,
    value,
    state: "counted",
    centre,
    ...limits,
    belowDetection: centre !== null && limits.lowerAction === null,
    beyond,
    pastWarning,
    ...over,
  };
}

const noLimits = { lowerAction: null, upperAction: null, lowerWarning: null, upperWarning: null };

function limitsOf(centre: number, denominator: number) {
  const deviation = Math.sqrt((centre * (1 - centre)) / denominator);
  const lower = (k: number) => (centre - k * deviation > 0 ? centre - k * deviation : null);
  const upper = (k: number) => (centre + k * deviation < 1 ? centre + k * deviation : null);
  return { lowerAction: lower(3), upperAction: upper(3), lowerWarning: lower(2), upperWarning: upper(2) };
}

/** A month without a figure. */
export function emptyPoint(month: string, over: Partial<ChartPoint> = {}): ChartPoint {
  return {
    month,
    label: longMonth(month),
    numerator: null,
    denominator: null,
    value: null,
    state: "missing",
    centre: null,
    ...noLimits,
    belowDetection: false,
    beyond: null,
    pastWarning: null,
    leftOut: false,
    corrected: false,
    late: false,
    note: null,
    countSoFar: null,
    ...over,
  };
}

export function segmentOf(from: number, to: number, over: Partial<ChartSegment> = {}): ChartSegment {
  return {
    from,
    to,
    centre: 0.1,
    provisional: false,
    trial: false,
    newBaselineLabel: null,
    method: "three-sigma",
    ...over,
  };
}

export function chartOf(points: ChartPoint[], over: Partial<ChartData> = {}): ChartData {
  return {
    title: "unplanned readmissions, Osier ward",
    per: 100,
    kind: "proportion",
    unitWords: "percent",
    betterWhen: "lower",
    numeratorLabel: "Readmissions",
    denominatorLabel: "Discharges",
    points,
    segments: [segmentOf(0, points.length - 1)],
    runs: [],
    pairs: [],
    target: null,
    hasLimits: true,
    ...over,
  };
}

/** Months in a row from a first one. */
export function monthsFrom(first: string, count: number): string[] {
  const start = Number(first.slice(0, 4)) * 12 + Number(first.slice(5)) - 1;
  return Array.from({ length: count }, (_, offset) => {
    const index = start + offset;
    return `${Math.floor(index / 12)}-${String((index % 12) + 1).padStart(2, "0")}`;
  });
}

const counts: [number, number][] = [
  [18, 142], [41, 168], [18, 186], [18, 171], [20, 149], [16, 131], [14, 98], [6, 49], [5, 44], [9, 102],
  [20, 128], [20, 136], [25, 151], [15, 176], [24, 198], [19, 189], [20, 167], [17, 142], [14, 131], [12, 118],
  [14, 126], [11, 134], [8, 148], [14, 171], [20, 192], [16, 204], [0, 0], [16, 162], [15, 139], [5, 96],
  [3, 58], [7, 71], [9, 118], [14, 137], [21, 146], [6, 163],
]; // prettier-ignore

/** Three years with a missing month, a change of baseline, a month left out and one not complete yet. */
export function readmissions(): ChartData {
  const months = monthsFrom("2023-12", counts.length);
  const extras: Record<string, Partial<ChartPoint>> = {
    "2024-01": { leftOut: true },
    "2024-09": { corrected: true, note: "Discharge calls start" },
    "2026-04": { late: true },
    "2026-07": { corrected: true },
  };
  const points = months.map((month, index) => {
    const [numerator = 0, denominator = 0] = counts[index] ?? [];
    if (month === "2026-02") return emptyPoint(month);
    if (month === "2026-11") {
      return emptyPoint(month, {
        state: "ripening",
        denominator,
        countSoFar: numerator,
        stateDetail: "until 30 December",
      });
    }
    return pointOf(month, numerator, denominator, index < 13 ? 0.127 : 0.095, extras[month]);
  });
  return chartOf(points, {
    segments: [
      segmentOf(0, 12, { centre: 0.127, provisional: true }),
      segmentOf(13, 35, { centre: 0.095, newBaselineLabel: "New baseline from Jan 2025" }),
    ],
    target: 0.07,
  });
}
