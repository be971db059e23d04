"use client";

import { Select, TextInput } from "@/app/_components/ui";
import { perWords } from "@/lib/indicators/chart-format";
import { indicatorWords, perChoices } from "@/lib/strings/indicator-set-up";
import type { FieldsProps } from "./fields-props";

const SHARED_LIST = "shared-codes";

/** How figures are shown, when they are complete, the target, and whose denominator it is. */
export function ShownFields({
  register,
  errors,
  isCounted,
  per,
  sharedCodes,
}: FieldsProps & { per: number | null; sharedCodes: string[] }) {
  const isListed = per === null || perChoices.some((choice) => choice.per === per);
  const units = isListed ? perChoices : [{ per, label: perWords(per) }, ...perChoices];
  return (
    <>
      <div className="form-triple">
        <Select id="per" label={indicatorWords.per} error={errors.per?.message} {...register("per")}>
          {units.map((unit) => (
            <option key={unit.per} value={unit.per}>
              {unit.label}
            </option>
          ))}
        </Select>
        <TextInput
          id="matureAfterDays"
          numeric
          label={indicatorWords.matureAfterDays}
          hint={indicatorWords.matureHint}
          error={errors.matureAfterDays?.message}
          {...register("matureAfterDays")}
        />
        <TextInput
          id="target"
          inputMode="decimal"
          label={indicatorWords.target}
          hint={indicatorWords.targetHint}
          error={errors.target?.message}
          {...register("target")}
        />
      </div>
      <TextInput
        id="sharedDenominator"
        list={SHARED_LIST}
        label={indicatorWords.shared}
        hint={isCounted ? indicatorWords.kindFixed : indicatorWords.sharedHint}
        error={errors.sharedDenominator?.message}
        readOnly={isCounted}
        autoCapitalize="characters"
        {...register("sharedDenominator")}
      />
      <datalist id={SHARED_LIST}>
        {sharedCodes.map((code) => (
          <option key={code} value={code} />
        ))}
      </datalist>
    </>
  );
}
