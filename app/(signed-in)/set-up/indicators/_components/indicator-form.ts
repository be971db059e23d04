import { z } from "zod";
import { runLengths } from "@/lib/indicators/definition-rules";
import { ruleNames, type WatchedRule } from "@/lib/indicators/vocabulary";
import type { IndicatorReply } from "@/lib/schemas/indicator";
import { indicatorWords } from "@/lib/strings/indicator-set-up";

/** What the form holds: text as typed. `toBody` makes the route's body of it. */
export interface IndicatorFormValues {
  code: string;
  name: string;
  numeratorLabel: string;
  denominatorLabel: string;
  attribution: string;
  kind: string;
  per: string;
  betterWhen: string;
  team: string;
  numeratorBy: string;
  matureAfterDays: string;
  sharedDenominator: string;
  /** In the unit shown: 7 for 7%. */
  target: string;
  limits: string;
  rules: Record<WatchedRule, { on: boolean; length: string }>;
  effectiveFrom: string;
  comparable: string;
  reason: string;
  version?: number;
}

export const formFields = [
  "code",
  "name",
  "numeratorLabel",
  "denominatorLabel",
  "attribution",
  "kind",
  "per",
  "betterWhen",
  "team",
  "numeratorBy",
  "matureAfterDays",
  "sharedDenominator",
  "target",
  "limits",
  "rules",
  "effectiveFrom",
  "comparable",
  "reason",
] as const;

export const formLabels = {
  name: indicatorWords.name,
  numeratorLabel: indicatorWords.numerator,
  denominatorLabel: indicatorWords.denominator,
  attribution: indicatorWords.attribution,
  kind: indicatorWords.kind,
  per: indicatorWords.per,
  betterWhen: indicatorWords.betterWhen,
  team: indicatorWords.team,
  numeratorBy: indicatorWords.numeratorBy,
  matureAfterDays: indicatorWords.matureAfterDays,
  sharedDenominator: indicatorWords.shared,
  target: indicatorWords.target,
  limits: indicatorWords.limits,
} as const;

/** The form of an indicator as it stands, or of a new one watched by the rules that are on by default. */
export function formValues(indicator: IndicatorReply | null, defaults: readonly { name: WatchedRule }[]) {
  const on: readonly { name: WatchedRule; length?: number }[] = indicator?.rules ?? defaults;
  const rules = Object.fromEntries(
    ruleNames.map((name) => {
      const rule = on.find((each) => each.name === name);
      const length = rule?.length ?? runLengths[name]?.usual;
      return [name, { on: rule !== undefined, length: length === undefined ? "" : String(length) }];
    }),
  ) as IndicatorFormValues["rules"];
  const values: IndicatorFormValues = {
    code: indicator?.code ?? "",
    name: indicator?.name ?? "",
    numeratorLabel: indicator?.numeratorLabel ?? "",
    denominatorLabel: indicator?.denominatorLabel ?? "",
    attribution: indicator?.attribution ?? "",
    kind: indicator?.kind ?? "",
    per: String(indicator?.per ?? 100),
    betterWhen: indicator?.betterWhen ?? "",
    team: indicator?.team ?? "",
    numeratorBy: indicator?.numeratorBy ?? "ward",
    matureAfterDays: String(indicator?.matureAfterDays ?? 0),
    sharedDenominator: indicator?.sharedDenominator ?? "",
    target: shownTarget(indicator),
    limits: indicator?.limits ?? "auto",
    rules,
    effectiveFrom: "",
    comparable: "",
    reason: "",
    version: indicator?.version,
  };
  return values;
}

/** True where the words typed differ from those of the newest version, so that a new one will be made. */
export function changesWords(values: DefinitionTexts, indicator: IndicatorReply): boolean {
  return (["numeratorLabel", "denominatorLabel", "attribution"] as const).some(
    (name) => values[name].trim() !== indicator[name],
  );
}

type DefinitionTexts = Pick<IndicatorFormValues, "numeratorLabel" | "denominatorLabel" | "attribution">;

/** The body for POST, or for PATCH where there is an indicator already; its schema still has to check it. */
export function toBody(
  values: IndicatorFormValues,
  indicator: IndicatorReply | null,
): Record<string, unknown> {
  const per = asNumber(values.per);
  const target = asNumber(values.target);
  const body = {
    name: values.name,
    numeratorLabel: values.numeratorLabel,
    denominatorLabel: values.denominatorLabel,
    attribution: values.attribution,
    kind: values.kind,
    per,
    betterWhen: values.betterWhen,
    team: values.team,
    numeratorBy: values.numeratorBy,
    matureAfterDays: asNumber(values.matureAfterDays),
    sharedDenominator: values.sharedDenominator.trim() || null,
    // Twelve figures: 7 / 100 is 0.07 again, not a neighbour of it.
    target: target === undefined || per === undefined ? null : Number((target / per).toPrecision(12)),
    limits: values.limits,
    rules: rulesOf(values.rules),
  };
  if (!indicator) return { ...body, code: values.code };
  const version = changesWords(values, indicator)
    ? { effectiveFrom: values.effectiveFrom || undefined, comparable: asAnswer(values.comparable) }
    : {};
  return { ...body, ...version, reason: values.reason.trim() || undefined, version: values.version };
}

/** The form's own schema in front of the route's: text becomes what the body holds. */
export function formSchema(
  route: z.ZodType<unknown, Record<string, unknown>>,
  indicator: IndicatorReply | null,
) {
  return z
    .custom<IndicatorFormValues>()
    .transform((values) => toBody(values, indicator))
    .pipe(route);
}

function rulesOf(rules: IndicatorFormValues["rules"]) {
  return ruleNames
    .filter((name) => rules[name].on)
    .map((name) => (runLengths[name] ? { name, length: asNumber(rules[name].length) } : { name }));
}

function asAnswer(text: string): boolean | undefined {
  return text === "" ? undefined : text === "yes";
}

/** Blank is nothing, not zero; what isn't plainly a number becomes NaN, which the schema refuses at the field. */
function asNumber(text: string): number | undefined {
  const typed = text.trim().replace(",", ".");
  if (typed === "") return undefined;
  return /^\d+(\.\d+)?$/.test(typed) ? Number(typed) : Number.NaN;
}

function shownTarget(indicator: IndicatorReply | null): string {
  if (!indicator || indicator.target === null) return "";
  return String(Number((indicator.target * indicator.per).toPrecision(12)));
}
