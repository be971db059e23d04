import { Link } from "@/app/_components/ui/link";
import { Cell, DataRow, DataTable, HeadCell, Mark } from "@/app/_components/ui";
import type { SignalInWords } from "@/lib/services/signals";
import { myPageWords as say } from "@/lib/strings/my-page";

/** Signals that nobody looks into yet. */
export function NewSignals({ signals }: { signals: readonly SignalInWords[] }) {
  if (signals.length === 0) return <p className="my-section">{say.noSignals}</p>;
  return (
    <section className="my-section">
      <DataTable caption={say.newSignals} look="roomy">
        <thead>
          <tr>
            <HeadCell className="waiting-mark">
              <span className="sr-only">{say.mark}</span>
            </HeadCell>
            <HeadCell>{say.indicatorAndWard}</HeadCell>
            <HeadCell>{say.seen}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {signals.map(({ signal, words, indicatorName, wardName }) => (
            <DataRow key={signal.id}>
              <Cell className="waiting-mark">
                <Mark mark={words.mark} size={16} alone />
              </Cell>
              <Cell>
                <Link href={`/charts/${signal.ward}/${signal.indicator}`}>{indicatorName}</Link>
                <small>{wardName}</small>
              </Cell>
              <Cell>
                {words.what}
                {words.towards ? `, ${words.towards}` : null}
                <small>{words.months}</small>
              </Cell>
            </DataRow>
          ))}
        </tbody>
      </DataTable>
      <p className="mt-2">
        <Link href="/signals">{say.allSignals}</Link>
      </p>
    </section>
  );
}
