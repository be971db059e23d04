import { Cell, DataTable, HeadCell, RowHead, SectionHead } from "@/app/_components/ui";
import { formatCount } from "@/lib/indicators/chart-format";
import type { ImportReply } from "@/lib/schemas/import";
import { checkPageWords as say } from "@/lib/strings/imports";

/** Which column of the sheet was taken for what. */
export function ColumnsRead({ columns }: Pick<ImportReply, "columns">) {
  const names: Record<string, string> = say.columnNames;
  return (
    <section className="mb-4">
      <SectionHead>{say.columnsTitle}</SectionHead>
      <DataTable look="tight" caption={say.columnsTitle} hideCaption>
        <thead>
          <tr>
            <HeadCell>{say.inYourSheet}</HeadCell>
            <HeadCell>{say.readAs}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {columns.map(({ letter, header, readAs }) => (
            <tr key={letter}>
              <RowHead>
                {letter} “{header}”
              </RowHead>
              <Cell>{readAs === null ? <i>{say.notUsed}</i> : (names[readAs] ?? readAs)}</Cell>
            </tr>
          ))}
        </tbody>
      </DataTable>
      <p className="hint">{say.columnsNote}</p>
    </section>
  );
}

/** Sums per indicator as stored now and after: a slipped column shows at once. */
export function Sums({ totals }: Pick<ImportReply, "totals">) {
  if (totals.length === 0) return null;
  const spoken = ({ numerator, denominator }: { numerator: number; denominator: number }) =>
    `${formatCount(numerator)} / ${formatCount(denominator)}`;
  return (
    <section className="mb-4">
      <SectionHead>{say.sumsTitle}</SectionHead>
      <DataTable look="tight" caption={say.sumsTitle} hideCaption>
        <thead>
          <tr>
            <HeadCell>{say.sumsHeads.indicator}</HeadCell>
            <HeadCell numeric>{say.sumsHeads.now}</HeadCell>
            <HeadCell numeric>{say.sumsHeads.after}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {totals.map((each) => (
            <tr key={each.indicator}>
              <RowHead className="file-name">{each.name}</RowHead>
              <Cell numeric workedOut>
                {spoken(each.before)}
              </Cell>
              <Cell numeric workedOut>
                {spoken(each.after)}
              </Cell>
            </tr>
          ))}
        </tbody>
      </DataTable>
    </section>
  );
}
