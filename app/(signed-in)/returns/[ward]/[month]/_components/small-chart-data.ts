import type { ChartMonth } from "@/lib/indicators/chart-points";
import { longMonth, perWords } from "@/lib/indicators/chart-format";
import type { BaselineStatus, Direction, Kind } from "@/lib/indicators/vocabulary";
import type { ChartData } from "@/lib/scene/chart-data";

interface LineRecord {
  name: string;
  kind: Kind;
  per: number;
  betterWhen: Direction;
  numeratorLabel: string;
  denominatorLabel: string;
  recent: readonly ChartMonth[];
  baselineStatus: BaselineStatus;
  hasLimits: boolean;
}

/** A line's last months as the small chart draws them: no runs, notes or targets at that size. */
export function smallChartData(line: LineRecord): ChartData {
  const last = Math.max(0, line.recent.length - 1);
  return {
    title: line.name,
    per: line.per,
    kind: line.kind,
    unitWords: perWords(line.per),
    betterWhen: line.betterWhen,
    numeratorLabel: line.numeratorLabel,
    denominatorLabel: line.denominatorLabel,
    points: line.recent.map((month) => ({
      ...month,
      label: longMonth(month.month),
      corrected: false,
      late: false,
      note: null,
      countSoFar: month.state === "ripening" ? month.numerator : null,
    })),
    segments: [
      {
        from: 0,
        to: last,
        centre: line.recent.at(-1)?.centre ?? null,
        provisional: line.baselineStatus === "provisional",
        trial: line.baselineStatus === "trial",
        newBaselineLabel: null,
        method: "three-sigma",
      },
    ],
    runs: [],
    pairs: [],
    target: null,
    hasLimits: line.hasLimits,
  };
}
