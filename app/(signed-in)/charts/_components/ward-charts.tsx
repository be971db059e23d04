import { Link } from "@/app/_components/ui/link";
import { Cell, DataRow, DataTable, HeadCell, Mark, NamedMark } from "@/app/_components/ui";
import { formatCount, formatRateWords, longMonth } from "@/lib/scene/format";
import type { ListedChart } from "@/lib/services/charts";
import { baselineStatusWords, chartIndexWords as words } from "@/lib/strings/charts";

/** One ward's charts with what the newest month of each says. */
export function WardCharts({ charts }: { charts: ListedChart[] }) {
  const ward = charts[0]?.ward;
  if (!ward) return null;
  return (
    <div className="table-scroll chart-index">
      <DataTable caption={ward.name} look="tight">
        <thead>
          <tr>
            <HeadCell>{words.indicator}</HeadCell>
            <HeadCell className="not-on-phone">{words.newest}</HeadCell>
            <HeadCell numeric className="not-on-phone">
              {words.counted}
            </HeadCell>
            <HeadCell numeric>{words.value}</HeadCell>
            <HeadCell className="not-on-phone">{words.limits}</HeadCell>
            <HeadCell>{words.says}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {charts.map((chart) => (
            <ChartRow key={chart.indicator.code} chart={chart} />
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

function ChartRow({ chart }: { chart: ListedChart }) {
  const { ward, indicator, newest } = chart;
  const href = `/charts/${ward.code}/${indicator.code}`;
  return (
    <DataRow>
      <th scope="row">
        <Link href={href}>
          {indicator.name}
          <span className="sr-only">, {ward.name}</span>
        </Link>
      </th>
      <Cell className="not-on-phone">{newest ? longMonth(newest.month) : words.nothingYet}</Cell>
      <Cell numeric className="not-on-phone">
        {newest ? words.outOf(formatCount(newest.numerator), formatCount(newest.denominator)) : null}
      </Cell>
      <Cell numeric workedOut>
        {newest ? <b>{formatRateWords(newest.value, indicator.per)}</b> : null}
      </Cell>
      <Cell className="not-on-phone">
        {chart.hasLimits || chart.status === "none"
          ? baselineStatusWords[chart.status]
          : baselineStatusWords.none}
      </Cell>
      <Cell>
        <span className="sayings">
          {chart.marks.map((mark) => (
            <NamedMark key={mark} mark={mark} size={13} />
          ))}
          {newest && chart.marks.length === 0 ? words.quiet : null}
          {chart.isProposed ? (
            <Link href={`${href}/baseline`}>
              <Mark mark="base" size={13} /> {words.proposed}
            </Link>
          ) : null}
        </span>
      </Cell>
    </DataRow>
  );
}
