"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { Button, ButtonLink, Notice, TextArea } from "@/app/_components/ui";
import { Dialog } from "@/app/_components/ui/dialog";
import { problemForForm, sendJson } from "@/app/_hooks/use-api";
import type { ReturnSteps } from "@/lib/indicators/return-entry";
import { reopenReturnSchema, type WardReturnReply } from "@/lib/schemas/ward-return";
import { sentPageWords } from "@/lib/strings/sent-return";
import { answerWords, historyWords } from "@/lib/strings/returns";
import { returnUrl } from "./use-entry";

interface StepsProps {
  wardReturn: WardReturnReply;
  may: ReturnSteps;
}

/** The steps that may follow on a sent return, by its state and by who looks. */
export function SentSteps({ wardReturn, may }: StepsProps) {
  const router = useRouter();
  const [failure, setFailure] = useState<string | null>(null);
  const [reopening, setReopening] = useState(false);
  const isSubmitted = wardReturn.status === "submitted";

  async function step(name: "recall" | "acceptance") {
    const sent = await sendJson("POST", `${returnUrl(wardReturn)}/${name}`, { version: wardReturn.version });
    setFailure(sent.ok ? null : sent.problem.detail);
    router.refresh();
  }

  return (
    <>
      {isSubmitted && may.recall ? (
        <Button onClick={() => step("recall")}>{sentPageWords.takeBack}</Button>
      ) : null}
      {may.reopen ? <Button onClick={() => setReopening(true)}>{sentPageWords.reopen}</Button> : null}
      {isSubmitted && may.accept ? (
        <Button look="primary" onClick={() => step("acceptance")}>
          {sentPageWords.accept}
        </Button>
      ) : (
        <ButtonLink look="primary" href="/">
          {sentPageWords.done}
        </ButtonLink>
      )}
      {failure ? <Notice mark="fix" live="alert" title={failure} /> : null}
      {reopening ? <Reopen wardReturn={wardReturn} onClose={() => setReopening(false)} /> : null}
    </>
  );
}

type Values = z.input<typeof reopenReturnSchema>;

function Reopen({ wardReturn, onClose }: { wardReturn: WardReturnReply; onClose: () => void }) {
  const router = useRouter();
  const [failure, setFailure] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState } = useForm<Values>({
    resolver: zodResolver(reopenReturnSchema),
    defaultValues: { reason: "", version: wardReturn.version },
  });

  const reopen = handleSubmit(async (values) => {
    const sent = await sendJson("POST", `${returnUrl(wardReturn)}/reopening`, values);
    if (sent.ok) {
      onClose();
      router.refresh();
      return;
    }
    const { fieldErrors, rest } = problemForForm(sent.problem, ["reason"]);
    for (const { name, message } of fieldErrors) setError(name, { message });
    setFailure(rest);
  });

  return (
    <Dialog open title={sentPageWords.reopenTitle} onClose={onClose}>
      <form onSubmit={reopen} noValidate>
        {failure ? <Notice mark="fix" live="alert" title={failure} className="mb-3" /> : null}
        <p className="mb-3">{sentPageWords.reopenExplains}</p>
        <TextArea
          id="reopen-reason"
          label={historyWords.reasonLabel}
          hint={historyWords.reasonHint}
          error={formState.errors.reason?.message}
          {...register("reason")}
        />
        <div className="actions">
          <Button look="primary" type="submit" disabled={formState.isSubmitting}>
            {sentPageWords.reopen}
          </Button>
          <Button onClick={onClose}>{answerWords.cancel}</Button>
        </div>
      </form>
    </Dialog>
  );
}
