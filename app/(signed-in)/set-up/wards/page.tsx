import type { Metadata } from "next";
import { Link } from "@/app/_components/ui/link";
import { ButtonLink, Cell, DataRow, DataTable, EmptyState, HeadCell, RowHead } from "@/app/_components/ui";
import { longMonth } from "@/lib/indicators/chart-format";
import { listWards } from "@/lib/services/wards";
import { formWords, wardWords } from "@/lib/strings/set-up";
import { setUpCtx } from "../_components/set-up-ctx";
import { SetUpFrame } from "../_components/set-up-frame";

export const metadata: Metadata = { title: wardWords.caption };

export default async function WardsPage() {
  const ctx = await setUpCtx("ward.update");
  const wards = await listWards({ ctx });
  const add = (
    <ButtonLink look="primary" href="/set-up/wards/new">
      {wardWords.add}
    </ButtonLink>
  );
  return (
    <SetUpFrame
      ctx={ctx}
      current="wards"
      title={wardWords.caption}
      subtitle={wardWords.subtitle(wards.length)}
      actions={add}
    >
      {wards.length === 0 ? (
        <EmptyState title={wardWords.empty}>{wardWords.emptyNext}</EmptyState>
      ) : (
        <DataTable caption={wardWords.caption} hideCaption>
          <thead>
            <tr>
              <HeadCell>{wardWords.name}</HeadCell>
              <HeadCell>{wardWords.division}</HeadCell>
              <HeadCell className="not-on-phone">{wardWords.open}</HeadCell>
              <HeadCell>
                <span className="sr-only">{formWords.edit}</span>
              </HeadCell>
            </tr>
          </thead>
          <tbody>
            {wards.map((ward) => (
              <DataRow key={ward.code}>
                <RowHead>
                  <b>{ward.name}</b>
                  <small>{ward.code}</small>
                </RowHead>
                <Cell>{ward.division}</Cell>
                <Cell className="not-on-phone">
                  {wardWords.openRange(longMonth(ward.openFrom), ward.openTo && longMonth(ward.openTo))}
                </Cell>
                <Cell className="numeric">
                  <Link href={`/set-up/wards/${ward.code}`}>
                    {formWords.edit}
                    <span className="sr-only"> {ward.name}</span>
                  </Link>
                </Cell>
              </DataRow>
            ))}
          </tbody>
        </DataTable>
      )}
    </SetUpFrame>
  );
}
