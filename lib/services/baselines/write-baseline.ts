import "server-only";
import { and, eq, inArray, isNull } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { baselines } from "@/db/schema";
import type { TxCtx } from "@/db/transaction";
import type { LimitMethod } from "@/lib/limits/types";
import { actorName } from "@/lib/policy";
import type { SetBaseline } from "@/lib/schemas/baseline";
import type { SeriesKey } from "@/lib/services/series";
import type { Baseline } from "./internal";

interface NewBaseline {
  key: SeriesKey;
  input: SetBaseline;
  limits: LimitMethod;
  /** Decided at once, or waiting for somebody else. */
  decided: boolean;
}

export async function insertBaseline(
  tx: TxCtx,
  { key, input, limits, decided }: NewBaseline,
): Promise<Baseline> {
  const who = { id: personId(tx), name: actorName(tx.actor) };
  const [row] = await tx.db
    .insert(baselines)
    .values({
      id: uuidv7(),
      ...key,
      fromMonth: input.from,
      toMonth: input.to,
      appliesFrom: input.appliesFrom,
      leftOut: [...input.leftOut],
      limits,
      reason: input.reason,
      state: decided ? "decided" : "proposed",
      proposedById: who.id,
      proposedBy: who.name,
      proposedAt: tx.now,
      ...(decided ? { decidedById: who.id, decidedBy: who.name, decidedAt: tx.now } : {}),
    })
    .returning();
  if (!row) throw new Error("No baseline was written.");
  return row;
}

/** The decided baseline of the same beginning makes way: at most one is in force. */
export async function supersedeDecided(tx: TxCtx, key: SeriesKey, replacedBy: Baseline): Promise<void> {
  const { appliesFrom } = replacedBy;
  const rows = await tx.db
    .select({ id: baselines.id, version: baselines.version })
    .from(baselines)
    .where(
      and(
        eq(baselines.wardId, key.wardId),
        eq(baselines.indicatorId, key.indicatorId),
        eq(baselines.state, "decided"),
        appliesFrom === null ? isNull(baselines.appliesFrom) : eq(baselines.appliesFrom, appliesFrom),
      ),
    );
  for (const row of rows) {
    await tx.db
      .update(baselines)
      .set({ state: "superseded", supersededAt: tx.now, version: row.version + 1 })
      .where(eq(baselines.id, row.id));
  }
}

/** Closes a proposal: agreed with the limits settled now, or declined. */
export async function closeProposal(
  tx: TxCtx,
  proposal: Baseline,
  decision: { agree: boolean; reason: string | null; limits: LimitMethod },
): Promise<Baseline> {
  const [row] = await tx.db
    .update(baselines)
    .set({
      state: decision.agree ? "decided" : "declined",
      limits: decision.limits,
      decidedById: personId(tx),
      decidedBy: actorName(tx.actor),
      decidedAt: tx.now,
      decisionReason: decision.reason,
      version: proposal.version + 1,
    })
    .where(and(eq(baselines.id, proposal.id), inArray(baselines.state, ["proposed"])))
    .returning();
  if (!row) throw new Error("The locked proposal has gone.");
  return row;
}

function personId(tx: TxCtx): string | null {
  return tx.actor.kind === "person" ? tx.actor.personId : null;
}
