import { Link } from "@/app/_components/ui/link";
import { Cell, DataRow, DataTable, HeadCell, Mark } from "@/app/_components/ui";
import { formatExpected } from "@/lib/indicators/signal-words";
import { formatCount, longDate } from "@/lib/scene/format";
import type { SignalInWords } from "@/lib/services/signals";
import { signalsPageWords as words, signalStatusWords } from "@/lib/strings/signals";

/** Each signal with what was counted, what the chart says and how easily chance does the same. */
export function SignalsTable({ items }: { items: SignalInWords[] }) {
  return (
    <div className="table-scroll">
      <DataTable caption={words.caption} hideCaption look="roomy" className="signals-table" role="table">
        <thead>
          <tr>
            <HeadCell>
              <span className="sr-only">{words.mark}</span>
            </HeadCell>
            <HeadCell>{words.indicatorAndWard}</HeadCell>
            <HeadCell>{words.seen}</HeadCell>
            <HeadCell numeric className="not-on-phone">
              {words.observed}
            </HeadCell>
            <HeadCell numeric className="not-on-phone">
              {words.expected}
            </HeadCell>
            <HeadCell numeric className="not-on-phone">
              {words.chance}
            </HeadCell>
            <HeadCell>{words.born}</HeadCell>
          </tr>
        </thead>
        {/* Laid out as blocks on a phone, where some browsers would forget what rows and cells are. */}
        <tbody role="rowgroup">
          {items.map((item) => (
            <SignalRow key={item.signal.id} item={item} />
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

function SignalRow({ item }: { item: SignalInWords }) {
  const { signal, evidence, words: said } = item;
  const isWithdrawn = signal.status === "withdrawn";
  return (
    <DataRow tone={isWithdrawn ? "quiet" : undefined} role="row">
      <Cell role="cell">
        <Mark mark={said.mark} size={18} />
      </Cell>
      <th scope="row" role="rowheader">
        <Link href={`/charts/${signal.ward}/${signal.indicator}`}>
          <b>{item.indicatorName}</b>
        </Link>
        <small>{item.wardName}</small>
        <small>{said.months}</small>
      </th>
      <Cell role="cell">
        <b>{said.what}</b>
        {said.towards ? `, ${said.towards}` : null}
        <small>{said.sentences.join(" ")}</small>
      </Cell>
      <Cell numeric role="cell" className="not-on-phone">
        {evidence ? <b>{formatCount(evidence.observed)}</b> : null}
      </Cell>
      <Cell numeric workedOut role="cell" className="not-on-phone">
        {evidence ? formatExpected(evidence.expected) : null}
      </Cell>
      <Cell numeric workedOut role="cell" className="not-on-phone odds">
        {said.odds}
      </Cell>
      <Cell role="cell">
        {words.since(longDate(signal.bornAt.slice(0, 10)))}
        <small>{signalStatusWords[signal.status]}</small>
        {signal.onNewest ? null : <small>{words.older}</small>}
      </Cell>
    </DataRow>
  );
}
