import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ButtonLink, PageHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { longMonth } from "@/lib/indicators/chart-format";
import { parseMonth } from "@/lib/indicators/month";
import { typesNumerator } from "@/lib/policy";
import { getHospital } from "@/lib/services/hospital";
import { getEntryPage } from "@/lib/services/returns";
import { listCorrections } from "@/lib/services/corrections";
import { getTallyHistory } from "@/lib/services/tallies";
import { entryWords, historyWords } from "@/lib/strings/returns";
import { CorrectLine } from "./_components/correct-line";
import { DecideCorrection } from "./_components/decide-correction";
import { HistoryTable } from "./_components/history-table";
import "../../../returns.css";

interface Props {
  params: Promise<{ ward: string; month: string; indicator: string }>;
}

export const metadata: Metadata = { title: historyWords.caption };

/** One line of a return: every value that it had, and its correction. */
export default async function LinePage({ params }: Props) {
  const { ward, month: monthText, indicator } = await params;
  const month = parseMonth(monthText);
  if (!month) notFound();
  const ctx = await pageCtx();
  const history = await forPage(getTallyHistory({ ctx, input: { ward, month, indicator } }));
  const { wardReturn, may } = await forPage(getEntryPage({ ctx, input: { ward, month } }));
  const { timeZone } = await forPage(getHospital({ ctx }));
  const { items } = await forPage(listCorrections({ ctx, input: { state: "waiting", ward: history.ward } }));
  const { tally } = history;
  const waiting = items.find((each) => each.month === month && each.indicator === tally.indicator);
  const isOpen = wardReturn.status === "open";
  return (
    <>
      <PageHead
        crumbs={[
          { label: entryWords.crumb, href: "/returns" },
          { label: history.wardName, href: `/returns/${history.ward}/${month}` },
        ]}
        title={historyWords.title(longMonth(month))}
        subtitle={historyWords.subtitle(tally.name, history.wardName)}
        actions={
          <>
            <ButtonLink href={`/charts/${history.ward}/${tally.indicator}`}>
              {historyWords.toChart}
            </ButtonLink>
            <ButtonLink href={`/returns/${history.ward}/${month}`}>{historyWords.backToReturn}</ButtonLink>
          </>
        }
      />
      <div className="with-aside">
        <HistoryTable history={history} timeZone={timeZone} />
        <div>
          {waiting ? (
            <DecideCorrection
              key={waiting.version}
              correction={waiting}
              tally={tally}
              mayDecide={may.decide}
              timeZone={timeZone}
            />
          ) : null}
          {isOpen ? <p className="hint">{historyWords.openHint}</p> : null}
          {!isOpen && may.correct && !waiting ? (
            <CorrectLine
              ward={history.ward}
              month={month}
              tally={tally}
              holdsAtOnce={may.decide}
              typesNumerator={typesNumerator(ctx.actor, tally)}
            />
          ) : null}
        </div>
      </div>
    </>
  );
}
