"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm, useWatch } from "react-hook-form";
import { Button, Checkbox, Notice, TextArea, TextInput } from "@/app/_components/ui";
import { problemForForm, sendJson } from "@/app/_hooks/use-api";
import { formatCount, formatRateWords, noFigure } from "@/lib/indicators/chart-format";
import { rateOf, readCount } from "@/lib/indicators/return-entry";
import type { CorrectionResult } from "@/lib/schemas/correction";
import type { TallyReply } from "@/lib/schemas/tally";
import { historyWords as say } from "@/lib/strings/returns";
import {
  correctionBody,
  correctionFields,
  correctionResolver,
  type CorrectionValues,
} from "./correction-form";

interface CorrectLineProps {
  ward: string;
  month: string;
  tally: TallyReply;
  /** True for whoever decides corrections: theirs need nobody else. */
  holdsAtOnce: boolean;
  typesNumerator: boolean;
}

/** New figures for a sent month, with a reason. */
export function CorrectLine({ ward, month, tally, holdsAtOnce, typesNumerator }: CorrectLineProps) {
  const router = useRouter();
  const [failure, setFailure] = useState<string | null>(null);
  const { register, handleSubmit, setError, control, formState, reset } = useForm<CorrectionValues>({
    resolver: correctionResolver(tally),
    defaultValues: valuesOf(tally),
  });
  const typed = useWatch({ control });
  const { errors, isSubmitting } = formState;

  const send = handleSubmit(async (values) => {
    setFailure(null);
    const url = `/api/returns/${encodeURIComponent(ward)}/${month}/corrections`;
    const sent = await sendJson<CorrectionResult>("POST", url, correctionBody(values, tally));
    if (sent.ok || sent.problem.current !== undefined) router.refresh();
    if (sent.ok) {
      reset(valuesOf(sent.data.tally));
      return;
    }
    const { fieldErrors, rest } = problemForForm(sent.problem, correctionFields);
    for (const { name, message } of fieldErrors) setError(name, { message });
    setFailure(sent.problem.current === undefined ? rest : say.stale);
  });

  return (
    <section className="panel correction-panel" aria-labelledby="correct-title">
      <h2 className="mb-2" id="correct-title">
        {holdsAtOnce ? say.correct : say.askFor}
      </h2>
      <form onSubmit={send} noValidate>
        {failure ? <Notice mark="fix" live="alert" title={failure} className="mb-3" /> : null}
        <p className="hint mb-3">{say.nowIs(figuresWords(tally))}</p>
        {typed.isNotCollected ? (
          <TextInput
            id="correct-not-collected"
            label={say.whyNotCollected}
            error={errors.notCollected?.message}
            {...register("notCollected")}
          />
        ) : (
          <div className="correction-figures">
            <TextInput
              id="correct-numerator"
              label={tally.numeratorLabel}
              numeric
              readOnly={!typesNumerator}
              error={errors.numerator?.message}
              {...register("numerator")}
            />
            <TextInput
              id="correct-denominator"
              label={tally.denominatorLabel}
              hint={tally.sharedDenominator === null ? undefined : say.holdsShared}
              numeric
              error={errors.denominator?.message}
              {...register("denominator")}
            />
          </div>
        )}
        {holdsAtOnce ? <Checkbox label={say.wasNotCollected} {...register("isNotCollected")} /> : null}
        <TextArea
          id="correct-reason"
          label={say.reasonLabel}
          hint={say.reasonHint}
          error={errors.reason?.message}
          {...register("reason")}
        />
        {typed.isNotCollected ? null : (
          <WouldBe tally={tally} numerator={typed.numerator} denominator={typed.denominator} />
        )}
        <p className="hint mb-3">{holdsAtOnce ? say.holdsAtOnce : say.waitsForLead}</p>
        <Button look="primary" type="submit" disabled={isSubmitting}>
          {holdsAtOnce ? say.send : say.ask}
        </Button>
      </form>
    </section>
  );
}

function valuesOf(tally: TallyReply): CorrectionValues {
  return {
    numerator: String(tally.numerator ?? ""),
    denominator: String(tally.denominator ?? ""),
    isNotCollected: false,
    notCollected: "",
    reason: "",
  };
}

/** "17 of 71, 23.9%" */
export function figuresWords(
  tally: Pick<TallyReply, "numerator" | "denominator" | "notCollected" | "awaited" | "kind" | "per">,
) {
  if (tally.notCollected !== null) return say.notCollected;
  const text = (count: number | null) => (count === null ? noFigure : formatCount(count));
  const rate = rateOf(tally.kind, tally);
  const counts = say.of(text(tally.numerator), text(tally.denominator));
  return rate === null ? counts : `${counts}, ${formatRateWords(rate, tally.per)}`;
}

function WouldBe({
  tally,
  numerator = "",
  denominator = "",
}: {
  tally: TallyReply;
  numerator?: string;
  denominator?: string;
}) {
  const [up, down] = [readCount(numerator), readCount(denominator)];
  if (!up.ok || !down.ok || (up.value === tally.numerator && down.value === tally.denominator)) return null;
  const next = { ...tally, numerator: up.value, denominator: down.value, notCollected: null };
  return <Notice className="mb-3">{say.wouldBe(figuresWords(tally), figuresWords(next))}</Notice>;
}
