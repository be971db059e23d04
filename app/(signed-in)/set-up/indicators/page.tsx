import type { Metadata } from "next";
import { Link } from "@/app/_components/ui/link";
import { ButtonLink, Cell, DataRow, DataTable, EmptyState, HeadCell, RowHead } from "@/app/_components/ui";
import { perWords } from "@/lib/indicators/chart-format";
import { indicatorReply, listIndicators } from "@/lib/services/indicators";
import { indicatorWords, kindWords, teamNames } from "@/lib/strings/indicator-set-up";
import { formWords } from "@/lib/strings/set-up";
import { setUpCtx } from "../_components/set-up-ctx";
import { SetUpFrame } from "../_components/set-up-frame";

export const metadata: Metadata = { title: indicatorWords.caption };

export default async function IndicatorsPage() {
  const ctx = await setUpCtx("indicator.update");
  const indicators = (await listIndicators({ ctx })).map(indicatorReply);
  const add = (
    <ButtonLink look="primary" href="/set-up/indicators/new">
      {indicatorWords.add}
    </ButtonLink>
  );
  return (
    <SetUpFrame
      ctx={ctx}
      current="indicators"
      title={indicatorWords.caption}
      subtitle={indicatorWords.subtitle(indicators.length)}
      actions={add}
    >
      {indicators.length === 0 ? (
        <EmptyState title={indicatorWords.empty}>{indicatorWords.emptyNext}</EmptyState>
      ) : (
        <DataTable caption={indicatorWords.caption} hideCaption>
          <thead>
            <tr>
              <HeadCell>{indicatorWords.name}</HeadCell>
              <HeadCell className="not-on-phone">{indicatorWords.numerator}</HeadCell>
              <HeadCell className="not-on-phone">{indicatorWords.denominator}</HeadCell>
              <HeadCell className="not-on-phone">{indicatorWords.kind}</HeadCell>
              <HeadCell>{indicatorWords.team}</HeadCell>
              <HeadCell>
                <span className="sr-only">{formWords.edit}</span>
              </HeadCell>
            </tr>
          </thead>
          <tbody>
            {indicators.map((indicator) => (
              <DataRow key={indicator.code}>
                <RowHead className="whitespace-normal!">
                  <b>{indicator.name}</b>
                  <small>{indicator.code}</small>
                </RowHead>
                <Cell className="not-on-phone">{indicator.numeratorLabel}</Cell>
                <Cell className="not-on-phone">
                  {indicator.denominatorLabel}
                  {indicator.sharedDenominator ? <small>{indicator.sharedDenominator}</small> : null}
                </Cell>
                <Cell className="not-on-phone">
                  {kindWords[indicator.kind]}
                  <small>{perWords(indicator.per)}</small>
                </Cell>
                <Cell>{teamNames[indicator.team]}</Cell>
                <Cell className="numeric">
                  <Link href={`/set-up/indicators/${indicator.code}`}>
                    {formWords.edit}
                    <span className="sr-only"> {indicator.name}</span>
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
