import { z } from "zod";
import { ruleProblem, withUsualLength } from "@/lib/indicators/definition-rules";
import { PROPORTION_PER, settingsProblems } from "@/lib/indicators/definition-settings";
import {
  countedBy,
  defaultRules,
  directions,
  kinds,
  limitChoices,
  ruleNames,
  teams,
} from "@/lib/indicators/vocabulary";
import { code, month, newCode, pageOf, reason, text, version } from "./common";

const oneOf = <const Values extends readonly [string, ...string[]]>(values: Values) =>
  z.enum(values, { error: `Choose one of: ${values.join(", ")}.` });

const ruleObject = z.object({ name: oneOf(ruleNames), length: z.number().int().optional() });

/** A rule by its name alone, or with a run length of its own. */
export const ruleSchema = z
  .union([oneOf(ruleNames), ruleObject], { error: `Name a rule: ${ruleNames.join(", ")}.` })
  .transform((rule) => (typeof rule === "string" ? { name: rule } : rule))
  .superRefine((rule, issues) => {
    const message = ruleProblem(rule);
    if (message) issues.addIssue({ code: "custom", path: ["length"], message });
  })
  .transform(withUsualLength);

const rules = z
  .array(ruleSchema, { error: "Give a list of rules." })
  .min(1, "Keep at least one rule.")
  .refine((list) => new Set(list.map((rule) => rule.name)).size === list.length, "Name each rule once.");

const fields = {
  name: text(80, "Give the indicator a name."),
  numeratorLabel: text(200, "Say what is counted."),
  denominatorLabel: text(200, "Say out of what it is counted."),
  attribution: z.string().trim().max(500, "At most 500 characters."),
  kind: oneOf(kinds),
  per: z
    .number({ error: "Give a whole number, such as 100 or 1000." })
    .int("Give a whole number, such as 100 or 1000.")
    .min(1, "Give a whole number, such as 100 or 1000.")
    .max(1_000_000, "At most 1 000 000."),
  betterWhen: oneOf(directions),
  team: oneOf(teams),
  numeratorBy: oneOf(countedBy),
  matureAfterDays: z
    .number({ error: "Give a number of days, 0 for none." })
    .int("Give whole days.")
    .min(0, "Give a number of days, 0 for none.")
    .max(366, "At most 366 days."),
  sharedDenominator: newCode.nullable(),
  limits: oneOf(limitChoices),
  target: z
    .number({ error: "Give the target as a part of 1 (0.07 for 7%), or none." })
    .min(0, "A target can't be below zero.")
    .max(1_000, "That target is too large.")
    .nullable(),
} as const;

export const createIndicatorSchema = z
  .object({
    ...fields,
    code: newCode,
    attribution: fields.attribution.default(""),
    per: fields.per.optional(),
    numeratorBy: fields.numeratorBy.default("ward"),
    matureAfterDays: fields.matureAfterDays.default(0),
    sharedDenominator: fields.sharedDenominator.default(null),
    limits: fields.limits.default("auto"),
    rules: rules.default(() => defaultRules.map((rule) => ({ ...rule }))),
    target: fields.target.default(null),
    /** Month from which the first definition holds; from the beginning unless given. */
    effectiveFrom: month.optional(),
  })
  .superRefine((indicator, issues) => {
    for (const problem of settingsProblems(indicator)) {
      issues.addIssue({ code: "custom", path: [problem.path], message: problem.message });
    }
    if (indicator.kind === "rate" && indicator.per === undefined) {
      const message = "Say per how many the rate is shown, such as 1000.";
      issues.addIssue({ code: "custom", path: ["per"], message });
    }
  })
  .transform((indicator) => ({ ...indicator, per: indicator.per ?? PROPORTION_PER }));
export type CreateIndicator = z.output<typeof createIndicatorSchema>;

export const updateIndicatorSchema = z
  .object({ ...fields, rules, effectiveFrom: month, comparable: z.boolean(), reason })
  // Without a version the change holds for the indicator as it stands.
  .extend({ version })
  .partial();
export type UpdateIndicator = z.output<typeof updateIndicatorSchema>;

const definitionReply = z.object({
  number: z.number().int(),
  effectiveFrom: month,
  numeratorLabel: z.string(),
  denominatorLabel: z.string(),
  attribution: z.string(),
  comparable: z.boolean(),
  reason: z.string(),
  decidedBy: z.string(),
  decidedAt: z.iso.datetime(),
});

/** The words are those of the newest definition; `definitions` holds every version, oldest first. */
export const indicatorSchema = z.object({
  code: z.string(),
  name: z.string(),
  numeratorLabel: z.string(),
  denominatorLabel: z.string(),
  attribution: z.string(),
  kind: z.enum(kinds),
  per: z.number().int(),
  betterWhen: z.enum(directions),
  team: z.enum(teams),
  numeratorBy: z.enum(countedBy),
  matureAfterDays: z.number().int(),
  sharedDenominator: z.string().nullable(),
  limits: z.enum(limitChoices),
  rules: z.array(z.object({ name: z.enum(ruleNames), length: z.number().int().optional() })),
  target: z.number().nullable(),
  version: z.number().int(),
  definitions: z.array(definitionReply),
});
export type IndicatorReply = z.infer<typeof indicatorSchema>;

export const indicatorListSchema = pageOf(indicatorSchema);

export const indicatorParams = z.object({ code });
