import "server-only";
import { sql } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import type { TxCtx } from "@/db/transaction";
import type { RevisionEvent, RevisionSource } from "@/lib/indicators/vocabulary";
import { actorName } from "@/lib/policy";
import { effectiveAwaited, effectiveDenominator } from "./effective";
import { inChunks, type TallyKey } from "./keys";

export interface RevisionKey extends TallyKey {
  /** What the revision does to the chart: true shows its figures, false takes the month off, null changes nothing. */
  charted: boolean | null;
}

export interface RevisionFacts {
  event: RevisionEvent;
  source: RevisionSource;
  reason?: string | null;
  importRunId?: string | null;
}

/** The person's id where a person acts. */
export function actorIdOf(tx: TxCtx): string | null {
  return tx.actor.kind === "person" ? tx.actor.personId : null;
}

/**
 * Adds a revision to each line, with the figures as they stand now in the transaction. Ids are made here, in order,
 * because what happens at the same instant is told apart by them.
 */
export async function addRevisions(
  tx: TxCtx,
  keys: readonly RevisionKey[],
  facts: RevisionFacts,
): Promise<void> {
  await inChunks(keys, async (chunk) => {
    const rows = chunk.map((key) => ({
      id: uuidv7(),
      ward_id: key.wardId,
      indicator_id: key.indicatorId,
      month: key.month,
      charted: key.charted,
    }));
    await tx.db.execute(sql`
      insert into tally_revisions (id, ward_id, indicator_id, month, event, charted, numerator, denominator,
        not_collected, awaited, note, tally_version, source, reason, import_run_id, actor_id, actor_name, at)
      select t.id, t.ward_id, t.indicator_id, t.month, ${facts.event}::text, t.charted, t.numerator,
        case when t.not_collected is null then ${effectiveDenominator} end,
        t.not_collected,
        case when t.not_collected is null then ${effectiveAwaited} end,
        t.note, coalesce(t.version, 0), ${facts.source}::text, ${facts.reason ?? null}::text,
        ${facts.importRunId ?? null}::uuid, ${actorIdOf(tx)}::text, ${actorName(tx.actor)}::text,
        ${tx.now.toISOString()}::timestamptz
      from (
        select k.id, k.ward_id, k.indicator_id, k.month, k.charted, line.numerator, line.denominator,
          line.not_collected, line.awaited, line.note, line.version
        from json_to_recordset(${JSON.stringify(rows)}::json)
          as k(id uuid, ward_id uuid, indicator_id uuid, month text, charted boolean)
        left join tallies line
          on line.ward_id = k.ward_id and line.indicator_id = k.indicator_id and line.month = k.month
      ) t
      join indicators i on i.id = t.indicator_id
      left join denominator_values d
        on d.ward_id = t.ward_id and d.month = t.month and d.shared_denominator_id = i.shared_denominator_id`);
  });
}
