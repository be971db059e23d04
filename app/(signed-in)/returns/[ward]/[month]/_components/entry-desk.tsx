"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, ButtonLink, EmptyState, Notice, PageHead } from "@/app/_components/ui";
import { sendJson } from "@/app/_hooks/use-api";
import { dayInWords } from "@/lib/indicators/return-dates";
import type { EarlierFigures, ReturnSteps, TypedParts } from "@/lib/indicators/return-entry";
import type { Month } from "@/lib/indicators/month";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { longMonth } from "@/lib/indicators/chart-format";
import { entryWords } from "@/lib/strings/returns";
import { typedIn } from "./entry-state";
import { EntryGrid } from "./entry-grid";
import { holdOf, lineStatus, saysSomething } from "./line-status";
import { OtherAnswer } from "./other-answer";
import { SendReasons, type HeldLine } from "./send-bar";
import { returnUrl, useEntry } from "./use-entry";

export interface EntryDeskProps {
  initial: WardReturnReply;
  months: Month[];
  earlier: Record<string, EarlierFigures[]>;
  types: Record<string, TypedParts>;
  may: ReturnSteps;
  /** False while the month is running: it can be filled in, not sent. */
  isOver: boolean;
  /** Whether this person brings workbooks in. */
  mayBringIn: boolean;
  timeZone: string;
}

const nothingTyped: TypedParts = { numerator: false, line: false };

/** The page of an open return: head with what is left to do, the table, and the sending. */
export function EntryDesk({
  initial,
  months,
  earlier,
  types,
  may,
  isOver,
  mayBringIn,
  timeZone,
}: EntryDeskProps) {
  const router = useRouter();
  const { store, state } = useEntry(initial);
  const [answering, setAnswering] = useState<string | null>(null);
  const [sending, setSending] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const { wardReturn } = state;
  const lines = wardReturn.tallies;
  const held: HeldLine[] = lines.flatMap((line) => {
    const hold = holdOf(lineStatus(line, state.drafts));
    if (!hold) return [];
    const box = hold.part === "denominator" ? typedIn(line, lines) : line;
    return [{ line: hold.part === "denominator" ? box : line, ...hold }];
  });
  const once = held.filter((each, index) => held.findIndex(({ line }) => line === each.line) === index);
  const canSend = may.submit && isOver && once.length === 0 && lines.length > 0 && !sending;
  const answered = lines.find((line) => line.indicator === answering);

  async function send() {
    if (!canSend) return;
    setSending(true);
    await store.settled();
    const sent = await sendJson<WardReturnReply>("POST", `${returnUrl(wardReturn)}/submission`, {
      version: wardReturn.version,
    });
    setSending(false);
    if (sent.ok) router.refresh();
    else
      setRefusal([sent.problem.detail, ...(sent.problem.errors ?? []).map((each) => each.message)].join(" "));
  }

  const sendButton = (
    <Button look="primary" aria-disabled={!canSend} aria-describedby="send-reasons" onClick={send}>
      {sending ? entryWords.sending : entryWords.send}
    </Button>
  );
  return (
    <div className="entry-page">
      <PageHead
        crumbs={[
          { label: entryWords.crumb, href: "/returns" },
          { label: entryWords.division(wardReturn.wardName, wardReturn.division) },
        ]}
        title={entryWords.title(longMonth(wardReturn.month))}
        subtitle={<Summary wardReturn={wardReturn} held={once} />}
        actions={
          <>
            {mayBringIn ? <ButtonLink href="/imports">{entryWords.bringIn}</ButtonLink> : null}
            <span className="not-on-phone">{sendButton}</span>
          </>
        }
      />
      {wardReturn.reopened && wardReturn.reopenedReason ? (
        <Notice className="mb-3">{entryWords.reopened(wardReturn.reopenedReason)}</Notice>
      ) : null}
      {(refusal ?? state.failure) ? (
        <Notice mark="fix" live="alert" className="mb-3" title={refusal ?? state.failure} />
      ) : null}
      <div id="send-reasons" aria-live="polite">
        {lines.length > 0 ? <SendReasons held={once} maySend={may.submit} isOver={isOver} /> : null}
      </div>
      {lines.length === 0 ? (
        <EmptyState title={entryWords.noLines}>{entryWords.noLinesNote}</EmptyState>
      ) : (
        <EntryGrid {...{ store, state, months, earlier, types, timeZone }} onOtherAnswer={setAnswering} />
      )}
      {answered ? (
        <OtherAnswer
          store={store}
          line={answered}
          typesNumerator={(types[answered.indicator] ?? nothingTyped).numerator}
          onClose={() => setAnswering(null)}
        />
      ) : null}
      <div className="send-bar">
        <span>{entryWords.savedOf(lines.filter(saysSomething).length, lines.length)}</span>
        {sendButton}
      </div>
    </div>
  );
}

function Summary({ wardReturn, held }: { wardReturn: WardReturnReply; held: readonly HeldLine[] }) {
  const lines = wardReturn.tallies;
  const count = (why: HeldLine["why"]) => held.filter((each) => each.why === why).length;
  const rest = [
    [count("fix"), entryWords.toFix] as const,
    [count("conflict"), entryWords.twoVersions] as const,
    [count("unsaved"), entryWords.notSaved] as const,
    [count("missing"), entryWords.toEnter] as const,
  ].flatMap(([some, words]) => (some > 0 ? [words(some)] : []));
  return (
    <>
      <b>{entryWords.savedOf(lines.filter(saysSomething).length, lines.length)}</b>
      {rest.map((words) => `, ${words}`).join("")}.{" "}
      {wardReturn.late ? `${entryWords.late} ${entryWords.wasDue}` : entryWords.due}{" "}
      <b>{dayInWords(wardReturn.dueOn)}</b>.
    </>
  );
}
