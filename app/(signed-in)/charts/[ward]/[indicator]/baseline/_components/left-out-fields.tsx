"use client";

import type { UseFieldArrayReturn, UseFormReturn } from "react-hook-form";
import { Button, ChoiceGroup, TextInput } from "@/app/_components/ui";
import { baselineWords as words } from "@/lib/strings/charts";
import type { BaselineValues } from "./baseline-form";

interface LeftOutFieldsProps {
  form: UseFormReturn<BaselineValues>;
  lines: UseFieldArrayReturn<BaselineValues, "leftOut">;
}

/** Months left out one by one, each with its cause. */
export function LeftOutFields({ form, lines }: LeftOutFieldsProps) {
  const errors = form.formState.errors.leftOut;
  return (
    <ChoiceGroup id="leftOut" label={words.leftOut} hint={words.leftOutHint}>
      {lines.fields.map((field, index) => (
        <div className="left-out-line" key={field.id}>
          <TextInput
            id={`leftOut-${index}-month`}
            type="month"
            label={words.leftOutMonth}
            error={errors?.[index]?.month?.message}
            {...form.register(`leftOut.${index}.month`)}
          />
          <TextInput
            id={`leftOut-${index}-reason`}
            label={words.leftOutReason}
            error={errors?.[index]?.reason?.message}
            maxLength={300}
            {...form.register(`leftOut.${index}.reason`)}
          />
          <Button look="text" onClick={() => lines.remove(index)}>
            {words.removeLeftOut}
          </Button>
        </div>
      ))}
      <Button look="text" onClick={() => lines.append({ month: "", reason: "" })}>
        {words.addLeftOut}
      </Button>
    </ChoiceGroup>
  );
}
