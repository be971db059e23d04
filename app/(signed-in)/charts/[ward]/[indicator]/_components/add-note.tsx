"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm, type Resolver } from "react-hook-form";
import { problemForForm, sendJson } from "@/app/_hooks/use-api";
import { Button, Notice, Select, TextInput } from "@/app/_components/ui";
import { createAnnotationSchema } from "@/lib/schemas/annotation";
import { chartPageWords as words } from "@/lib/strings/charts";

interface AddNoteProps {
  ward: string;
  indicator: string;
  months: { value: string; label: string }[];
}

interface NoteValues {
  month: string;
  text: string;
}

const fields = ["month", "text"] as const;
const noteForm = createAnnotationSchema.pick({ month: true, text: true });

/** A remark on one month; it shows on the chart at once. */
export function AddNote({ ward, indicator, months }: AddNoteProps) {
  const router = useRouter();
  const [outcome, setOutcome] = useState<{ kept: boolean; words: string } | null>(null);
  const form = useForm<NoteValues>({
    resolver: zodResolver(noteForm) as unknown as Resolver<NoteValues>,
    defaultValues: { month: months[0]?.value ?? "", text: "" },
  });
  const { errors, isSubmitting } = form.formState;

  async function save(values: NoteValues) {
    setOutcome(null);
    const sent = await sendJson("POST", "/api/annotations", { ward, indicator, ...values });
    if (sent.ok) {
      form.setValue("text", "");
      setOutcome({ kept: true, words: words.noteSaved });
      router.refresh();
      return;
    }
    const { fieldErrors, rest } = problemForForm(sent.problem, fields);
    for (const { name, message } of fieldErrors) form.setError(name, { message });
    if (rest) setOutcome({ kept: false, words: rest });
  }

  return (
    <form className="mt-2" noValidate method="post" onSubmit={(event) => void form.handleSubmit(save)(event)}>
      <Select
        id="note-month"
        label={words.noteMonth}
        error={errors.month?.message}
        {...form.register("month")}
      >
        {months.map((month) => (
          <option key={month.value} value={month.value}>
            {month.label}
          </option>
        ))}
      </Select>
      <TextInput
        id="note-text"
        label={words.noteText}
        hint={words.noteHint}
        error={errors.text?.message}
        maxLength={300}
        {...form.register("text")}
      />
      {outcome ? (
        <Notice
          mark={outcome.kept ? "saved" : "fix"}
          live={outcome.kept ? "status" : "alert"}
          className="mb-3"
        >
          {outcome.words}
        </Notice>
      ) : null}
      <Button type="submit" disabled={isSubmitting}>
        {words.noteSave}
      </Button>
    </form>
  );
}
