"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { Button, Notice, TextInput } from "@/app/_components/ui";
import { sendJson } from "@/app/_hooks/use-api";
import { tableInstant } from "@/lib/indicators/return-dates";
import type { CorrectionReply } from "@/lib/schemas/correction";
import type { TallyReply } from "@/lib/schemas/tally";
import { historyWords as say } from "@/lib/strings/returns";
import { figuresWords } from "./correct-line";

interface DecideCorrectionProps {
  correction: CorrectionReply;
  tally: TallyReply;
  mayDecide: boolean;
  timeZone: string;
}

/** A correction that waits: what would change and why, and the decision for whoever may take it. */
export function DecideCorrection({ correction, tally, mayDecide, timeZone }: DecideCorrectionProps) {
  const router = useRouter();
  const [failure, setFailure] = useState<string | null>(null);
  const { register, getValues, formState } = useForm({ defaultValues: { reason: "" } });
  const asked = {
    ...tally,
    numerator: correction.numerator,
    denominator: correction.denominator,
    notCollected: null,
  };

  async function decide(agree: boolean) {
    const reason = agree ? undefined : getValues("reason");
    const body = { agree, reason, version: correction.version };
    const sent = await sendJson("POST", `/api/corrections/${correction.id}/decision`, body);
    setFailure(sent.ok ? null : sent.problem.detail);
    if (sent.ok) router.refresh();
  }

  return (
    <section className="panel correction-panel" aria-labelledby="waiting-title">
      <h2 className="mb-2" id="waiting-title">
        {say.waiting}
      </h2>
      {failure ? <Notice mark="fix" live="alert" title={failure} className="mb-3" /> : null}
      <p>{say.wouldBe(figuresWords(tally), figuresWords(asked))}</p>
      <p className="mb-2">“{correction.reason}”</p>
      <p className="hint mb-3">
        {say.waitingBy(correction.askedBy, tableInstant(correction.askedAt, timeZone))}{" "}
        {mayDecide ? null : say.onlyLead}
      </p>
      {mayDecide ? (
        <>
          <TextInput id="decline-reason" label={say.declineWhy} {...register("reason")} />
          <div className="actions">
            <Button look="primary" disabled={formState.isSubmitting} onClick={() => decide(true)}>
              {say.agree}
            </Button>
            <Button disabled={formState.isSubmitting} onClick={() => decide(false)}>
              {say.decline}
            </Button>
          </div>
        </>
      ) : null}
    </section>
  );
}
