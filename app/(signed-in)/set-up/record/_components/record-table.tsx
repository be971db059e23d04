import { Fragment } from "react";
import { Cell, DataRow, DataTable, HeadCell, RowHead } from "@/app/_components/ui";
import { formatCount } from "@/lib/indicators/chart-format";
import type { AuditPage } from "@/lib/schemas/audit";
import { actionWords } from "@/lib/strings/record";
import { recordWords } from "@/lib/strings/set-up";
import { differencesOf, subjectInWords, valueInWords, type Difference } from "./differences";

/** Entries, newest first; what changed opens under each. */
export function RecordTable({ items, timeZone }: { items: AuditPage["items"]; timeZone: string }) {
  const clock = new Intl.DateTimeFormat("en-GB", { timeZone, dateStyle: "medium", timeStyle: "short" });
  return (
    <div className="table-scroll" tabIndex={0} role="region" aria-label={recordWords.caption}>
      <DataTable
        caption={recordWords.caption}
        captionNote={recordWords.captionNote(timeZone)}
        className="record-table"
      >
        <thead>
          <tr>
            <HeadCell numeric className="not-on-phone">
              {recordWords.number}
            </HeadCell>
            <HeadCell>{recordWords.when}</HeadCell>
            <HeadCell>{recordWords.who}</HeadCell>
            <HeadCell>{recordWords.what}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {items.map((entry) => (
            <EntryRow key={entry.seq} entry={entry} at={clock.format(new Date(entry.at))} />
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

function EntryRow({ entry, at }: { entry: AuditPage["items"][number]; at: string }) {
  const subject = subjectInWords(entry);
  return (
    <DataRow>
      <RowHead numeric className="not-on-phone">
        {formatCount(entry.seq)}
      </RowHead>
      <Cell>
        <time dateTime={entry.at}>{at}</time>
      </Cell>
      <Cell>{entry.actor.name}</Cell>
      <Cell>
        {actionWords[entry.action] ?? entry.action}
        {subject === null ? null : <small>{subject}</small>}
        <Changed number={formatCount(entry.seq)} differences={differencesOf(entry.before, entry.after)} />
      </Cell>
    </DataRow>
  );
}

function Changed({ number, differences }: { number: string; differences: Difference[] }) {
  if (differences.length === 0) return null;
  return (
    <details>
      <summary>
        {recordWords.details(differences.length)}
        <span className="sr-only"> {recordWords.ofEntry(number)}</span>
      </summary>
      <dl>
        {differences.map(({ field, before, after }) => (
          <Fragment key={field}>
            <dt>{field}</dt>
            <dd>{recordWords.change(valueInWords(before), valueInWords(after) ?? recordWords.nothing)}</dd>
          </Fragment>
        ))}
      </dl>
    </details>
  );
}
