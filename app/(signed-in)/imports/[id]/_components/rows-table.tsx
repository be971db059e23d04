import { Cell, classNames, DataTable, EmptyState, HeadCell, Mark, RowHead } from "@/app/_components/ui";
import { formatCount } from "@/lib/indicators/chart-format";
import type { ImportColumn } from "@/lib/indicators/import-row";
import type { ShownRow } from "@/lib/services/imports";
import { checkPageWords as say, monthName } from "@/lib/strings/imports";

/** The rows of the sheet with the cells that need fixing marked. */
export function RowsTable({ rows }: { rows: ShownRow[] }) {
  if (rows.length === 0) return <EmptyState title={say.noRows} />;
  return (
    <div className="table-scroll" role="region" aria-label={say.caption} tabIndex={0}>
      <DataTable className="import-table data-table-sheet" caption={say.caption} hideCaption>
        <thead>
          <tr>
            <HeadCell numeric>{say.heads.row}</HeadCell>
            <HeadCell>{say.heads.ward}</HeadCell>
            <HeadCell>{say.heads.indicator}</HeadCell>
            <HeadCell>{say.heads.month}</HeadCell>
            <HeadCell numeric>{say.heads.numerator}</HeadCell>
            <HeadCell numeric>{say.heads.denominator}</HeadCell>
            <HeadCell>{say.heads.outcome}</HeadCell>
            <HeadCell>{say.heads.why}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <SheetRow key={row.row} row={row} />
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

function SheetRow({ row }: { row: ShownRow }) {
  const isFix = row.outcome === "rejected";
  const marked = new Set(row.messages.flatMap((message) => message.columns));
  const fix = (column: ImportColumn) => isFix && marked.has(column);
  const tone = isFix ? "row-fix" : row.outcome === "same" ? "row-quiet" : undefined;
  return (
    <tr className={tone}>
      <RowHead numeric>{row.row}</RowHead>
      <Cell needsFixing={fix("ward")}>{row.wardName ?? row.ward}</Cell>
      <Cell needsFixing={fix("indicator")}>{row.indicatorName ?? row.indicator}</Cell>
      <Cell className="month" needsFixing={fix("month")}>
        {monthName(row.month)}
      </Cell>
      <Cell numeric needsFixing={fix("numerator")}>
        {figure(row, "numerator")}
      </Cell>
      <Cell numeric needsFixing={fix("denominator")}>
        {figure(row, "denominator")}
      </Cell>
      <Cell className={classNames("outcome", isFix && "outcome-fix")}>
        <Outcome row={row} />
      </Cell>
      <Cell className="why">
        {whyOf(row).map((words) => (
          <p key={words}>{words}</p>
        ))}
      </Cell>
    </tr>
  );
}

/** The count, or what stood there where it can't be read. */
function figure(row: ShownRow, column: "numerator" | "denominator"): string {
  const value = row[column];
  if (value !== null) return formatCount(value);
  return row.messages.find((message) => message.columns.includes(column))?.written ?? "";
}

function Outcome({ row }: { row: ShownRow }) {
  const words = say.outcome[row.outcome];
  switch (row.outcome) {
    case "rejected":
      return (
        <>
          <Mark mark="fix" /> {words}
        </>
      );
    case "changed":
      return (
        <>
          <Mark mark="corrected" /> {changesSent(row) ? `${words}, ${say.needsReason}` : words}
        </>
      );
    case "new":
      return (
        <>
          <Mark mark="saved" /> {changesSent(row) ? `${words}, ${say.needsReason}` : words}
        </>
      );
    default:
      return (
        <>
          <span className="dash" aria-hidden /> {words}
        </>
      );
  }
}

function changesSent({ before }: ShownRow): boolean {
  return before?.return != null && before.return.status !== "open";
}

function whyOf(row: ShownRow): string[] {
  const messages = row.messages.map(({ cell, message, columns }) =>
    columns.length > 0 ? `${cell}: ${message}` : message,
  );
  const given = [
    ...(row.notCollected ? [say.notCollected(row.notCollected)] : []),
    ...(row.note ? [say.note(row.note)] : []),
  ];
  return [...messages, ...(row.outcome === "changed" ? wasOf(row) : []), ...given];
}

/** What a row replaces. */
function wasOf({ before }: ShownRow): string[] {
  if (!before?.tally) return [];
  const { numerator, denominator, notCollected } = before.tally;
  if (notCollected !== null) return [say.wasNotCollected(notCollected)];
  const outOf = denominator ?? before.shared?.value ?? null;
  const spoken = (count: number | null) => (count === null ? say.blank : formatCount(count));
  return [say.was(spoken(numerator), spoken(outOf))];
}
