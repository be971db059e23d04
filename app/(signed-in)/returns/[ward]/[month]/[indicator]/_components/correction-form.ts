import type { FieldErrors, Resolver } from "react-hook-form";
import { readCount } from "@/lib/indicators/return-entry";
import { correctTallySchema } from "@/lib/schemas/correction";
import type { TallyReply } from "@/lib/schemas/tally";
import { checkWords } from "@/lib/strings/returns";

/** What the boxes hold: text, as typed. */
export interface CorrectionValues {
  numerator: string;
  denominator: string;
  isNotCollected: boolean;
  notCollected: string;
  reason: string;
}

export const correctionFields = ["numerator", "denominator", "notCollected", "reason"] as const;

/** The body that the route takes, or what is wrong with the boxes; figures that stay as they are aren't sent. */
export function correctionBody(values: CorrectionValues, tally: TallyReply) {
  const versions = {
    indicator: tally.indicator,
    version: tally.version,
    denominatorVersion: tally.denominatorVersion,
  };
  if (values.isNotCollected) return { ...versions, notCollected: values.notCollected, reason: values.reason };
  const numerator = readCount(values.numerator);
  const denominator = readCount(values.denominator);
  return {
    ...versions,
    numerator: numerator.ok ? numerator.value : undefined,
    denominator: denominator.ok ? denominator.value : undefined,
    reason: values.reason,
  };
}

/** Reads the boxes, then asks the route's own schema. */
export function correctionResolver(tally: TallyReply): Resolver<CorrectionValues> {
  return (values) => {
    const errors: FieldErrors<CorrectionValues> = {};
    for (const name of ["numerator", "denominator"] as const) {
      if (!values.isNotCollected && !readCount(values[name]).ok) {
        errors[name] = { type: "custom", message: checkWords.wholeNumber };
      }
    }
    const parsed = correctTallySchema.safeParse(correctionBody(values, tally));
    for (const issue of parsed.error?.issues ?? []) {
      const name = correctionFields.find((field) => field === issue.path[0]);
      if (name && !errors[name]) errors[name] = { type: "custom", message: issue.message };
    }
    return Object.keys(errors).length > 0 ? { values: {}, errors } : { values, errors: {} };
  };
}
