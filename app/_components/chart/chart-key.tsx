import { Mark } from "@/app/_components/ui/mark";
import { LineSample } from "@/app/_components/chart/key-samples";
import { chartKeyWords } from "@/lib/strings/chart";
import { keyEntries, type KeyEntry } from "@/lib/scene/key";
import type { ChartData } from "@/lib/scene/chart-data";
import type { MarkId } from "@/lib/strings/frame";

const marks: Partial<Record<KeyEntry, MarkId>> = {
  above: "above",
  below: "below",
  warn: "warn",
  pair: "pair",
  run: "run",
  ripening: "ripening",
  awaited: "awaited",
  missing: "missing",
  leftOut: "leftout",
  corrected: "corrected",
  late: "late",
  note: "note",
  newBaseline: "base",
};

/** Explains what appears on this chart and nothing else. */
export function ChartKey({ data }: { data: ChartData }) {
  const entries = keyEntries(data);
  if (entries.length === 0) return null;
  return (
    <ul className="chart-key" aria-label={chartKeyWords.name}>
      {entries.map((entry) => {
        const mark = marks[entry];
        return (
          <li key={entry}>
            {mark ? <Mark mark={mark} /> : <LineSample entry={entry} />}
            {chartKeyWords[entry]}
          </li>
        );
      })}
    </ul>
  );
}
