import "server-only";
import { eq } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { indicatorDefinitions, indicators } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError, type FieldError } from "@/lib/errors";
import { newestDefinition } from "@/lib/indicators/definition";
import { decideDefinition, type NewDefinition } from "@/lib/indicators/definition-change";
import {
  decideSettings,
  reevaluationNeeded,
  type SettingsDecision,
} from "@/lib/indicators/definition-settings";
import { actorName, authorize, requireAction } from "@/lib/policy";
import type { UpdateIndicator } from "@/lib/schemas/indicator";
import { writeAudit } from "@/lib/services/audit";
import { reevaluateIndicator } from "@/lib/services/series";
import { hasTallies, lockIndicator, type IndicatorDefinition, type IndicatorDetail } from "./internal";
import { indicatorReply } from "./reply";
import { joinSharedDenominator } from "./shared-denominator";

type Input = UpdateIndicator & { code: string };

/**
 * Changes an indicator. New words of the definition make a new version from a month on; settings, rules and the
 * limit method hold for the whole chart. Its series are worked out again where the change touches them.
 */
export async function updateIndicator({ ctx, input }: { ctx: Ctx; input: Input }): Promise<IndicatorDetail> {
  requireAction(ctx.actor, "indicator.update");
  return withTransaction(ctx, async (tx) => {
    const before = await lockIndicator(tx, input.code);
    authorize(tx.actor, "indicator.update", { team: before.team });
    if (input.version !== undefined && before.version !== input.version) {
      const current = indicatorReply(before);
      throw new DomainError("stale", "Somebody changed this indicator meanwhile.", { current });
    }

    const version = decideDefinition(newestDefinition(before.definitions), input);
    const settings = decideSettings(settingsOf(before), input);
    refuse("invalid", settings.problems);
    if (settings.fixedOnceCounted.length > 0 && (await hasTallies(tx.db, before.id))) {
      refuse("conflict", settings.fixedOnceCounted);
    }
    if (settings.changed.length === 0 && version === null) return before;

    const after = await writeChange(tx, before, settings, version);
    const why = reevaluationNeeded(settings.changed, version !== null);
    if (why) await reevaluateIndicator(tx, { indicatorId: before.id, why });
    writeAudit(tx, {
      action: "indicator.update",
      subject: { type: "indicator", id: before.id },
      before: indicatorReply(before),
      after: { ...indicatorReply(after), ...(input.reason ? { reason: input.reason } : {}) },
    });
    return after;
  });
}

async function writeChange(
  tx: TxCtx,
  before: IndicatorDetail,
  { settings }: SettingsDecision,
  version: NewDefinition | null,
): Promise<IndicatorDetail> {
  const { sharedDenominator: sharedCode, ...columns } = settings;
  const label = version?.denominatorLabel ?? newestDefinition(before.definitions).denominatorLabel;
  const sharedDenominator = sharedCode === null ? null : await joinSharedDenominator(tx, sharedCode, label);
  const [row] = await tx.db
    .update(indicators)
    .set({ ...columns, sharedDenominatorId: sharedDenominator?.id ?? null, version: before.version + 1 })
    .where(eq(indicators.id, before.id))
    .returning();
  if (!row) throw new Error("The locked indicator has gone.");
  const added = version ? [await writeDefinition(tx, before.id, version)] : [];
  return { ...row, sharedDenominator, definitions: [...before.definitions, ...added] };
}

async function writeDefinition(
  tx: TxCtx,
  indicatorId: string,
  version: NewDefinition,
): Promise<IndicatorDefinition> {
  const [row] = await tx.db
    .insert(indicatorDefinitions)
    .values({ id: uuidv7(), indicatorId, ...version, decidedBy: actorName(tx.actor), decidedAt: tx.now })
    .returning();
  if (!row) throw new Error("No definition was written.");
  return row;
}

function settingsOf(detail: IndicatorDetail) {
  return { ...detail, sharedDenominator: detail.sharedDenominator?.code ?? null };
}

function refuse(code: "invalid" | "conflict", errors: FieldError[]): void {
  const [first] = errors;
  if (first) throw new DomainError(code, first.message, { errors });
}
