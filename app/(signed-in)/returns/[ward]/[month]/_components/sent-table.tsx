import { Link } from "@/app/_components/ui/link";
import { SmallChart } from "@/app/_components/chart";
import { Cell, DataRow, DataTable, HeadCell, Mark, RowHead } from "@/app/_components/ui";
import { formatCount, formatRate, formatRateSign, noFigure, perWords } from "@/lib/indicators/chart-format";
import type { ChartMonth } from "@/lib/indicators/chart-points";
import type { ReturnSteps } from "@/lib/indicators/return-entry";
import { buildSmallScene } from "@/lib/scene/small-chart";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import type { SentLine } from "@/lib/services/returns";
import { sentPageWords as say } from "@/lib/strings/sent-return";
import { smallChartData } from "./small-chart-data";

interface SentTableProps {
  wardReturn: WardReturnReply;
  lines: readonly SentLine[];
  may: ReturnSteps;
}

export function SentTable({ wardReturn, lines, may }: SentTableProps) {
  return (
    <DataTable caption={say.caption} hideCaption look="roomy" className="sent-lines blocks-on-phone">
      <thead>
        <tr>
          <HeadCell>{say.indicator}</HeadCell>
          <HeadCell numeric>{say.counted}</HeadCell>
          <HeadCell numeric>{say.rate}</HeadCell>
          <HeadCell>{say.limits}</HeadCell>
          <HeadCell className="not-on-phone sent-chart">{say.months}</HeadCell>
          <HeadCell>{say.says}</HeadCell>
          <HeadCell>{say.next}</HeadCell>
        </tr>
      </thead>
      <tbody>
        {lines.map((line) => (
          <SentRow key={line.indicator} line={line} wardReturn={wardReturn} may={may} />
        ))}
      </tbody>
    </DataTable>
  );
}

function SentRow({
  line,
  wardReturn,
  may,
}: {
  line: SentLine;
  wardReturn: WardReturnReply;
  may: ReturnSteps;
}) {
  const { month, saying } = line;
  const history = `/returns/${wardReturn.ward}/${wardReturn.month}/${line.indicator}`;
  return (
    <DataRow tone={saying.isSignal ? "signal" : undefined}>
      <RowHead>
        <Link href={`/charts/${wardReturn.ward}/${line.indicator}`}>{line.name}</Link>
        <small>{perWords(line.per)}</small>
      </RowHead>
      <Cell numeric>{countedWords(month)}</Cell>
      <Cell numeric workedOut>
        {month?.state === "counted" && month.value !== null
          ? formatRateSign(month.value, line.per)
          : noFigure}
      </Cell>
      <Cell workedOut className="not-on-phone">
        {limitWords(month, line)}
      </Cell>
      <Cell className="not-on-phone sent-chart">
        <SmallChart scene={buildSmallScene(smallChartData(line), line.name)} />
      </Cell>
      <Cell className="sent-says block-wide">
        <span className="mark-line">
          {saying.mark ? <Mark mark={saying.mark} /> : null}
          <span>
            <b>{saying.title}</b> {saying.sentence}
            {line.corrected ? (
              <>
                {" "}
                <Mark mark="corrected" /> {say.corrected}.
              </>
            ) : null}
          </span>
        </span>
      </Cell>
      <Cell className="block-wide">
        {saying.next}
        <br />
        <Link href={history}>{correctWords(may)}</Link>
      </Cell>
    </DataRow>
  );
}

function correctWords(may: ReturnSteps): string {
  if (!may.correct) return say.history;
  return may.decide ? say.correctNow : say.correct;
}

function countedWords(month: ChartMonth | null): string {
  if (month === null || (month.numerator === null && month.denominator === null)) return noFigure;
  const text = (count: number | null) => (count === null ? noFigure : formatCount(count));
  return say.countedOf(text(month.numerator), text(month.denominator));
}

/** A limit at the end of what is possible can't be passed: there is none. */
function limitWords(month: ChartMonth | null, { per, kind }: SentLine): string {
  if (month?.state !== "counted" || (month.lowerAction === null && month.upperAction === null))
    return noFigure;
  const { lowerAction: lower, upperAction: upper } = month;
  const hasUpper = upper !== null && (kind === "rate" || upper < 1);
  return say.limitRange(
    lower !== null && lower > 0 ? formatRate(lower, per) : say.noLimit,
    hasUpper ? formatRate(upper, per) : say.noLimit,
  );
}
