import { hasLimitsAt, isPlotted, type ChartData, type ChartPoint } from "@/lib/scene/chart-data";

/** Things that a chart may show and its key may explain. */
export type KeyEntry =
  | "channel"
  | "provisional"
  | "trial"
  | "warning"
  | "centre"
  | "earlierCentre"
  | "target"
  | "above"
  | "below"
  | "warn"
  | "pair"
  | "run"
  | "belowDetection"
  | "openReturn"
  | "ripening"
  | "awaited"
  | "missing"
  | "leftOut"
  | "corrected"
  | "late"
  | "note"
  | "newBaseline";

/** What appears on this chart, in the key's order. */
export function keyEntries(data: ChartData): KeyEntry[] {
  const limited = data.points.filter((_, index) => hasLimitsAt(data, index));
  const some = (test: (point: ChartPoint) => boolean) => data.points.some(test);
  const segment = (test: (each: ChartData["segments"][number]) => boolean) => data.segments.some(test);
  const holds: [KeyEntry, boolean][] = [
    ["channel", limited.length > 0],
    ["warning", limited.some((point) => point.lowerWarning !== null || point.upperWarning !== null)],
    ["centre", segment((each) => each.centre !== null)],
    ["earlierCentre", segment((each) => (each.earlierCentre ?? null) !== null)],
    ["target", data.target !== null],
    ["provisional", limited.length > 0 && segment((each) => each.provisional && !each.trial)],
    ["trial", limited.length > 0 && segment((each) => each.trial)],
    ["above", some((point) => isPlotted(point) && point.beyond === "upper")],
    ["below", some((point) => isPlotted(point) && point.beyond === "lower")],
    ["warn", some((point) => isPlotted(point) && point.beyond === null && point.pastWarning !== null)],
    ["pair", data.pairs.length > 0],
    ["run", data.runs.length > 0],
    ["belowDetection", some((point) => point.belowDetection)],
    ["openReturn", some((point) => point.state === "open" && point.value !== null)],
    ["ripening", some((point) => point.state === "ripening")],
    ["awaited", some((point) => point.state === "awaited")],
    ["missing", some((point) => point.state === "missing")],
    ["leftOut", some((point) => point.leftOut)],
    ["corrected", some((point) => point.corrected)],
    ["late", some((point) => point.late)],
    ["note", some((point) => point.note !== null)],
    ["newBaseline", segment((each) => each.newBaselineLabel !== null)],
  ];
  return holds.filter(([, shown]) => shown).map(([entry]) => entry);
}
