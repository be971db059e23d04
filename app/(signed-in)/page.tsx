import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { PageHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { inWords } from "@/lib/indicators/chart-format";
import { addMonths, dateInZone, monthInZone, monthRange } from "@/lib/indicators/month";
import { dayInWords, monthAlone } from "@/lib/indicators/return-dates";
import { mayAttempt, scopeOf } from "@/lib/policy";
import { listCorrections } from "@/lib/services/corrections";
import { getHospital } from "@/lib/services/hospital";
import { listReturns, listTeamLines, teamOf } from "@/lib/services/returns";
import { listSignalsInWords } from "@/lib/services/signals";
import { myPageWords as say } from "@/lib/strings/my-page";
import { navigationWords } from "@/lib/strings/people";
import { teamWords } from "@/lib/strings/returns";
import { GoodToKnow, type KnownThing } from "./_my-page/good-to-know";
import { NewSignals } from "./_my-page/new-signals";
import { ToCount } from "./_my-page/to-count";
import {
  correctionsAsked,
  correctionsToDecide,
  returnsSent,
  returnsToAccept,
  returnsToFillIn,
  type Day,
} from "./_my-page/waiting";
import { WaitingList, type WaitingThing } from "./_my-page/waiting-list";
import { WardScales } from "./_my-page/ward-scales";
import "./_my-page/my-page.css";

export const metadata: Metadata = { title: navigationWords.myPage };

const SHOWN_SIGNALS = 8;
/** A nurse sees them after what waits. */
const OWN_SIGNALS = 3;

/** What waits for whoever has signed in, and what is good to know. */
export default async function MyPage() {
  const ctx = await pageCtx();
  const { actor } = ctx;
  if (!mayAttempt(actor, "return.read")) redirect("/packs");
  const { timeZone } = await forPage(getHospital({ ctx }));
  const thisMonth = monthInZone(ctx.now, timeZone);
  const lastMonth = addMonths(thisMonth, -1);
  const day: Day = { today: dateInZone(ctx.now, timeZone), thisMonth, timeZone };
  const items = await forPage(listReturns({ ctx, input: {} }));
  const { items: corrections } = await forPage(listCorrections({ ctx, input: { state: "waiting" } }));
  const team = teamOf(actor);
  const hasOwnWards = scopeOf(actor).wards !== "all";
  const decides = mayAttempt(actor, "correction.decide");
  const things: WaitingThing[] = [
    ...(hasOwnWards ? returnsToFillIn(items, day) : []),
    ...(mayAttempt(actor, "return.accept") ? returnsToAccept(items, day) : []),
    ...(decides ? correctionsToDecide(corrections) : []),
  ];
  const known: KnownThing[] = [
    ...(hasOwnWards ? correctionsAsked(corrections) : wholeMonth(items, lastMonth)),
    ...(hasOwnWards ? returnsSent(items, lastMonth, day) : []),
  ];
  const signals = await forPage(
    listSignalsInWords({
      ctx,
      input: { status: ["new"], team: team ?? undefined, limit: hasOwnWards ? OWN_SIGNALS : SHOWN_SIGNALS },
    }),
  );
  const wards = [...new Set(items.map((item) => item.wardName))];
  return (
    <>
      <PageHead
        title={dayInWords(day.today)}
        subtitle={subtitle(things.length, hasOwnWards ? wards : null)}
      />
      <div className="with-aside">
        <div>
          <WaitingList things={things} />
          {hasOwnWards ? null : <NewSignals signals={signals.items} />}
          <GoodToKnow things={known} />
          {hasOwnWards ? <NewSignals signals={signals.items} /> : null}
        </div>
        <div>
          {team ? <ToCount team={teamWords[team]} lines={await forPage(listTeamLines({ ctx }))} /> : null}
          {team ? null : (
            <WardScales
              title={hasOwnWards ? say.yourWards : say.allWards}
              items={items}
              months={monthRange(addMonths(thisMonth, -11), thisMonth)}
              thisMonth={thisMonth}
            />
          )}
        </div>
      </div>
    </>
  );
}

function subtitle(waiting: number, wards: readonly string[] | null): string {
  const waits = waiting === 0 ? say.nothingWaits : say.thingsWait(waiting);
  if (wards === null) return waits;
  if (wards.length === 0) return say.noWards;
  return `${waits} ${wards.length === 1 ? say.oneWard(wards[0] ?? "") : say.wards(inWords(wards))}`;
}

/** How far the hospital's returns of the month have come in. */
function wholeMonth(items: Awaited<ReturnType<typeof listReturns>>, month: string): KnownThing[] {
  const own = items.filter((item) => item.month === month);
  if (own.length === 0) return [];
  const open = own.filter((item) => item.status === "open").map((item) => item.wardName);
  const sent = say.sentOf(own.length - open.length, own.length);
  return [
    {
      key: "month",
      mark: open.length === 0 ? "saved" : "unsaved",
      what: say.returnsOf(monthAlone(month)),
      detail: open.length === 0 ? sent : `${sent} ${say.notSent(inWords(open))}`,
      link: { label: navigationWords.returns, href: `/returns?month=${month}` },
    },
  ];
}
