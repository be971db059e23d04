import "server-only";
import { sql } from "drizzle-orm";
import { uuidv7 } from "uuidv7";
import { selectRows } from "@/db/rows";
import type { TxCtx } from "@/db/transaction";
import { asMonth } from "@/lib/indicators/month";
import { actorName } from "@/lib/policy";
import { actorIdOf, keyTable, type TallyKey } from "@/lib/services/tallies";
import { importWords } from "@/lib/strings/imports";
import type { ImportRun } from "./queries";
import { inTurns } from "./yielding";

interface KeyRow {
  ward_id: string;
  indicator_id: string;
  month: string;
}

const keyOf = (row: KeyRow): TallyKey => ({
  wardId: row.ward_id,
  indicatorId: row.indicator_id,
  month: asMonth(row.month),
});

/**
 * Puts every line that the import charted or corrected back on, or off, its chart as the last revision before it
 * says, with a revision of that. Answers the lines.
 */
export async function restoreCharts(tx: TxCtx, run: ImportRun): Promise<TallyKey[]> {
  const rows = await selectRows<KeyRow>(
    tx.db,
    sql`select distinct ward_id, indicator_id, month from tally_revisions
        where import_run_id = ${run.id}::uuid and charted is not null order by ward_id, month, indicator_id`,
  );
  const keys = rows.map(keyOf);
  await inTurns(keys, async (some) => {
    await restoreSome(tx, run, some);
    await noteRestored(tx, run, some);
  });
  return keys;
}

async function restoreSome(tx: TxCtx, run: ImportRun, keys: readonly TallyKey[]): Promise<void> {
  await tx.db.execute(sql`
    update tallies t set charted = coalesce(b.charted, false),
      charted_numerator = case when b.charted then b.numerator end,
      charted_denominator = case when b.charted then b.denominator end,
      charted_not_collected = case when b.charted then b.not_collected end,
      charted_awaited = case when b.charted then b.awaited end,
      corrected = exists (
        select 1 from tally_revisions c where c.ward_id = t.ward_id and c.indicator_id = t.indicator_id
          and c.month = t.month and c.event = 'corrected' and c.import_run_id is distinct from ${run.id}::uuid)
    from ${keyTable(keys)}
    left join lateral (
      select v.* from tally_revisions v
      where v.ward_id = k.ward_id and v.indicator_id = k.indicator_id and v.month = k.month
        and v.charted is not null and v.import_run_id is distinct from ${run.id}::uuid
      order by v.at desc, v.id desc limit 1
    ) b on true
    where t.ward_id = k.ward_id and t.indicator_id = k.indicator_id and t.month = k.month`);
}

/** A revision holds what it shows: the charted figures, which after a reopening may differ from the typed ones. */
async function noteRestored(tx: TxCtx, run: ImportRun, keys: readonly TallyKey[]): Promise<void> {
  const json = JSON.stringify(
    keys.map((key) => ({
      id: uuidv7(),
      ward_id: key.wardId,
      indicator_id: key.indicatorId,
      month: key.month,
    })),
  );
  await tx.db.execute(sql`
    insert into tally_revisions (id, ward_id, indicator_id, month, event, charted, numerator, denominator,
      not_collected, awaited, note, tally_version, source, reason, import_run_id, actor_id, actor_name, at)
    select k.id, t.ward_id, t.indicator_id, t.month,
      case when t.charted then 'corrected' else 'recalled' end, t.charted,
      case when t.charted then t.charted_numerator else t.numerator end,
      case when t.charted then t.charted_denominator when t.not_collected is null then coalesce(t.denominator, d.value) end,
      case when t.charted then t.charted_not_collected else t.not_collected end,
      case when t.charted then t.charted_awaited else coalesce(t.awaited, d.awaited) end,
      t.note, t.version, 'import', ${importWords.takenBackReason}::text, ${run.id}::uuid,
      ${actorIdOf(tx)}::text, ${actorName(tx.actor)}::text, ${tx.now.toISOString()}::timestamptz
    from json_to_recordset(${json}::json) as k(id uuid, ward_id uuid, indicator_id uuid, month text)
    join tallies t on t.ward_id = k.ward_id and t.indicator_id = k.indicator_id and t.month = k.month
    join indicators i on i.id = t.indicator_id
    left join denominator_values d
      on d.ward_id = t.ward_id and d.month = t.month and d.shared_denominator_id = i.shared_denominator_id`);
}
