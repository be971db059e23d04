import { newestDefinition } from "@/lib/indicators/definition";
import type { IndicatorReply } from "@/lib/schemas/indicator";
import type { IndicatorDetail } from "./internal";

/** An indicator as the API and the audit name it: codes instead of ids, words of the newest definition on top. */
export function indicatorReply(detail: IndicatorDetail): IndicatorReply {
  const newest = newestDefinition(detail.definitions);
  return {
    code: detail.code,
    name: detail.name,
    numeratorLabel: newest.numeratorLabel,
    denominatorLabel: newest.denominatorLabel,
    attribution: newest.attribution,
    kind: detail.kind,
    per: detail.per,
    betterWhen: detail.betterWhen,
    team: detail.team,
    numeratorBy: detail.numeratorBy,
    matureAfterDays: detail.matureAfterDays,
    sharedDenominator: detail.sharedDenominator?.code ?? null,
    limits: detail.limits,
    rules: detail.rules,
    target: detail.target,
    version: detail.version,
    definitions: detail.definitions.map((version) => ({
      number: version.number,
      effectiveFrom: version.effectiveFrom,
      numeratorLabel: version.numeratorLabel,
      denominatorLabel: version.denominatorLabel,
      attribution: version.attribution,
      comparable: version.comparable,
      reason: version.reason,
      decidedBy: version.decidedBy,
      decidedAt: version.decidedAt.toISOString(),
    })),
  };
}
