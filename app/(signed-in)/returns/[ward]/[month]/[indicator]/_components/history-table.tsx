import { Cell, DataRow, DataTable, EmptyState, HeadCell, Mark } from "@/app/_components/ui";
import { formatCount, noFigure } from "@/lib/indicators/chart-format";
import { tableInstant } from "@/lib/indicators/return-dates";
import type { TallyHistory, TallyRevision } from "@/lib/schemas/tally";
import { historyWords } from "@/lib/strings/returns";

const marked = new Set<TallyRevision["event"]>(["correction-asked", "corrected", "correction-declined"]);

/** Every value of one line, oldest first. */
export function HistoryTable({ history, timeZone }: { history: TallyHistory; timeZone: string }) {
  const { tally, items } = history;
  if (items.length === 0) return <EmptyState title={historyWords.none} />;
  return (
    <div className="table-scroll" tabIndex={0} role="region" aria-label={historyWords.caption}>
      <DataTable
        caption={historyWords.caption}
        captionNote={historyWords.captionNote}
        look="roomy"
        className="history-lines"
      >
        <thead>
          <tr>
            <HeadCell>{historyWords.when}</HeadCell>
            <HeadCell>{historyWords.who}</HeadCell>
            <HeadCell>{historyWords.from}</HeadCell>
            <HeadCell numeric>{tally.numeratorLabel}</HeadCell>
            <HeadCell numeric>{tally.denominatorLabel}</HeadCell>
            <HeadCell>{historyWords.what}</HeadCell>
            <HeadCell>{historyWords.reason}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {items.map((revision, index) => (
            <DataRow key={index} tone={index === items.length - 1 ? "selected" : undefined}>
              <Cell>{tableInstant(revision.at, timeZone)}</Cell>
              <Cell>{revision.by}</Cell>
              <Cell>{historyWords.sources[revision.source]}</Cell>
              <Cell numeric>{figure(revision.numerator)}</Cell>
              <Cell numeric>{figure(revision.denominator)}</Cell>
              <Cell>
                {marked.has(revision.event) ? <Mark mark="corrected" /> : null} {eventWords(revision)}
              </Cell>
              <Cell>{revision.reason ?? revision.note ?? ""}</Cell>
            </DataRow>
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

const figure = (count: number | null): string => (count === null ? noFigure : formatCount(count));

function eventWords({ event, charted, notCollected, awaited }: TallyRevision): string {
  const words: string[] = [historyWords.events[event]];
  if (notCollected !== null) words.push(`${historyWords.notCollected}: ${notCollected}`);
  if (awaited !== null) words.push(`${historyWords.awaited}: ${awaited}`);
  if (charted === false && event !== "recalled") words.push(historyWords.offChart);
  return words.join(", ");
}
