import { monthAlone, shortDay, tableInstant } from "@/lib/indicators/return-dates";
import type { Month } from "@/lib/indicators/month";
import type { CorrectionReply } from "@/lib/schemas/correction";
import type { ReturnListItem } from "@/lib/schemas/ward-return";
import { myPageWords as say } from "@/lib/strings/my-page";
import type { KnownThing } from "./good-to-know";
import type { WaitingThing } from "./waiting-list";

export interface Day {
  today: string;
  thisMonth: Month;
  timeZone: string;
}

function dueWords({ dueOn, late }: ReturnListItem, today: string): string {
  if (dueOn === today) return say.today;
  return late ? say.late(shortDay(dueOn)) : shortDay(dueOn);
}

const returnPage = ({ ward, month }: { ward: string; month: string }) => `/returns/${ward}/${month}`;

/** Returns of months that are over and still open, newest first: the one that is due now stands on top. */
export function returnsToFillIn(items: readonly ReturnListItem[], day: Day): WaitingThing[] {
  return items
    .filter((item) => item.status === "open" && item.month < day.thisMonth)
    .map((item, index) => ({
      key: `return ${item.ward} ${item.month}`,
      mark: item.late ? "late" : "unsaved",
      what: say.returnOf(item.wardName, monthAlone(item.month)),
      detail: fillInDetail(item),
      due: dueWords(item, day.today),
      step: { label: item.answered > 0 ? say.carryOn : say.fillIn, href: returnPage(item) },
      isFirst: index === 0,
    }));
}

function fillInDetail(item: ReturnListItem): string {
  const lines = item.answered > 0 ? say.linesEntered(item.answered, item.lines) : say.notBegun(item.lines);
  return item.reopened ? `${say.openedAgain} ${lines}` : lines;
}

/** Returns that were sent and wait for acceptance, the oldest sending first. */
export function returnsToAccept(items: readonly ReturnListItem[], { timeZone }: Day): WaitingThing[] {
  return items
    .filter((item) => item.status === "submitted")
    .sort((left, right) => ((left.submittedAt ?? "") < (right.submittedAt ?? "") ? -1 : 1))
    .map((item, index) => ({
      key: `accept ${item.ward} ${item.month}`,
      mark: "saved",
      what: say.returnOf(item.wardName, monthAlone(item.month)),
      detail: say.toAccept(
        item.submittedBy ?? "",
        item.submittedAt ? tableInstant(item.submittedAt, timeZone) : "",
      ),
      due: null,
      step: { label: say.lookAndAccept, href: returnPage(item) },
      isFirst: index === 0,
    }));
}

const linePage = (each: CorrectionReply) => `${returnPage(each)}/${each.indicator}`;

export function correctionsToDecide(corrections: readonly CorrectionReply[]): WaitingThing[] {
  return corrections.map((each) => ({
    key: `correction ${each.id}`,
    mark: "corrected",
    what: `${each.wardName}, ${say.correctionOf(each.indicatorName, monthAlone(each.month))}`,
    detail: say.correctionWaits(each.askedBy, each.reason),
    due: null,
    step: { label: say.decide, href: linePage(each) },
  }));
}

export function correctionsAsked(corrections: readonly CorrectionReply[]): KnownThing[] {
  return corrections.map((each) => ({
    key: `asked ${each.id}`,
    mark: "corrected",
    what: `${each.wardName}, ${say.yourCorrection(each.indicatorName, monthAlone(each.month))}`,
    detail: say.correctionStands,
    link: { label: say.whatItShows, href: linePage(each) },
  }));
}

/** The last month's returns that are sent, with what they show. */
export function returnsSent(items: readonly ReturnListItem[], month: Month, { timeZone }: Day): KnownThing[] {
  return items
    .filter((item) => item.status !== "open" && item.month === month)
    .map((item) => {
      const sent = item.submittedAt ? say.sent(tableInstant(item.submittedAt, timeZone)) : "";
      const accepted = item.acceptedAt ? say.accepted(tableInstant(item.acceptedAt, timeZone)) : "";
      const awaited = item.awaited > 0 ? say.awaited(item.awaited) : "";
      return {
        key: `sent ${item.ward} ${item.month}`,
        mark: "saved",
        what: say.returnOf(item.wardName, monthAlone(item.month)),
        detail: [sent, accepted, awaited].filter(Boolean).join(" "),
        link: { label: say.whatItShows, href: returnPage(item) },
      };
    });
}
