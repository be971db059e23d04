import type { EarlierFigures } from "@/lib/indicators/return-entry";

const WIDTH = 112;
const HEIGHT = 34;
const EDGE = 4;

interface SmallRecordProps {
  earlier: readonly EarlierFigures[];
  /** The open month's rate so far. */
  rate: number | null;
}

/** Rates of the earlier months and the open one, without limits; the figures stand beside it. */
export function SmallRecord({ earlier, rate }: SmallRecordProps) {
  const rates = [...earlier.map(rateOf), rate];
  const most = Math.max(...rates.map((each) => each ?? 0)) || 1;
  const x = (index: number) => EDGE + (index * (WIDTH - 2 * EDGE)) / Math.max(1, rates.length - 1);
  const y = (value: number) => HEIGHT - EDGE - (value / most) * (HEIGHT - 2 * EDGE);
  const last = rates.length - 1;
  return (
    <svg
      className="small-record"
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      width={WIDTH}
      height={HEIGHT}
      aria-hidden="true"
    >
      {stretches(rates.slice(0, last)).map((stretch) => (
        <polyline
          key={stretch[0]?.index}
          points={stretch.map(({ index, value }) => `${x(index)},${y(value)}`).join(" ")}
          className="fill-none stroke-ink"
          strokeWidth={1.2}
        />
      ))}
      {rate === null ? null : (
        <circle cx={x(last)} cy={y(rate)} r={3} className="fill-none stroke-ink" strokeDasharray="2 1.5" />
      )}
    </svg>
  );
}

function rateOf({ numerator, denominator }: EarlierFigures): number | null {
  return numerator === null || !denominator ? null : numerator / denominator;
}

/** The record breaks where a month is missing. */
function stretches(rates: readonly (number | null)[]): { index: number; value: number }[][] {
  const found: { index: number; value: number }[][] = [[]];
  rates.forEach((value, index) => {
    if (value === null) found.push([]);
    else found.at(-1)?.push({ index, value });
  });
  return found.filter((stretch) => stretch.length > 0);
}
