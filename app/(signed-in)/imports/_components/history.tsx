import { Link } from "@/app/_components/ui/link";
import { Cell, DataRow, DataTable, EmptyState, HeadCell, RowHead, SectionHead } from "@/app/_components/ui";
import { longDate } from "@/lib/indicators/chart-format";
import { dateInZone } from "@/lib/indicators/month";
import type { ImportSummary } from "@/lib/schemas/import";
import { importPageWords as say } from "@/lib/strings/imports";
import { TakeBack } from "./take-back";

interface HistoryProps {
  items: ImportSummary[];
  nextCursor: string | null;
  timeZone: string;
}

/** The files so far, newest first, and what became of each. */
export function History({ items, nextCursor, timeZone }: HistoryProps) {
  const dayOf = (instant: string) => longDate(dateInZone(new Date(instant), timeZone));
  return (
    <section>
      <SectionHead>{say.historyTitle}</SectionHead>
      {items.length === 0 ? (
        <EmptyState title={say.noHistory} />
      ) : (
        <DataTable caption={say.historyCaption} hideCaption>
          <thead>
            <tr>
              <HeadCell>{say.columns.file}</HeadCell>
              <HeadCell className="not-on-phone">{say.columns.checked}</HeadCell>
              <HeadCell>{say.columns.outcome}</HeadCell>
              <HeadCell>{say.columns.action}</HeadCell>
            </tr>
          </thead>
          <tbody>
            {items.map((item) => (
              <DataRow key={item.id} tone={item.state === "committed" ? undefined : "quiet"}>
                <RowHead className="file-name">
                  <Link href={`/imports/${item.id}`}>{item.fileName}</Link>
                </RowHead>
                <Cell className="not-on-phone">{say.by(item.uploadedBy, dayOf(item.uploadedAt))}</Cell>
                <Cell>{outcomeOf(item, dayOf)}</Cell>
                <Cell>
                  {item.state === "committed" ? (
                    <TakeBack id={item.id} rows={item.broughtIn} />
                  ) : (
                    <Link href={`/imports/${item.id}`}>
                      {say.look}
                      <span className="sr-only">: {item.fileName}</span>
                    </Link>
                  )}
                </Cell>
              </DataRow>
            ))}
          </tbody>
        </DataTable>
      )}
      {nextCursor ? (
        <p className="mt-2">
          <Link href={`/imports?cursor=${nextCursor}`}>{say.more}</Link>
        </p>
      ) : null}
    </section>
  );
}

function outcomeOf(item: ImportSummary, dayOf: (instant: string) => string): string {
  if (item.state === "taken-back") return say.outcomes.takenBack(dayOf(item.takenBackAt ?? item.uploadedAt));
  if (item.state === "checked") return say.outcomes.checked;
  return say.outcomes.committed(
    item.broughtIn,
    item.committedBy ?? "",
    dayOf(item.committedAt ?? item.uploadedAt),
  );
}
