"use client";

import { RadioGroup, SectionHead, TextInput } from "@/app/_components/ui";
import { indicatorWords } from "@/lib/strings/indicator-set-up";
import { formWords } from "@/lib/strings/set-up";
import type { FieldsProps } from "./fields-props";

const answers = [
  { value: "yes", title: indicatorWords.isComparable, note: indicatorWords.isComparableNote },
  { value: "no", title: indicatorWords.notComparable, note: indicatorWords.notComparableNote },
] as const;

/** From when the new words hold, why, and whether months on both sides can be compared; asked when words change. */
export function VersionFields({ register, errors, number }: FieldsProps & { number: number | null }) {
  const { name, ...input } = register("comparable");
  return (
    <>
      {number === null ? null : (
        <SectionHead note={indicatorWords.changeNote(number)}>{indicatorWords.change}</SectionHead>
      )}
      <div className="form-pair">
        {number === null ? null : (
          <TextInput
            id="effectiveFrom"
            type="month"
            label={indicatorWords.effectiveFrom}
            hint={formWords.monthHint}
            error={errors.effectiveFrom?.message}
            {...register("effectiveFrom")}
          />
        )}
        <TextInput
          id="reason"
          label={indicatorWords.reason}
          hint={indicatorWords.reasonHint}
          error={errors.reason?.message}
          {...register("reason")}
        />
      </div>
      {number === null ? null : (
        <div className="panel mb-3">
          <RadioGroup
            id="comparable"
            name={name}
            input={input}
            label={indicatorWords.comparable}
            error={errors.comparable?.message}
            options={answers.map(({ value, title, note }) => ({
              value,
              label: (
                <>
                  <b>{title}</b> {note}
                </>
              ),
            }))}
          />
        </div>
      )}
    </>
  );
}
