import "server-only";
import { sql } from "drizzle-orm";
import { seriesState, type SeriesColumns } from "@/db/schema";
import { withTransaction, type Ctx, type TxCtx } from "@/db/transaction";
import { requireAction } from "@/lib/policy";
import { writeAudit } from "@/lib/services/audit";
import { distinctPairs, keyOf, pairTable, type SeriesKey } from "./pairs";
import { allSeries, reevaluateSeries, type SignalChanges } from "./reevaluate-series";

export interface RebuildResult extends SignalChanges {
  series: number;
  /** Series whose stored state differed from what the figures say. */
  states: number;
}

/** Series a transaction: others who save meanwhile wait for one of these, not for all. */
const CHUNK = 100;

/**
 * Works every series out again from its figures. Right after normal use it finds nothing to change; what it does
 * find is put right and counted.
 */
export async function rebuildSeries({ ctx }: { ctx: Ctx }): Promise<RebuildResult> {
  requireAction(ctx.actor, "series.rebuild");
  const pairs = distinctPairs(await allSeries(ctx));
  const total: RebuildResult = {
    series: pairs.length,
    states: 0,
    born: 0,
    moved: 0,
    cameBack: 0,
    withdrawn: 0,
  };
  for (let start = 0; start < pairs.length; start += CHUNK) {
    const chunk = pairs.slice(start, start + CHUNK);
    const found = await withTransaction(ctx, (tx) => rebuildChunk(tx, chunk));
    total.states += found.states;
    total.born += found.born;
    total.moved += found.moved;
    total.cameBack += found.cameBack;
    total.withdrawn += found.withdrawn;
    await new Promise((resolve) => setImmediate(resolve));
  }
  await withTransaction(ctx, async (tx) => {
    writeAudit(tx, { action: "series.rebuild", subject: { type: "series", id: "all" }, after: { ...total } });
  });
  return total;
}

async function rebuildChunk(
  tx: TxCtx,
  pairs: readonly SeriesKey[],
): Promise<SignalChanges & { states: number }> {
  const before = await loadStates(tx, pairs);
  const changes = await reevaluateSeries(tx, { pairs, why: "rules" });
  const after = await loadStates(tx, pairs);
  const states = [...after].filter(([key, state]) => state !== before.get(key)).length;
  return { ...changes, states };
}

/** Each stored state as text, so that two can be compared. */
async function loadStates(tx: TxCtx, pairs: readonly SeriesKey[]): Promise<Map<string, string>> {
  const rows = await tx.db
    .select()
    .from(seriesState)
    .where(
      sql`(${seriesState.wardId}, ${seriesState.indicatorId}) in (select ward_id, indicator_id from ${pairTable(pairs)})`,
    );
  return new Map(
    rows.map((row) => [keyOf(row), JSON.stringify([...verdictsOf(row), columnsInOrder(row.columns)])]),
  );
}

function verdictsOf(row: typeof seriesState.$inferSelect) {
  return [row.centre, row.baselineStatus, row.hasLimits, row.activeSignals, row.newestMonth];
}

/** The database doesn't keep the order of keys. */
function columnsInOrder(columns: SeriesColumns): unknown[] {
  return Object.entries(columns)
    .sort(([left], [right]) => (left < right ? -1 : 1))
    .map(([, values]) => values as unknown);
}
