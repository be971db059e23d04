import "server-only";
import { uuidv7 } from "uuidv7";
import { indicatorDefinitions, indicators } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { DomainError } from "@/lib/errors";
import { FROM_THE_BEGINNING } from "@/lib/indicators/definition";
import { actorName, authorize, requireAction } from "@/lib/policy";
import type { CreateIndicator } from "@/lib/schemas/indicator";
import { writeAudit } from "@/lib/services/audit";
import type { IndicatorDefinition, IndicatorDetail } from "./internal";
import { indicatorReply } from "./reply";
import { joinSharedDenominator } from "./shared-denominator";

interface Verb {
  ctx: Ctx;
  input: CreateIndicator;
}

/** A new indicator with its first definition. */
export async function createIndicator({ ctx, input }: Verb): Promise<IndicatorDetail> {
  requireAction(ctx.actor, "indicator.create");
  return withTransaction(ctx, async (tx) => {
    authorize(tx.actor, "indicator.create", { team: input.team });

    const sharedDenominator =
      input.sharedDenominator === null
        ? null
        : await joinSharedDenominator(tx, input.sharedDenominator, input.denominatorLabel);
    const [indicator] = await tx.db
      .insert(indicators)
      .values({
        id: uuidv7(),
        code: input.code,
        name: input.name,
        kind: input.kind,
        per: input.per,
        betterWhen: input.betterWhen,
        team: input.team,
        numeratorBy: input.numeratorBy,
        matureAfterDays: input.matureAfterDays,
        sharedDenominatorId: sharedDenominator?.id ?? null,
        limits: input.limits,
        rules: input.rules,
        target: input.target,
      })
      .onConflictDoNothing({ target: indicators.code })
      .returning();
    if (!indicator) throw codeTaken(input.code);
    const first = await writeFirstDefinition(tx, indicator.id, input);

    const detail = { ...indicator, sharedDenominator, definitions: [first] };
    writeAudit(tx, {
      action: "indicator.create",
      subject: { type: "indicator", id: indicator.id },
      after: indicatorReply(detail),
    });
    return detail;
  });
}

async function writeFirstDefinition(
  tx: TxCtx,
  indicatorId: string,
  input: CreateIndicator,
): Promise<IndicatorDefinition> {
  const [first] = await tx.db
    .insert(indicatorDefinitions)
    .values({
      id: uuidv7(),
      indicatorId,
      number: 1,
      effectiveFrom: input.effectiveFrom ?? FROM_THE_BEGINNING,
      numeratorLabel: input.numeratorLabel,
      denominatorLabel: input.denominatorLabel,
      attribution: input.attribution,
      comparable: true,
      reason: "First definition",
      decidedBy: actorName(tx.actor),
      decidedAt: tx.now,
    })
    .returning();
  if (!first) throw new Error("No definition was written.");
  return first;
}

function codeTaken(code: string): DomainError {
  const message = `There is an indicator with the code ${code} already.`;
  return new DomainError("conflict", message, { errors: [{ path: "code", message }] });
}
