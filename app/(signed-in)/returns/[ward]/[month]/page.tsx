import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { forPage, pageCtx } from "@/lib/auth";
import { longMonth } from "@/lib/indicators/chart-format";
import { parseMonth } from "@/lib/indicators/month";
import { can } from "@/lib/policy";
import { getHospital } from "@/lib/services/hospital";
import { getEntryPage, getSentLines } from "@/lib/services/returns";
import { listCorrections } from "@/lib/services/corrections";
import { entryWords } from "@/lib/strings/returns";
import { EntryDesk } from "./_components/entry-desk";
import { SentReturn } from "./_components/sent-return";
import "../../returns.css";

interface Props {
  params: Promise<{ ward: string; month: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const month = parseMonth((await params).month);
  return { title: month ? entryWords.title(longMonth(month)) : undefined };
}

/** One return: to fill in while it is open, then what it shows. */
export default async function ReturnPage({ params }: Props) {
  const { ward, month: monthText } = await params;
  const month = parseMonth(monthText);
  if (!month) notFound();
  const ctx = await pageCtx();
  const page = await forPage(getEntryPage({ ctx, input: { ward, month } }));
  const { timeZone } = await forPage(getHospital({ ctx }));
  const { wardReturn, may } = page;
  if (wardReturn.status === "open") {
    return (
      <EntryDesk
        initial={wardReturn}
        months={page.earlierMonths}
        earlier={page.earlier}
        types={page.types}
        may={may}
        isOver={page.isOver}
        mayBringIn={can(ctx.actor, "import.create")}
        timeZone={timeZone}
      />
    );
  }
  const lines = await forPage(getSentLines({ ctx, input: { ward, month } }));
  const { items } = await forPage(
    listCorrections({ ctx, input: { state: "waiting", ward: wardReturn.ward } }),
  );
  const waiting = items.filter((each) => each.month === month);
  return <SentReturn wardReturn={wardReturn} lines={lines} waiting={waiting} may={may} timeZone={timeZone} />;
}
