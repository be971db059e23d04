"use client";

import { RadioGroup, TextArea, TextInput } from "@/app/_components/ui";
import { countedBy, directions, kinds, teams } from "@/lib/indicators/vocabulary";
import {
  countedByWords,
  directionWords,
  indicatorWords,
  kindNotes,
  kindWords,
  teamNames,
} from "@/lib/strings/indicator-set-up";
import type { FieldsProps } from "./fields-props";

/** What is counted out of what, and by whom. */
export function DefinitionFields({ register, errors, isNew, isCounted }: FieldsProps) {
  const radio = (name: "kind" | "betterWhen" | "numeratorBy" | "team") => {
    const { name: registered, ...input } = register(name);
    return { id: name, name: registered, input, error: errors[name]?.message };
  };
  return (
    <>
      {isNew ? (
        <TextInput
          id="code"
          label={indicatorWords.code}
          hint={indicatorWords.codeHint}
          error={errors.code?.message}
          autoCapitalize="characters"
          {...register("code")}
        />
      ) : null}
      <TextInput id="name" label={indicatorWords.name} error={errors.name?.message} {...register("name")} />
      <div className="form-pair">
        <TextInput
          id="numeratorLabel"
          label={indicatorWords.numerator}
          hint={indicatorWords.numeratorHint}
          error={errors.numeratorLabel?.message}
          {...register("numeratorLabel")}
        />
        <TextInput
          id="denominatorLabel"
          label={indicatorWords.denominator}
          hint={indicatorWords.denominatorHint}
          error={errors.denominatorLabel?.message}
          {...register("denominatorLabel")}
        />
      </div>
      <TextArea
        id="attribution"
        label={indicatorWords.attribution}
        hint={indicatorWords.attributionHint}
        error={errors.attribution?.message}
        {...register("attribution")}
      />
      <div className="form-pair">
        <RadioGroup
          {...radio("kind")}
          label={indicatorWords.kind}
          hint={isCounted ? indicatorWords.kindFixed : undefined}
          options={kinds.map((value) => ({
            value,
            label: kindWords[value],
            detail: kindNotes[value],
            disabled: isCounted,
          }))}
        />
        <RadioGroup
          {...radio("betterWhen")}
          label={indicatorWords.betterWhen}
          options={directions.map((value) => ({ value, label: directionWords[value] }))}
        />
        <RadioGroup
          {...radio("numeratorBy")}
          label={indicatorWords.numeratorBy}
          options={countedBy.map((value) => ({ value, label: countedByWords[value] }))}
        />
        <RadioGroup
          {...radio("team")}
          label={indicatorWords.team}
          options={teams.map((value) => ({ value, label: teamNames[value] }))}
        />
      </div>
    </>
  );
}
