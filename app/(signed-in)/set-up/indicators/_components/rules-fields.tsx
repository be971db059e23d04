"use client";

import { Checkbox, ChoiceGroup, Select } from "@/app/_components/ui";
import { runLengths } from "@/lib/indicators/definition-rules";
import { limitChoices, ruleNames } from "@/lib/indicators/vocabulary";
import { indicatorWords, limitWords, ruleWords } from "@/lib/strings/indicator-set-up";
import type { FieldsProps } from "./fields-props";

/** Limit method and rules: they hold for the whole chart, earlier months too. */
export function RulesFields({ register, errors }: FieldsProps) {
  return (
    <>
      <Select
        id="limits"
        label={indicatorWords.limits}
        hint={indicatorWords.limitsHint}
        error={errors.limits?.message}
        {...register("limits")}
      >
        {limitChoices.map((choice) => (
          <option key={choice} value={choice}>
            {limitWords[choice]}
          </option>
        ))}
      </Select>
      <ChoiceGroup id="rules" label={indicatorWords.rules} error={messageIn(errors.rules)}>
        {ruleNames.map((name) => (
          <div key={name} className="rule-line">
            <Checkbox label={ruleWords[name]} {...register(`rules.${name}.on`)} />
            {runLengths[name] ? (
              <select
                className="input"
                aria-label={indicatorWords.ruleLength(ruleWords[name])}
                {...register(`rules.${name}.length`)}
              >
                {lengthsOf(runLengths[name]).map((length) => (
                  <option key={length}>{length}</option>
                ))}
              </select>
            ) : null}
          </div>
        ))}
      </ChoiceGroup>
    </>
  );
}

function lengthsOf({ least, most }: { least: number; most: number }): number[] {
  return Array.from({ length: most - least + 1 }, (_, index) => least + index);
}

/** A message about the list itself, or the first about one of its rules. */
function messageIn(error: unknown): string | undefined {
  if (typeof error !== "object" || error === null) return undefined;
  if ("message" in error && typeof error.message === "string") return error.message;
  return Object.values(error).map(messageIn).find(Boolean);
}
