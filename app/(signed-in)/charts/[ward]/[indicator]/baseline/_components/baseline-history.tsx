import { Cell, DataRow, DataTable, EmptyState, HeadCell } from "@/app/_components/ui";
import { flagMonth, formatRateWords, longDate } from "@/lib/scene/format";
import type { BaselineItem } from "@/lib/services/baselines";
import { baselineStateWords, baselineWords as words, limitMethodWords } from "@/lib/strings/charts";

/** Every baseline that the chart had or was proposed. */
export function BaselineHistory({ items, per }: { items: BaselineItem[]; per: number }) {
  if (items.length === 0) return <EmptyState title={words.history}>{words.noHistory}</EmptyState>;
  return (
    <div className="table-scroll mb-3">
      <DataTable caption={words.history} look="roomy">
        <thead>
          <tr>
            <HeadCell>{words.months}</HeadCell>
            <HeadCell>{words.state}</HeadCell>
            <HeadCell numeric>{words.centre}</HeadCell>
            <HeadCell className="not-on-phone">{words.limits}</HeadCell>
            <HeadCell>{words.reason}</HeadCell>
            <HeadCell className="not-on-phone">{words.who}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {items.map((item) => (
            <HistoryRow key={item.id} item={item} per={per} />
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

function HistoryRow({ item, per }: { item: BaselineItem; per: number }) {
  return (
    <DataRow tone={item.state === "decided" || item.state === "proposed" ? undefined : "quiet"}>
      <th scope="row">
        {words.range(flagMonth(item.from), flagMonth(item.to))}
        <small>
          {item.appliesFrom ? words.holdsFrom(flagMonth(item.appliesFrom)) : words.holdsFromStart}
        </small>
        <small>{words.leftOutCount(item.leftOut.length)}</small>
      </th>
      <Cell>{baselineStateWords[item.state]}</Cell>
      <Cell numeric workedOut>
        {item.centre === null ? words.none : formatRateWords(item.centre, per)}
      </Cell>
      <Cell className="not-on-phone">{limitMethodWords[item.limits]}</Cell>
      <Cell>
        {item.reason}
        {item.leftOut.map((each) => (
          <small key={each.month}>{words.leftOutLine(flagMonth(each.month), each.reason)}</small>
        ))}
      </Cell>
      <Cell className="not-on-phone">
        {words.proposedBy(item.proposedBy, longDate(item.proposedAt.slice(0, 10)))}
        {item.decidedBy && item.decidedAt ? (
          <small>{decisionWords(item, item.decidedBy, longDate(item.decidedAt.slice(0, 10)))}</small>
        ) : null}
        {item.decisionReason ? <small>{item.decisionReason}</small> : null}
      </Cell>
    </DataRow>
  );
}

function decisionWords(item: BaselineItem, by: string, date: string): string {
  return item.state === "declined" ? words.declinedBy(by, date) : words.decidedBy(by, date);
}
