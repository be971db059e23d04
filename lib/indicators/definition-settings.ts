import type { FieldError } from "@/lib/errors";
import type { CountedBy, Direction, Kind, LimitChoice, Team, WatchedRule } from "./vocabulary";

/** Events of a proportion are shown in percent unless something else is asked for. */
export const PROPORTION_PER = 100;

export interface RuleSetting {
  name: WatchedRule;
  length?: number;
}

/** What holds for the whole chart of an indicator, whichever version of the definition a month is counted under. */
export interface IndicatorSettings {
  name: string;
  kind: Kind;
  per: number;
  betterWhen: Direction;
  team: Team;
  numeratorBy: CountedBy;
  matureAfterDays: number;
  /** Code, or null where the denominator is the indicator's own. */
  sharedDenominator: string | null;
  limits: LimitChoice;
  rules: RuleSetting[];
  target: number | null;
}

export type SettingName = keyof IndicatorSettings;

export interface SettingsDecision {
  settings: IndicatorSettings;
  changed: SettingName[];
  /** What can't stand together. */
  problems: FieldError[];
  /** Changes that are refused once the indicator has counts. */
  fixedOnceCounted: FieldError[];
}

/** What can't stand together in one indicator: the target of a proportion is a part of the whole. */
export function settingsProblems(settings: { kind: Kind; target: number | null }): FieldError[] {
  if (settings.kind === "proportion" && settings.target !== null && settings.target > 1) {
    return [{ path: "target", message: "The target of a part of the whole is at most 1 (100%)." }];
  }
  return [];
}

/** The settings after a change: what was left out keeps its value. */
export function decideSettings(
  before: IndicatorSettings,
  change: Partial<IndicatorSettings>,
): SettingsDecision {
  const settings: IndicatorSettings = {
    name: change.name ?? before.name,
    kind: change.kind ?? before.kind,
    per: change.per ?? before.per,
    betterWhen: change.betterWhen ?? before.betterWhen,
    team: change.team ?? before.team,
    numeratorBy: change.numeratorBy ?? before.numeratorBy,
    matureAfterDays: change.matureAfterDays ?? before.matureAfterDays,
    sharedDenominator:
      change.sharedDenominator === undefined ? before.sharedDenominator : change.sharedDenominator,
    limits: change.limits ?? before.limits,
    rules: change.rules ?? before.rules,
    target: change.target === undefined ? before.target : change.target,
  };
  const changed = settingNames.filter((name) => !sameSetting(before[name], settings[name]));
  return {
    settings,
    changed,
    problems: settingsProblems(settings),
    fixedOnceCounted: changed.flatMap((name) => {
      const message = FIXED_ONCE_COUNTED[name];
      return message ? [{ path: name, message }] : [];
    }),
  };
}

/**
 * Why an indicator's series have to be worked out again, or null where the change shows on no chart. A change of
 * `per`, target or name alters how figures are shown, never which month stands out.
 */
export function reevaluationNeeded(
  changed: readonly SettingName[],
  hasNewDefinition: boolean,
): "definition" | "rules" | null {
  if (hasNewDefinition || changed.includes("kind") || changed.includes("matureAfterDays"))
    return "definition";
  return changed.some((name) => CHANGES_VERDICTS.has(name)) ? "rules" : null;
}

const settingNames = [
  "name",
  "kind",
  "per",
  "betterWhen",
  "team",
  "numeratorBy",
  "matureAfterDays",
  "sharedDenominator",
  "limits",
  "rules",
  "target",
] as const satisfies readonly SettingName[];

const CHANGES_VERDICTS: ReadonlySet<SettingName> = new Set<SettingName>(["limits", "rules", "betterWhen"]);

/** The kind decides the mathematics of every month counted so far; the other says where denominators are kept. */
const FIXED_ONCE_COUNTED: Partial<Record<SettingName, string>> = {
  kind: "The kind is fixed once counts exist. Set up a new indicator instead.",
  sharedDenominator:
    "Where the denominator is kept is fixed once counts exist. Set up a new indicator instead.",
};

function sameSetting(left: unknown, right: unknown): boolean {
  return JSON.stringify(left) === JSON.stringify(right);
}
