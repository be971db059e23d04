"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm, useWatch } from "react-hook-form";
import { z } from "zod";
import { Button, ChoiceGroup, Notice, Radio, TextArea, TextInput } from "@/app/_components/ui";
import { Dialog } from "@/app/_components/ui/dialog";
import { answerOf } from "@/lib/indicators/tally-answer";
import { saveTallySchema, type TallyReply } from "@/lib/schemas/tally";
import { answerWords } from "@/lib/strings/returns";
import type { EntryStore, TallyFields } from "./entry-store";

const answers = ["count", "nothing", "not-collected", "awaited"] as const;
type Answer = (typeof answers)[number];

const fields = saveTallySchema.shape;

/** The same limits as the route's, with the text asked for where the answer needs one. */
const formSchema = z
  .object({
    answer: z.enum(answers),
    notCollected: fields.notCollected,
    awaited: fields.awaited,
    note: fields.note,
  })
  .superRefine((values, issues) => {
    const ask = (path: "notCollected" | "awaited", message: string) => {
      if (!values[path]) issues.addIssue({ code: "custom", path: [path], message });
    };
    if (values.answer === "not-collected") ask("notCollected", answerWords.whyMissing);
    if (values.answer === "awaited") ask("awaited", answerWords.fromMissing);
  });
type Values = z.input<typeof formSchema>;

interface OtherAnswerProps {
  store: EntryStore;
  line: TallyReply;
  /** False where the numerator is another's to count: then only denominator and note are asked about. */
  typesNumerator: boolean;
  onClose: () => void;
}

/** The answers that aren't counts, and the note of a line. */
export function OtherAnswer({ store, line, typesNumerator, onClose }: OtherAnswerProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const before = answerNow(line);
  const { register, handleSubmit, control, formState } = useForm<
    Values,
    unknown,
    z.output<typeof formSchema>
  >({
    resolver: zodResolver(formSchema),
    defaultValues: {
      answer: before,
      notCollected: line.notCollected ?? "",
      awaited: line.awaited ?? "",
      note: line.note ?? "",
    },
  });
  const answer = useWatch({ control, name: "answer" });
  const isShared = line.sharedDenominator !== null;

  const keep = handleSubmit(async (values) => {
    const problem = await store.saveAnswer(line.indicator, {
      ...changeOf(values, before),
      note: values.note ?? null,
    });
    if (problem === null) onClose();
    else setFailure(problem.detail);
  });

  return (
    <Dialog open title={answerWords.title(line.name)} onClose={onClose}>
      <form onSubmit={keep} noValidate>
        {failure ? <Notice mark="fix" live="alert" title={failure} className="mb-3" /> : null}
        <ChoiceGroup id="answer" label={answerWords.answer}>
          <Radio label={answerWords.count} value="count" {...register("answer")} />
          {isShared || !typesNumerator ? null : (
            <Radio
              label={answerWords.nothing}
              detail={answerWords.nothingHint(line.denominatorLabel)}
              value="nothing"
              {...register("answer")}
            />
          )}
          <Radio
            label={answerWords.notCollected}
            detail={answerWords.notCollectedHint}
            value="not-collected"
            {...register("answer")}
          />
          <Radio
            label={answerWords.awaited}
            detail={answerWords.awaitedHint(line.denominatorLabel)}
            value="awaited"
            {...register("answer")}
          />
        </ChoiceGroup>
        {answer === "not-collected" ? (
          <TextInput
            id="answer-not-collected"
            label={answerWords.why}
            error={formState.errors.notCollected?.message}
            {...register("notCollected")}
          />
        ) : null}
        {answer === "awaited" ? (
          <TextInput
            id="answer-awaited"
            label={answerWords.from}
            error={formState.errors.awaited?.message}
            {...register("awaited")}
          />
        ) : null}
        <TextArea
          id="answer-note"
          label={answerWords.note}
          hint={answerWords.noteHint}
          error={formState.errors.note?.message}
          {...register("note")}
        />
        <div className="actions">
          <Button look="primary" type="submit" disabled={formState.isSubmitting}>
            {answerWords.save}
          </Button>
          <Button onClick={onClose}>{answerWords.cancel}</Button>
        </div>
      </form>
    </Dialog>
  );
}

function answerNow(line: TallyReply): Answer {
  switch (answerOf(line)) {
    case "not-collected":
      return "not-collected";
    case "awaited":
      return "awaited";
    case "nothing-to-count":
      return line.sharedDenominator === null ? "nothing" : "count";
    default:
      return "count";
  }
}

/** Only what the choice changes, so that a note alone touches no figure. */
function changeOf(values: z.output<typeof formSchema>, before: Answer): TallyFields {
  switch (values.answer) {
    case "nothing":
      return before === "nothing" ? {} : { numerator: null, denominator: 0 };
    case "not-collected":
      return { notCollected: values.notCollected ?? null };
    case "awaited":
      return { awaited: values.awaited ?? null };
    case "count":
      if (before === "not-collected") return { notCollected: null };
      if (before === "awaited") return { awaited: null };
      return before === "nothing" ? { denominator: null } : {};
  }
}
