import { seaFigureWords } from "@/lib/strings/sign-in";

/** An invented record: what was counted, out of what. The picture follows from it by the limits' own formula. */
const RECORD: readonly (readonly [number, number])[] = [
  [14, 193],
  [20, 255],
  [29, 274],
  [30, 287],
  [31, 241],
  [19, 212],
  [19, 177],
  [28, 148],
  [20, 160],
  [13, 145],
  [23, 159],
  [5, 66],
  [3, 44],
  [4, 58],
  [15, 96],
  [11, 131],
  [21, 168],
  [7, 108],
  [15, 185],
  [15, 230],
  [12, 233],
  [18, 217],
  [11, 220],
  [11, 188],
  [14, 190],
  [11, 200],
];
const WIDTH = 860;
const HEIGHT = 900;
const CENTRE = 0.095;
/** The middle of the sheet, and units of the sheet per unit of the rate. */
const MIDDLE = 415;
const SCALE = 2150;
const SLOT = WIDTH / RECORD.length;
const ABOVE = 7;
const BELOW_DETECTION = 12;
const NUMBER_GAP = 18;

const yOf = (rate: number) => round(MIDDLE - (rate - CENTRE) * SCALE);
const round = (value: number) => Math.round(value * 10) / 10;

/** Half the channel's height at a month's denominator: k standard errors of a proportion. */
const spread = (denominator: number, k: number) => k * Math.sqrt((CENTRE * (1 - CENTRE)) / denominator);

interface SeaMonth {
  left: number;
  middle: number;
  denominator: number;
  point: number;
  upper: number;
  lower: number;
  warnings: number[];
}

const MONTHS: SeaMonth[] = RECORD.map(([count, denominator], index) => ({
  left: round(index * SLOT),
  middle: round((index + 0.5) * SLOT),
  denominator,
  point: yOf(count / denominator),
  upper: yOf(CENTRE + spread(denominator, 3)),
  lower: yOf(CENTRE - spread(denominator, 3)),
  warnings: [yOf(CENTRE + spread(denominator, 2)), yOf(CENTRE - spread(denominator, 2))],
}));

const stepsOf = (levels: number[]) =>
  levels
    .map((y, index) => `${index === 0 ? "M0" : "V"}${index === 0 ? `,${y}` : y}H${round((index + 1) * SLOT)}`)
    .join("");

const UPPER = stepsOf(MONTHS.map((month) => month.upper));
const LOWER = stepsOf(MONTHS.map((month) => month.lower));
const BACK = [...MONTHS]
  .reverse()
  .map((month) => `V${month.lower}H${month.left}`)
  .join("");
const RECORD_LINE = MONTHS.map(
  (month, index) => `${index === 0 ? "M" : "L"}${month.middle},${month.point}`,
).join("");
const WARNING_LINES = MONTHS.flatMap((month) =>
  month.warnings.map((y) => `M${round(month.left + 5)},${y}h${round(SLOT - 10)}`),
).join("");
const GRID = [
  ...MONTHS.map((month) => `M${month.left},0V${HEIGHT}`),
  ...Array.from({ length: HEIGHT / 50 - 1 }, (_, index) => `M0,${(index + 1) * 50}H${WIDTH}`),
].join("");

/** The picture beside the sign-in form: a channel that follows its denominators. Decoration with a caption. */
export function SeaFigure() {
  return (
    <figure className="sign-in-figure">
      <svg
        className="sea"
        viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
        preserveAspectRatio="xMinYMax slice"
        aria-hidden="true"
      >
        <rect className="fill-sheet" width={WIDTH} height={HEIGHT} />
        <path className="fill-none stroke-hair" strokeWidth={0.6} d={GRID} />
        <path className="fill-channel" d={`${UPPER}${BACK}Z`} />
        <path className="fill-none stroke-edge" strokeWidth={1.5} d={`${UPPER}${LOWER}`} />
        <path className="fill-none stroke-edge" strokeDasharray="3 2" d={WARNING_LINES} />
        <path className="fill-none stroke-edge" d={`M0,${MIDDLE}H${WIDTH}`} />
        <path className="fill-none stroke-ink" strokeWidth={1.7} d={RECORD_LINE} />
        {MONTHS.map((month, index) => (
          <SeaPoint key={month.left} month={month} index={index} />
        ))}
        <text x={WIDTH - 14} y={MIDDLE - 8} textAnchor="end">
          {seaFigureWords.centre}
        </text>
        <SheetEdge />
      </svg>
      <figcaption className="sea-caption">
        <b>{seaFigureWords.title}</b>
        {seaFigureWords.text}
      </figcaption>
    </figure>
  );
}

function SeaPoint({ month, index }: { month: SeaMonth; index: number }) {
  return (
    <>
      {index === ABOVE ? (
        <>
          <path className="fill-over stroke-sheet" d={`M${month.middle},${month.point - 9}l9 9-9 9-9-9z`} />
          <path
            className="stroke-over"
            strokeWidth={2.2}
            d={`M${month.middle - 12},${month.point + 14}h24`}
          />
        </>
      ) : (
        <circle
          className={index === BELOW_DETECTION ? "fill-sheet stroke-ink" : "fill-ink"}
          strokeWidth={1.5}
          cx={month.middle}
          cy={month.point}
          r={4}
        />
      )}
      <text x={month.middle} y={month.lower + NUMBER_GAP} textAnchor="middle">
        {month.denominator}
      </text>
    </>
  );
}

/** The month scale down the left and along the foot, as on the edge of a chart sheet. */
function SheetEdge() {
  const down = Array.from({ length: HEIGHT / 100 }, (_, index) => `M0,${index * 100}h7v50h-7z`).join("");
  const along = Array.from({ length: Math.ceil(RECORD.length / 2) }, (_, index) => {
    const left = round(index * 2 * SLOT);
    return `M${left},${HEIGHT - 7}h${round(SLOT)}v7h-${round(SLOT)}z`;
  }).join("");
  return (
    <>
      <path className="fill-sheet" d={`M0,0h7v${HEIGHT}h-7zM0,${HEIGHT - 7}h${WIDTH}v7h-${WIDTH}z`} />
      <path className="fill-ink" d={`${down}${along}`} />
      <path className="fill-none stroke-ink" d={`M7.5,0V${HEIGHT - 7.5}H${WIDTH}`} />
    </>
  );
}
