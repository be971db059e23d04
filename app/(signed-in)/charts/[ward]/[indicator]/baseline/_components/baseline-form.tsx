"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useFieldArray, useForm, type Resolver } from "react-hook-form";
import { sendJson, type ApiProblem } from "@/app/_hooks/use-api";
import { Button, Notice, TextArea, TextInput } from "@/app/_components/ui";
import { setBaselineSchema } from "@/lib/schemas/baseline";
import { baselineWords as words } from "@/lib/strings/charts";
import { addressOf } from "../../../../_components/search-params";
import { LeftOutFields } from "./left-out-fields";

export interface BaselineValues {
  from: string;
  to: string;
  appliesFrom: string | null;
  leftOut: { month: string; reason: string }[];
  reason: string;
}

interface BaselineFormProps {
  ward: string;
  indicator: string;
  mode: "set" | "propose";
  months: { first: string | undefined; last: string | undefined };
}

const blankAsNull = { setValueAs: (value: string | null) => value || null };

/** Sets the first baseline or proposes a later one; the preview stands in the address. */
export function BaselineForm({ ward, indicator, mode, months }: BaselineFormProps) {
  const router = useRouter();
  const [outcome, setOutcome] = useState<{ kept: boolean; words: string } | null>(null);
  const form = useForm<BaselineValues>({
    resolver: zodResolver(setBaselineSchema) as unknown as Resolver<BaselineValues>,
    defaultValues: {
      from: months.first ?? "",
      to: months.last ?? "",
      appliesFrom: null,
      leftOut: [],
      reason: "",
    },
  });
  const lines = useFieldArray({ control: form.control, name: "leftOut" });
  const { errors, isSubmitting } = form.formState;
  const page = `/charts/${ward}/${indicator}/baseline`;

  function show(problem: ApiProblem) {
    for (const { path, message } of problem.errors ?? []) {
      // Paths are the route's own, those of this form's values.
      form.setError(path as keyof BaselineValues, { message });
    }
    if (!problem.errors?.length) setOutcome({ kept: false, words: problem.detail });
  }

  async function save(values: BaselineValues) {
    setOutcome(null);
    const sent = await sendJson("PUT", `/api/baselines/${ward}/${indicator}`, values);
    if (!sent.ok) return show(sent.problem);
    setOutcome({ kept: true, words: mode === "set" ? words.savedSet : words.savedProposed });
    router.push(page);
    router.refresh();
  }

  function preview() {
    const { from, to, appliesFrom, leftOut } = form.getValues();
    const months = leftOut.map((each) => each.month).filter(Boolean);
    router.push(
      addressOf(page, { from, to, appliesFrom: appliesFrom ?? undefined, leftOut: months.join(",") }),
    );
  }

  return (
    <form
      className="panel"
      noValidate
      method="post"
      onSubmit={(event) => void form.handleSubmit(save)(event)}
    >
      <h2 className="section-head">{words.formTitle[mode]}</h2>
      <p className="hint mb-3">{words.formNote[mode]}</p>
      <div className="month-pair">
        <TextInput
          id="from"
          type="month"
          label={words.from}
          error={errors.from?.message}
          {...form.register("from")}
        />
        <TextInput
          id="to"
          type="month"
          label={words.to}
          error={errors.to?.message}
          {...form.register("to")}
        />
      </div>
      <TextInput
        id="appliesFrom"
        type="month"
        label={words.appliesFrom}
        hint={words.appliesFromHint}
        error={errors.appliesFrom?.message}
        {...form.register("appliesFrom", blankAsNull)}
      />
      <LeftOutFields form={form} lines={lines} />
      <TextArea
        id="reason"
        label={words.reason}
        hint={words.reasonHint}
        error={errors.reason?.message}
        maxLength={500}
        {...form.register("reason")}
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
      <div className="actions">
        <Button onClick={preview}>{words.preview}</Button>
        <Button look="primary" type="submit" disabled={isSubmitting}>
          {words.save[mode]}
        </Button>
      </div>
    </form>
  );
}
