import { Cell, DataRow, DataTable, HeadCell, RowHead } from "@/app/_components/ui/data-table";
import { isOverprint, Mark } from "@/app/_components/ui/mark";
import { Sayings } from "@/app/_components/chart/sayings";
import { figureGroups, type FigureGroup, type FigureRow } from "@/lib/scene/figures";
import { formatRate } from "@/lib/scene/format";
import { figuresTableWords as words } from "@/lib/strings/chart";
import type { ChartData } from "@/lib/scene/chart-data";

const columns = 10;

/** The chart's figures, newest first: always on the page, directly under the chart. */
export function FiguresTable({ data, id }: { data: ChartData; id?: string }) {
  return (
    <DataTable id={id} look="tight" caption={words.caption} captionNote={<CaptionNote data={data} />}>
      <thead>
        <tr>
          <HeadCell>{words.month}</HeadCell>
          <HeadCell numeric>{data.numeratorLabel}</HeadCell>
          <HeadCell numeric>{data.denominatorLabel}</HeadCell>
          <HeadCell numeric>{words.rate}</HeadCell>
          <LimitHeads />
          <HeadCell>{words.says}</HeadCell>
        </tr>
      </thead>
      {figureGroups(data).map((group) => (
        <Group key={group.rows[0]?.month ?? "empty"} group={group} />
      ))}
    </DataTable>
  );
}

function CaptionNote({ data }: { data: ChartData }) {
  const unit = data.unitWords.startsWith("per ")
    ? words.ratesAre(data.unitWords)
    : words.ratesIn(data.unitWords);
  const target = data.target === null ? null : words.target(formatRate(data.target, data.per));
  return (
    <>
      {words.upright} <i>{words.italic}</i> {words.order} {[unit, target].filter(Boolean).join("; ")}.
    </>
  );
}

function LimitHeads() {
  const heads = [words.lowerAction, words.lowerWarning, words.centre, words.upperWarning, words.upperAction];
  return heads.map((head) => (
    <HeadCell key={head} numeric className="not-on-phone">
      {head}
    </HeadCell>
  ));
}

function Group({ group }: { group: FigureGroup }) {
  return (
    <tbody>
      {group.heading === null ? null : (
        <DataRow tone="divider">
          <th scope="rowgroup" colSpan={columns}>
            <Mark mark="base" /> {group.heading}
          </th>
        </DataRow>
      )}
      {group.rows.map((row) => (
        <FigureRowView key={row.month} row={row} />
      ))}
    </tbody>
  );
}

function FigureRowView({ row }: { row: FigureRow }) {
  const stands = row.says.some((saying) => saying.mark !== null && isOverprint(saying.mark));
  return (
    <DataRow tone={stands ? "signal" : undefined}>
      <RowHead>{row.label}</RowHead>
      <Cell numeric>{row.numerator}</Cell>
      <Cell numeric>{row.denominator}</Cell>
      <Cell numeric workedOut={row.isWorkedOut}>
        {row.isWorkedOut ? <b>{row.rate}</b> : row.rate}
      </Cell>
      {row.limits === null ? (
        <Cell colSpan={5} className="not-on-phone" />
      ) : (
        row.limits.map((limit, index) => (
          <Cell key={index} numeric workedOut className="not-on-phone">
            {limit}
          </Cell>
        ))
      )}
      <Cell>
        <span className="sayings">
          <Sayings says={row.says} />
        </span>
      </Cell>
    </DataRow>
  );
}
