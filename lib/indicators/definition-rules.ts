import type { RuleSetting } from "./definition-settings";
import type { WatchedRule } from "./vocabulary";

export interface RunLength {
  usual: number;
  least: number;
  most: number;
}

/** Rules whose run length is a setting: months in a row, the usual number and what may be chosen. */
export const runLengths: Partial<Record<WatchedRule, RunLength>> = {
  "one-side": { usual: 8, least: 6, most: 20 },
  trend: { usual: 6, least: 5, most: 20 },
  "within-one-sigma": { usual: 15, least: 10, most: 40 },
};

/** What is wrong with one rule as given, or null. */
export function ruleProblem(rule: RuleSetting): string | null {
  if (rule.length === undefined) return null;
  const bounds = runLengths[rule.name];
  if (!bounds) return "The length of this rule can't be chosen.";
  if (rule.length >= bounds.least && rule.length <= bounds.most) return null;
  return `Choose ${bounds.least} to ${bounds.most} months.`;
}

/** The rule with its usual length filled in, so that the record says what was in use. */
export function withUsualLength(rule: RuleSetting): RuleSetting {
  const length = rule.length ?? runLengths[rule.name]?.usual;
  return length === undefined ? { name: rule.name } : { name: rule.name, length };
}
